import type { Kelvin } from '@/lib/units';
import { figureOfMerit } from './constant';
import type { ModuleConstants, ModuleMaxima } from './types';

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
