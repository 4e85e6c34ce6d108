import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { read } from '@/lib/reading';
import { documentOf, manifest, stored } from './stored';

/** Hashes are not looked at here: the size of the picture is what reading needs. */
async function sizeOf(file: string) {
  const { width, height } = await sharp(stored(file)).metadata();
  return { width, height, fileSha256: '', pixelsSha256: '' };
}

const resultOf = (reading: (typeof manifest.readings)[number]) =>
  read(documentOf(reading.file), { picture: (image) => sizeOf(`sheets/${reading.sheet}/${image}`) });

describe('the product reads every sample', () => {
  test.each(manifest.readings)('$module gets a model that misses by what three constants miss', async (reading) => {
    const { model, modelMissing, charts } = await resultOf(reading);
    expect(modelMissing).toBeNull();
    // Three constants on a real leg: about 1 % of Qmax, voltage 4 to 9 % of Vmax (worked out for this project, no outside source).
    expect(model?.rmsPercentOfQmax).toBeLessThan(2.5);
    expect(model?.rmsPercentOfVmax).toBeLessThan(9);
    for (const { frame } of charts) expect(frame.residualPx).toBeLessThan(1);
  });

  test.each(manifest.readings.filter(({ sheet }) => sheet.startsWith('dunmarrow')))('$module stands on a turned page', async (reading) => {
    const { charts } = await resultOf(reading);
    expect(charts.map(({ frame }) => frame.kind)).toEqual(['turned', 'turned']);
  });
});
