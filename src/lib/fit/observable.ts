import { currentAtVoltage, responseOf, type ByConstants, type ModelForm, type ModuleConstants, type ModuleResponse } from '@/lib/module';
import type { Answer, Observation } from './types';

/** Derivatives by α, R and K, in base units. */
export type Gradient = ByConstants;

/** What the constants answer at one observation and how that changes with them. */
export interface Observable {
  readonly value: number;
  readonly gradient: Gradient;
}

/** An answer with its derivatives by the constants at fixed current, and by the current. */
interface AtCurrent extends Observable {
  readonly byCurrent: number;
}

/** Conditions of an observation: faces in K, and the current or the voltage. */
export type Conditions = Pick<Observation, 'Tc' | 'Th' | 'I' | 'V'>;

/**
 * The answer of a module of some form at an observation, from its heat and voltage; where V is given the current follows from it, and
 * its own dependence on α, R and K enters the derivatives. Null where COP is not defined (P ≤ 0) or the form has no steady state.
 */
export function observe(constants: ModuleConstants, answer: Answer, at: Conditions, form: ModelForm = 'constant'): Observable | null {
  const I = at.I ?? currentAtVoltage(form, constants, at.V ?? NaN, at.Tc, at.Th);
  const response = responseOf(form, constants, I, at.Tc, at.Th);
  const found = response && atCurrent(response, answer, I);
  if (!found || at.I !== undefined) return found;
  const { voltageBy, voltageByCurrent } = response;
  const along = (part: number, k: 0 | 1 | 2) => part - (found.byCurrent * voltageBy[k]) / voltageByCurrent;
  const [byAlpha, byR, byK] = found.gradient;
  return { value: found.value, gradient: [along(byAlpha, 0), along(byR, 1), along(byK, 2)] };
}

const combine = (a: Gradient, b: Gradient, by: number): Gradient => [a[0] + by * b[0], a[1] + by * b[1], a[2] + by * b[2]];

function atCurrent(
  { heat, voltage, heatBy, voltageBy, heatByCurrent, voltageByCurrent }: ModuleResponse,
  answer: Answer,
  I: number,
): AtCurrent | null {
  const Qc: AtCurrent = { value: heat, gradient: heatBy, byCurrent: heatByCurrent };
  if (answer === 'Qc') return Qc;
  if (answer === 'V') return { value: voltage, gradient: voltageBy, byCurrent: voltageByCurrent };
  if (answer === 'I') return { value: I, gradient: [0, 0, 0], byCurrent: 1 };
  const byCurrent = voltage + I * voltageByCurrent;
  const P: AtCurrent = { value: voltage * I, gradient: combine([0, 0, 0], voltageBy, I), byCurrent };
  if (answer === 'P') return P;
  if (answer === 'COP') return ratio(Qc, P);
  return { value: heat + P.value, gradient: combine(heatBy, voltageBy, I), byCurrent: heatByCurrent + byCurrent };
}

/** Quotient rule over every derivative; null over nothing or less. */
function ratio(over: AtCurrent, under: AtCurrent): AtCurrent | null {
  if (!(under.value > 0)) return null;
  const value = over.value / under.value;
  const by = (top: number, bottom: number) => (top - value * bottom) / under.value;
  const [a, b] = [over.gradient, under.gradient];
  return { value, gradient: [by(a[0], b[0]), by(a[1], b[1]), by(a[2], b[2])], byCurrent: by(over.byCurrent, under.byCurrent) };
}

/** Whether the answer of the constant form depends linearly on α, R and K: heat, power and voltage at a given current. */
export const isLinear = ({ answer, I }: Observation): boolean => I !== undefined && answer !== 'COP' && answer !== 'I';
