import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bestCop, constantModule, currentForBestCop, currentForHeat, currentForMostHeat, maximaAtHotSide } from '@/lib/module';
import { kelvin } from '@/lib/units';
import { anyConstants, anyFace } from './arbitraries';

const share = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe('currentForHeat', () => {
  it('gives back the current that pumps a heat, up to the current of most heat', () => {
    fc.assert(
      fc.property(anyConstants, anyFace, anyFace, share(-0.5, 0.999), (c, Tc, Th, part) => {
        const I = part * currentForMostHeat(c, Tc);
        const found = currentForHeat(c, constantModule(c).heat(I, Tc, Th), Tc, Th);
        expect(found).not.toBeNull();
        expect(Math.abs(found! - I)).toBeLessThan(1e-6 * currentForMostHeat(c, Tc));
      }),
    );
  });

  it('knows when no current pumps that much', () => {
    const c = { alpha: 0.053, R: 1.6, K: 0.66 };
    const [Tc, Th] = [kelvin(270), kelvin(300)];
    const most = constantModule(c).heat(currentForMostHeat(c, Tc), Tc, Th);
    expect(currentForHeat(c, most + 0.001, Tc, Th)).toBeNull();
    expect(currentForHeat(c, most - 0.001, Tc, Th)).toBeLessThan(currentForMostHeat(c, Tc));
  });
});

describe('currentForBestCop', () => {
  it('is the current at which the module has its best COP, and no other has a better one', () => {
    fc.assert(
      fc.property(anyConstants, anyFace, share(0.05, 0.95), share(0.5, 1.5), (c, Th, part, off) => {
        const Tc = kelvin(Th - part * maximaAtHotSide(c, Th).dTmaxK);
        const [I, best] = [currentForBestCop(c, Tc, Th)!, bestCop(c, Tc, Th)!];
        const module = constantModule(c);
        expect(Math.abs(module.cop(I, Tc, Th)! - best)).toBeLessThan(1e-9 * (1 + Math.abs(best)));
        expect(module.cop(I * off, Tc, Th)!).toBeLessThanOrEqual(best + 1e-9 * (1 + Math.abs(best)));
      }),
    );
  });

  it('does not exist without a positive temperature difference, where COP has no bound', () => {
    const c = { alpha: 0.053, R: 1.6, K: 0.66 };
    for (const Tc of [300, 310]) {
      expect(currentForBestCop(c, kelvin(Tc), kelvin(300))).toBeNull();
      expect(bestCop(c, kelvin(Tc), kelvin(300))).toBeNull();
    }
  });

  it('has a best COP below zero where the difference is beyond reach', () => {
    const c = { alpha: 0.053, R: 1.6, K: 0.66 };
    expect(bestCop(c, kelvin(300 - maximaAtHotSide(c, kelvin(300)).dTmaxK - 1), kelvin(300))).toBeLessThan(0);
  });
});
