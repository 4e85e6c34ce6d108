/**
 * Numbers that carry their unit in the type, so that degrees Celsius cannot be passed for kelvin.
 * At run time each is a plain number; arithmetic gives a plain number, which has to be branded again on purpose.
 */
declare const unit: unique symbol;

/** A number whose unit is fixed by its type. */
export type Measured<U extends string> = number & { readonly [unit]: U };

/** Absolute (thermodynamic) temperature in kelvin. */
export type Kelvin = Measured<'K'>;
/** Celsius temperature in degrees Celsius. */
export type Celsius = Measured<'C'>;
/** Difference of two temperatures in kelvin. */
export type KelvinDifference = Measured<'K difference'>;
/** Electric current in amperes. */
export type Ampere = Measured<'A'>;
/** Voltage in volts. */
export type Volt = Measured<'V'>;
/** Heat flow or electrical power in watts. */
export type Watt = Measured<'W'>;
/** Resistance in ohms. */
export type Ohm = Measured<'ohm'>;
/** Seebeck coefficient of a module in volts per kelvin. */
export type VoltPerKelvin = Measured<'V/K'>;
/** Thermal conductance in watts per kelvin. */
export type WattPerKelvin = Measured<'W/K'>;

/** States that a plain number is an absolute temperature in kelvin. */
export const kelvin = (value: number) => value as Kelvin;
/** States that a plain number is in degrees Celsius. */
export const celsius = (value: number) => value as Celsius;
/** States that a plain number is a temperature difference in kelvin. */
export const kelvinDifference = (value: number) => value as KelvinDifference;
/** States that a plain number is a current in amperes. */
export const ampere = (value: number) => value as Ampere;
/** States that a plain number is a voltage in volts. */
export const volt = (value: number) => value as Volt;
/** States that a plain number is a heat flow or power in watts. */
export const watt = (value: number) => value as Watt;
/** States that a plain number is a resistance in ohms. */
export const ohm = (value: number) => value as Ohm;
/** States that a plain number is a Seebeck coefficient in volts per kelvin. */
export const voltPerKelvin = (value: number) => value as VoltPerKelvin;
/** States that a plain number is a thermal conductance in watts per kelvin. */
export const wattPerKelvin = (value: number) => value as WattPerKelvin;
