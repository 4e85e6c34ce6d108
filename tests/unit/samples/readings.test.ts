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
  test.each(manifest.readings)('$module gets the leg form, and misses less than any constants could', async (reading) => {
    const { model, modelMissing, charts } = await resultOf(reading);
    expect(modelMissing).toBeNull();
    // Three constants on a real leg: about 1 % of Qmax, voltage 4 to 9 % of Vmax; legs of the published shapes on other material: heat 0.1 to
    // 0.4 % in the sheet, up to 2 % over two hot sides, voltage about 1 % (worked out for this project, no outside source).
    expect(model?.form).toBe('leg');
    expect(model?.rmsPercentOfQmax).toBeLessThan(1);
    expect(model?.rmsPercentOfVmax).toBeLessThan(1);
    for (const { frame } of charts) expect(frame.residualPx).toBeLessThan(1);
  });

  test.each(manifest.readings.filter(({ sheet }) => sheet.startsWith('dunmarrow')))('$module stands on a turned page', async (reading) => {
    const { charts } = await resultOf(reading);
    expect(charts.map(({ frame }) => frame.kind)).toEqual(['turned', 'turned']);
  });
});
