import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isMatch, judge, type Candidate, type Duty } from '@/lib/duty';
import { constantModule, currentForHeat } from '@/lib/module';
import { propagate } from '@/lib/numeric';
import { celsius, toKelvin } from '@/lib/units';
import { anyCandidate, candidate, plainModel } from './support';

const duty: Duty = { heatW: 20, coldFaceC: 5, hotFaceC: 40 };
const Tc = toKelvin(celsius(5));
const Th = toKelvin(celsius(40));

const matchOf = (one: Candidate) => {
  const row = judge(duty, one);
  return isMatch(row) ? row : null;
};

describe('uncertainty of a match', () => {
  it('is what propagation by finite differences gives, covariances included', () => {
    fc.assert(
      fc.property(anyCandidate, (one) => {
        const row = matchOf(one);
        // close to the most heat the current reacts without bound, where finite differences mean nothing
        if (!row || !row.cop || row.reserveW < 0.05 * duty.heatW) return;
        const at = row.current.value;
        const { u } = propagate(
          ([alpha, R, K]) => {
            const constants = { alpha: alpha!, R: R!, K: K! };
            const module = constantModule(constants);
            const I = currentForHeat(constants, duty.heatW, Tc, Th)!;
            return [I, module.cop(I, Tc, Th)!, module.heat(at, Tc, Th)];
          },
          one.model.parameters,
          one.model.covariance,
        );
        expect(row.current.u! / u[0]!).toBeCloseTo(1, 4);
        expect(row.cop.u! / u[1]!).toBeCloseTo(1, 4);
        expect(row.heat.u! / u[2]!).toBeCloseTo(1, 4);
      }),
    );
  });

  it('grows by what the form leaves: heat by its misfit, current by that over the slope', () => {
    const still = candidate({
      model: {
        covariance: [
          [0, 0, 0],
          [0, 0, 0],
          [0, 0, 0],
        ],
        misfit: { heatW: 0.5, voltageV: 0.1 },
      },
    });
    const row = matchOf(still)!;
    const [alpha, R] = plainModel.parameters;
    const slope = alpha * Tc - row.current.value * R;
    expect(row.heat.u).toBeCloseTo(0.5, 12);
    expect(row.current.u).toBeCloseTo(0.5 / slope, 12);
    const dP = Math.hypot(row.current.value * 0.1, ((row.current.value * R + row.voltageV) * 0.5) / slope);
    expect(row.cop!.u).toBeCloseTo((row.cop!.value / row.powerW) * dP, 12);
  });

  it('tells the tolerance as what a module at its low end needs', () => {
    const row = matchOf(candidate())!;
    const [alpha, R, K] = plainModel.parameters;
    const constants = { alpha, R, K };
    const needed = currentForHeat(constants, duty.heatW / 0.9, Tc, Th)!;
    expect(row.current.tolerance).toBeCloseTo(needed - row.current.value, 12);
    expect(row.cop!.value - row.cop!.tolerance!).toBeCloseTo(duty.heatW / constantModule(constants).power(needed, Tc, Th), 12);
    expect(row.heat.tolerance).toBeCloseTo(2, 12);
  });

  it('states no tolerance where the sheet states none', () => {
    const row = matchOf(candidate({ model: { tolerancePercent: null } }))!;
    expect([row.current.tolerance, row.cop!.tolerance, row.heat.tolerance]).toEqual([null, null, null]);
  });

  it('states no tolerance of the current where the low end does not reach the heat', () => {
    const row = judge({ ...duty, heatW: 43 }, candidate());
    expect(isMatch(row) && row.current.tolerance).toBeNull();
    expect(isMatch(row) && row.heat.tolerance).toBeCloseTo(4.3, 12);
  });
});
