import { formatWithUnit } from '@/lib/units';
import { axisLabel, type PlotLayout } from './layout';
import type { PlotData } from './types';

/** What the plot shows, in a few sentences for who cannot see it: axes with their ranges, each curve with its ends, the duty point. */
export function summary({ x, y, curves, dots, duty }: PlotData, layout: PlotLayout): string {
  const range = (axis: 'x' | 'y', unit: string) => {
    const [from, to] = layout[axis].domain();
    return `${formatWithUnit(from, unit)} to ${formatWithUnit(to, unit)}`;
  };
  const ends = curves.map(({ label, points }) => {
    const [first, last] = [points[0], points.at(-1)];
    if (!first || !last) return `${label}: empty.`;
    const at = ([vx, vy]: readonly [number, number]) => `${formatWithUnit(vy, y.unit)} at ${formatWithUnit(vx, x.unit)}`;
    return `${label}: ${at(first)}, ${at(last)}.`;
  });
  const loose = (dots ?? []).map((series) => `${series.label}: ${series.points.length} points.`);
  const point = duty ? [`${duty.label}: ${formatWithUnit(duty.y, y.unit)} at ${formatWithUnit(duty.x, x.unit)}.`] : [];
  return [
    `${axisLabel(y)} from ${range('y', y.unit)}, against ${axisLabel(x)} from ${range('x', x.unit)}.`,
    ...ends,
    ...loose,
    ...point,
  ].join(' ');
}
