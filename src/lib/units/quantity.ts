/** What an axis, a family or an answer of a chart can be. */
export type Quantity = 'I' | 'V' | 'deltaT' | 'Tc' | 'Th' | 'Qc' | 'Qh' | 'P' | 'COP';

/** Units in which a chart can be drawn. `1` is a plain ratio; `1` and `%` also stand for a share of a rating. */
export type Unit = 'K' | 'C' | 'F' | 'W' | 'mW' | 'V' | 'mV' | 'A' | 'mA' | '1' | '%';

interface QuantityEntry {
  readonly name: string;
  readonly symbol: string;
  readonly units: readonly Unit[];
}

const POWER: readonly Unit[] = ['W', 'mW'];
const ABSOLUTE_TEMPERATURE: readonly Unit[] = ['C', 'K', 'F'];

const TABLE: Readonly<Record<Quantity, QuantityEntry>> = {
  I: { name: 'current', symbol: 'I', units: ['A', 'mA'] },
  V: { name: 'voltage', symbol: 'V', units: ['V', 'mV'] },
  deltaT: { name: 'temperature difference', symbol: 'ΔT', units: ['K', 'C', 'F'] },
  Tc: { name: 'cold side', symbol: 'Tc', units: ABSOLUTE_TEMPERATURE },
  Th: { name: 'hot side', symbol: 'Th', units: ABSOLUTE_TEMPERATURE },
  Qc: { name: 'heat pumped', symbol: 'Qc', units: POWER },
  Qh: { name: 'heat rejected', symbol: 'Qh', units: POWER },
  P: { name: 'electrical power', symbol: 'P', units: POWER },
  COP: { name: 'COP', symbol: 'COP', units: ['1'] },
};

/** Every quantity, in the order in which a person meets them. */
export const QUANTITIES = Object.keys(TABLE) as readonly Quantity[];

/** Units a quantity may be drawn in, the usual one first. Shares of a rating (`1`, `%`) come on top and are not listed. */
export const unitsOf = (quantity: Quantity): readonly Unit[] => TABLE[quantity].units;

/** Name of a quantity in lower case: "temperature difference", "heat pumped", "hot side". */
export const quantityName = (quantity: Quantity): string => TABLE[quantity].name;

/** Symbol of a quantity: "ΔT", "Qc". */
export const quantitySymbol = (quantity: Quantity): string => TABLE[quantity].symbol;

const SYMBOLS: Readonly<Record<string, string>> = { C: '°C', F: '°F', '1': '', ohm: 'Ω', '1/K': 'K⁻¹' };

/** Printed symbol of a unit: "°C" for `C`, "Ω" for `ohm`, nothing for `1`; any other unit stands for itself. */
export const unitSymbol = (unit: string): string => SYMBOLS[unit] ?? unit;
