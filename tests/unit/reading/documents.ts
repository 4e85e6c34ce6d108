import type { Px } from '@/lib/geometry';
import { constantModule, type ThermoelectricModule } from '@/lib/module';
import { parseReadingDocument, type ReadingChart, type ReadingDocument } from '@/lib/reading';
import { kelvin } from '@/lib/units';

type Json = Record<string, unknown>;

/** The picture of these charts is 1000 by 720; x runs from 100 to 900 px, y from 650 up to 50 px. */
const LEFT = 100;
const RIGHT = 900;
const BOTTOM = 650;
const TOP = 50;

/** A known module: α 0.05 V/K, R 2 ohm, K 0.5 W/K. */
export const KNOWN = { alpha: 0.05, R: 2, K: 0.5 };
export const known: ThermoelectricModule = constantModule(KNOWN);

/** Heat of the known module with the hot side at t °C, W. */
export const heatAt = (hotSideC: number) => (I: number, deltaT: number) =>
  known.heat(I, kelvin(hotSideC + 273.15 - deltaT), kelvin(hotSideC + 273.15));
export const voltageAt = (hotSideC: number) => (I: number, deltaT: number) =>
  known.voltage(I, kelvin(hotSideC + 273.15 - deltaT), kelvin(hotSideC + 273.15));

/** Where a value stands on the picture of a chart from 0 to `right` on x and 0 to `top` on y. */
export const pixelOf = (x: number, y: number, right: number, top: number): Px => [
  LEFT + ((RIGHT - LEFT) * x) / right,
  BOTTOM - ((BOTTOM - TOP) * y) / top,
];

export const cornerMarks = (right: number, top: number) => [
  { px: pixelOf(0, 0, right, top), x: 0, y: 0 },
  { px: pixelOf(right, 0, right, top), x: right },
  { px: pixelOf(0, top, right, top), y: top },
];

/** A chart of one function of x for every value of the family, as plain JSON that a test may spoil. */
export interface ChartPlan {
  readonly x: Json;
  readonly y: Json;
  readonly family: Json;
  readonly values: readonly number[];
  readonly at: readonly number[];
  readonly right: number;
  readonly top: number;
  readonly of: (value: number, x: number) => number;
  readonly side?: Json;
}

export const chartOf = ({ x, y, family, values, at, right, top, of, side = { hotSideC: 27 } }: ChartPlan): Json => ({
  image: 'chart.png',
  x: { scale: 'linear', ...x },
  y: { scale: 'linear', ...y },
  family,
  ...side,
  marks: cornerMarks(right, top),
  curves: values.map((value) => ({ value, points: at.map((place) => pixelOf(place, of(value, place), right, top)) })),
});

const DIFFERENCES = [0, 10, 20, 30, 40];

export const heatChart = (changes: Partial<ChartPlan> = {}) =>
  chartOf({
    x: { quantity: 'deltaT', unit: 'K' },
    y: { quantity: 'Qc', unit: 'W' },
    family: { quantity: 'I', unit: 'A' },
    values: [2, 3, 4],
    at: DIFFERENCES,
    right: 60,
    top: 50,
    of: heatAt(27),
    ...changes,
  });

export const voltageChart = (changes: Partial<ChartPlan> = {}) =>
  chartOf({
    x: { quantity: 'deltaT', unit: 'K' },
    y: { quantity: 'V', unit: 'V' },
    family: { quantity: 'I', unit: 'A' },
    values: [2, 3, 4],
    at: DIFFERENCES,
    right: 60,
    top: 12,
    of: voltageAt(27),
    ...changes,
  });

/** A whole document as plain JSON. */
export const plainDocument = (charts: readonly Json[] = [heatChart(), voltageChart()], rest: Json = {}): Json => ({
  format: 'couplet.reading',
  version: 1,
  module: { vendor: 'Invented', partNumber: 'Specimen T' },
  charts,
  ...rest,
});

/** The same, checked. */
export function documentOf(json: unknown): ReadingDocument {
  const parsed = parseReadingDocument(JSON.parse(JSON.stringify(json)));
  if (!parsed.ok) throw new Error(`${parsed.path}: ${parsed.message}`);
  return parsed.document;
}

/** The refusal of a document; fails when it is taken. */
export function refusalOf(json: unknown): { path: string; message: string } {
  const parsed = parseReadingDocument(json);
  if (parsed.ok) throw new Error('the document was taken');
  return { path: parsed.path, message: parsed.message };
}

export const firstChart = (json: unknown): ReadingChart => documentOf(json).charts[0]!;
