import { celsius, type Celsius } from '@/lib/units';
import type { Duty } from './types';

/** Saturation pressure e = pressure · exp[slope t/(offset + t)], hPa and °C. */
interface Magnus {
  readonly pressureHPa: number;
  readonly slope: number;
  readonly offsetC: number;
}

/**
 * Magnus form over water and over ice.
 * Source: O. A. Alduchov, R. E. Eskridge, J. Appl. Meteor. 35 (1996) 601, eqs 21 (water) and 23 (ice); the constants over ice
 * as quoted with these equation numbers in the R package phaselag (laubblatt/phaselag, R/meteo_vapor.R).
 */
const WATER: Magnus = { pressureHPa: 6.1094, slope: 17.625, offsetC: 243.04 };
const ICE: Magnus = { pressureHPa: 6.1121, slope: 22.587, offsetC: 273.86 };

const pressureOver = ({ pressureHPa, slope, offsetC }: Magnus, t: number) => pressureHPa * Math.exp((slope * t) / (offsetC + t));

/** The Magnus form solved for t: t = offset·g/(slope − g), g = ln(e/pressure). */
function temperatureOver({ pressureHPa, slope, offsetC }: Magnus, vapourHPa: number): number {
  const g = Math.log(vapourHPa / pressureHPa);
  return (offsetC * g) / (slope - g);
}

/** Saturation vapour pressure over water, hPa, at an air temperature in °C. */
export const saturationPressureHPa = (air: Celsius): number => pressureOver(WATER, air);

/** What settles on a surface that is cold enough, and from which temperature on. */
export interface Condensation {
  /** Water from the dew point down, or, where that lies below 0 °C, ice from the frost point down. */
  readonly kind: 'dew' | 'frost';
  readonly celsius: Celsius;
}

/** Temperature at which air of this vapour pressure is saturated over water, °C, also below 0 °C. `relativeHumidityPercent` above 0, over water. */
export const dewPoint = (air: Celsius, relativeHumidityPercent: number): Celsius =>
  celsius(temperatureOver(WATER, (saturationPressureHPa(air) * relativeHumidityPercent) / 100));

/** Temperature at which air of this vapour pressure is saturated over ice, °C; it means something below 0 °C only. */
export const frostPoint = (air: Celsius, relativeHumidityPercent: number): Celsius =>
  celsius(temperatureOver(ICE, (saturationPressureHPa(air) * relativeHumidityPercent) / 100));

/** Dew point, or frost point where the dew point lies below 0 °C. Relative humidity in %, above 0, over water. */
export function condensation(air: Celsius, relativeHumidityPercent: number): Condensation {
  const dew = dewPoint(air, relativeHumidityPercent);
  return dew < 0 ? { kind: 'frost', celsius: frostPoint(air, relativeHumidityPercent) } : { kind: 'dew', celsius: dew };
}

/** What settles on the cold face of a duty, and by how many kelvin it stays clear of it: negative where water or ice forms. */
export interface ColdFaceCondensation extends Condensation {
  readonly reserveK: number;
}

/** Condensation on the cold face of a duty; null while the air or its humidity is not stated. */
export function coldFaceCondensation({ coldFaceC, ambientC, humidityPercent }: Duty): ColdFaceCondensation | null {
  if (ambientC === undefined || humidityPercent === undefined) return null;
  const found = condensation(celsius(ambientC), humidityPercent);
  return { ...found, reserveK: coldFaceC - found.celsius };
}
