import { formatWithUnit } from './format';
import { unitSymbol } from './quantity';

/** What a typed number must be. Limits are in the unit of the field and belong to the allowed range, except `above`. */
export interface ParseOptions {
  /** Unit of the field; it may be typed behind the number, another one may not. */
  readonly unit?: string | undefined;
  readonly min?: number | undefined;
  readonly max?: number | undefined;
  /** The number must be larger than this. */
  readonly above?: number | undefined;
}

/** A number, or a sentence that says how to mend what was typed. */
export type ParsedNumber = { readonly ok: true; readonly value: number } | { readonly ok: false; readonly message: string };

const MINUS_SIGNS = /[\u2010-\u2015\u2212\uFE63\uFF0D]/g;
const TIMES_TEN_TO = /\s*[×x·*]\s*10\s*\^?\s*(?=[-+\d])/i;
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';
/** Sign, digits with an optional decimal part, power of ten; then whatever stands behind, meant to be the unit. */
const SHAPE = /^([-+]?)\s*((?:\d{1,3}(?: \d{3})+|\d+)?(?:[.,]\d*)?)(?:e([-+]?\d+))?\s*(.*)$/i;
const UNIT_ALIASES: Readonly<Record<string, readonly string[]>> = {
  C: ['°C', '℃', 'degC'],
  F: ['°F', '℉', 'degF'],
  ohm: ['Ω', 'Ω', 'ohms'],
};

const refuse = (message: string): ParsedNumber => ({ ok: false, message });

/** Plain ASCII spelling: one kind of minus, one kind of space, `e` for a power of ten. */
function normalise(text: string): string {
  return text
    .trim()
    .replace(MINUS_SIGNS, '-')
    .replace(/⁻/g, '-')
    .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(SUPERSCRIPTS.indexOf(digit)))
    .replace(TIMES_TEN_TO, 'e')
    .replace(/\s+/g, ' ');
}

function isUnit(typed: string, unit: string | undefined): boolean {
  if (unit === undefined) return false;
  return [unit, unitSymbol(unit), ...(UNIT_ALIASES[unit] ?? [])].includes(typed);
}

function checkLimits(value: number, { unit = '1', min, max, above }: ParseOptions): string | null {
  if (above !== undefined && value <= above) return `Type a number larger than ${formatWithUnit(above, unit)}.`;
  if (min !== undefined && value < min) return `Type ${formatWithUnit(min, unit)} or more.`;
  if (max !== undefined && value > max) return `Type ${formatWithUnit(max, unit)} or less.`;
  return null;
}

/**
 * Reads a number as people type it: decimal comma or point, groups of three digits set apart by spaces, any minus sign,
 * a power of ten as `e-3` or `× 10⁻³`, and the unit of the field behind it. A comma is always a decimal comma.
 * Returns the value in the unit of the field, or a sentence that says how to mend the entry; never NaN or infinite.
 */
export function parseNumber(text: string, options: ParseOptions = {}): ParsedNumber {
  const body = normalise(text);
  if (body === '') return refuse('Type a number, such as 2.5.');
  const [, sign = '', digits = '', exponent = '0', rest = ''] = SHAPE.exec(body) ?? [];
  if (!/\d/.test(digits)) return refuse(`“${text.trim()}” is not a number: type digits, such as 2.5.`);
  if (/^[.,\d]/.test(rest)) return refuse('Write the number with one decimal point or comma and no other separators, such as 1234.5.');
  if (rest !== '' && !isUnit(rest, options.unit)) return refuse(unitMessage(rest, options.unit));
  const value = Number(`${sign}${digits.replace(/ /g, '').replace(',', '.')}e${exponent}`);
  if (!Number.isFinite(value)) return refuse('That number is too large to work with: check its power of ten.');
  const complaint = checkLimits(value, options);
  return complaint === null ? { ok: true, value: value === 0 ? 0 : value } : refuse(complaint);
}

function unitMessage(typed: string, unit: string | undefined): string {
  const symbol = unit === undefined ? '' : unitSymbol(unit);
  if (symbol === '') return `Leave out “${typed}”: this field takes a number without a unit.`;
  return `This field is in ${symbol}: leave out “${typed}” and type the value in ${symbol}.`;
}
