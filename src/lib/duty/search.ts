import { celsius, toKelvin, type Kelvin } from '@/lib/units';
import { formOf, type Form } from './form';
import { notesOn } from './notes';
import { flowsAnyhow, tooHot, whyNoCurrent, whyNot } from './reasons';
import {
  MISS_KINDS,
  type Candidate,
  type Duty,
  type DutyMatch,
  type DutyMiss,
  type DutyOutcome,
  type MissKind,
  type MissReason,
  type Reach,
  type WorkingPoint,
} from './types';
import { doubtsAt, lowEndPoint } from './uncertainty';
import { reachWithin, workingPoint, type Limits } from './working-point';

interface Faces {
  readonly Tc: Kelvin;
  readonly Th: Kelvin;
}

/** A hundred kelvin above the highest temperature counts as much as missing all of the heat (our own scale, no source). */
const KELVIN_PER_SHARE = 100;

const limitsOf = ({ maxCurrentA = Infinity, maxVoltageV = Infinity }: Duty, { allowedCurrentA }: Candidate): Limits => ({
  currentA: Math.min(maxCurrentA, allowedCurrentA ?? Infinity),
  voltageV: maxVoltageV,
});

function shortfallOf(duty: Duty, { maxTemperatureC }: Candidate, reach: Reach, idleHeatW: number): number {
  const missing = Math.max(0, duty.heatW - reach.heatW, idleHeatW - duty.heatW) / duty.heatW;
  const tooHotK = Math.max(0, Math.max(duty.hotFaceC, duty.coldFaceC) - (maxTemperatureC ?? Infinity));
  return missing + tooHotK / KELVIN_PER_SHARE;
}

function toMatch<C extends Candidate>(
  duty: Duty,
  candidate: C,
  form: Form,
  point: WorkingPoint,
  reach: Reach,
  { Tc, Th }: Faces,
): DutyMatch<C> {
  const low = lowEndPoint(form, candidate.model, duty.heatW, Tc, Th);
  const notes = notesOn(duty, candidate, form, point, low, Th);
  return {
    candidate,
    ...doubtsAt(form, candidate.model, duty.heatW, point, low, Tc, Th),
    voltageV: point.voltageV,
    powerW: point.powerW,
    heatRejectedW: point.heatRejectedW,
    shareOfImax: point.currentA / form.largestDeltaT(Th).currentA,
    reserveW: Math.max(0, reach.heatW - duty.heatW),
    inside: !notes.some(({ kind }) => kind === 'current' || kind === 'deltaT' || kind === 'hotSide'),
    notes,
  };
}

/** Holds one candidate against a duty: a match, or a miss with every reason. */
export function judge<C extends Candidate>(duty: Duty, candidate: C): DutyMatch<C> | DutyMiss<C> {
  const faces = { Tc: toKelvin(celsius(duty.coldFaceC)), Th: toKelvin(celsius(duty.hotFaceC)) };
  const { Tc, Th } = faces;
  const form = formOf(candidate.model);
  const current = form.currentForHeat(duty.heatW, Tc, Th);
  const point = current === null ? null : workingPoint(form.module, current, Tc, Th);
  const first: MissReason[] =
    point === null
      ? [whyNoCurrent({ form, ...faces })]
      : point.currentA < 0
        ? [flowsAnyhow({ form, ...faces })]
        : whyNot(duty, candidate, point);
  const reasons = [...first, ...tooHot(duty, candidate)];
  const reach = reachWithin(form, limitsOf(duty, candidate), Tc, Th);
  if (point !== null && reasons.length === 0) return toMatch(duty, candidate, form, point, reach, faces);
  return { candidate, reasons, reach, shortfall: shortfallOf(duty, candidate, reach, form.module.heat(0, Tc, Th)) };
}

/** Whether a candidate does the duty. */
export const isMatch = <C extends Candidate>(row: DutyMatch<C> | DutyMiss<C>): row is DutyMatch<C> => 'current' in row;

/** A module that takes no power beats every COP. */
const rank = ({ cop }: DutyMatch) => cop?.value ?? Infinity;

/** Highest first; also right for two infinities, where a difference would be NaN. */
const descending = (a: number, b: number) => (a === b ? 0 : a < b ? 1 : -1);

function countMisses(misses: readonly DutyMiss[]): Record<MissKind, number> {
  const counts = Object.fromEntries(MISS_KINDS.map((kind) => [kind, 0])) as Record<MissKind, number>;
  for (const { reasons } of misses) counts[MISS_KINDS.find((kind) => reasons.some((reason) => reason.kind === kind))!] += 1;
  return counts;
}

/**
 * Finds the modules that pump a wanted heat between two faces within the limits on current and voltage.
 * A match runs at the smaller of the two currents that pump exactly that heat, which is the one of better COP, and never at a
 * reversed current. Matches come best COP first (one that takes no power before all), misses by how much of the heat is
 * missing within the limits; equals keep the order in which they came. Every candidate comes back once.
 */
export function searchDuty<C extends Candidate>(duty: Duty, candidates: readonly C[]): DutyOutcome<C> {
  const rows = candidates.map((candidate) => judge(duty, candidate));
  const matches = rows.filter(isMatch).sort((a, b) => descending(rank(a), rank(b)));
  const misses = rows.filter((row): row is DutyMiss<C> => !isMatch(row)).sort((a, b) => a.shortfall - b.shortfall);
  return { matches, misses, missCounts: countMisses(misses) };
}
