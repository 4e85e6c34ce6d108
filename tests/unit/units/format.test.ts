import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatNumber, formatUncertain, formatWithUnit, NOT_STATED } from '@/lib/units';

describe('formatNumber', () => {
  it('shows four significant digits without trailing zeros when nothing is asked', () => {
    expect([3.866254, 0.05, 5, 0.99999].map((x) => formatNumber(x))).toEqual(['3.866', '0.05', '5', '1']);
  });

  it('keeps the digits or decimals that are asked for', () => {
    expect(formatNumber(0.05, { digits: 3 })).toBe('0.0500');
    expect(formatNumber(3.866254, { decimals: 2 })).toBe('3.87');
    expect(formatNumber(99.96, { digits: 3 })).toBe('100');
  });

  it('writes the true minus, and none in front of a rounded zero', () => {
    expect(formatNumber(-2.5)).toBe('\u22122.5');
    expect(formatNumber(-0.001, { decimals: 2 })).toBe('0.00');
    expect(formatNumber(-0)).toBe('0');
  });

  it('groups five digits and more with a thin space that does not break', () => {
    expect(formatNumber(1234, { decimals: 0 })).toBe('1234');
    expect(formatNumber(12345.678, { decimals: 2 })).toBe('12\u202F345.68');
    expect(formatNumber(1234567, { decimals: 0 })).toBe('1\u202F234\u202F567');
  });

  it('uses a power of ten below 10⁻⁴ and from 10⁷ on', () => {
    expect(formatNumber(-0.00001234)).toBe('\u22121.234\u00A0×\u00A010⁻⁵');
    expect(formatNumber(0.0001234)).toBe('0.0001234');
    expect(formatNumber(9999999.9)).toBe('1\u00A0×\u00A010⁷');
  });

  it('shows an en dash for what is missing or not finite', () => {
    expect([null, undefined, NaN, Infinity].map((x) => formatNumber(x))).toEqual(Array(4).fill(NOT_STATED));
  });
});

describe('formatWithUnit', () => {
  it('sets a no-break space before every unit, the percent sign too', () => {
    expect(formatWithUnit(27, 'C')).toBe('27\u00A0°C');
    expect(formatWithUnit(1.9896, 'ohm')).toBe('1.99\u00A0Ω');
    expect(formatWithUnit(80, '%')).toBe('80\u00A0%');
  });

  it('leaves a ratio without unit and a missing value without unit', () => {
    expect(formatWithUnit(0.84, '1')).toBe('0.84');
    expect(formatWithUnit(null, 'W')).toBe(NOT_STATED);
  });
});

describe('formatUncertain', () => {
  // The mass standard of JCGM 100:2008, 7.2.2: 100.02147 g with a combined standard uncertainty of 0.35 mg, printed
  // there with two digits as 100.02147(35); this house shows one digit where the first is not a 1.
  it.each([
    [100.02147, 0.00035, 'g', '100.0215(3)\u00A0g'],
    [0.05123, 0.00021, 'V/K', '0.0512(2)\u00A0V/K'],
    [0.05123, 0.00014, 'V/K', '0.05123(14)\u00A0V/K'],
    [1.9896, 0.0096, 'ohm', '1.990(10)\u00A0Ω'],
    [2.34, 1.2, 'ohm', '2.3(1.2)\u00A0Ω'],
    [34.14, 3, 'W', '34(3)\u00A0W'],
    [1234, 20, 'W', '1230(20)\u00A0W'],
    [1234, 12, 'W', '1234(12)\u00A0W'],
    [-5.04, 0.3, 'K', '\u22125.0(3)\u00A0K'],
    [0.0024341, 0.000012, '1/K', '0.002434(12)\u00A0K⁻¹'],
    [0.00000123, 0.00000004, 'V', '1.23(4)\u00A0×\u00A010⁻⁶\u00A0V'],
    [0.4737, 0.023, '1', '0.47(2)'],
  ])('prints %d with %d %s as %s', (value, u, unit, text) => expect(formatUncertain(value, u, unit).text).toBe(text));

  it('says the same aloud with the uncertainty written out', () => {
    expect(formatUncertain(0.05123, 0.00021, 'V/K').spoken).toBe('0.0512 plus or minus 0.0002\u00A0V/K');
    expect(formatUncertain(0.00000123, 0.00000004, 'V').spoken).toBe('(1.23 plus or minus 0.04)\u00A0×\u00A010⁻⁶\u00A0V');
  });

  it('never prints an uncertainty of nothing', () => {
    for (const u of [0, undefined, null, NaN, -1, Infinity]) expect(formatUncertain(3.866254, u, 'A').text).toBe('3.866\u00A0A');
  });

  it('prints what is missing as an en dash and says so', () => {
    expect(formatUncertain(undefined, 0.1, 'A')).toEqual({ text: NOT_STATED, spoken: 'not stated' });
  });

  it('always shows the uncertainty within half of its last digit', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-3, max: 1e3, noNaN: true }), fc.double({ min: 1e-6, max: 10, noNaN: true }), (value, u) => {
        const [shownValue, shownU] = formatUncertain(value, u)
          .spoken.split(' plus or minus ')
          .map((part) => Number(part.replace(/\u202F/g, '')));
        const digit = u.toExponential().startsWith('1') ? 2 : 1;
        const last = 10 ** (Math.floor(Math.log10(u)) - digit + 1);
        expect(Math.abs(shownU! - u)).toBeLessThanOrEqual(0.5001 * last);
        expect(Math.abs(shownValue! - value)).toBeLessThanOrEqual(0.5001 * last);
      }),
    );
  });
});
