import { unitSymbol } from './quantity';

/** Shown in place of a value that nobody stated; read out as "not stated". */
export const NOT_STATED = '–';

/** U+2212, the true minus. */
export const MINUS = '\u2212';
/** U+00A0, between a number and its unit. */
export const NO_BREAK_SPACE = '\u00A0';
/** U+202F, a thin space that does not break, between groups of three digits. */
export const THIN_SPACE = '\u202F';

/** Either significant digits or decimals; four significant digits when neither is given. */
export interface FormatOptions {
  readonly digits?: number | undefined;
  readonly decimals?: number | undefined;
}

const DEFAULT_DIGITS = 4;
/** Outside these powers of ten a number is written with one. */
const SMALLEST_PLAIN_POWER = -4;
const LARGEST_PLAIN_POWER = 7;

/** Groups of three from five digits on (BIPM, The International System of Units, 9th edition, 5.4.4). */
const group = (whole: string) => (whole.length < 5 ? whole : whole.replace(/\B(?=(?:\d{3})+$)/g, THIN_SPACE));

/** Sets a plain decimal string ("-1234.5") in print: true minus and grouped whole part; a negative zero loses its sign. */
export function typeset(plain: string): string {
  const negative = plain.startsWith('-') && /[1-9]/.test(plain);
  const [whole = '', fraction] = plain.replace('-', '').split('.');
  return (negative ? MINUS : '') + group(whole) + (fraction === undefined ? '' : `.${fraction}`);
}

/** A power of ten in print: " × 10⁻⁶" with spaces that do not break. */
export function timesTenTo(power: number): string {
  const raised = String(power).replace(/./g, (sign) => (sign === '-' ? '⁻' : '⁰¹²³⁴⁵⁶⁷⁸⁹'[Number(sign)]!));
  return `${NO_BREAK_SPACE}×${NO_BREAK_SPACE}10${raised}`;
}

/** The power of ten of the leading digit after rounding to so many significant digits; 0 for zero. */
export const leadingPower = (value: number, digits: number): number => Number(value.toExponential(digits - 1).split('e')[1]);

/** Whether numbers of this power of ten are written out instead of with × 10ⁿ. */
export const isPlainPower = (power: number): boolean => power >= SMALLEST_PLAIN_POWER && power < LARGEST_PLAIN_POWER;

/**
 * A number in print: true minus, thin grouping, fixed decimals or significant digits, × 10ⁿ below 10⁻⁴ and from 10⁷ on
 * (decimals never use a power of ten). What is missing or not finite prints as an en dash.
 */
export function formatNumber(value: number | null | undefined, { digits, decimals }: FormatOptions = {}): string {
  if (value == null || !Number.isFinite(value)) return NOT_STATED;
  if (decimals !== undefined) return typeset(value.toFixed(decimals));
  const significant = digits ?? DEFAULT_DIGITS;
  const [mantissa = '', exponent] = value.toExponential(significant - 1).split('e');
  const power = Number(exponent);
  const shown = digits === undefined ? trimZeros : (text: string) => text;
  if (isPlainPower(power)) return typeset(shown(roundTo(value, significant - 1 - power)));
  return typeset(shown(mantissa)) + timesTenTo(power);
}

/** A number with its unit behind a no-break space; a number of unit `1` stands alone, what is missing prints as an en dash without unit. */
export function formatWithUnit(value: number | null | undefined, unit: string, options: FormatOptions = {}): string {
  const text = formatNumber(value, options);
  return text === NOT_STATED ? text : text + behind(unit);
}

/** The unit as it stands behind a number: no-break space and symbol, or nothing for `1`. */
export const behind = (unit: string): string => (unitSymbol(unit) === '' ? '' : NO_BREAK_SPACE + unitSymbol(unit));

/** Plain decimal string rounded to so many decimals; a negative count rounds to tens, hundreds … */
export function roundTo(value: number, decimals: number): string {
  if (decimals >= 0) return value.toFixed(decimals);
  const step = 10 ** -decimals;
  return (Math.round(value / step) * step).toFixed(0);
}

const trimZeros = (plain: string) => (plain.includes('.') ? plain.replace(/\.?0+$/, '') : plain);
