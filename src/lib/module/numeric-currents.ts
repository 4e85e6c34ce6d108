import { findRoot } from '@/lib/numeric';
import type { Kelvin } from '@/lib/units';
import { currentForHeat } from './currents';
import { lumpedAt, responseOf } from './forms';
import type { ModelForm, ModuleConstants } from './types';

/** Currents of a form that has no closed formula for them; A, W, K. */
export interface NumericCurrents {
  /** The current of most heat; null where none is found. */
  mostHeat(Tc: number, Th: number): number | null;
  /** The smaller current that pumps this heat, below the current of most heat; null where none does. */
  forHeat(heatW: number, Tc: number, Th: number): number | null;
}

const SETTLED = 1e-12;
const MOST_STEPS = 40;

/** Currents of most heat and of a wanted heat for any form of the model, by Newton's method and, where that does not settle, Brent's. */
export function numericCurrents(form: ModelForm, constants: ModuleConstants): NumericCurrents {
  const scale = constants.alpha / constants.R;
  const at = (I: number, Tc: number, Th: number) => responseOf(form, constants, I, Tc, Th);

  let known: { readonly Tc: number; readonly Th: number; readonly I: number | null } | null = null;

  /** The current of most heat, remembered for the last faces: a search asks for it again and again. */
  function mostHeat(Tc: number, Th: number): number | null {
    if (known?.Tc !== Tc || known.Th !== Th) known = { Tc, Th, I: peakCurrent(Tc, Th) };
    return known.I;
  }

  /** Root of dQc/dI, which falls nearly along a line of slope −R: secant steps after the first. */
  function peakCurrent(Tc: number, Th: number): number | null {
    const { alpha, R } = lumpedAt(form, constants, Tc, Th);
    let [I, slope] = [(alpha * Tc) / R, -R];
    let last: { I: number; gain: number } | null = null;
    for (let step = 0; step < MOST_STEPS; step += 1) {
      const gain = at(I, Tc, Th)?.heatByCurrent;
      if (gain === undefined) return null;
      if (last && gain !== last.gain && I !== last.I) slope = (gain - last.gain) / (I - last.I);
      const change = -gain / slope;
      last = { I, gain };
      I += change;
      if (Math.abs(change) <= SETTLED * Math.max(Math.abs(I), scale)) return I;
    }
    return null;
  }

  /** Newton's method from the root of the lumped equations; heat over current is concave, so that a root with a rising heat is the smaller one. */
  function newton(heatW: number, start: number, Tc: number, Th: number): number | null {
    let I = start;
    for (let step = 0; step < MOST_STEPS; step += 1) {
      const found = at(I, Tc, Th);
      if (found === null || !(found.heatByCurrent > 0)) return null;
      const change = (heatW - found.heat) / found.heatByCurrent;
      I += change;
      if (Math.abs(change) <= SETTLED * Math.max(Math.abs(I), scale)) return I;
    }
    return null;
  }

  function forHeat(heatW: number, Tc: number, Th: number): number | null {
    const guess = currentForHeat(lumpedAt(form, constants, Tc, Th), heatW, Tc as Kelvin, Th as Kelvin);
    const quick = guess === null ? null : newton(heatW, guess, Tc, Th);
    if (quick !== null) return quick;
    const most = mostHeat(Tc, Th);
    const gap = (I: number) => (at(I, Tc, Th)?.heat ?? NaN) - heatW;
    if (most === null || !(gap(most) >= 0)) return null;
    return findRoot(gap, gap(0) <= 0 ? 0 : -most, most);
  }
  return { mostHeat, forHeat };
}
