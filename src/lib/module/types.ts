import type { Kelvin, Volt, Watt } from '@/lib/units';

/** The forms of a model, each the next one's simpler case: fixed constants, constants shaped by the mean temperature, properties along the leg. */
export const MODEL_FORMS = ['constant', 'shaped', 'leg'] as const;
export type ModelForm = (typeof MODEL_FORMS)[number];

/**
 * The three constants of a module: Seebeck coefficient in V/K, resistance in ohm, thermal conductance in W/K. For the forms shaped and leg they
 * are the values at 300.15 K.
 */
export interface ModuleConstants {
  readonly alpha: number;
  readonly R: number;
  readonly K: number;
}

/**
 * A thermoelectric module as every other room sees it, whatever stands behind it. Current in A, positive when it cools the cold
 * face; absolute face temperatures in K; any sign of the current and of Th − Tc.
 */
export interface ThermoelectricModule {
  /** Heat absorbed at the cold face, W. */
  heat(I: number, Tc: Kelvin, Th: Kelvin): Watt;
  /** Voltage over the module, V. */
  voltage(I: number, Tc: Kelvin, Th: Kelvin): Volt;
  /** Electrical power taken up, W; negative while the module generates. */
  power(I: number, Tc: Kelvin, Th: Kelvin): Watt;
  /** Heat given off at the hot face, W: heat absorbed plus power. */
  heatRejected(I: number, Tc: Kelvin, Th: Kelvin): Watt;
  /** Heat absorbed over power; null where no power is taken up or the module generates. */
  cop(I: number, Tc: Kelvin, Th: Kelvin): number | null;
  /** The current at a voltage (V), A; NaN where the module has none. */
  currentAtVoltage(V: number, Tc: Kelvin, Th: Kelvin): number;
}

/** Derivatives by α, R and K, in base units. */
export type ByConstants = readonly [byAlpha: number, byR: number, byK: number];

/** Heat (W) and voltage (V) at one state with their derivatives by the constants at a fixed current, and by the current. */
export interface ModuleResponse {
  readonly heat: number;
  readonly voltage: number;
  readonly heatBy: ByConstants;
  readonly voltageBy: ByConstants;
  readonly heatByCurrent: number;
  readonly voltageByCurrent: number;
}

/** What a module reaches with its hot face held at one temperature. */
export interface ModuleMaxima {
  /** Current of the largest temperature difference, A: the usual meaning of a printed Imax. */
  readonly imaxLargestDeltaT: number;
  /** Current of most heat with both faces alike, A. */
  readonly imaxMostHeat: number;
  /** Heat with both faces alike at the current of the largest temperature difference, W. */
  readonly qmaxW: number;
  /** Most heat with both faces alike, W, at `imaxMostHeat`. */
  readonly qMostHeatW: number;
  /** Largest temperature difference, K, without heat load. */
  readonly dTmaxK: number;
  /** Voltage at the largest temperature difference, V. */
  readonly vmaxV: number;
  /** Figure of merit α²/(RK), 1/K, at a mean temperature equal to that of the hot face. */
  readonly Z: number;
}
