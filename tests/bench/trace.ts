import { readFileSync } from 'node:fs';
import { followLine, type Raster } from '@/lib/trace';
import { intake } from '@/lib/server/pictures/intake';
import type { Px } from '@/lib/geometry';
import { documentOf, frameOf, truthOf } from '../support/charts';
import { normals } from '../support/random';
import { scoreCurve, type Score } from '../support/trace-score';

/** Scores following on the fourteen drawings; following itself sees pixels and starts only. */

export const CHARTS = Array.from({ length: 14 }, (_, k) => `d${String(k + 1).padStart(2, '0')}`);
const ROUNDS = 3;

/** One curve: its score, or null where following refused or lost it, and the time it took in ms. */
export interface Row {
  readonly chart: string;
  readonly value: number;
  readonly score: Score | null;
  readonly scattered: Score | null;
  readonly ms: number;
}

const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
const median = (values: readonly number[]) => {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length / 2;
  return (sorted[Math.ceil(middle) - 1]! + sorted[Math.floor(middle)]!) / 2;
};

async function rasterOf(image: string): Promise<Raster> {
  const { width, height, rgb } = await intake(readFileSync(new URL(`../fixtures/charts/${image}`, import.meta.url)));
  return { width, height, rgb };
}

const span = (values: readonly number[]) => Math.max(...values) - Math.min(...values);

/** The rows of one chart; `rounds` times for the time of a curve, of which the shortest counts (ground and inks of the picture are measured anew each time). */
export async function scoreChart(name: string, rounds = 1): Promise<Row[]> {
  const chart = documentOf(name).charts[0]!;
  const [frame, truth, picture] = [frameOf(chart), truthOf(name), await rasterOf(chart.image)];
  const marks = chart.marks ?? [];
  const [xRange, yRange] = [span(marks.flatMap(({ x }) => x ?? [])), span(marks.flatMap(({ y }) => y ?? []))];
  const normal = normals(20 + Number(name.slice(1)));
  return (chart.curves ?? []).map(({ value, start }) => {
    const drawn = truth.curves.find((curve) => curve.value === value)!;
    const scoreFrom = (place: Px) => {
      const followed = followLine(picture, place);
      return followed.ok ? scoreCurve(frame, xRange, yRange, drawn, followed) : null;
    };
    const times = Array.from({ length: rounds }, () => {
      const fresh = { ...picture, rgb: picture.rgb.slice() };
      const from = performance.now();
      followLine(fresh, start!);
      return performance.now() - from;
    });
    const beside: Px = [start![0] + normal(), start![1] + normal()];
    return { chart: name, value, score: scoreFrom(start!), scattered: scoreFrom(beside), ms: Math.min(...times) };
  });
}

const WORST_P95 = 0.25;
const LEAST_COVERAGE = 98;

const percent = (value: number, digits: number) => (Number.isFinite(value) ? value.toFixed(digits).replace('-', '−') : '–');

function line(name: string, rows: readonly Row[]): string {
  const half = (scores: readonly Score[]) => [
    percent(mean(scores.map((score) => score.mean)), 4),
    percent(Math.max(...scores.map(({ p95 }) => p95)), 3),
    percent(mean(scores.map(({ bias }) => bias)), 4),
    percent(Math.min(...scores.map(({ coverage }) => coverage)), 1),
  ];
  const of = (which: 'score' | 'scattered') => rows.flatMap((row) => row[which] ?? []);
  const cells = [name, ...half(of('score')), median(rows.map(({ ms }) => ms)).toFixed(0), ...half(of('scattered'))];
  return `| ${cells.join(' | ')} |`;
}

/** What does not reach the figures of the design, in sentences. */
function misses(rows: readonly Row[], which: 'score' | 'scattered'): string[] {
  const from = which === 'score' ? '' : ' (scattered start)';
  return rows.flatMap((row) => {
    const [score, name] = [row[which], `${row.chart} at ${row.value}${from}`];
    if (!score) return [`- ${name}: refused`];
    return [
      ...(score.coverage < LEAST_COVERAGE ? [`- ${name}: ${percent(score.coverage, 1)} % covered`] : []),
      ...(score.beyond > 0 ? [`- ${name}: ${score.beyond} points beyond the ends of the curve`] : []),
      ...(score.p95 > WORST_P95 ? [`- ${name}: p95 ${percent(score.p95, 3)} %`] : []),
    ];
  });
}

/** The table of following, with its misses below. */
export async function run(): Promise<string> {
  await scoreChart('d01', 2);
  const rows: Row[] = [];
  for (const name of CHARTS) rows.push(...(await scoreChart(name, ROUNDS)));
  const of = (name: string) => rows.filter(({ chart }) => chart === name);
  const means = (which: 'score' | 'scattered') => CHARTS.map((name) => mean(of(name).flatMap((row) => row[which]?.mean ?? [])));
  const missed = [...misses(rows, 'score'), ...misses(rows, 'scattered')];
  return [
    'Following from the start of each curve, and from starts scattered by 1 px (standard deviation, seeded): distance from the drawn curve in % of the',
    'range of the y axis (mean of the curves, 95th percentile of the worst curve, signed bias), coverage of the least covered curve in %, median time of a curve in ms.',
    '',
    '| chart | mean | p95 | bias | covered | ms | mean, scattered | p95 | bias | covered |',
    '| --- | --- | --- | --- | --- | --- | --- | --- | --- | --- |',
    ...CHARTS.map((name) => line(name, of(name))),
    '',
    `Median of the means: ${percent(median(means('score')), 4)} %, from scattered starts ${percent(median(means('scattered')), 4)} %. Slowest curve ${Math.max(...rows.map(({ ms }) => ms)).toFixed(0)} ms.`,
    '',
    missed.length
      ? `Below what is to be reached (98 % covered, p95 at most 0.25 %, no point beyond the ends):\n\n${missed.join('\n')}`
      : 'No curve is below what is to be reached.',
  ].join('\n');
}
