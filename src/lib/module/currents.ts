import type { Kelvin } from '@/lib/units';
import { figureOfMerit } from './constant';
import type { ModuleConstants } from './types';

/** √(1 + Z Tm) with Tm = (Th + Tc)/2, which every formula of best COP is made of. */
const root = (constants: ModuleConstants, Tc: Kelvin, Th: Kelvin) => Math.sqrt(1 + (figureOfMerit(constants) * (Th + Tc)) / 2);

/**
 * The smaller current, A, at which the cold face absorbs `heatW` (W) between Tc and Th (K), or null where no current does.
 * I = {α Tc − √[(α Tc)² − 2R(Qc + K ΔT)]}/R; negative where heat that would flow anyhow has to be held back. Re-derived.
 */
export function currentForHeat({ alpha, R, K }: ModuleConstants, heatW: number, Tc: Kelvin, Th: Kelvin): number | null {
  const peltier = alpha * Tc;
  const wanted = heatW + K * (Th - Tc);
  const discriminant = peltier * peltier - 2 * R * wanted;
  return discriminant < 0 ? null : (2 * wanted) / (peltier + Math.sqrt(discriminant));
}

/** Current of most heat at a cold face of Tc (K), A: I = α Tc/R (Mechanical Engineers' Handbook, vol. 4, eq. 119). */
export const currentForMostHeat = ({ alpha, R }: ModuleConstants, Tc: Kelvin): number => (alpha * Tc) / R;

/**
 * Current of best COP between faces at Tc and Th (K), A: I = α ΔT/{R[√(1 + Z Tm) − 1]} (Mechanical Engineers' Handbook, vol. 4,
 * eq. 121). Null without a positive ΔT: there COP grows without bound as the current falls.
 */
export function currentForBestCop(constants: ModuleConstants, Tc: Kelvin, Th: Kelvin): number | null {
  if (!(Th > Tc)) return null;
  return (constants.alpha * (Th - Tc)) / (constants.R * (root(constants, Tc, Th) - 1));
}

/**
 * Best COP between faces at Tc and Th (K): (Tc/ΔT)(M − Th/Tc)/(M + 1), M = √(1 + Z Tm) (Mechanical Engineers' Handbook, vol. 4,
 * eqs 122-123). Not positive where no current pumps heat over that ΔT; null without a positive ΔT, where it has no bound.
 */
export function bestCop(constants: ModuleConstants, Tc: Kelvin, Th: Kelvin): number | null {
  if (!(Th > Tc)) return null;
  const M = root(constants, Tc, Th);
  return ((Tc / (Th - Tc)) * (M - Th / Tc)) / (M + 1);
}
