import type { Px } from '@/lib/geometry';
import { formatWithUnit, quantityName } from '@/lib/units';
import type { BenchChart, BenchCurve } from './document';
import { frameOf, readyFrame } from './frame';

/** What a chart still misses, station by station, as sentences; all three empty when it is ready for the model. */
export interface ChartState {
  readonly chart: readonly string[];
  readonly frame: readonly string[];
  readonly curves: readonly string[];
}

/** A problem of one chart. */
export interface ChartProblem {
  readonly chart: string;
  readonly station: keyof ChartState;
  readonly text: string;
}

const ELECTRICAL = ['I', 'V'];
const THERMAL = ['deltaT', 'Tc', 'Th'];
const HEAT = ['Qc', 'Qh', 'P', 'COP'];

const PLACES = { x: 'the x axis shows', y: 'the y axis shows', family: 'tells one curve from the next' } as const;

const missingQuantities = (chart: BenchChart): readonly string[] =>
  (Object.keys(PLACES) as (keyof typeof PLACES)[]).filter((place) => !chart[place].quantity).map((place) => `Say what ${PLACES[place]}.`);

/** One electrical, one thermal, one answer; the answer may be the other electrical quantity. None may be the face the chart keeps. */
const clashOfQuantities = (chart: BenchChart): string | null => {
  const quantities = [chart.x.quantity, chart.y.quantity, chart.family.quantity].filter((q) => q !== null);
  const count = (group: readonly string[]) => quantities.filter((q) => group.includes(q)).length;
  const kept = chart.side.kind === 'hot' ? 'Th' : 'Tc';
  if (quantities.includes(kept)) {
    return `The chart keeps its ${quantityName(kept)}, so the ${quantityName(kept)} cannot also vary: choose the other side or another quantity.`;
  }
  if (new Set(quantities).size < quantities.length) return 'Two of x, y and the family show the same quantity: change one of them.';
  if (count(THERMAL) !== 1) return 'Of x, y and the family exactly one is a temperature or a temperature difference: change one of them.';
  if (count(ELECTRICAL) === 0) return 'Of x, y and the family one is the current or the voltage: change one of them.';
  if (count(ELECTRICAL) + count(HEAT) !== 2)
    return 'Of x, y and the family one is the answer: heat, power, COP, or voltage beside current.';
  return null;
};

const chartSentences = (chart: BenchChart): readonly string[] => {
  const missing = missingQuantities(chart);
  const clash = missing.length === 0 ? clashOfQuantities(chart) : null;
  const side = chart.side.celsius === null ? [`Type the temperature of the ${chart.side.kind} side at which the chart holds.`] : [];
  return [...missing, ...(clash ? [clash] : []), ...side];
};

const isOutside = ({ width, height }: BenchChart, [x, y]: Px): boolean => x < 0 || y < 0 || x > width || y > height;

const outsideSentence = (chart: BenchChart, what: string, places: readonly Px[]): readonly string[] => {
  const outside = places.filter((px) => isOutside(chart, px)).length;
  return outside === 0 ? [] : [`${outside} of ${places.length} ${what} lie outside the picture: move or remove them.`];
};

const frameSentences = (chart: BenchChart): readonly string[] => {
  if (chart.marks.length === 0)
    return ['Place a mark on a tick of the x axis and one on a tick of the y axis, and type what is printed there.'];
  const outcome = frameOf(chart);
  const empty = chart.marks.flatMap((mark, index) =>
    mark.x === null && mark.y === null ? [`Mark ${index + 1} has no value yet: type its x value, its y value or both.`] : [],
  );
  if (empty.length > 0) return empty;
  return outcome.ok
    ? outsideSentence(
        chart,
        'marks',
        chart.marks.map(({ px }) => px),
      )
    : [outcome.message];
};

/** A curve's value with its unit, or its number in the list while it has none: "1.4 A", "curve 2". */
export const curveName = (chart: BenchChart, curve: BenchCurve): string =>
  curve.value === null
    ? `curve ${chart.curves.indexOf(curve) + 1}`
    : formatWithUnit(curve.value, chart.family.unit ?? '1', { digits: undefined });

const curveSentence = (chart: BenchChart, curve: BenchCurve): string | null => {
  const name = curveName(chart, curve);
  const used = curve.points.length - curve.omitted.length;
  if (curve.value === null) return `Type the value of ${name}: what is printed beside the line.`;
  if (chart.curves.some((other) => other !== curve && other.value === curve.value))
    return `Two curves say ${name}: change one or remove it.`;
  if (used > 0) return null;
  return curve.points.length > 0
    ? `Every point of the ${name} curve is left out: use one again or remove the curve.`
    : `Place points on the ${name} curve.`;
};

const curveSentences = (chart: BenchChart): readonly string[] => {
  if (chart.curves.length === 0) return ['Add a curve and place points on its line.'];
  const outside = outsideSentence(
    chart,
    'points',
    chart.curves.flatMap(({ points }) => points),
  );
  return [...new Set([...chart.curves.flatMap((curve) => curveSentence(chart, curve) ?? []), ...outside])];
};

const known = new WeakMap<BenchChart, ChartState>();

/** What each station of a chart still misses. Remembered for as long as the chart stays the same. */
export const chartState = (chart: BenchChart): ChartState => {
  const state = known.get(chart) ?? { chart: chartSentences(chart), frame: frameSentences(chart), curves: curveSentences(chart) };
  known.set(chart, state);
  return state;
};

/** All that keeps a chart from the model, in the order of the stations. */
export const problemsOf = (chart: BenchChart): readonly ChartProblem[] => {
  const state = chartState(chart);
  return (['chart', 'frame', 'curves'] as const).flatMap((station) => state[station].map((text) => ({ chart: chart.id, station, text })));
};

/** Whether a chart can go into the model. */
export const isFinished = (chart: BenchChart): boolean => problemsOf(chart).length === 0;

const count = (n: number, one: string) => `${n}\u00A0${one}${n === 1 ? '' : 's'}`;

/** How far a chart has come, in two or three words: "not begun", "frame only", "5 curves", "5 curves · to finish". */
export const progressOf = (chart: BenchChart): string => {
  if (chart.curves.length > 0) return count(chart.curves.length, 'curve') + (isFinished(chart) ? '' : ' · to finish');
  if (readyFrame(chart)) return 'frame only';
  if (chart.marks.length > 0) return `${count(chart.marks.length, 'mark')} only`;
  return chart.x.quantity || chart.y.quantity ? 'no frame yet' : 'not begun';
};

/** What a chart is called: its title, else what its y axis shows and at which side ("Heat pumped, 27 °C"), else "New chart". */
export const chartName = (chart: BenchChart): string => {
  if (chart.title) return chart.title;
  if (!chart.y.quantity) return 'New chart';
  const name = quantityName(chart.y.quantity);
  const side = chart.side.celsius === null ? '' : `, ${formatWithUnit(chart.side.celsius, 'C')}`;
  return name.charAt(0).toUpperCase() + name.slice(1) + side;
};
