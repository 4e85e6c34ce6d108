import { describe, expect, test } from 'vitest';
import type { Made } from '../../../samples/draw/plan';
import { makeModule } from '../../../samples/draw/sheet';
import { sheets } from '../../../samples/plan';

/** A module of the plan with the truth behind its curves, by its part number. */
function madeOf(partNumber: string): Made {
  for (const { body, modules } of sheets)
    for (const plan of modules) if (plan.partNumber === partNumber) return makeModule(body.vendor, plan);
  throw new Error(partNumber);
}

/** Printed over true, at the first hot side. */
function shares(partNumber: string) {
  const { body, truth } = madeOf(partNumber);
  const printed = body.ratings[0];
  const real = truth.ratings(printed?.hotSideC ?? 27);
  const share = (value: number | null | undefined, of: number) => (value ?? NaN) / of;
  return {
    imax: share(printed?.imaxA, real.imaxLargestDeltaT),
    imaxMostHeat: share(printed?.imaxA, real.imaxMostHeat),
    vmax: share(printed?.vmaxV, real.vmaxV),
    qmax: share(printed?.qmaxW, real.qmaxLargestDeltaT),
    qmaxMostHeat: share(printed?.qmaxW, real.qmaxMostHeat),
    dTmax: share(printed?.dTmaxK, real.dTmaxK),
  };
}

const within = (value: number, centre: number, by: number) => expect(Math.abs(value - centre)).toBeLessThan(by);

describe('printed ratings', () => {
  test('follow the truth but for rounding where a sheet says what it means', () => {
    const { imax, vmax, qmax, dTmax } = shares('Coldwick 62');
    for (const share of [imax, vmax, qmax, dTmax]) within(share, 1, 0.01);
  });

  test('are the current of most heat and that heat where a sheet says so', () => {
    const { imaxMostHeat, qmaxMostHeat, imax } = shares('Levanter');
    for (const share of [imaxMostHeat, qmaxMostHeat]) within(share, 1, 0.01);
    expect(imax).toBeGreaterThan(1.02);
  });

  test('are least values at Thistlecap', () => {
    within(shares('Tarn 20').qmax, 0.95, 0.01);
  });

  test('of Brimstead 40-C give a current that its curves contradict', () => {
    const { imax, qmax } = shares('Brimstead 40-C');
    within(imax, 0.87, 0.01);
    within(qmax, 1, 0.01);
  });

  test('of Haff 40 give more heat than it can pump', () => {
    const { imax, qmax } = shares('Haff 40');
    within(qmax, 1.27 * 0.95, 0.01);
    within(imax, 1, 0.01);
  });

  test('of Sarabande give the current it allows, and say so', () => {
    within(shares('Sarabande').imax, 0.9, 0.01);
    expect(madeOf('Sarabande').body.ratings[0]?.imaxMeans).toBe('allowed');
  });
});
