import { MODEL_FORMS, type ModelForm, type ModuleConstants } from '@/lib/module';
import { mean } from '@/lib/numeric';
import { fitForm, refit } from './fit-form';
import { observe } from './observable';
import type { FitOutcome, ModuleFit, Observation } from './types';
import { curveOf, POINTS_A_CURVE } from './weights';

/** How well one form foretells what it was not fitted to. */
export interface FormScore {
  readonly form: ModelForm;
  /** Root mean square over curves of what was left out less what is foretold, percent of the axis range; null where the form could not be tried. */
  readonly percentOfRange: number | null;
}

/** Why a form was chosen. */
export interface FormChoice {
  /** What was left out in turn; null where nothing could be left out. */
  readonly leftOut: 'hotSide' | 'curve' | null;
  readonly scores: readonly FormScore[];
}

/** The fit of the form that foretells best, with the numbers of the choice. */
export type ChosenFit = { readonly outcome: Extract<FitOutcome, { ok: true }>; readonly choice: FormChoice };

/** A chart whose hot side varies by less than this is drawn for one, and two charts this near are drawn for the same, K. */
const ONE_SIDE_K = 1;

/** Points that are used, those of a curve thinned evenly to as many as it weighs: enough to compare forms. */
function thinned(observations: readonly Observation[]): Observation[] {
  const curves = new Map<string, Observation[]>();
  for (const point of observations) {
    if (point.omitted === true) continue;
    const curve = curves.get(curveOf(point));
    if (curve) curve.push(point);
    else curves.set(curveOf(point), [point]);
  }
  return [...curves.values()].flatMap((curve) => {
    const step = Math.max(1, (curve.length - 1) / (POINTS_A_CURVE - 1));
    return curve.filter((_, at) => Math.round(Math.round(at / step) * step) === at);
  });
}

/** The hot side of each chart that is drawn for one, K. */
function hotSides(observations: readonly Observation[]): ReadonlyMap<number, number> {
  const ranges = new Map<number, [number, number]>();
  for (const { chart, Th } of observations) {
    const [low, high] = ranges.get(chart) ?? [Th, Th];
    ranges.set(chart, [Math.min(low, Th), Math.max(high, Th)]);
  }
  const held = [...ranges].filter(([, [low, high]]) => high - low < ONE_SIDE_K);
  return new Map(held.map(([chart, [low, high]]) => [chart, (low + high) / 2]));
}

type Fold = (point: Observation) => boolean;

/** What to leave out in turn, as tests for the points that are left out. */
function foldsOf(observations: readonly Observation[], leftOut: 'hotSide' | 'curve'): Fold[] {
  if (leftOut === 'curve') return [...new Set(observations.map(curveOf))].map((curve) => (point) => curveOf(point) === curve);
  const sides = hotSides(observations);
  const apart = [...sides.values()].sort((a, b) => a - b).filter((side, i, all) => i === 0 || side - all[i - 1]! >= ONE_SIDE_K);
  if (apart.length < 2) return [];
  return apart.map((side) => (point) => {
    const own = sides.get(point.chart);
    return own !== undefined && own - side >= 0 && own - side < ONE_SIDE_K;
  });
}

/** Mean square of what a form foretells wrongly along each curve, as a share of the axis range; null where it has no answer for a point. */
function errorsByCurve(form: ModelForm, constants: ModuleConstants, points: readonly Observation[]): ReadonlyMap<string, number> | null {
  const errors = new Map<string, number[]>();
  for (const point of points) {
    const answer = observe(constants, point.answer, point, form);
    if (answer === null) return null;
    const name = curveOf(point);
    errors.set(name, [...(errors.get(name) ?? []), ((point.value - answer.value) / point.range) ** 2]);
  }
  return new Map([...errors].map(([name, squares]) => [name, mean(squares)]));
}

/** Errors of a form along every curve that some fold leaves out and the rest can foretell. */
function foretold(whole: ModuleFit, observations: readonly Observation[], folds: readonly Fold[]): ReadonlyMap<string, number> {
  const errors = new Map<string, number>();
  for (const isOut of folds) {
    const rest = observations.filter((point) => !isOut(point));
    const constants = refit(whole, rest);
    const found = constants && errorsByCurve(whole.form, constants, observations.filter(isOut));
    for (const [name, error] of found ?? []) errors.set(name, error);
  }
  return errors;
}

