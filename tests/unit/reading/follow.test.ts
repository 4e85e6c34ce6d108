import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { read, ReadingRefused, type ReadingDocument } from '@/lib/reading';
import { intake } from '@/lib/server/pictures/intake';
import { documentOf, truthOf } from '../../support/charts';

const host = {
  picture: async (image: string) => {
    const { width, height, fileSha256, pixelsSha256, rgb } = await intake(
      readFileSync(new URL(`../../fixtures/charts/${image}`, import.meta.url)),
    );
    return { width, height, fileSha256, pixelsSha256, rgb: () => Promise.resolve(rgb) };
  },
};

const together = (...names: string[]): ReadingDocument => {
  const documents = names.map(documentOf);
  return { ...documents[0]!, charts: documents.flatMap(({ charts }) => charts) };
};

describe('curves given by a start', () => {
  it('are followed, with their values and what hides them', async () => {
    const { charts } = await read(documentOf('d12'), host);
    const curve = charts[0]!.curves[0]!;
    expect(curve).toMatchObject({ value: 1.5, by: 'followed' });
    expect(curve.gaps.map(({ why }) => why)).toContain('label');
    const drawn = truthOf('d12').curves[0]!;
    expect(curve.points[0]!.y).toBeCloseTo(drawn.y[0]!, 0);
    expect(curve.points[curve.points.length - 1]!.x).toBeCloseTo(drawn.x[drawn.x.length - 1]!, 0);
  });

  it('make a model of heat and voltage that is close to the sheet', async () => {
    const { model, modelMissing } = await read(together('d01', 'd03'), host);
    expect(modelMissing).toBeNull();
    expect(model!.rmsPercentOfQmax).toBeLessThan(1.5);
    expect(model!.derived[0]!.qmaxW.value / truthOf('d01').Qmax).toBeCloseTo(1, 1);
  });

  it('are refused at the start that has no line', async () => {
    const document = documentOf('d01');
    const blank = {
      ...document,
      charts: document.charts.map((chart) => ({ ...chart, curves: [{ value: 1, start: [820, 150] as const }] })),
    };
    await expect(read(blank, host)).rejects.toThrow(ReadingRefused);
    await expect(read(blank, host)).rejects.toMatchObject({
      path: 'charts[0].curves[0].start',
      message: expect.stringMatching(/no line within 6 pixels/),
    });
  });

  it('are refused outside the picture', async () => {
    const document = documentOf('d01');
    const off = {
      ...document,
      charts: document.charts.map((chart) => ({ ...chart, curves: [{ value: 1, start: [2000, 150] as const }] })),
    };
    await expect(read(off, host)).rejects.toMatchObject({ path: 'charts[0].curves[0].start' });
  });
});
