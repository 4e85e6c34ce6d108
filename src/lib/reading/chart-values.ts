import type { Answer } from '@/lib/fit';
import { toValue, type Frame, type Px } from '@/lib/geometry';
import type { ThermoelectricModule } from '@/lib/module';
import { kelvin } from '@/lib/units';
import type { ReadingChart, ReadingModule } from './document';
import { rolesOf, type ChartRoles, type Place } from './roles';
import { conversionOf, type Conversion } from './values';

/** What a point of a chart says about the module, in base units: faces in K, current or voltage, and the answer. */
export interface State {
  readonly Tc: number;
  readonly Th: number;
  readonly I?: number;
  readonly V?: number;
  readonly value: number;
}

/** A chart with the roles of its quantities and the way to base units; made once, then asked for every point. */
export interface ChartValues {
  readonly roles: ChartRoles;
  readonly conversions: Readonly<Record<Place, Conversion>>;
}

/** Roles and conversions of a chart that `parseReadingDocument` let through; throws a RangeError for any other. */
export function chartValues(chart: ReadingChart, module: ReadingModule): ChartValues {
  const outcome = rolesOf(chart);
  if (!outcome.ok) throw new RangeError(outcome.message);
  const conversion = (place: Place) => conversionOf(chart, place, module);
  return { roles: outcome.roles, conversions: { x: conversion('x'), y: conversion('y'), family: conversion('family') } };
}

function facesOf({ thermal, side }: ChartRoles, value: number): { Tc: number; Th: number } {
  if (side.kind === 'hot') return { Th: side.kelvin, Tc: thermal.quantity === 'deltaT' ? side.kelvin - value : value };
  return { Tc: side.kelvin, Th: thermal.quantity === 'deltaT' ? side.kelvin + value : value };
}

/** The state of the module at numbers of x, y and family as the chart prints them. */
export function stateOf({ roles, conversions }: ChartValues, shown: Readonly<Record<Place, number>>): State {
  const base = (place: Place) => conversions[place].toBase(shown[place]);
  const { electrical, thermal, answer } = roles;
  return { ...facesOf(roles, base(thermal.place)), [electrical.quantity]: base(electrical.place), value: base(answer.place) };
}

/** The state at a pixel of a curve. */
export function stateAt(values: ChartValues, frame: Frame, family: number, px: Px): State {
  const [x, y] = toValue(frame, px);
  return stateOf(values, { x, y, family });
}

/** What a module answers at a state, base units; null where COP is not defined. */
export function modelAnswer(module: ThermoelectricModule, answer: Answer, state: Omit<State, 'value'>): number | null {
  const [Tc, Th] = [kelvin(state.Tc), kelvin(state.Th)];
  const I = state.I ?? module.currentAtVoltage(state.V ?? NaN, Tc, Th);
  switch (answer) {
    case 'Qc':
      return module.heat(I, Tc, Th);
    case 'Qh':
      return module.heatRejected(I, Tc, Th);
    case 'P':
      return module.power(I, Tc, Th);
    case 'COP':
      return module.cop(I, Tc, Th);
    case 'V':
      return module.voltage(I, Tc, Th);
    case 'I':
      return I;
  }
}
