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

/** Percent of the axis below which no point is called far, however even the rest is. */
const NEAR_PERCENT = 0.3;
/** Leaving the point out makes the run of the rest this many times smoother, in squares. */
const SMOOTHER = 6;
/** Curves with fewer points have no run that a point could be off. */
const FEWEST = 5;

/** How far a residual is off the line through two others. */
const offLine = ({ px, percentOfRange }: Residual, a: Residual, b: Residual): number => {
  const run = b.px[0] - a.px[0];
  const share = Math.abs(run) < 1e-6 ? 0.5 : (px[0] - a.px[0]) / run;
  return percentOfRange - (a.percentOfRange + share * (b.percentOfRange - a.percentOfRange));
};

/** How far the residual at `index` is off its two neighbours; at an end, off the next two. */
const offNeighbours = (list: readonly Residual[], index: number): number => {
  const first = Math.min(Math.max(index - 1, 0), list.length - 3);
  const [a, b] = [first, first + 1, first + 2].filter((other) => other !== index).map((other) => list[other]);
  const here = list[index];
  return here && a && b ? offLine(here, a, b) : 0;
};

/** Sum of the squares by which inner residuals are off their neighbours. */
const roughness = (list: readonly Residual[]): number =>
  list.reduce((sum, _, index) => (index === 0 || index === list.length - 1 ? sum : sum + offNeighbours(list, index) ** 2), 0);

/**
 * Residuals that stand out along a curve. A form that does not fit bends them evenly; a slip of the hand is a single one
 * without which the run of the rest is much smoother. Found one at a time.
 */
const farOf = ({ residuals }: CurveResiduals): readonly Residual[] => {
  const far: Residual[] = [];
  let list = residuals.filter(({ omitted }) => !omitted);
  while (list.length >= FEWEST) {
    const without = list.map((_, index) => ({ index, left: roughness(list.toSpliced(index, 1)) }));
    const best = without.reduce((a, b) => (b.left < a.left ? b : a));
    const slip = list[best.index];
    if (!slip || best.left * SMOOTHER > roughness(list) || Math.abs(offNeighbours(list, best.index)) < NEAR_PERCENT) break;
    far.push(slip);
    list = list.toSpliced(best.index, 1);
  }
  return far;
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
