import { faultOfMarks } from './check-marks';
import { parameterCovariance } from './covariance';
import { knownsOf, meanPlace, type Known } from './knowns';
import { solvePerspective } from './perspective';
import { projectionOf } from './projection';
import { rmsDistance, rmsInUnits } from './residuals';
import { solveTurned, solveUpright, type Solved } from './straight';
import type { Frame, FrameKind, FrameOutcome, Mark, Px, Scales } from './types';

const SOLVERS: Readonly<Record<FrameKind, (knowns: readonly Known[]) => Solved>> = {
  upright: solveUpright,
  turned: solveTurned,
  perspective: solvePerspective,
};

/** Unknowns of each kind of frame. */
const UNKNOWNS: Readonly<Record<FrameKind, number>> = { upright: 4, turned: 5, perspective: 8 };

/** A simpler frame that fits its marks this well, px, is not given up for a more general one. */
const GOOD_ENOUGH_PX: Readonly<Record<Exclude<FrameKind, 'upright'>, number>> = { turned: 1, perspective: 3 };

/** A more general frame must leave less than this share of the simpler one's residual. */
const MUCH_BETTER = 1 / 3;

/** Standard uncertainty of a mark that a person or the program placed, px; common practice for a click with a loupe, no source. */
const MARK_UNCERTAINTY_PX = 0.5;

interface Tried {
  readonly kind: FrameKind;
  readonly solved: Solved;
  /** Pixels; infinite when the marks do not determine the kind. */
  readonly residual: number;
}

function attempt(kind: FrameKind, knowns: readonly Known[]): Tried {
  const solved = SOLVERS[kind](knowns);
  return { kind, solved, residual: solved.ok ? rmsDistance(projectionOf(kind, solved.parameters), knowns) : Infinity };
}

/** The simplest kind that the marks determine and explain. */
function choose(knowns: readonly Known[]): Tried {
  let taken = attempt('upright', knowns);
  for (const kind of ['turned', 'perspective'] as const) {
    if (taken.residual <= GOOD_ENOUGH_PX[kind]) continue;
    const general = attempt(kind, knowns);
    if (general.residual < taken.residual * MUCH_BETTER) taken = general;
  }
  return taken;
}

const COUNT = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven'];

function inLineSentence(knowns: readonly Known[]): string {
  const span = (axis: 'x' | 'y', at: 0 | 1) => {
    const places = knowns.filter((known) => known.axis === axis).map(({ d }) => d[at]);
    return Math.max(...places) - Math.min(...places);
  };
  if (span('x', 0) < 1) {
    return 'The marks with x values stand in a line above one another, so they do not tell how x runs across the picture: place one further left or right.';
  }
  if (span('y', 1) < 1) {
    return 'The marks with y values stand in a line beside one another, so they do not tell how y runs up the picture: place one further up or down.';
  }
  return 'The marks do not tell how the axes run across the picture: place marks at both ends of the x axis and at both ends of the y axis.';
}

function whyNot(kind: FrameKind, why: 'tooFew' | 'inLine', knowns: readonly Known[]): string {
  if (why === 'tooFew') {
    return `A ${kind} frame needs ${COUNT[UNKNOWNS[kind]] ?? 'eight'} known values and the marks give ${COUNT[knowns.length] ?? knowns.length}: place another mark, best in a corner with both values.`;
  }
  if (kind === 'upright') return inLineSentence(knowns);
  return `The marks stand too much in a line for a ${kind} frame: place marks in all four corners, with both values.`;
}

/**
 * Fits the frame of a chart to its marks: every known value of a mark is one equation, all of equal weight in pixels.
 * The kind is the simplest that the marks determine and explain; a more general one is taken only when the one taken so far leaves more than 1 px rms
 * (3 px for perspective) and the general one leaves less than a third of that. `force` takes a kind as asked.
 * Values are in the chart's own units. Never throws; what is missing comes back as a sentence.
 */
export function fitFrame(marks: readonly Mark[], scales: Scales, force?: FrameKind): FrameOutcome {
  const fault = faultOfMarks(marks, scales);
  if (fault) return { ok: false, ...fault };
  const origin = meanPlace(marks);
  const knowns = knownsOf(marks, scales, origin);
  const { kind, solved } = force ? attempt(force, knowns) : choose(knowns);
  if (!solved.ok) return { ok: false, message: whyNot(kind, solved.why, knowns) };
  const frame = describe(kind, solved.parameters, knowns, scales, origin);
  const sound = [...frame.parameters, ...frame.covariance.flat()].every(Number.isFinite);
  return sound
    ? { ok: true, frame }
    : { ok: false, message: 'The numbers of the marks are too far apart to be worked with: check their values and places.' };
}

function describe(kind: FrameKind, parameters: readonly number[], knowns: readonly Known[], scales: Scales, origin: Px): Frame {
  const projection = projectionOf(kind, parameters);
  const residualPx = knowns.length > UNKNOWNS[kind] ? rmsDistance(projection, knowns) : null;
  const inUnits = (axis: 'x' | 'y') => (residualPx === null ? null : rmsInUnits(projection, scales, knowns, axis));
  const markUncertaintyPx = Math.max(MARK_UNCERTAINTY_PX, residualPx ?? 0);
  return {
    kind,
    scales,
    origin,
    parameters,
    covariance: parameterCovariance(kind, parameters, knowns, markUncertaintyPx),
    markUncertaintyPx,
    residualPx,
    residualInUnits: { x: inUnits('x'), y: inUnits('y') },
  };
}
