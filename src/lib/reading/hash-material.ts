import type { ReadingDocument } from './document';
import type { ReadingModel } from './result';

/** Everything that an approval stands for; hashed over its RFC 8785 form. */
export interface HashMaterial {
  readonly document: ReadingDocument;
  /** Of the picture of each chart, in order. */
  readonly pixelsSha256: readonly string[];
  readonly model: ReadingModel | null;
  readonly engine: string;
}

/** What the approval hash is taken of: SHA-256 of the RFC 8785 form of this object. Canonical form and hash are made by the caller. */
export const hashMaterial = (
  document: ReadingDocument,
  pixelsSha256: readonly string[],
  model: ReadingModel | null,
  engine: string,
): HashMaterial => ({ document, pixelsSha256, model, engine });
