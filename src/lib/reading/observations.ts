import type { Observation } from '@/lib/fit';
import { isVisible, toValue, type Frame, type Px } from '@/lib/geometry';
import type { ThermoelectricModule } from '@/lib/module';
import { chartValues, modelAnswer, stateAt, type ChartValues, type State } from './chart-values';
import type { ReadingChart, ReadingCurve, ReadingDocument } from './document';
import type { Refusal } from './refused';

/** Standard uncertainty of a point in each direction, px: clicked, followed along its ink, or taken from a drawing's own path (common practice, no source). */
export const POINT_UNCERTAINTY_PX = { hand: 0.5, followed: 0.15, path: 0.05 } as const;

/** What the curves say, point by point, and the points that say something impossible. */
export interface Observations {
  readonly observations: readonly Observation[];
  readonly problems: readonly Refusal[];
}

interface CurveInChart {
  readonly values: ChartValues;
  readonly frame: Frame;
  readonly curve: ReadingCurve;
}

/** By how much model and answer drift apart when the point moves by one pixel; without a model, by how much the answer moves. */
function changePerPixel({ values, frame, curve }: CurveInChart, px: Px, module: ThermoelectricModule | null): number | null {
  const gap = (dx: number, dy: number) => {
    const state = stateAt(values, frame, curve.value, [px[0] + dx, px[1] + dy]);
    const model = module ? modelAnswer(module, values.roles.answer.quantity, state) : 0;
    return model === null ? NaN : state.value - model;
  };
  const change = Math.hypot(gap(0.5, 0) - gap(-0.5, 0), gap(0, 0.5) - gap(0, -0.5));
  return Number.isFinite(change) ? change : null;
}

/**
 * Standard uncertainty of the answer at a point, base units: the uncertainty of its pixel, taken along both axes at once through the model
 * (effective variance: the error of the given quantity counts by the slope of the answer over it). That of the marks is common to the chart and is not in here.
 */
function uncertaintyAt(place: CurveInChart, px: Px, module: ThermoelectricModule | null): number {
  const perPixel = changePerPixel(place, px, module) ?? changePerPixel(place, px, null) ?? 0;
  return POINT_UNCERTAINTY_PX[place.curve.by ?? 'hand'] * perPixel;
}

/** Span of the answer in base units: from end to end of its axis as far as marks and points reach, or of the family's values. */
function rangeOf(chart: ReadingChart, frame: Frame, { roles, conversions }: ChartValues): number {
  const { place } = roles.answer;
  const curves = chart.curves ?? [];
  const onAxis = (axis: 'x' | 'y') => [
    ...(chart.marks ?? []).flatMap((mark) => mark[axis] ?? []),
    ...curves.flatMap(({ points }) => (points ?? []).map((px) => toValue(frame, px)[axis === 'x' ? 0 : 1])),
  ];
  const shown = place === 'family' ? curves.map(({ value }) => value) : onAxis(place);
  const base = shown.map(conversions[place].toBase);
  const [least, most] = base.reduce(([low, high], value) => [Math.min(low, value), Math.max(high, value)], [Infinity, -Infinity]);
  return Math.max(LEAST_RANGE, most > least ? most - least : Math.abs(most) || 1);
}

/** In A, V, W, K or 1: far beyond any module, and near enough that its square can be worked with. */
const LARGEST_BASE_VALUE = 1e9;
const LEAST_RANGE = 1e-9;

function impossible(state: State): string | null {
  if (!(state.Tc > 0 && state.Th > 0)) {
    return 'Here one side of the module would be colder than absolute zero: check the marks, the units and which side is held.';
  }
  const isSmall = (value: number) => Math.abs(value) < LARGEST_BASE_VALUE;
  return Object.values(state).every(isSmall)
    ? null
    : 'Here the chart reads a value that no module has: check the marks, the units and the scales.';
}

const BEYOND = 'This point lies beyond the horizon of the perspective: check the marks.';

/** What the points of one chart say, and the impossible ones. */
function observeChart(document: ReadingDocument, chart: number, frame: Frame, module: ThermoelectricModule | null): Observations {
  const shown = document.charts[chart]!;
  const values = chartValues(shown, document.module);
  const answer = values.roles.answer.quantity;
  const range = rangeOf(shown, frame, values);
  const observations: Observation[] = [];
  const problems: Refusal[] = [];
  for (const [at, curve] of (shown.curves ?? []).entries()) {
    for (const [point, px] of (curve.points ?? []).entries()) {
      const state = stateAt(values, frame, curve.value, px);
      const message = isVisible(frame, px) ? impossible(state) : BEYOND;
      if (message) problems.push({ path: `charts[${chart}].curves[${at}].points[${point}]`, message });
      else observations.push({ chart, curve: at, point, ...state, answer, u: uncertaintyAt({ values, frame, curve }, px, module), range });
    }
  }
  return { observations, problems };
}

/**
 * What every point of every curve says about the module, in base units, for the fit. `frames` are those of the charts in order.
 * With `module` the uncertainties take both axes through that model; without, that of the answer's own axis alone.
 * A point that says something impossible is left out and named among the problems.
 */
export function observationsOf(
  document: ReadingDocument,
  frames: readonly Frame[],
  module: ThermoelectricModule | null = null,
): Observations {
  const charts = frames.slice(0, document.charts.length).map((frame, chart) => observeChart(document, chart, frame, module));
  return { observations: charts.flatMap((chart) => chart.observations), problems: charts.flatMap((chart) => chart.problems) };
}
