import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { drawFront } from '../../../samples/draw/front';
import { LETTERS } from '../../../samples/draw/letters';
import { pathOf } from '../../../samples/draw/manifest';
import { drawPicture } from '../../../samples/draw/picture';
import type { Made, SheetPlan } from '../../../samples/draw/plan';
import { drawSheet, makeModule, slugOf, toJson } from '../../../samples/draw/sheet';
import { drawText, textWidth } from '../../../samples/draw/text';
import type { Truth } from '../../../samples/draw/truth';
import { sheets } from '../../../samples/plan';
import type { Px } from '@/lib/geometry';
import { manifest, stored } from './stored';

const plan = (slug: string): SheetPlan => {
  const found = sheets.find((sheet) => sheet.slug === slug);
  if (!found) throw new Error(slug);
  return found;
};

/** A module as the manifest has it, which is all that a front page shows. */
const storedModule = (sheet: SheetPlan, at: number): Made => {
  const modulePlan = sheet.modules[at] as Made['plan'];
  const slug = slugOf(modulePlan.partNumber, modulePlan.variant);
  const body = manifest.modules.find((module) => module.slug === slug)?.module as Made['body'];
  return { slug, plan: modulePlan, body, truth: {} as Truth };
};

describe('drawing again', () => {
  test.each(['oc-131', 'dunmarrow-6'])('gives the same pictures and readings of the sheet %s, byte for byte', async (slug) => {
    const drawn = await drawSheet(plan(slug));
    for (const { name, bytes } of drawn.pictures) expect([name, bytes.equals(stored(pathOf(drawn, name)))]).toEqual([name, true]);
    for (const { name, document } of drawn.readings) expect(toJson(document)).toBe(stored(pathOf(drawn, name)).toString('utf8'));
  });

  test.each(sheets)('gives the same front page of the sheet $slug', async (sheet) => {
    const { name, bytes } = await drawFront(
      sheet,
      sheet.modules.map((_, at) => storedModule(sheet, at)),
    );
    expect(bytes.equals(stored(`sheets/${sheet.slug}/${name}`))).toBe(true);
  });
});

/** How far below a line its ink lies: the middle of the darkness in one column of pixels, near the line. */
async function offsets(bytes: Buffer, line: readonly Px[]): Promise<number[]> {
  const { data, info } = await sharp(bytes).toColourspace('b-w').raw().toBuffer({ resolveWithObject: true });
  const dark = (x: number, y: number) => Math.max(0, 235 - (data[(y * info.width + x) * info.channels] ?? 255));
  return line.slice(8, -8).flatMap(([x, y], at) => {
    const next = line[at + 9] ?? [x, y];
    const column = Math.floor(x);
    const centre = y + ((next[1] - y) / (next[0] - x)) * (column + 0.5 - x);
    const rows = Array.from({ length: 11 }, (_, row) => Math.floor(centre) - 5 + row);
    const ink = rows.reduce((sum, row) => sum + dark(column, row), 0);
    return ink > 0 ? [rows.reduce((sum, row) => sum + dark(column, row) * (row + 0.5), 0) / ink - centre] : [];
  });
}

const middle = (values: readonly number[]) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? NaN;

describe('the ink', () => {
  test.each([
    { sheet: 'oc-131', page: 2, near: 0.01 },
    { sheet: 'dunmarrow-9', page: 0, near: 0.02 },
  ])('of the sheet $sheet lies where the readings take it to be, within $near px', async ({ sheet, page, near }) => {
    const { style, body, modules } = plan(sheet);
    const made = makeModule(body.vendor, modules[0] as Made['plan']);
    const picture = made.plan.pictures(made)[page] as ReturnType<Made['plan']['pictures']>[number];
    const { bytes, lines } = await drawPicture(made, picture, style);
    expect(lines.length).toBeGreaterThanOrEqual(4);
    for (const line of lines) expect(Math.abs(middle(await offsets(bytes, line)))).toBeLessThan(near);
  });
});

describe('the alphabet', () => {
  test('has every character that the sheets are written in', () => {
    const words = [
      ...manifest.sheets.flatMap(({ sheet, pages }) => [
        sheet.vendor,
        sheet.title,
        sheet.number,
        sheet.revision,
        sheet.dated,
        ...pages.map(({ title }) => title),
      ]),
      ...manifest.modules.flatMap(({ module }) => [module.partNumber, module.variant, module.sealing ?? '']),
      ...sheets.flatMap(({ style }) => [...Object.values(style.words.x), ...Object.values(style.words.y)]),
      '0123456789 − – . , : ; ( ) % ± = × ° Ω Δ',
    ]
      .join('')
      .replaceAll('_', '')
      .replaceAll('\u00a0', ' ');
    expect([...new Set(words)].filter((letter) => !(letter in LETTERS))).toEqual([]);
  });

  test('refuses a character it does not have, by name', () => {
    const face = { weight: 0.1, stretch: 1, slant: 0 };
    expect(() => drawText('2 ½', { x: 0, y: 0, size: 10, ink: '#000' }, face)).toThrow('has no “½”');
  });

  test('sets figures equally wide and letters after an underscore low', () => {
    const face = { weight: 0.1, stretch: 1, slant: 0 };
    expect(textWidth('1111', 10, face)).toBeCloseTo(textWidth('0868', 10, face), 10);
    expect(textWidth('Q_c', 10, face)).toBeLessThan(textWidth('Qc', 10, face));
    expect(drawText('I_max = 3', { x: 0, y: 0, size: 10, ink: '#000' }, face).match(/scale\(0\.7\)/g)).toHaveLength(3);
  });
});
