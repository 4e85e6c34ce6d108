import type { Kelvin } from '@/lib/units';
import type { ModuleConstants } from './types';

/** Three of the four ratings; constants carry only three, so the fourth follows (Qmax = Vmax Imax (1 + dTmax/Th)/2). */
export type ThreeRatings =
  | { readonly vmaxV: number; readonly imaxA: number; readonly dTmaxK: number; readonly qmaxW?: undefined }
  | { readonly qmaxW: number; readonly imaxA: number; readonly dTmaxK: number; readonly vmaxV?: undefined }
  | { readonly qmaxW: number; readonly vmaxV: number; readonly dTmaxK: number; readonly imaxA?: undefined }
  | { readonly qmaxW: number; readonly vmaxV: number; readonly imaxA: number; readonly dTmaxK?: undefined };

/** Constants, or a sentence on which rating cannot be true. */
export type ConstantsFromRatings =
  { readonly ok: true; readonly constants: ModuleConstants } | { readonly ok: false; readonly message: string };

const refuse = (message: string): ConstantsFromRatings => ({ ok: false, message });

/**
 * The constants whose ratings at a hot face of Th (K) are the given three: Imax (A) of the largest ΔT, Vmax (V) at it,
 * dTmax (K), Qmax (W) at ΔT = 0 and Imax. Exact inverse of `maximaAtHotSide`.
 * Source for Vmax, Imax, dTmax: S. Lineykin, S. Ben-Yaakov, IEEE Power Electronics Letters 3(2) (2005) 63, quoted as eqs 1-3 by
 * F. L. Tan, S. C. Fok, Energy Convers. Manage. 49 (2008) 1715; the three other choices are re-derived from the same closed forms.
 */
export function constantsFromRatings(ratings: ThreeRatings, Th: Kelvin): ConstantsFromRatings {
  const given = Object.values(ratings).filter((rating): rating is number => rating !== undefined);
  if (!given.every((rating) => rating > 0)) return refuse('Ratings are positive numbers: check their signs.');
  const dTmaxK = ratings.dTmaxK ?? Th * ((2 * ratings.qmaxW) / (ratings.vmaxV * ratings.imaxA) - 1);
  if (!(dTmaxK > 0)) return refuse('Qmax is below half of Vmax times Imax, which no module can have: check the three ratings.');
  if (!(dTmaxK < Th)) {
    return refuse(
      ratings.dTmaxK === undefined
        ? 'Qmax is above Vmax times Imax, which no module can have: check the three ratings.'
        : 'ΔTmax reaches down to absolute zero: check its unit and the hot side.',
    );
  }
  return { ok: true, constants: inverse(ratings, dTmaxK, Th) };
}

function inverse({ vmaxV, imaxA, qmaxW }: ThreeRatings, D: number, Th: number): ModuleConstants {
  if (vmaxV !== undefined && imaxA !== undefined) {
    return { alpha: vmaxV / Th, R: ((vmaxV / imaxA) * (Th - D)) / Th, K: (vmaxV * imaxA * (Th - D)) / (2 * Th * D) };
  }
  const Q = qmaxW!;
  const K = (Q * (Th - D)) / (D * (Th + D));
  if (imaxA !== undefined) return { alpha: (2 * Q) / (imaxA * (Th + D)), R: (2 * Q * (Th - D)) / (imaxA ** 2 * (Th + D)), K };
  return { alpha: vmaxV! / Th, R: (vmaxV! ** 2 * (Th ** 2 - D ** 2)) / (2 * Q * Th ** 2), K };
}
