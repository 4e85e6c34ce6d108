import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constantModule, maximaAtHotSide, maximaOf, moduleOfForm, numericCurrents, type ModuleConstants } from '@/lib/module';
import { kelvin } from '@/lib/units';
import { anyConstants } from './arbitraries';

const anyHot = fc.double({ min: 270, max: 350, noNaN: true }).map(kelvin);

describe.each(['shaped', 'leg'] as const)('maxima of the %s form', (form) => {
  it('pump no heat at the largest ΔT, where no other current pumps any', () => {
    fc.assert(
      fc.property(anyConstants, anyHot, (c: ModuleConstants, Th) => {
        const m = maximaOf(form, c, Th);
        const module = moduleOfForm(form, c);
        const Tc = kelvin(Th - m.dTmaxK);
        expect(Math.abs(module.heat(m.imaxLargestDeltaT, Tc, Th))).toBeLessThan(1e-7 * m.qmaxW);
        for (const off of [0.95, 1.05]) expect(module.heat(off * m.imaxLargestDeltaT, Tc, Th)).toBeLessThan(0);
        expect(module.voltage(m.imaxLargestDeltaT, Tc, Th)).toBeCloseTo(m.vmaxV, 9);
        expect(module.heat(m.imaxLargestDeltaT, Th, Th)).toBeCloseTo(m.qmaxW, 9);
        for (const off of [0.97, 1.03]) expect(module.heat(off * m.imaxMostHeat, Th, Th)).toBeLessThan(m.qMostHeatW);
      }),
      { numRuns: 40 },
    );
  });

  it('have the smaller current that pumps a heat, and none for more than the most heat', () => {
    fc.assert(
      fc.property(anyConstants, anyHot, fc.double({ min: -0.2, max: 0.98, noNaN: true }), (c, Th, share) => {
        const Tc = kelvin(Th - 20);
        const currents = numericCurrents(form, c);
        const module = moduleOfForm(form, c);
        const most = currents.mostHeat(Tc, Th)!;
        const peak = module.heat(most, Tc, Th);
        const I = currents.forHeat(share * Math.abs(peak), Tc, Th);
        if (share * Math.abs(peak) > peak) return;
        expect(I).toBeLessThan(most);
        expect(module.heat(I!, Tc, Th) / Math.abs(peak)).toBeCloseTo(share, 8);
        expect(currents.forHeat(peak + 0.001 * Math.abs(peak), Tc, Th)).toBeNull();
      }),
      { numRuns: 40 },
    );
  });
});

describe('maxima of constants', () => {
  it('are the closed ones', () => {
    const c = { alpha: 0.05, R: 2, K: 0.5 };
    expect(maximaOf('constant', c, kelvin(300))).toEqual(maximaAtHotSide(c, kelvin(300)));
    const most = numericCurrents('constant', c).mostHeat(280, 300)!;
    expect(most).toBeCloseTo((0.05 * 280) / 2, 9);
    expect(numericCurrents('constant', c).forHeat(constantModule(c).heat(3, kelvin(280), kelvin(300)), 280, 300)).toBeCloseTo(3, 9);
  });
});
