import type { Observation } from './types';

/** Throws a RangeError, naming the place, for what is no observation; each fault has its own words. */
export function checkObservations(observations: readonly Observation[]): void {
  for (const point of observations) {
    const complaint = complaintAbout(point);
    if (complaint !== null) throw new RangeError(`chart ${point.chart}, curve ${point.curve}, point ${point.point}: ${complaint}`);
  }
}

function complaintAbout({ Tc, Th, I, V, answer, value, u, range }: Observation): string | null {
  if (!(Tc > 0 && Th > 0 && Number.isFinite(Tc + Th))) return 'face temperatures must be above 0 K';
  if ((I === undefined) === (V === undefined)) return 'either the current or the voltage must be given';
  if (!Number.isFinite(I ?? V)) return 'the current or voltage must be finite';
  if (answer === 'V' && I === undefined) return 'a voltage answers to a current';
  if (answer === 'I' && V === undefined) return 'a current answers to a voltage';
  if (!Number.isFinite(value)) return 'the value must be finite';
  if (!(u >= 0 && Number.isFinite(u))) return 'the uncertainty must be finite and not negative';
  return range > 0 && Number.isFinite(range) ? null : 'the range of the axis must be positive';
}
