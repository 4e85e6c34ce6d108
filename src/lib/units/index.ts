/** Quantities and units: branded numbers, conversion, reading what people type, printing with uncertainty. */
export * from './brands';
export { ABSOLUTE_ZERO_CELSIUS, REFERENCE_KELVIN, toCelsius, toKelvin, ZERO_CELSIUS } from './temperature';
export { QUANTITIES, quantityName, quantitySymbol, unitsOf, unitSymbol, type Quantity, type Unit } from './quantity';
export { baseUnitsPer, fromBase, fromFraction, toBase, toFraction } from './convert';
export { parseNumber, type ParsedNumber, type ParseOptions } from './parse';
export { formatNumber, formatWithUnit, MINUS, NO_BREAK_SPACE, NOT_STATED, THIN_SPACE, type FormatOptions } from './format';
export { formatUncertain, type UncertainText } from './uncertain';
