import { readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { parseReadingDocument, type ReadingDocument } from '@/lib/reading';
import { parseManifest } from '@/lib/server/demo/manifest';

export const samples = fileURLToPath(new URL('../../../samples/', import.meta.url));

export const stored = (file: string): Buffer => readFileSync(path.join(samples, file));

export const manifest = parseManifest(stored('manifest.json').toString('utf8'));

/** The document of a reading; one that the program refuses stops the test with the place and the sentence. */
export function documentOf(file: string): ReadingDocument {
  const parsed = parseReadingDocument(JSON.parse(stored(file).toString('utf8')));
  if (!parsed.ok) throw new Error(`${file}, ${parsed.path}: ${parsed.message}`);
  return parsed.document;
}
