import type { Kelvin } from '@/lib/units';
import type { Form } from './form';
import { brief } from './text';
import type { Candidate, Duty, DutyNote, WorkingPoint } from './types';

type Range = readonly [low: number, high: number];

/** Relative room for rounding at the ends of a range. */
const ROUNDING = 1e-9;

const within = (value: number, [low, high]: Range) => {
  const room = ROUNDING * Math.max(1, Math.abs(low), Math.abs(high));
  return value >= low - room && value <= high + room;
};

const shown = ([low, high]: Range, unit: string) =>
  low === high ? `at ${brief(low, unit)}` : `from ${brief(low, unit)} to ${brief(high, unit)}`;

/** Where a working point leaves the ranges in which the model holds. */
export function outsideSheet(duty: Duty, { model: { validity } }: Candidate, { currentA }: WorkingPoint): DutyNote[] {
  const looks = [
    { kind: 'current', name: 'current', value: currentA, range: validity.I, unit: 'A' },
    { kind: 'deltaT', name: 'ΔT', value: duty.hotFaceC - duty.coldFaceC, range: validity.deltaT, unit: 'K' },
    { kind: 'hotSide', name: 'hot side', value: duty.hotFaceC, range: validity.hotSideC, unit: 'C' },
  ] as const;
  return looks
    .filter(({ value, range }) => !within(value, range))
    .map(({ kind, name, value, range, unit }) => ({ kind, text: `${name} ${brief(value, unit)}, the model holds ${shown(range, unit)}` }));
}

/** Whether a module at the low end of its tolerance would still stay within the supply; null point: it does not reach the heat. */
function lowEndNote(duty: Duty, { model, allowedCurrentA }: Candidate, low: WorkingPoint | null): DutyNote[] {
  if (model.tolerancePercent === null) return [];
  const { maxCurrentA = Infinity, maxVoltageV = Infinity } = duty;
  const limit = Math.min(maxCurrentA, allowedCurrentA ?? Infinity);
  if (low !== null && low.currentA <= limit && Math.abs(low.voltageV) <= maxVoltageV) return [];
  return [{ kind: 'lowEnd', text: `may not do it at the low end of its tolerance, ± ${brief(model.tolerancePercent, '%')}` }];
}

/** All that is to be known about a match. */
export function notesOn(
  duty: Duty,
  candidate: Candidate,
  form: Form,
  point: WorkingPoint,
  low: WorkingPoint | null,
  Th: Kelvin,
): DutyNote[] {
  const notes = [...outsideSheet(duty, candidate, point), ...lowEndNote(duty, candidate, low)];
  if (point.currentA > form.largestDeltaT(Th).currentA) notes.push({ kind: 'aboveImax', text: 'runs above its current of largest ΔT' });
  if (candidate.maxTemperatureC === null) notes.push({ kind: 'maxTemperature', text: 'highest temperature not stated' });
  return notes;
}
