import { volt, watt, type Kelvin } from '@/lib/units';
import type { ModuleConstants, ThermoelectricModule } from './types';

/**
 * A module of three constants α (V/K), R (ohm), K (W/K), with ΔT = Th − Tc:
 * Qc = α Tc I − I²R/2 − K ΔT; V = α ΔT + I R; P = V I; Qh = Qc + P = α Th I + I²R/2 − K ΔT; COP = Qc/P.
 * Source: M. Kutz (ed.), Mechanical Engineers' Handbook, vol. 4, "Cooling Electronic Equipment", eqs 111-116;
 * F. L. Tan, S. C. Fok, Energy Convers. Manage. 49 (2008) 1715, eqs 4-7 and 9.
 */
export function constantModule({ alpha, R, K }: ModuleConstants): ThermoelectricModule {
  const heat = (I: number, Tc: Kelvin, Th: Kelvin) => watt(alpha * Tc * I - (I * I * R) / 2 - K * (Th - Tc));
  const voltage = (I: number, Tc: Kelvin, Th: Kelvin) => volt(alpha * (Th - Tc) + I * R);
  const power = (I: number, Tc: Kelvin, Th: Kelvin) => watt(voltage(I, Tc, Th) * I);
  const heatRejected = (I: number, Tc: Kelvin, Th: Kelvin) => watt(heat(I, Tc, Th) + power(I, Tc, Th));
  const cop = (I: number, Tc: Kelvin, Th: Kelvin) => {
    const taken = power(I, Tc, Th);
    return taken > 0 ? heat(I, Tc, Th) / taken : null;
  };
  return { heat, voltage, power, heatRejected, cop };
}

/** Figure of merit Z = α²/(R K), 1/K. */
export const figureOfMerit = ({ alpha, R, K }: ModuleConstants): number => (alpha * alpha) / (R * K);
