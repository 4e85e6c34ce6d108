import { readFileSync } from 'node:fs';
import { fitFrame, toPixel, type Frame, type Px } from '@/lib/geometry';
import { parseReadingDocument, type ReadingChart, type ReadingDocument } from '@/lib/reading';
import { normals } from './random';

const FOLDER = new URL('../fixtures/charts/', import.meta.url);

/** The exact curves of a drawn chart, and its module's figures at the chart's hot side: A, W, K, V. */
export interface Truth {
  readonly hotSideC: number;
  readonly Imax: number;
  readonly Qmax: number;
  readonly dTmax: number;
  readonly Vmax: number;
  readonly curves: readonly { readonly value: number; readonly x: readonly number[]; readonly y: readonly number[] }[];
}

const json = (name: string): unknown => JSON.parse(readFileSync(new URL(name, FOLDER), 'utf8'));

export const truthOf = (chart: string) => json(`${chart}.truth.json`) as Truth;

/** The document of a drawn chart, as a person would give it. */
export function documentOf(chart: string): ReadingDocument {
  const parsed = parseReadingDocument(json(`${chart}.reading.json`));
  if (!parsed.ok) throw new Error(`${parsed.path}: ${parsed.message}`);
  return parsed.document;
}

export function frameOf(chart: ReadingChart): Frame {
  const outcome = fitFrame(chart.marks ?? [], { x: chart.x.scale ?? 'linear', y: chart.y.scale ?? 'linear' }, chart.frame);
  if (!outcome.ok) throw new Error(outcome.message);
  return outcome.frame;
}

/** How points are put on the true curves: so many on each, scattered by a hand with this standard deviation in px, from a seed. */
export interface Clicks {
  readonly count: number;
  readonly scatterPx: number;
  readonly seed: number;
}

/** A drawn chart whose curves were clicked by hand, off the truth by a seeded scatter. */
export function clickedChart(name: string, { count, scatterPx, seed }: Clicks): ReadingChart {
  const chart = documentOf(name).charts[0]!;
  const frame = frameOf(chart);
  const normal = normals(seed);
  const click = (value: readonly [number, number]): Px => {
    const [x, y] = toPixel(frame, value);
    return [x + scatterPx * normal(), y + scatterPx * normal()];
  };
  const curves = truthOf(name).curves.map(({ value, x, y }) => {
    const at = Array.from({ length: count }, (_, point) => Math.round((point * (x.length - 1)) / (count - 1)));
    return { value, by: 'hand' as const, points: at.map((index) => click([x[index]!, y[index]!])) };
  });
  return { ...chart, curves };
}

/** One document of several drawn charts of one module, clicked by hand. */
export function clickedDocument(names: readonly string[], clicks: Clicks): ReadingDocument {
  const { module } = documentOf(names[0]!);
  return {
    format: 'couplet.reading',
    version: 1,
    module,
    charts: names.map((name, at) => clickedChart(name, { ...clicks, seed: clicks.seed + at })),
  };
}

/** A picture of the size of the drawn charts, for readings that need no pixels. */
export const blankHost = {
  picture: () => Promise.resolve({ width: 1000, height: 720, fileSha256: 'f'.repeat(64), pixelsSha256: 'a'.repeat(64) }),
};
