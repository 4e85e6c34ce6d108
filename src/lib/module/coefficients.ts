import { REFERENCE_KELVIN } from '@/lib/units';
import { SHAPES, shapeSlope } from './shapes';
import type { ModelForm } from './types';

/** d ln α/dT, d ln R/dT and d ln K/dT at 300.15 K, 1/K. */
export interface TemperatureCoefficients {
  readonly alphaPerK: number;
  readonly RPerK: number;
  readonly KPerK: number;
}

/** How α, R and K of a form change with temperature at 300.15 K, 1/K: by the published shapes, or not at all. */
export function temperatureCoefficients(form: ModelForm): TemperatureCoefficients {
  if (form === 'constant') return { alphaPerK: 0, RPerK: 0, KPerK: 0 };
  const slope = (key: keyof typeof SHAPES) => shapeSlope(SHAPES[key], REFERENCE_KELVIN);
  return { alphaPerK: slope('alpha'), RPerK: slope('R'), KPerK: slope('K') };
}
