import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constantModule, figureOfMerit } from '@/lib/module';
import { kelvin } from '@/lib/units';
import { anyConstants, anyFace } from './arbitraries';

const constants = { alpha: 0.053, R: 1.6, K: 0.66 };
const module = constantModule(constants);
const [cold, hot] = [kelvin(270), kelvin(300)];

describe('constantModule', () => {
  // By hand: 0.053·270·3 − 9·1.6/2 − 0.66·30 = 42.93 − 7.2 − 19.8; 0.053·30 + 3·1.6; 6.39·3; sum; quotient.
  it('gives heat, voltage, power, heat rejected and COP of a case worked by hand', () => {
    expect(module.heat(3, cold, hot)).toBeCloseTo(15.93, 10);
    expect(module.voltage(3, cold, hot)).toBeCloseTo(6.39, 10);
    expect(module.power(3, cold, hot)).toBeCloseTo(19.17, 10);
    expect(module.heatRejected(3, cold, hot)).toBeCloseTo(35.1, 10);
    expect(module.cop(3, cold, hot)).toBeCloseTo(15.93 / 19.17, 10);
  });

  it('only conducts without current', () => {
    expect(module.heat(0, cold, hot)).toBeCloseTo(-19.8, 10);
    expect(module.heatRejected(0, cold, hot)).toBeCloseTo(-19.8, 10);
    expect(module.cop(0, cold, hot)).toBeNull();
  });

  it('generates with a small reversed current and then has no COP', () => {
    expect(module.power(-0.5, cold, hot)).toBeLessThan(0);
    expect(module.cop(-0.5, cold, hot)).toBeNull();
  });

  it('heats the cold face when the current is reversed', () => {
    expect(module.heat(-3, cold, cold)).toBeLessThan(0);
  });

  it('rejects α Th I + I²R/2 − K ΔT at any current and any faces', () => {
    fc.assert(
      fc.property(anyConstants, fc.double({ min: -10, max: 10, noNaN: true }), anyFace, anyFace, (c, I, Tc, Th) => {
        const expected = c.alpha * Th * I + (I * I * c.R) / 2 - c.K * (Th - Tc);
        expect(constantModule(c).heatRejected(I, Tc, Th)).toBeCloseTo(expected, 8);
      }),
    );
  });

  it('keeps energy: with both the current and the faces exchanged, heat absorbed becomes heat given off', () => {
    fc.assert(
      fc.property(anyConstants, fc.double({ min: -10, max: 10, noNaN: true }), anyFace, anyFace, (c, I, Tc, Th) => {
        const one = constantModule(c);
        expect(one.heat(-I, Th, Tc)).toBeCloseTo(-one.heatRejected(I, Tc, Th), 8);
      }),
    );
  });
});

describe('figureOfMerit', () => {
  it('is α²/(R K)', () => expect(figureOfMerit(constants)).toBeCloseTo(0.053 ** 2 / (1.6 * 0.66), 15));
});
