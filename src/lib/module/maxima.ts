import type { Kelvin } from '@/lib/units';
import { figureOfMerit } from './constant';
import { lumpedAt, responseOf } from './forms';
import { numericCurrents } from './numeric-currents';
import type { ModelForm, ModuleConstants, ModuleMaxima } from './types';

/**
 * What a constant module reaches with its hot face held at Th (K): with Z = α²/(RK) and s = √(1 + 2 Z Th),
 * dTmax = Th − (s − 1)/Z, Imax = (K/α)(s − 1) = α (Th − dTmax)/R, Vmax = α Th, Qmax (ΔT = 0, I = Imax) = α²(Th² − dTmax²)/(2R);
 * most heat at ΔT = 0 takes I = α Th/R and is (α Th)²/(2R).
 * Source: re-derived; same content as H. Lee, Thermoelectrics: Design and Materials, Wiley 2016, ch. 3 (from memory) and
 * S. Lineykin, S. Ben-Yaakov, IEEE Trans. Ind. Appl. 43 (2007) 505.
 */
export function maximaAtHotSide(constants: ModuleConstants, Th: Kelvin): ModuleMaxima {
  const { alpha, R } = constants;
  const Z = figureOfMerit(constants);
  const coldestK = coldestFace(Z, Th);
  const imaxMostHeat = (alpha * Th) / R;
  const dTmaxK = Th - coldestK;
  return {
    imaxLargestDeltaT: (alpha * coldestK) / R,
    imaxMostHeat,
    qmaxW: (alpha * alpha * coldestK * (Th + dTmaxK)) / (2 * R),
    qMostHeatW: (alpha * Th * imaxMostHeat) / 2,
    dTmaxK,
    vmaxV: alpha * Th,
    Z,
  };
}

/** Th − dTmax = (√(1 + 2 Z Th) − 1)/Z, written as 2 Th/(√(1 + 2 Z Th) + 1) so that a small Z loses no digits. */
const coldestFace = (Z: number, Th: number) => (2 * Th) / (Math.sqrt(1 + 2 * Z * Th) + 1);

/** Steps of the differences that stand for second derivatives: a share of the current, and K. */
const [CURRENT_STEP, KELVIN_STEP] = [1e-4, 0.01];
const SETTLED = 1e-11;
const MOST_STEPS = 50;

interface Coldest {
  readonly I: number;
  readonly Tc: number;
}

/**
 * Current and cold face of the largest ΔT: Qc = 0 and ∂Qc/∂I = 0 at once, by Newton's method from what the lumped constants half way down
 * would give. Null where it does not settle.
 */
function coldestOf(form: ModelForm, constants: ModuleConstants, Th: Kelvin): Coldest | null {
  const first = maximaAtHotSide(constants, Th);
  const start = maximaAtHotSide(lumpedAt(form, constants, Th - first.dTmaxK, Th), Th);
  let [I, Tc] = [start.imaxLargestDeltaT, Th - start.dTmaxK];
  const at = (I: number, Tc: number) => responseOf(form, constants, I, Tc, Th);
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const [here, more, warmer] = [at(I, Tc), at(I * (1 + CURRENT_STEP), Tc), at(I, Tc + KELVIN_STEP)];
    if (!here || !more || !warmer) return null;
    const heatByTc = (warmer.heat - here.heat) / KELVIN_STEP;
    const gainByI = (more.heatByCurrent - here.heatByCurrent) / (I * CURRENT_STEP);
    const gainByTc = (warmer.heatByCurrent - here.heatByCurrent) / KELVIN_STEP;
    const determinant = here.heatByCurrent * gainByTc - heatByTc * gainByI;
    const dI = (-here.heat * gainByTc + heatByTc * here.heatByCurrent) / determinant;
    const dTc = (gainByI * here.heat - here.heatByCurrent ** 2) / determinant;
    [I, Tc] = [I + dI, Tc + dTc];
    if (!(I > 0 && Tc > 0 && Tc < Th)) return null;
    if (Math.abs(dI) <= SETTLED * I && Math.abs(dTc) <= SETTLED * Th) return { I, Tc };
  }
  return null;
}

/** Current (A) of the largest ΔT and that ΔT (K) of any form with its hot face held at Th (K), and nothing else; NaN where none is found. */
export function largestDeltaTOf(
  form: ModelForm,
  constants: ModuleConstants,
  Th: Kelvin,
): { readonly currentA: number; readonly deltaTK: number } {
  const found = coldestOf(form, constants, Th);
  return { currentA: found?.I ?? NaN, deltaTK: Th - (found?.Tc ?? NaN) };
}

/**
 * What a module of any form reaches with its hot face held at Th (K): closed for constants, else from the form's own heat and voltage. NaN
 * where the form finds no largest ΔT or no most heat there.
 */
export function maximaOf(form: ModelForm, constants: ModuleConstants, Th: Kelvin): ModuleMaxima {
  if (form === 'constant') return maximaAtHotSide(constants, Th);
  const { I, Tc } = coldestOf(form, constants, Th) ?? { I: NaN, Tc: NaN };
  const imaxMostHeat = numericCurrents(form, constants).mostHeat(Th, Th) ?? NaN;
  const at = (current: number, cold: number) => responseOf(form, constants, current, cold, Th);
  return {
    imaxLargestDeltaT: I,
    imaxMostHeat,
    qmaxW: at(I, Th)?.heat ?? NaN,
    qMostHeatW: at(imaxMostHeat, Th)?.heat ?? NaN,
    dTmaxK: Th - Tc,
    vmaxV: at(I, Tc)?.voltage ?? NaN,
    Z: figureOfMerit(lumpedAt(form, constants, Th, Th)),
  };
}
