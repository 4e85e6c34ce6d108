import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { apply, benchDocument, emptyChart, emptyDocument, fromReadingDocument, toReadingDocument } from '@/lib/editor';
import { readingDocument } from '@/lib/reading';
import { finishedDocument, picture } from './arbitrary';

const seed = 20260514;
const module = { vendor: 'Ormsund Cold', partNumber: 'Brimstead 40-C' };
const name = (id: number) => `page-${id}.png`;
const find = (image: string) => (image === 'page-7.png' ? picture : null);

describe('a draft and its reading document', () => {
  test(`a finished draft comes back as it went (seed ${seed})`, () => {
    fc.assert(
      fc.property(finishedDocument, (draft) => {
        const { document, problems } = toReadingDocument(draft, module, name);
        expect(problems).toEqual([]);
        const parsed = readingDocument.parse(JSON.parse(JSON.stringify(document)));
        const back = fromReadingDocument(parsed, find);
        expect(back.ok && renamed(back.document)).toEqual(renamed(draft));
      }),
      { seed, numRuns: 200 },
    );
  });

  test(`and is a draft by its own schema (seed ${seed})`, () => {
    fc.assert(
      fc.property(finishedDocument, (draft) => {
        expect(benchDocument.safeParse(draft).error).toBeUndefined();
      }),
      { seed },
    );
  });

  test('points that are left out are not among the points of the document', () => {
    fc.assert(
      fc.property(finishedDocument, (draft) => {
        const { document, origin } = toReadingDocument(draft, module, name);
        document!.charts.forEach((chart, c) =>
          chart.curves!.forEach((curve, k) => {
            const kept = draft.charts[c]!.curves[k]!;
            expect(curve.points).toHaveLength(kept.points.length - kept.omitted.length);
            expect(origin[c]!.curves[k]!.points.map((index) => kept.points[index])).toEqual(curve.points);
          }),
        );
      }),
      { seed },
    );
  });

  test('a chart that is not finished is left out, with what it misses in sentences', () => {
    const draft = apply(emptyDocument(), { type: 'addChart', chart: emptyChart('c1', picture) });
    const { document, problems } = toReadingDocument(draft, module, name);
    expect(document).toBeNull();
    expect(problems.map(({ station }) => station)).toEqual(['chart', 'chart', 'chart', 'chart', 'frame', 'curves']);
  });

  test('a reading made on a picture that the sheets do not have is refused by the name of the picture', () => {
    const [draft] = fc.sample(finishedDocument, { seed, numRuns: 1 });
    const { document } = toReadingDocument(draft!, module, () => 'elsewhere.png');
    const back = fromReadingDocument(document!, find);
    expect(back.ok ? '' : back.message).toContain('“elsewhere.png”');
  });
});

/** Ids are given out anew on the way back; everything else must be the same. */
const renamed = (draft: unknown) => JSON.parse(JSON.stringify(draft, (key, value: unknown) => (key === 'id' ? 'id' : value)));
