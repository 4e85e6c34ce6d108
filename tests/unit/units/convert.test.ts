import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  baseUnitsPer,
  celsius,
  fromBase,
  fromFraction,
  kelvin,
  QUANTITIES,
  quantityName,
  quantitySymbol,
  REFERENCE_KELVIN,
  toBase,
  toCelsius,
  toFraction,
  toKelvin,
  unitsOf,
  unitSymbol,
} from '@/lib/units';

describe('temperatures', () => {
  it('puts 0 °C at 273.15 K and the reference at 27 °C', () => {
    expect(toKelvin(celsius(0))).toBe(273.15);
    expect(toCelsius(REFERENCE_KELVIN)).toBe(27);
  });

  it('comes back from kelvin to the same Celsius temperature', () => {
    fc.assert(
      fc.property(fc.double({ min: -273, max: 1000, noNaN: true }), (t) => {
        expect(toCelsius(toKelvin(celsius(t)))).toBeCloseTo(t, 9);
      }),
    );
  });

  it('takes a brand for a plain number at run time', () => {
    expect(kelvin(300) + 1).toBe(301);
  });
});

describe('toBase', () => {
  // Boiling and freezing water and the common point of both scales: value from memory, exact by definition of the scales.
  it.each([
    [32, 'F', 273.15],
    [212, 'F', 373.15],
    [-40, 'F', 233.15],
    [-40, 'C', 233.15],
    [25, 'C', 298.15],
    [310, 'K', 310],
  ] as const)('takes an absolute temperature of %d %s as %d K', (value, unit, expected) => {
    expect(toBase(value, 'Th', unit)).toBeCloseTo(expected, 10);
    expect(toBase(value, 'Tc', unit)).toBeCloseTo(expected, 10);
  });

  it('scales a temperature difference and never shifts it', () => {
    expect(toBase(126, 'deltaT', 'F')).toBe(70);
    expect(toBase(70, 'deltaT', 'C')).toBe(70);
    expect(toBase(0, 'deltaT', 'F')).toBe(0);
  });

  it('takes 700 mA as exactly 0.7 A and so on for every milli unit', () => {
    expect(toBase(700, 'I', 'mA')).toBe(0.7);
    expect(toBase(2100, 'V', 'mV')).toBe(2.1);
    expect(toBase(35, 'Qc', 'mW')).toBe(0.035);
  });

  it('refuses a unit that the quantity does not have', () => {
    expect(() => toBase(1, 'I', 'V')).toThrow('I cannot be in V; its units are A, mA');
    expect(() => fromBase(1, 'Qc', '%')).toThrow(RangeError);
  });

  it('comes back from base units for every quantity and unit', () => {
    const pairs = QUANTITIES.flatMap((quantity) => unitsOf(quantity).map((unit) => ({ quantity, unit })));
    fc.assert(
      fc.property(fc.constantFrom(...pairs), fc.double({ min: -1e4, max: 1e4, noNaN: true }), ({ quantity, unit }, value) => {
        expect(fromBase(toBase(value, quantity, unit), quantity, unit)).toBeCloseTo(value, 8);
      }),
    );
  });

  it('says how many base units a unit spans, without any shift', () => {
    expect(baseUnitsPer('Th', 'F')).toBeCloseTo(5 / 9, 15);
    expect(baseUnitsPer('Th', 'C')).toBe(1);
    expect(baseUnitsPer('V', 'mV')).toBe(0.001);
  });
});

describe('shares of a rating', () => {
  it('reads percent and plain fractions', () => {
    expect(toFraction(80, '%')).toBe(0.8);
    expect(toFraction(0.8, '1')).toBe(0.8);
    expect(fromFraction(0.35, '%')).toBe(35);
    expect(fromFraction(0.35, '1')).toBe(0.35);
  });
});

describe('names', () => {
  it('gives every quantity a name, a symbol and at least one unit', () => {
    expect(QUANTITIES.map((quantity) => quantityName(quantity))).toEqual([
      'current',
      'voltage',
      'temperature difference',
      'cold side',
      'hot side',
      'heat pumped',
      'heat rejected',
      'electrical power',
      'COP',
    ]);
    expect(quantitySymbol('deltaT')).toBe('ΔT');
    expect(QUANTITIES.every((quantity) => unitsOf(quantity).length > 0)).toBe(true);
  });

  it('puts the usual unit first: °C for a side, K for a difference', () => {
    expect(unitsOf('Th')).toEqual(['C', 'K', 'F']);
    expect(unitsOf('deltaT')).toEqual(['K', 'C', 'F']);
  });

  it('prints symbols of units and leaves unknown ones as they are', () => {
    expect(['C', 'F', 'ohm', '1', '1/K', 'V/K'].map(unitSymbol)).toEqual(['°C', '°F', 'Ω', '', 'K⁻¹', 'V/K']);
  });
});
