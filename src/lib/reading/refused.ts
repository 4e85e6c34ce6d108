/** Why a document is not read: where in the document, and a sentence that says how to mend it. */
export interface Refusal {
  /** Like `charts[0].marks[2].px`; empty for the document as a whole. */
  readonly path: string;
  readonly message: string;
}

/** Thrown by `read` when a document cannot be read. */
export class ReadingRefused extends Error implements Refusal {
  override readonly name = 'ReadingRefused';
  constructor(
    readonly path: string,
    message: string,
  ) {
    super(message);
  }
}

/** Thrown by a host that cannot give a picture; `read` turns it into a refusal at the image of the chart. */
export class PictureRefused extends Error {
  override readonly name = 'PictureRefused';
}

/** A path as the refusals print it: `charts[0].marks[2].px` from `['charts', 0, 'marks', 2, 'px']`. */
export const pathText = (path: readonly PropertyKey[]): string =>
  path.reduce<string>((text, step) => (typeof step === 'number' ? `${text}[${step}]` : `${text}${text && '.'}${String(step)}`), '');
