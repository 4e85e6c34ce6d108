import type { ThermoelectricModule } from '@/lib/module';
import type { Kelvin } from '@/lib/units';
import type { Form } from './form';
import type { Reach, WorkingPoint } from './types';

/** How a module runs at a current (A) between faces at Tc and Th (K). */
export function workingPoint(module: ThermoelectricModule, I: number, Tc: Kelvin, Th: Kelvin): WorkingPoint {
  return {
    currentA: I,
    voltageV: module.voltage(I, Tc, Th),
    powerW: module.power(I, Tc, Th),
    cop: module.cop(I, Tc, Th),
    heatRejectedW: module.heatRejected(I, Tc, Th),
  };
}

/** Limits on a module's current (A) and on the size of its voltage (V); Infinity where there is none. */
export interface Limits {
  readonly currentA: number;
  readonly voltageV: number;
}

/** Most heat (W) within the limits, and the current that pumps it; never a reversed current. */
export function reachWithin(form: Form, limits: Limits, Tc: Kelvin, Th: Kelvin): Reach {
  const most = Math.min(form.currentForMostHeat(Tc, Th), limits.currentA, form.currentForVoltage(limits.voltageV, Tc, Th));
  const currentA = Math.max(0, most);
  return { currentA, heatW: form.module.heat(currentA, Tc, Th) };
}
