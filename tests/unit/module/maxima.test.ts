import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constantModule, maximaAtHotSide } from '@/lib/module';
import { minimise } from '@/lib/numeric';
import { kelvin } from '@/lib/units';
import { anyConstants, anyFace } from './arbitraries';

const relative = (got: number, expected: number) => Math.abs(got - expected) / Math.abs(expected);

describe('maximaAtHotSide', () => {
  it('balances heat at the largest ΔT and its current, where any other current absorbs less', () => {
    fc.assert(
      fc.property(anyConstants, anyFace, fc.double({ min: -0.3, max: 0.3, noNaN: true }), (c, Th, off) => {
        const { imaxLargestDeltaT: I, dTmaxK, qmaxW } = maximaAtHotSide(c, Th);
        const Tc = kelvin(Th - dTmaxK);
        const module = constantModule(c);
        expect(Math.abs(module.heat(I, Tc, Th))).toBeLessThan(1e-9 * qmaxW + 1e-12 * c.K * Th);
        expect(module.heat(I * (1 + off), Tc, Th)).toBeLessThanOrEqual(1e-9 * qmaxW + 1e-12 * c.K * Th);
      }),
    );
  });

  it('obeys the closed forms Imax = (K/α)(√(1 + 2 Z Th) − 1), D = Z (Th − D)²/2 and Qmax = Vmax Imax (Th + D)/(2 Th)', () => {
    fc.assert(
      fc.property(anyConstants, anyFace, (c, Th) => {
        const m = maximaAtHotSide(c, Th);
        expect(relative(m.imaxLargestDeltaT, (c.K / c.alpha) * (Math.sqrt(1 + 2 * m.Z * Th) - 1))).toBeLessThan(1e-11);
        expect(relative(m.dTmaxK, (m.Z * (Th - m.dTmaxK) ** 2) / 2)).toBeLessThan(1e-11);
        expect(relative(m.qmaxW, (m.vmaxV * m.imaxLargestDeltaT * (Th + m.dTmaxK)) / (2 * Th))).toBeLessThan(1e-11);
      }),
    );
  });

  it('has its Vmax, Qmax and most heat where the module itself has them', () => {
    fc.assert(
      fc.property(anyConstants, anyFace, (c, Th) => {
        const m = maximaAtHotSide(c, Th);
        const module = constantModule(c);
        expect(relative(module.voltage(m.imaxLargestDeltaT, kelvin(Th - m.dTmaxK), Th), m.vmaxV)).toBeLessThan(1e-11);
        expect(relative(module.heat(m.imaxLargestDeltaT, Th, Th), m.qmaxW)).toBeLessThan(1e-11);
        expect(relative(module.heat(m.imaxMostHeat, Th, Th), m.qMostHeatW)).toBeLessThan(1e-11);
        expect(relative(m.qmaxW / m.qMostHeatW, 1 - (m.dTmaxK / Th) ** 2)).toBeLessThan(1e-11);
      }),
    );
  });

  it('has no current of more heat at ΔT = 0 than the current of most heat', () => {
    const c = { alpha: 0.053, R: 1.6, K: 0.66 };
    const Th = kelvin(300);
    const most = minimise((I) => -constantModule(c).heat(I, Th, Th), 0, 30);
    expect(most.x).toBeCloseTo(maximaAtHotSide(c, Th).imaxMostHeat, 5);
    expect(-most.value).toBeCloseTo(maximaAtHotSide(c, Th).qMostHeatW, 10);
  });
});
