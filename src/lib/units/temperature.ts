import { celsius, kelvin, type Celsius, type Kelvin } from './brands';

/** Celsius temperature is t/°C = T/K − 273.15, exactly (BIPM, The International System of Units, 9th edition, 2.3.1). */
export const ZERO_CELSIUS = kelvin(273.15);

/** The one reference temperature of every model: 27 °C mean of both faces. */
export const REFERENCE_KELVIN = kelvin(300.15);

/** Celsius temperature of absolute zero; nothing is colder. */
export const ABSOLUTE_ZERO_CELSIUS = celsius(-273.15);

/** Degrees Celsius to kelvin: T/K = t/°C + 273.15. */
export const toKelvin = (temperature: Celsius): Kelvin => kelvin(temperature + ZERO_CELSIUS);

/** Kelvin to degrees Celsius: t/°C = T/K − 273.15. */
export const toCelsius = (temperature: Kelvin): Celsius => celsius(temperature - ZERO_CELSIUS);
