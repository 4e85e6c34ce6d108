import type { FittedCurve, ModelAnswer, Residual } from '@/lib/contracts';
import { chartName, curveName, frameOf, valueAt, type BenchChart, type BenchDocument } from '@/lib/editor';
import { markResiduals, type Px } from '@/lib/geometry';
import { rolesOf, type ChartRoles } from '@/lib/reading';
import { baseUnitsPer, type Quantity, type Unit } from '@/lib/units';

/** How many of a chart's points are marked as farthest from the model. */
const MARKED_AS_WORST = 3;

/** One curve of a chart: what was read, what the model draws in its place, and what lies between the two. */
export interface CurveEvidence {
  readonly name: string;
  /** Counts the curves of the chart from 0, for colour, dash and marker. */
  readonly style: number;
  readonly points: readonly Px[];
  readonly leftOut: readonly Px[];
  readonly fitted: readonly (readonly Px[])[];
  readonly residuals: readonly Residual[];
  /** Root mean square over the points that were fitted, in the answer's unit and in percent of its axis; null without a fit. */
  readonly rms: number | null;
  readonly rmsPercent: number | null;
}

/** A point far from the model, numbered from 1 as on the picture. */
export interface WorstPoint {
  readonly number: number;
  readonly curve: string;
  readonly px: Px;
  readonly at: number | null;
  readonly residual: number;
  readonly percentOfRange: number;
}

/** A mark of the frame with what it was said to be and how far off it lies. */
export interface MarkEvidence {
  readonly number: number;
  readonly px: Px;
  readonly x: number | null;
  readonly y: number | null;
  /** Distance from the line of its value, px, signed along the growing value. */
  readonly offX: number | null;
  readonly offY: number | null;
}

export interface ChartEvidence {
  readonly id: string;
  readonly at: number;
  readonly chart: BenchChart;
  readonly name: string;
  readonly answer: { readonly quantity: Quantity; readonly unit: string };
  /** What stands along the other axis, against which residuals are drawn. */
  readonly along: { readonly axis: 'x' | 'y'; readonly quantity: Quantity; readonly unit: string };
  readonly curves: readonly CurveEvidence[];
  readonly worst: readonly WorstPoint[];
  readonly marks: readonly MarkEvidence[];
  readonly problems: readonly string[];
}

const rms = (values: readonly number[]): number | null =>
  values.length === 0 ? null : Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);

function roles({ x, y, family, side }: BenchChart): ChartRoles | null {
  if (!x.quantity || !y.quantity || !family.quantity || side.celsius === null) return null;
  const outcome = rolesOf({
    x: { quantity: x.quantity },
    y: { quantity: y.quantity },
    family: { quantity: family.quantity },
    [side.kind === 'hot' ? 'hotSideC' : 'coldSideC']: side.celsius,
  });
  return outcome.ok ? outcome.roles : null;
}

const BASE: Readonly<Record<Quantity, string>> = { I: 'A', V: 'V', deltaT: 'K', Tc: 'K', Th: 'K', Qc: 'W', Qh: 'W', P: 'W', COP: '1' };

interface Answer {
  readonly quantity: Quantity;
  readonly unit: string;
  /** Base units in one of `unit`. */
  readonly perUnit: number;
  readonly along: 'x' | 'y';
}

/** Where the answer stands, and the unit that its residuals are told in: that of the chart, or the base unit of a normalised axis. */
function answerOf(chart: BenchChart): Answer {
  const found = roles(chart)?.answer;
  const place = found?.place ?? 'y';
  const { unit, of } = chart[place];
  const quantity = found?.quantity ?? chart.y.quantity ?? 'Qc';
  const along = place === 'x' ? 'y' : 'x';
  if (of || unit === null) return { quantity, unit: BASE[quantity], perUnit: 1, along };
  return { quantity, unit, perUnit: baseUnitsPer(quantity, unit as Unit), along };
}

function curveEvidence(
  chart: BenchChart,
  style: number,
  residuals: readonly Residual[],
  fitted: readonly FittedCurve[],
  perUnit: number,
): CurveEvidence {
  const curve = chart.curves[style]!;
  const omitted = new Set(curve.omitted);
  const own = residuals
    .filter((residual) => residual.curve === style)
    .map((residual) => ({ ...residual, residual: residual.residual / perUnit }));
  const used = own.filter((residual) => !residual.omitted);
  return {
    name: curveName(chart, curve),
    style,
    points: curve.points.filter((_, index) => !omitted.has(index)),
    leftOut: curve.points.filter((_, index) => omitted.has(index)),
    fitted: fitted.filter((line) => line.curve === style).map((line) => line.points),
    residuals: own,
    rms: rms(used.map(({ residual }) => residual)),
    rmsPercent: rms(used.map(({ percentOfRange }) => percentOfRange)),
  };
}

function worstOf(chart: BenchChart, curves: readonly CurveEvidence[], along: 'x' | 'y'): WorstPoint[] {
  const all = curves.flatMap((curve) =>
    curve.residuals.filter(({ omitted }) => !omitted).map((residual) => ({ curve: curve.name, residual })),
  );
  return all
    .sort((a, b) => Math.abs(b.residual.percentOfRange) - Math.abs(a.residual.percentOfRange))
    .slice(0, MARKED_AS_WORST)
    .map(({ curve, residual: { px, residual, percentOfRange } }, at) => ({
      number: at + 1,
      curve,
      px,
      at: valueAt(chart, px)?.[along === 'x' ? 0 : 1] ?? null,
      residual,
      percentOfRange,
    }));
}

function marksOf(chart: BenchChart): MarkEvidence[] {
  const outcome = frameOf(chart);
  const given = chart.marks.map(({ px, x, y }) => ({ px, ...(x !== null && { x }), ...(y !== null && { y }) }));
  const off = outcome.ok ? markResiduals(outcome.frame, given) : [];
  return chart.marks.map(({ px, x, y }, at) => ({ number: at + 1, px, x, y, offX: off[at]?.x ?? null, offY: off[at]?.y ?? null }));
}

/** Everything the evidence page shows about each chart of a draft, in the order of the draft. */
export function chartEvidence(document: BenchDocument, model: Pick<ModelAnswer, 'residuals' | 'curves' | 'problems'>): ChartEvidence[] {
  return document.charts.map((chart, at) => {
    const { quantity, unit, perUnit, along } = answerOf(chart);
    const residuals = model.residuals.filter((residual) => residual.chart === at);
    const fitted = model.curves.filter((line) => line.chart === at);
    const curves = chart.curves.map((_, style) => curveEvidence(chart, style, residuals, fitted, perUnit));
    return {
      id: `chart-${at + 1}`,
      at,
      chart,
      name: chartName(chart),
      answer: { quantity, unit },
      along: { axis: along, quantity: chart[along].quantity ?? 'deltaT', unit: chart[along].unit ?? '1' },
      curves,
      worst: worstOf(chart, curves, along),
      marks: marksOf(chart),
      problems: model.problems.filter((problem) => problem.chart === at).map((problem) => problem.text),
    };
  });
}

/** Residuals of the fitted points of a chart as loose dots over the other axis, one series a curve. */
export const residualDots = ({ chart, curves, along }: ChartEvidence) =>
  curves.map((curve) => ({
    label: curve.name,
    points: curve.residuals
      .filter(({ omitted }) => !omitted)
      .flatMap(({ px, residual }): [number, number][] => {
        const value = valueAt(chart, px);
        return value ? [[value[along.axis === 'x' ? 0 : 1], residual]] : [];
      }),
  }));
