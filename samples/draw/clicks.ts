import type { Px } from '@/lib/geometry';
import type { ReadingChart, ReadingCurve, ReadingMark } from '@/lib/reading';
import type { DrawnLayer, DrawnPanel } from './panel';
import { normals, uniforms } from './random';

/** Standard deviation, both ways, of a simulated careful click on a curve, and of a mark set under the loupe. Pixels. */
export const CLICK_PX = 0.5;
export const MARK_PX = 0.25;
const CLICKS = { least: 9, most: 15 };

const round = (value: number) => Math.round(value * 100) / 100 + 0;

/** Points at shares of a line's length. */
function alongLine(line: readonly Px[], shares: readonly number[]): readonly Px[] {
  const lengths = [0];
  for (let at = 1; at < line.length; at++) {
    const [a, b] = [line[at - 1] ?? [0, 0], line[at] ?? [0, 0]];
    lengths.push((lengths[at - 1] ?? 0) + Math.hypot(b[0] - a[0], b[1] - a[1]));
  }
  const total = lengths.at(-1) ?? 0;
  return shares.map((share) => {
    const at = Math.max(
      1,
      lengths.findIndex((length) => length >= share * total),
    );
    const [a, b] = [line[at - 1] ?? [0, 0], line[at] ?? [0, 0]];
    const [from, to] = [lengths[at - 1] ?? 0, lengths[at] ?? 1];
    const part = (share * total - from) / (to - from);
    return [a[0] + part * (b[0] - a[0]), a[1] + part * (b[1] - a[1])] as const;
  });
}

type Turn = (px: Px) => Px;

const scatter = (seed: string, spread: number) => {
  const normal = normals(seed);
  return ([x, y]: Px): [number, number] => [round(x + spread * normal()), round(y + spread * normal())];
};

function clicked(line: readonly Px[], seed: string, turn: Turn): [number, number][] {
  const uniform = uniforms(`places ${seed}`);
  const count = CLICKS.least + Math.floor(uniform() * (CLICKS.most - CLICKS.least + 1));
  const shares = Array.from({ length: count }, (_, at) => (at + 0.2 + 0.6 * uniform()) / count);
  return alongLine(line, shares)
    .map(turn)
    .map(scatter(`clicks ${seed}`, CLICK_PX));
}

/** Marks at tick crossings: the corners of the axes, and on a turned page the middle too. */
function marksOf({ x, y }: DrawnLayer, seed: string, turn: Turn, more: boolean): ReadingMark[] {
  const move = scatter(`marks ${seed}`, MARK_PX);
  const middle = <T>(list: readonly T[]) => list[Math.floor(list.length / 2)] as T;
  const crossings = [
    [x.min, y.min],
    [x.max, y.min],
    [x.max, y.max],
    [x.min, y.max],
    ...(more ? [[middle(x.ticks), middle(y.ticks)]] : []),
  ] as [number, number][];
  return crossings.map(([xv, yv]) => ({ px: move(turn([x.place(xv), y.place(yv)])), x: xv, y: yv }));
}

/** What a careful person would tell the program about one drawn layer, as an entry of a reading document. */
export function readingChart(
  image: string,
  title: string,
  { panel }: DrawnPanel,
  drawn: DrawnLayer,
  turn: Turn,
  isTurned: boolean,
): ReadingChart {
  const { layer } = drawn;
  const seed = `${image} ${title}`;
  const curves: ReadingCurve[] = drawn.curves.map(({ value, line }) => ({
    value,
    points: clicked(line, `${seed} ${value}`, turn),
    by: 'hand',
  }));
  return {
    image,
    x: { quantity: panel.x, unit: panel.xUnit, scale: 'linear' },
    y: { quantity: layer.answer, unit: layer.unit, scale: drawn.y.scale, ...(layer.yOf && { of: layer.yOf }) },
    family: { quantity: layer.family, unit: layer.familyUnit, ...(layer.familyOf && { of: layer.familyOf }) },
    hotSideC: layer.hotSideC,
    marks: marksOf(drawn, seed, turn, isTurned),
    curves,
    note: { title },
  };
}
