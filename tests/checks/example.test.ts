import { readFileSync, writeFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { parseReadingDocument, read, type ReadingDocument } from '@/lib/reading';
import { intake } from '@/lib/server/pictures/intake';

// The worked example of the reading document: d01 and d03 of tests/fixtures/charts clicked by hand. After a change that is meant,
// COUPLET_WRITE_EXAMPLE=1 writes the result anew; look at what changed before keeping it.
const FOLDER = new URL('../fixtures/example/', import.meta.url);
const CHARTS = new URL('../fixtures/charts/', import.meta.url);
const RESULT = new URL('couplet.result.json', FOLDER);

function exampleDocument(): ReadingDocument {
  const parsed = parseReadingDocument(JSON.parse(readFileSync(new URL('couplet.reading.json', FOLDER), 'utf8')));
  if (!parsed.ok) throw new Error(`${parsed.path}: ${parsed.message}`);
  return parsed.document;
}

/** The same data with every number cut to nine digits: a last bit may differ between machines, nothing else. */
const cut = (text: string): unknown =>
  JSON.parse(text, (_, value: unknown) => (typeof value === 'number' ? Number(value.toPrecision(9)) : value));

it('the example document gives the example result', async () => {
  const result = await read(exampleDocument(), {
    picture: async (image) => ({ ...(await intake(readFileSync(new URL(image, CHARTS)))), rgb: undefined }),
  });
  const text = `${JSON.stringify(result, null, 1)}\n`;
  if (process.env['COUPLET_WRITE_EXAMPLE']) writeFileSync(RESULT, text);
  expect(cut(text)).toEqual(cut(readFileSync(RESULT, 'utf8')));
});
