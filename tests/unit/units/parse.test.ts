import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatNumber, formatWithUnit, parseNumber, type ParseOptions } from '@/lib/units';

const value = (text: string, options?: ParseOptions) => {
  const parsed = parseNumber(text, options);
  return parsed.ok ? parsed.value : parsed.message;
};

describe('parseNumber reads', () => {
  it.each([
    ['2.5', 2.5],
    ['2,5', 2.5],
    [' 2.5 ', 2.5],
    ['.5', 0.5],
    ['5.', 5],
    ['+3', 3],
    ['-3', -3],
    ['−3', -3],
    ['–3', -3],
    ['1 234,5', 1234.5],
    ['12\u202F345', 12345],
    ['1\u00A0234', 1234],
    ['1e-3', 0.001],
    ['1.5E+2', 150],
    ['1.5 × 10⁻³', 0.0015],
    ['2·10^3', 2000],
    ['-0', 0],
  ])('“%s” as %d', (text, expected) => expect(value(text)).toBe(expected));

  it.each([
    ['3.4 A', 'A', 3.4],
    ['3.4A', 'A', 3.4],
    ['27 °C', 'C', 27],
    ['27 C', 'C', 27],
    ['1.9 Ω', 'ohm', 1.9],
    ['1.9 ohm', 'ohm', 1.9],
    ['80 %', '%', 80],
    ['1e3 mV', 'mV', 1000],
  ])('“%s” in a field of %s', (text, unit, expected) => expect(value(text, { unit })).toBe(expected));

  it('every number that formatNumber prints, to the digits printed', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e9, max: 1e9, noNaN: true }), (x) => {
        const back = value(formatNumber(x, { digits: 12 })) as number;
        expect(Math.abs(back - x)).toBeLessThanOrEqual(1e-11 * Math.abs(x));
      }),
    );
  });

  it('a printed value with its unit', () => {
    expect(value(formatWithUnit(-12345.5, 'W', { decimals: 1 }), { unit: 'W' })).toBe(-12345.5);
  });
});

describe('parseNumber tells how to mend', () => {
  it.each<[string, ParseOptions, string]>([
    ['', {}, 'Type a number, such as 2.5.'],
    ['   ', {}, 'Type a number, such as 2.5.'],
    ['abc', {}, '“abc” is not a number: type digits, such as 2.5.'],
    ['-', {}, '“-” is not a number: type digits, such as 2.5.'],
    ['1.2.3', {}, 'Write the number with one decimal point or comma and no other separators, such as 1234.5.'],
    ['1,234.5', {}, 'Write the number with one decimal point or comma and no other separators, such as 1234.5.'],
    ['3 4', {}, 'Write the number with one decimal point or comma and no other separators, such as 1234.5.'],
    ['3 mA', { unit: 'A' }, 'This field is in A: leave out “mA” and type the value in A.'],
    ['80 °F', { unit: 'C' }, 'This field is in °C: leave out “°F” and type the value in °C.'],
    ['5 W', {}, 'Leave out “W”: this field takes a number without a unit.'],
    ['1e999', {}, 'That number is too large to work with: check its power of ten.'],
    ['0.4', { min: 0.5, unit: 'A' }, 'Type 0.5\u00A0A or more.'],
    ['41', { max: 40, unit: 'K' }, 'Type 40\u00A0K or less.'],
    ['0', { above: 0 }, 'Type a number larger than 0.'],
  ])('“%s”', (text, options, message) => expect(parseNumber(text, options)).toEqual({ ok: false, message }));

  it('and takes the limits themselves as allowed', () => {
    expect(value('0.5', { min: 0.5 })).toBe(0.5);
    expect(value('40', { max: 40 })).toBe(40);
  });

  it('and never lets NaN or infinity through', () => {
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom(...'0123456789.,-+e ×10⁻A%°C'), maxLength: 12 }), (text) => {
        const parsed = parseNumber(text, { unit: 'A' });
        expect(parsed.ok ? Number.isFinite(parsed.value) : parsed.message.length > 0).toBe(true);
      }),
    );
  });
});
