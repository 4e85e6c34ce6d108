import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { stateOf, type Build } from '../../../samples/draw/leg';
import { publishedMaterial, scattered, scatterOf } from '../../../samples/draw/material';
import { makeTruth } from '../../../samples/draw/truth';

const bare: Build = {
  couples: 127,
  legAreaM2: 1.633e-6,
  legLengthM: 1e-3,
  contactOhmM2: 0,
  plateKelvinPerWatt: 0,
  material: publishedMaterial,
};
const whole: Build = { ...bare, contactOhmM2: 1e-10, plateKelvinPerWatt: 0.0125, material: scattered(scatterOf('a leg')) };

describe('the leg behind the drawings', () => {
  // Another solution of the same equation with the same polynomials (N = 127, A/L = 1.633 mm), worked out for this project.
  test.each([
    { hot: 300, cold: 300, current: 4, heat: 51.051, voltage: 6.998 },
    { hot: 300, cold: 270, current: 3, heat: 14.446, voltage: 6.4 },
    { hot: 300, cold: 270, current: 6, heat: 36.076, voltage: 11.474 },
    { hot: 323, cold: 283, current: 4, heat: 20.653, voltage: 9.248 },
    { hot: 300, cold: 250, current: 5, heat: 10.192, voltage: 10.295 },
    { hot: 300, cold: 240, current: 6, heat: 4.282, voltage: 12.143 },
  ])('gives $heat W and $voltage V at $hot K, $cold K and $current A, within 5 mW and 3 mV', ({ hot, cold, current, heat, voltage }) => {
    const state = stateOf(bare, current, cold, hot);
    expect(Math.abs(state.heat - heat)).toBeLessThan(0.005);
    expect(Math.abs(state.voltage - voltage)).toBeLessThan(0.003);
  });

  test('meets α Tc I − I²R/2 − K ΔT where the properties do not change', () => {
    const material = () => ({ alpha: 2.1e-4, rho: 1.1e-5, kappa: 1.6 });
    const { heat, voltage } = stateOf({ ...bare, material }, 3, 270, 300);
    const [alpha, R, K] = [254 * 2.1e-4, (254 * 1.1e-5) / 1.633e-3, 254 * 1.6 * 1.633e-3];
    expect(heat).toBeCloseTo(alpha * 270 * 3 - (9 * R) / 2 - K * 30, 6);
    expect(voltage).toBeCloseTo(alpha * 30 + 3 * R, 6);
  });

  test('gives off what it takes up and what it is fed, with contacts and plates too', () => {
    fc.assert(
      fc.property(fc.double({ min: -8, max: 8, noNaN: true }), fc.double({ min: -20, max: 75, noNaN: true }), (current, deltaT) => {
        const { heat, rejected, voltage } = stateOf(whole, current, 310 - deltaT, 310);
        expect(rejected - heat).toBeCloseTo(current * voltage, 7);
      }),
      { numRuns: 100, seed: 7 },
    );
  });

  test('pumps less through contacts and plates', () => {
    const through = stateOf({ ...whole, material: publishedMaterial }, 4, 280, 300);
    expect(through.heat).toBeLessThan(stateOf(bare, 4, 280, 300).heat - 0.5);
  });

  test('reaches the largest difference it was made for', () => {
    const truth = makeTruth({ seed: 'any', couples: 31, legMm: [1, 1.5], plateMm: [15, 15], aimK: 69, aimAtC: 25 });
    const { dTmaxK, imaxLargestDeltaT } = truth.ratings(25);
    expect(dTmaxK).toBeCloseTo(69, 1);
    for (const other of [0.9, 1.1]) expect(truth.reach(other * imaxLargestDeltaT, 25)).toBeLessThan(dTmaxK);
  });
});
