import { behind, formatNumber, isPlainPower, leadingPower, NOT_STATED, roundTo, timesTenTo, typeset } from './format';

/** A value with its standard uncertainty, for the eye and for the ear. */
export interface UncertainText {
  /** "0.0512(2) V/K": the figure in brackets is the standard uncertainty in the last digits shown. */
  readonly text: string;
  /** "0.0512 plus or minus 0.0002 V/K". */
  readonly spoken: string;
}

/**
 * Decimal place of the last digit shown: one digit of the uncertainty, two when its first digit is a 1
 * or becomes one by rounding, so that 0.0096 shows as 0.010 (common practice, no source).
 */
function lastPlace(u: number): number {
  const [digits = '', power = '0'] = u.toExponential().split('e');
  return (digits.startsWith('1') ? 1 : 0) - Number(power);
}

/** The uncertainty between brackets: in units of the last digit, or written out where it straddles the decimal point (both forms of GUM 7.2.2). */
function bracketed(u: number, place: number): string {
  const written = roundTo(u, place);
  return place <= 0 || Number(written) >= 1 ? written : written.replace(/^0\.0*/, '');
}

/**
 * A value with its standard uncertainty as JCGM 100:2008 (GUM) 7.2.2 writes it, in the short form "0.0512(2) V/K".
 * The uncertainty is shown to one digit, to two when its first digit is 1. Without an uncertainty (missing, zero, not
 * finite) the value stands alone with four significant digits; "(0)" is never printed. A missing value is an en dash, spoken "not stated".
 */
export function formatUncertain(value: number | null | undefined, u: number | null | undefined, unit = '1'): UncertainText {
  if (value == null || !Number.isFinite(value)) return { text: NOT_STATED, spoken: 'not stated' };
  if (u == null || !Number.isFinite(u) || u <= 0) return alone(value, unit);
  const power = leadingPower(Math.max(Math.abs(value), u), 1);
  const scale = isPlainPower(power) && lastPlace(u) <= 9 ? 0 : power;
  const place = lastPlace(u / 10 ** scale);
  const shown = typeset(roundTo(value / 10 ** scale, place));
  const tail = (scale === 0 ? '' : timesTenTo(scale)) + behind(unit);
  const uText = typeset(roundTo(u / 10 ** scale, place));
  return {
    text: `${shown}(${bracketed(u / 10 ** scale, place)})${tail}`,
    spoken: scale === 0 ? `${shown} plus or minus ${uText}${tail}` : `(${shown} plus or minus ${uText})${tail}`,
  };
}

function alone(value: number, unit: string): UncertainText {
  const text = formatNumber(value) + behind(unit);
  return { text, spoken: text };
}
