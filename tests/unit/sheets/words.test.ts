import { expect, test } from 'vitest';
import { moduleFacts, numberAndRevision, plateText, printBytes, printSent, ratingText, sheetTitle } from '@/components/sheets/words';
import type { ModuleView, Rating } from '@/lib/contracts';

const N = '\u00a0';
const MB = 1024 * 1024;

const RATING: Rating = {
  hotSideC: 27,
  imaxA: 3.4,
  vmaxV: null,
  qmaxW: 28.912345,
  dTmaxK: 66,
  imaxMeans: 'notStated',
  basis: 'notStated',
  atmosphere: 'notStated',
  tolerancePercent: null,
};

const MODULE: ModuleView = {
  id: 1,
  vendor: { id: 1, name: 'Ormsund Cold' },
  partNumber: 'Brimstead 40-C',
  variant: '',
  stages: 1,
  couples: 127,
  coldPlateMm: [40, 40],
  hotPlateMm: [40, 40],
  heightMm: 3.6,
  maxTemperatureC: null,
  leadsOhm: null,
  sealing: null,
  acResistanceOhm: null,
  acResistanceAtC: null,
  ratings: [],
  version: 1,
};

test('sizes of files are told in units that fit them', () => {
  expect(printBytes(900)).toBe(`900${N}bytes`);
  expect(printBytes(312 * 1024)).toBe(`312${N}kB`);
  expect(printBytes(30 * MB)).toBe(`30${N}MB`);
  expect(printBytes(1.44 * MB)).toBe(`1.4${N}MB`);
});

test('what has gone is told in the unit of the whole', () => {
  expect(printSent(100 * 1024, 312 * 1024)).toBe(`100 of 312${N}kB`);
  expect(printSent(0.5 * MB, 2 * MB)).toBe(`0.5 of 2${N}MB`);
});

test('printed values keep every digit that was typed', () => {
  expect(ratingText(RATING)).toBe(`27${N}°C: 3.4${N}A, 28.912345${N}W, 66${N}K`);
});

test('a hot side with nothing rated says so', () => {
  expect(ratingText({ ...RATING, imaxA: null, qmaxW: null, dTmaxK: null })).toBe(`27${N}°C: not stated`);
});

test('plates of one size are told once, of two sizes apart', () => {
  expect(moduleFacts(MODULE)).toEqual(['127 couples', `40${N}×${N}40${N}mm`, `3.6${N}mm high`]);
  expect(moduleFacts({ ...MODULE, hotPlateMm: [40, 44] })).toContain(`hot plate 40${N}×${N}44${N}mm`);
  expect(moduleFacts({ ...MODULE, hotPlateMm: null })).toContain(`cold plate 40${N}×${N}40${N}mm`);
});

test('one stage goes without saying, two do not', () => {
  expect(moduleFacts({ ...MODULE, stages: 2 })[0]).toBe('2 stages');
});

test('a plate that is not stated has no words', () => {
  expect(plateText(null)).toBeNull();
});

test('a sheet without title goes by its number, one without either by its place', () => {
  const sheet = { id: 7, title: '', number: 'OC-118', revision: 'B' };
  expect(sheetTitle({ ...sheet, title: 'Brimstead series' })).toBe('Brimstead series');
  expect(sheetTitle(sheet)).toBe(`OC-118, rev.${N}B`);
  expect(sheetTitle({ ...sheet, number: '', revision: '' })).toBe(`Sheet${N}7`);
  expect(numberAndRevision({ number: '', revision: 'B' })).toBe(`rev.${N}B`);
});
