import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constantsFromRatings, maximaAtHotSide, type ThreeRatings } from '@/lib/module';
import { kelvin } from '@/lib/units';
import { anyConstants, anyFace } from './arbitraries';

const Th = kelvin(300.15);
const message = (ratings: ThreeRatings) => {
  const outcome = constantsFromRatings(ratings, Th);
  return outcome.ok ? null : outcome.message;
};

describe('constantsFromRatings', () => {
  it.each(['qmaxW', 'vmaxV', 'imaxA', 'dTmaxK'] as const)('inverts the maxima exactly without %s', (left) => {
    fc.assert(
      fc.property(anyConstants, anyFace, (c, hot) => {
        const m = maximaAtHotSide(c, hot);
        const four = { qmaxW: m.qmaxW, vmaxV: m.vmaxV, imaxA: m.imaxLargestDeltaT, dTmaxK: m.dTmaxK };
        const outcome = constantsFromRatings({ ...four, [left]: undefined } as unknown as ThreeRatings, hot);
        if (!outcome.ok) throw new Error(outcome.message);
        // Without dTmax, it is the small difference of two large products: a few digits go.
        const tolerance = left === 'dTmaxK' ? 1e-7 : 1e-10;
        for (const name of ['alpha', 'R', 'K'] as const) {
          expect(Math.abs(outcome.constants[name] / c[name] - 1)).toBeLessThan(tolerance);
        }
      }),
    );
  });

  it('changes with each rating as the published inverse does', () => {
    // Logarithmic sensitivities at Vmax 15.9 V, Imax 7.6 A, dTmax 70 K, Th 298 K, worked from
    // α = Vmax/Th, R = (Vmax/Imax)(Th − D)/Th, K = Vmax Imax (Th − D)/(2 Th D): D/(Th − D) = 0.307.
    const at = (ratings: { vmaxV: number; imaxA: number; dTmaxK: number }) => {
      const outcome = constantsFromRatings(ratings, kelvin(298));
      return outcome.ok ? Object.values(outcome.constants).map(Math.log) : [];
    };
    const base = { vmaxV: 15.9, imaxA: 7.6, dTmaxK: 70 };
    const slopes = (name: keyof typeof base) => {
      const [up, down] = [at({ ...base, [name]: base[name] * 1.0001 }), at({ ...base, [name]: base[name] * 0.9999 })];
      return up.map((value, i) => (value - down[i]!) / 2e-4);
    };
    const expected = { vmaxV: [1, 1, 1], imaxA: [0, -1, 1], dTmaxK: [0, -0.307, -1.307] };
    for (const name of ['vmaxV', 'imaxA', 'dTmaxK'] as const) slopes(name).forEach((s, i) => expect(s).toBeCloseTo(expected[name][i]!, 3));
  });

  it('refuses ratings that no module can have, and says which', () => {
    expect(message({ vmaxV: 15, imaxA: -3, dTmaxK: 66 })).toBe('Ratings are positive numbers: check their signs.');
    expect(message({ vmaxV: 15, imaxA: 3, dTmaxK: 320 })).toBe('ΔTmax reaches down to absolute zero: check its unit and the hot side.');
    expect(message({ vmaxV: 15, imaxA: 3, qmaxW: 20 })).toMatch(/below half of Vmax times Imax/);
    expect(message({ vmaxV: 15, imaxA: 3, qmaxW: 46 })).toMatch(/above Vmax times Imax/);
    expect(message({ vmaxV: 15, imaxA: 3, qmaxW: 28 })).toBeNull();
  });
});