/** Standard error of the mean of values; that of a single one is as large as itself. */
function standardError(values: readonly number[]): number {
  const middle = mean(values);
  if (values.length < 2) return Math.abs(middle);
  const squares = values.reduce((sum, value) => sum + (value - middle) ** 2, 0);
  return Math.sqrt(squares / (values.length * (values.length - 1)));
}

/** A curve that was left out, and with which others at the same time. */
interface LeftOut {
  readonly name: string;
  readonly fold: number;
}

/**
 * Standard error of the mean of one value a curve, over curves or over what was left out together, whichever is larger: curves that are left out
 * together are foretold by one and the same fit and err alike.
 */
function errorOver(curves: readonly LeftOut[], values: readonly number[]): number {
  const folds = [...new Set(curves.map(({ fold }) => fold))];
  const together = folds.map((fold) => mean(values.filter((_, i) => curves[i]!.fold === fold)));
  return Math.max(standardError(values), standardError(together));
}

interface Tried {
  readonly outcome: Extract<FitOutcome, { ok: true }>;
  readonly errors: ReadonlyMap<string, number>;
}

/**
 * The form whose mean square error over the curves that every form could foretell is least; the leg form also where it is worse by no more than one
 * standard error of the differences (see `errorOver`; the one-standard-error rule of L. Breiman et al., Classification and Regression Trees,
 * 1984, ch. 3, from memory, turned towards the form that holds at other temperatures).
 */
function bestOf(tried: readonly Tried[], curves: readonly LeftOut[]): Tried {
  const leg = tried.find(({ outcome }) => outcome.fit.form === 'leg');
  const score = ({ errors }: Tried) => mean(curves.map(({ name }) => errors.get(name)!));
  if (curves.length === 0) return leg ?? tried[0]!;
  const best = tried.reduce((a, b) => (score(b) < score(a) ? b : a));
  if (!leg || leg === best) return best;
  const worse = curves.map(({ name }) => leg.errors.get(name)! - best.errors.get(name)!);
  return mean(worse) <= errorOver(curves, worse) ? leg : best;
}

/**
 * Fits every form and keeps the one that foretells best, never the one that merely fits best: where charts are drawn for two hot sides, one of them
 * is left out in turn, otherwise one curve. A refusal is that of the constant form, which asks least.
 */
export function fitBest(observations: readonly Observation[]): ChosenFit | Extract<FitOutcome, { ok: false }> {
  const outcomes = MODEL_FORMS.map((form) => fitForm(form, observations));
  const [constant] = outcomes;
  if (!constant!.ok) return constant!;
  const few = thinned(observations);
  const fits = outcomes.filter((outcome) => outcome.ok);
  for (const leftOut of ['hotSide', 'curve'] as const) {
    const folds = foldsOf(few, leftOut);
    const tried = fits.map((outcome): Tried => ({ outcome, errors: foretold(outcome.fit, few, folds) }));
    const curves = [...tried[0]!.errors.keys()]
      .filter((name) => tried.every(({ errors }) => errors.has(name)))
      .map((name): LeftOut => ({ name, fold: folds.findIndex((isOut) => few.some((point) => curveOf(point) === name && isOut(point))) }));
    if (curves.length === 0) continue;
    const scoreOf = (form: ModelForm) => tried.find(({ outcome }) => outcome.fit.form === form);
    const scores = MODEL_FORMS.map((form) => {
      const errors = scoreOf(form)?.errors;
      return { form, percentOfRange: errors ? 100 * Math.sqrt(mean(curves.map(({ name }) => errors.get(name)!))) : null };
    });
    return { outcome: bestOf(tried, curves).outcome, choice: { leftOut, scores } };
  }
  const outcome = bestOf(
    fits.map((fit) => ({ outcome: fit, errors: new Map<string, number>() })),
    [],
  ).outcome;
  return { outcome, choice: { leftOut: null, scores: MODEL_FORMS.map((form) => ({ form, percentOfRange: null })) } };
}
