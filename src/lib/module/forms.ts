import { volt, watt, type Kelvin } from '@/lib/units';
import { lumpedResponse } from './constant';
import { legResponse } from './leg';
import { constantsAt, shapedResponse } from './shaped';
import type { ModelForm, ModuleConstants, ModuleResponse, ThermoelectricModule } from './types';

/** Heat and voltage of a form of the model at one state with their derivatives; null where the form has no steady state there. */
export function responseOf(form: ModelForm, constants: ModuleConstants, I: number, Tc: number, Th: number): ModuleResponse | null {
  if (form === 'constant') return lumpedResponse(constants, I, Tc, Th);
  return form === 'shaped' ? shapedResponse(constants, I, Tc, Th) : legResponse(constants, I, Tc, Th);
}

/** What the equations of three constants take at these faces: the constants themselves, or their values at the mean temperature. */
export const lumpedAt = (form: ModelForm, constants: ModuleConstants, Tc: number, Th: number): ModuleConstants =>
  form === 'constant' ? constants : constantsAt(constants, (Tc + Th) / 2);

/** Newton's method ends at this share of the current, or after so many steps. */
const SETTLED = 1e-12;
const MOST_STEPS = 30;

/**
 * The current (A) at which a form takes a voltage (V) between faces at Tc and Th (K): closed for constants, else by Newton's method from there, as the
 * voltage rises with the current nearly along a line. NaN where there is none.
 */
export function currentAtVoltage(form: ModelForm, constants: ModuleConstants, V: number, Tc: number, Th: number): number {
  const lumped = lumpedAt(form, constants, Tc, Th);
  let I = (V - lumped.alpha * (Th - Tc)) / lumped.R;
  if (form !== 'leg') return I;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const at = legResponse(constants, I, Tc, Th);
    if (at === null) return NaN;
    const change = (V - at.voltage) / at.voltageByCurrent;
    I += change;
    if (Math.abs(change) <= SETTLED * Math.max(Math.abs(I), constants.alpha / constants.R)) return I;
  }
  return I;
}

/** Heat and voltage, remembering the last state: power, heat rejected and COP ask both. */
function answering(form: ModelForm, constants: ModuleConstants) {
  let last: { readonly I: number; readonly Tc: number; readonly Th: number; readonly found: ModuleResponse | null } | null = null;
  return (I: number, Tc: number, Th: number) => {
    if (last === null || last.I !== I || last.Tc !== Tc || last.Th !== Th) {
      last = { I, Tc, Th, found: responseOf(form, constants, I, Tc, Th) };
    }
    return last.found;
  };
}

/**
 * A module of one form of the model. P = V I, Qh = Qc + P, COP = Qc/P (F. L. Tan, S. C. Fok, Energy Convers. Manage. 49 (2008) 1715, eqs 5-9).
 * Where the leg form has no steady state, at several times any current in use, every answer is NaN and COP null.
 */
export function moduleOfForm(form: ModelForm, constants: ModuleConstants): ThermoelectricModule {
  const at = answering(form, constants);
  const heat = (I: number, Tc: Kelvin, Th: Kelvin) => watt(at(I, Tc, Th)?.heat ?? NaN);
  const voltage = (I: number, Tc: Kelvin, Th: Kelvin) => volt(at(I, Tc, Th)?.voltage ?? NaN);
  const power = (I: number, Tc: Kelvin, Th: Kelvin) => watt(voltage(I, Tc, Th) * I);
  return {
    heat,
    voltage,
    power,
    heatRejected: (I, Tc, Th) => watt(heat(I, Tc, Th) + power(I, Tc, Th)),
    cop: (I, Tc, Th) => {
      const taken = power(I, Tc, Th);
      return taken > 0 ? heat(I, Tc, Th) / taken : null;
    },
    currentAtVoltage: (V, Tc, Th) => currentAtVoltage(form, constants, V, Tc, Th),
  };
}

/** A module of three constants α (V/K), R (ohm), K (W/K); see `lumpedResponse`. */
export const constantModule = (constants: ModuleConstants): ThermoelectricModule => moduleOfForm('constant', constants);
