import type { ModuleConstants } from '@/lib/module';
import type { Answer, Observation } from './types';

/** Derivatives by α, R and K, in base units. */
export type Gradient = readonly [byAlpha: number, byR: number, byK: number];

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
 * The answer of a constant module at an observation, from the equations of `constantModule`; where V is given the current is
 * I = (V − α ΔT)/R and its own dependence on α and R enters the derivatives. Null where COP is not defined (P ≤ 0).
 */
export function observe(constants: ModuleConstants, answer: Answer, at: Conditions): Observable | null {
  const { alpha, R } = constants;
  const deltaT = at.Th - at.Tc;
  const I = at.I ?? ((at.V ?? NaN) - alpha * deltaT) / R;
  const currentBy: Gradient = at.I === undefined ? [-deltaT / R, -I / R, 0] : [0, 0, 0];
  const found = atCurrent(constants, answer, at, I);
  if (found === null) return null;
  const [byAlpha, byR, byK] = found.gradient;
  return {
    value: found.value,
    gradient: [byAlpha + found.byCurrent * currentBy[0], byR + found.byCurrent * currentBy[1], byK],
  };
}

function atCurrent({ alpha, R, K }: ModuleConstants, answer: Answer, { Tc, Th }: Conditions, I: number): AtCurrent | null {
  const deltaT = Th - Tc;
  const linear = (gradient: Gradient, byCurrent: number): AtCurrent => ({
    value: gradient[0] * alpha + gradient[1] * R + gradient[2] * K,
    gradient,
    byCurrent,
  });
  const heat = () => linear([Tc * I, (-I * I) / 2, -deltaT], alpha * Tc - I * R);
  const power = () => linear([deltaT * I, I * I, 0], alpha * deltaT + 2 * I * R);
  switch (answer) {
    case 'Qc':
      return heat();
    case 'Qh':
      return linear([Th * I, (I * I) / 2, -deltaT], alpha * Th + I * R);
    case 'P':
      return power();
    case 'V':
      return linear([deltaT, I, 0], R);
    case 'I':
      return { value: I, gradient: [0, 0, 0], byCurrent: 1 };
    case 'COP':
      return ratio(heat(), power());
  }
}

/** Quotient rule over every derivative; null over nothing or less. */
function ratio(over: AtCurrent, under: AtCurrent): AtCurrent | null {
  if (!(under.value > 0)) return null;
  const value = over.value / under.value;
  const by = (top: number, bottom: number) => (top - value * bottom) / under.value;
  const [a, b] = [over.gradient, under.gradient];
  return { value, gradient: [by(a[0], b[0]), by(a[1], b[1]), by(a[2], b[2])], byCurrent: by(over.byCurrent, under.byCurrent) };
}

/** Whether the answer depends linearly on α, R and K: heat, power and voltage at a given current. */
export const isLinear = ({ answer, I }: Observation): boolean => I !== undefined && answer !== 'COP' && answer !== 'I';
