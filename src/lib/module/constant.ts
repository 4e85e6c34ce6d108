import type { ModuleConstants, ModuleResponse } from './types';

/**
 * A module of three constants α (V/K), R (ohm), K (W/K), with ΔT = Th − Tc:
 * Qc = α Tc I − I²R/2 − K ΔT; V = α ΔT + I R; P = V I; Qh = Qc + P = α Th I + I²R/2 − K ΔT; COP = Qc/P; with the derivatives of Qc and V.
 * Source: M. Kutz (ed.), Mechanical Engineers' Handbook, vol. 4, "Cooling Electronic Equipment", eqs 111-116;
 * F. L. Tan, S. C. Fok, Energy Convers. Manage. 49 (2008) 1715, eqs 4-7 and 9.
 */
export function lumpedResponse({ alpha, R, K }: ModuleConstants, I: number, Tc: number, Th: number): ModuleResponse {
  const deltaT = Th - Tc;
  return {
    heat: alpha * Tc * I - (I * I * R) / 2 - K * deltaT,
    voltage: alpha * deltaT + I * R,
    heatBy: [Tc * I, -(I * I) / 2, -deltaT],
    voltageBy: [deltaT, I, 0],
    heatByCurrent: alpha * Tc - I * R,
    voltageByCurrent: R,
  };
}

/** Figure of merit Z = α²/(R K), 1/K. */
export const figureOfMerit = ({ alpha, R, K }: ModuleConstants): number => (alpha * alpha) / (R * K);
