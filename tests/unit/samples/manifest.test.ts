import { readdirSync, statSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { readingModule } from '../../../samples/draw/printed';
import { benchDocument, fromReadingDocument } from '@/lib/editor';
import { parseManifest, samplesManifest } from '@/lib/server/demo/manifest';
import { documentOf, manifest, samples, stored } from './stored';

const named = [...manifest.sheets.flatMap(({ pages }) => pages.map(({ file }) => file)), ...manifest.readings.map(({ file }) => file)];
const pagesOf = (slug: string) => manifest.sheets.find((sheet) => sheet.slug === slug)?.pages.map(({ file }) => path.basename(file)) ?? [];

function filesUnder(folder: string): string[] {
  return readdirSync(path.join(samples, folder), { withFileTypes: true }).flatMap((entry) =>
    entry.isDirectory() ? filesUnder(`${folder}/${entry.name}`) : [`${folder}/${entry.name}`],
  );
}

describe('the manifest of the samples', () => {
  test('names every file under sheets and no other', () => {
    expect(filesUnder('sheets').sort()).toEqual([...named].sort());
  });

  test('names no file twice', () => {
    expect(new Set(named).size).toBe(named.length);
  });

  test('has at least twenty-six modules of five makers, each with one reading', () => {
    expect(manifest.vendors).toHaveLength(5);
    expect(manifest.modules.length).toBeGreaterThanOrEqual(26);
    expect(manifest.readings.map(({ module }) => module).sort()).toEqual(manifest.modules.map(({ slug }) => slug).sort());
    expect(new Set(manifest.modules.map(({ module }) => module.vendor))).toEqual(new Set(manifest.vendors.map(({ name }) => name)));
  });

  test('spans sizes from 8 to 62 mm, 0.8 to 15 A, 7 to 254 couples and largest differences of 62 to 74 K near room temperature', () => {
    const spread = (values: readonly (number | null | undefined)[]) => {
      const known = values.filter((value) => typeof value === 'number');
      return [Math.min(...known), Math.max(...known)];
    };
    const modules = manifest.modules.map(({ module }) => module);
    const nearRoom = modules.flatMap(({ ratings }) => ratings.filter(({ hotSideC }) => hotSideC <= 30));
    expect(spread(modules.map(({ coldPlateMm }) => coldPlateMm?.[0]))).toEqual([8, 62]);
    expect(spread(modules.map(({ couples }) => couples))).toEqual([7, 254]);
    const [least, most] = spread(nearRoom.map(({ imaxA }) => imaxA));
    expect(least).toBeCloseTo(0.8, 1);
    expect(most).toBeCloseTo(15, 0);
    expect(spread(nearRoom.map(({ dTmaxK }) => dTmaxK))).toEqual([62, 74]);
  });

  test('leaves some things unstated', () => {
    const modules = manifest.modules.map(({ module }) => module);
    for (const key of ['couples', 'stages', 'heightMm', 'hotPlateMm', 'maxTemperatureC', 'leadsOhm', 'sealing', 'acResistanceOhm'] as const)
      expect([key, modules.some((module) => module[key] === null)]).toEqual([key, true]);
    const ratings = modules.flatMap((module) => module.ratings);
    expect(ratings.some(({ imaxMeans }) => imaxMeans === 'notStated')).toBe(true);
    expect(ratings.some(({ tolerancePercent }) => tolerancePercent === null)).toBe(true);
  });

  test('keeps couples and currents out of the part numbers', () => {
    for (const { module } of manifest.modules) {
      const numbers = (module.partNumber.match(/\d+(\.\d+)?/g) ?? []).map(Number);
      for (const { imaxA } of module.ratings) expect(numbers).not.toContain(imaxA);
      expect(numbers).not.toContain(module.couples);
    }
  });

  test('stays below 4 MB of pictures, in PNG and in JPEG', () => {
    const pictures = named.filter((file) => !file.endsWith('.json'));
    const bytes = pictures.reduce((sum, file) => sum + statSync(path.join(samples, file)).size, 0);
    expect(bytes).toBeLessThan(4e6);
    expect(new Set(pictures.map((file) => path.extname(file)))).toEqual(new Set(['.png', '.jpg']));
  });

  test('refuses names that lead nowhere, each with a sentence', () => {
    const reading = { ...manifest.readings[0], sheet: 'nowhere' };
    const stranger = { ...manifest, vendors: manifest.vendors.slice(1), readings: [reading] };
    const faults = samplesManifest.safeParse(stranger).error?.issues.map(({ message }) => message) ?? [];
    expect(faults).toContain('oc-118 is of Ormsund Cold, which is not among the vendors.');
    expect(faults).toContain(`${reading.file} names the sheet nowhere, which is not there.`);
  });

  test('refuses a path out of its folder', () => {
    const text = stored('manifest.json').toString('utf8').replace('sheets/oc-118/oc-118-ratings.png', 'sheets/../oc-118-ratings.png');
    expect(() => parseManifest(text)).toThrow('Name a file under sheets/.');
  });
});

describe('the readings of the samples', () => {
  test.each(manifest.readings)('$module: the document parses, says what the manifest says and stands on pages of its sheet', (reading) => {
    const document = documentOf(reading.file);
    const module = manifest.modules.find(({ slug }) => slug === reading.module)?.module;
    expect(module && readingModule(module)).toEqual(document.module);
    const pages = pagesOf(reading.sheet);
    for (const { image } of document.charts) expect(pages).toContain(image);
  });

  test('have 9 to 15 points by hand on every curve, and marks whose values are known', () => {
    for (const { file } of manifest.readings)
      for (const { marks = [], curves = [] } of documentOf(file).charts) {
        expect(marks.length).toBeGreaterThanOrEqual(4);
        expect(curves.length).toBeGreaterThanOrEqual(4);
        for (const { points = [], by } of curves) {
          expect(by).toBe('hand');
          expect(points.length).toBeGreaterThanOrEqual(9);
          expect(points.length).toBeLessThanOrEqual(15);
        }
      }
  });

  test('open as drafts of the bench', () => {
    const picture = { id: 1, pixelsSha256: '0'.repeat(64), width: 1200, height: 1330 };
    for (const { file } of manifest.readings) {
      const opened = fromReadingDocument(documentOf(file), () => picture);
      expect([file, opened.ok && benchDocument.safeParse(opened.document).success]).toEqual([file, true]);
    }
  });

  test('say in their note that the clicks are simulated', () => {
    for (const { file } of manifest.readings) expect(documentOf(file).note).toMatch(/^Simulated clicks with 0\.5 px of scatter/);
  });
});
