import { kelvin, type Kelvin } from '@/lib/units';
import { formOf, type Form } from './form';
import type { CandidateModel } from './types';
import { standardUncertainty, wholeCovariance } from './uncertainty';

/** A value with the standard uncertainty of the reading; null where that is not finite. */
export interface ReadValue {
  readonly value: number;
  readonly u: number | null;
}

/** What a module does at one current and one ΔT. */
export interface FamilyPoint {
  readonly deltaTK: number;
  readonly heat: ReadValue;
  readonly voltage: ReadValue;
  /** Null where no power is taken up. */
  readonly cop: ReadValue | null;
}

/** A curve of a module at one current. */
export interface FamilyCurve {
  readonly currentA: number;
  /** From ΔT = 0 to where no heat is left to pump; empty where there is none even at ΔT = 0. */
  readonly points: readonly FamilyPoint[];
}

type Covariance = readonly (readonly number[])[];

function pointAt(form: Form, covariance: Covariance, I: number, deltaTK: number, Th: Kelvin): FamilyPoint {
  const Tc = kelvin(Th - deltaTK);
  const { heat: heatSlopes, voltage: voltageSlopes } = form.slopes(I, Tc, Th);
  const cop = form.module.cop(I, Tc, Th);
  const P = form.module.power(I, Tc, Th);
  // COP = Qc/(V I), so dCOP = (dQc − COP I dV)/P
  const copSlopes = cop === null ? null : heatSlopes.map((slope, k) => (slope - cop * I * voltageSlopes[k]!) / P);
  const doubtful = (value: number, slopes: readonly number[]) => ({ value, u: standardUncertainty(slopes, covariance) });
  return {
    deltaTK,
    heat: doubtful(form.module.heat(I, Tc, Th), heatSlopes),
    voltage: doubtful(form.module.voltage(I, Tc, Th), voltageSlopes),
    cop: cop === null || copSlopes === null ? null : doubtful(cop, copSlopes),
  };
}

/**
 * Curves of heat, voltage and COP against ΔT with the hot side held at `Th` (K), one for each current (A), with the standard
 * uncertainty of the reading at `count` points each, spread evenly from ΔT = 0 to where heat pumped falls to zero.
 */
export function familyAtHotSide(model: CandidateModel, Th: Kelvin, currents: readonly number[], count = 25): FamilyCurve[] {
  const form = formOf(model);
  const covariance = wholeCovariance(model);
  return currents.map((currentA) => {
    const end = form.deltaTWithoutHeat(currentA, Th);
    if (!(end > 0)) return { currentA, points: [] };
    return { currentA, points: Array.from({ length: count }, (_, k) => pointAt(form, covariance, currentA, (end * k) / (count - 1), Th)) };
  });
}

/** Two significant digits: what a person would write on a curve. */
const rounded = (value: number) => Number(value.toPrecision(2));

/** Currents (A) for a family when a sheet names none: five even steps up to the largest it shows, rounded, each once. */
export const evenCurrents = (largestA: number): number[] => [...new Set([1, 2, 3, 4, 5].map((k) => rounded((largestA * k) / 5)))];
