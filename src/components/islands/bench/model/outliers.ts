import type { ModelAnswer, Residual } from '@/lib/contracts';
import { curveName, type BenchDocument } from '@/lib/editor';
import { formatNumber } from '@/lib/units';

/** A point whose residual is far from those of the rest of its curve. */
export interface Outlier {
  readonly residual: Residual;
  readonly text: string;
}

/** Residuals of one curve of one chart, in the order of its points. */
export interface CurveResiduals {
  readonly chart: number;
  readonly curve: number;
  readonly residuals: readonly Residual[];
}

/** Residuals by chart and curve, in the order of the draft. */
export const byCurve = (residuals: readonly Residual[]): readonly CurveResiduals[] => {
  const groups = new Map<string, Residual[]>();
  for (const residual of residuals) {
    const key = `${residual.chart}/${residual.curve}`;
    groups.set(key, [...(groups.get(key) ?? []), residual]);
  }
  return [...groups.values()]
    .map((list) => ({ chart: list[0]?.chart ?? 0, curve: list[0]?.curve ?? 0, residuals: list }))
    .sort((a, b) => a.chart - b.chart || a.curve - b.curve);
};

const median = (values: readonly number[]): number => {
  const sorted = values.toSorted((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  return sorted.length % 2 ? (sorted[middle] ?? 0) : ((sorted[middle - 1] ?? 0) + (sorted[middle] ?? 0)) / 2;
};

/** Scale of a normal distribution from its median absolute deviation. */
const NORMAL = 1.4826;
/** Robust standard deviations beyond which a point is worth a look. */
const FAR = 4;
/** Percent of the axis below which no point is called far, however even the rest is. */
const NEAR_PERCENT = 0.25;

/** Points far from the run of their curve: more than four robust standard deviations from its median, and a quarter percent of the axis. Farthest first. */
export const outliersOf = ({ residuals }: ModelAnswer, document: BenchDocument): readonly Outlier[] =>
  byCurve(residuals)
    .flatMap(({ residuals: list }) => {
      const used = list.filter(({ omitted }) => !omitted).map(({ percentOfRange }) => percentOfRange);
      const middle = median(used);
      const spread = NORMAL * median(used.map((value) => Math.abs(value - middle)));
      const limit = Math.max(FAR * spread, NEAR_PERCENT);
      return used.length < 4 ? [] : list.filter((r) => !r.omitted && Math.abs(r.percentOfRange - middle) > limit);
    })
    .sort((a, b) => Math.abs(b.percentOfRange) - Math.abs(a.percentOfRange))
    .map((residual) => ({ residual, text: outlierText(residual, document) }));

const outlierText = ({ chart, curve, point, percentOfRange }: Residual, document: BenchDocument): string => {
  const of = document.charts[chart];
  const line = of?.curves[curve];
  const name = of && line ? curveName(of, line) : 'curve';
  return `Point ${point + 1} of ${name}: ${formatNumber(percentOfRange, { decimals: 2 })}\u00A0% of the axis`;
};
