import type { ModelAnswer, Residual } from '@/lib/contracts';
import { curveName, type BenchDocument } from '@/lib/editor';
import { formatNumber } from '@/lib/units';

/** A point whose residual stands out from those of its neighbours along the curve. */
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
const FAR = 5;
/** Percent of the axis below which no point is called far, however even the rest is. */
const NEAR_PERCENT = 0.3;
/** Curves with fewer points have no run that a point could be off. */
const FEWEST = 5;

/** How far each residual is off the line through its two neighbours; at an end, off the line through the next two. */
const offNeighbours = (list: readonly Residual[]): readonly number[] => {
  const at = (index: number) => list[index] ?? { px: [0, 0] as const, percentOfRange: 0 };
  const line = (a: ReturnType<typeof at>, b: ReturnType<typeof at>, x: number) => {
    const run = b.px[0] - a.px[0];
    return Math.abs(run) < 1e-6
      ? (a.percentOfRange + b.percentOfRange) / 2
      : a.percentOfRange + ((b.percentOfRange - a.percentOfRange) * (x - a.px[0])) / run;
  };
  return list.map(({ px, percentOfRange }, index) => {
    const [a, b] = index === 0 ? [1, 2] : index === list.length - 1 ? [index - 1, index - 2] : [index - 1, index + 1];
    return percentOfRange - line(at(a), at(b), px[0]);
  });
};

/** A form that does not fit bends residuals evenly along a curve; a slip of the hand stands out from its neighbours. */
const farOf = ({ residuals }: CurveResiduals): readonly Residual[] => {
  const used = residuals.filter(({ omitted }) => !omitted);
  if (used.length < FEWEST) return [];
  const off = offNeighbours(used).map(Math.abs);
  const limit = Math.max(FAR * NORMAL * median(off), NEAR_PERCENT);
  const peak = (index: number) => Math.max(off[index - 1] ?? 0, off[index + 1] ?? 0) <= (off[index] ?? 0);
  return used.filter((_, index) => (off[index] ?? 0) > limit && peak(index));
};

/** Points that stand out from their neighbours along the curve, largest residual first. */
export const outliersOf = ({ residuals }: ModelAnswer, document: BenchDocument): readonly Outlier[] =>
  byCurve(residuals)
    .flatMap(farOf)
    .sort((a, b) => Math.abs(b.percentOfRange) - Math.abs(a.percentOfRange))
    .map((residual) => ({ residual, text: outlierText(residual, document) }));

const outlierText = ({ chart, curve, point, percentOfRange }: Residual, document: BenchDocument): string => {
  const of = document.charts[chart];
  const line = of?.curves[curve];
  const name = of && line ? curveName(of, line) : 'curve';
  return `Point ${point + 1} of ${name}: ${formatNumber(percentOfRange, { decimals: 2 })}\u00A0% of the axis`;
};
