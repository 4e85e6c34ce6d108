import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isMatch, judge, searchDuty } from '@/lib/duty';
import { constantModule, maximaAtHotSide } from '@/lib/module';
import { celsius, toKelvin } from '@/lib/units';
import { anyCandidate, anyDuty, type Named } from './support';

const moduleOf = ({ model: { parameters } }: Named) => constantModule({ alpha: parameters[0], R: parameters[1], K: parameters[2] });
const faces = (duty: { coldFaceC: number; hotFaceC: number }) =>
  [toKelvin(celsius(duty.coldFaceC)), toKelvin(celsius(duty.hotFaceC))] as const;

const search = fc.tuple(anyDuty, fc.array(anyCandidate, { maxLength: 12 }));

describe('searchDuty, for any duty and any modules', () => {
  it('gives every module back once, as a match or as a miss', () => {
    fc.assert(
      fc.property(search, ([duty, candidates]) => {
        const { matches, misses } = searchDuty(duty, candidates);
        const back = [...matches, ...misses].map((row) => row.candidate);
        expect(back).toHaveLength(candidates.length);
        expect(new Set(back)).toEqual(new Set(candidates));
        expect(misses.every((miss) => miss.reasons.length > 0)).toBe(true);
      }),
    );
  });

  it('finds both matches and misses among what it is tried with', () => {
    const tried = fc.sample(fc.tuple(anyDuty, anyCandidate), { numRuns: 300, seed: 7 }).map(([duty, one]) => isMatch(judge(duty, one)));
    expect(tried.filter(Boolean).length).toBeGreaterThan(20);
    expect(tried.filter((match) => !match).length).toBeGreaterThan(20);
  });

  it('pumps the wanted heat with every match to 1e-9 of it', () => {
    fc.assert(
      fc.property(search, ([duty, candidates]) => {
        for (const match of searchDuty(duty, candidates).matches) {
          const heat = moduleOf(match.candidate).heat(match.current.value, ...faces(duty));
          expect(Math.abs(heat - duty.heatW)).toBeLessThanOrEqual(1e-9 * Math.max(1, duty.heatW));
        }
      }),
    );
  });

  it('keeps current, voltage and temperature of every match within the limits', () => {
    fc.assert(
      fc.property(search, ([duty, candidates]) => {
        for (const { candidate, current, voltageV } of searchDuty(duty, candidates).matches) {
          expect(current.value).toBeGreaterThanOrEqual(0);
          expect(current.value).toBeLessThanOrEqual(Math.min(duty.maxCurrentA ?? Infinity, candidate.allowedCurrentA ?? Infinity));
          expect(Math.abs(voltageV)).toBeLessThanOrEqual(duty.maxVoltageV ?? Infinity);
          expect(Math.max(duty.hotFaceC, duty.coldFaceC)).toBeLessThanOrEqual(candidate.maxTemperatureC ?? Infinity);
        }
      }),
    );
  });

  it('takes the smaller of the two currents that pump the heat', () => {
    fc.assert(
      fc.property(anyDuty, anyCandidate, (duty, one) => {
        const row = judge(duty, one);
        if (!isMatch(row)) return;
        const [alpha, R] = one.model.parameters;
        expect(row.current.value).toBeLessThanOrEqual(((alpha * faces(duty)[0]) / R) * (1 + 1e-12));
      }),
    );
  });

  it('puts the best COP first, before all what takes no power, and the closest miss first', () => {
    fc.assert(
      fc.property(search, ([duty, candidates]) => {
        const { matches, misses } = searchDuty(duty, candidates);
        const cops = matches.map((match) => match.cop?.value ?? Infinity);
        expect(cops.every((cop, k) => k === 0 || cop <= cops[k - 1]!)).toBe(true);
        expect(misses.every(({ shortfall }, k) => k === 0 || shortfall >= misses[k - 1]!.shortfall)).toBe(true);
      }),
    );
  });

  it('has a COP exactly where power is taken up, and it is heat over power', () => {
    fc.assert(
      fc.property(search, ([duty, candidates]) => {
        for (const { cop, powerW, heatRejectedW } of searchDuty(duty, candidates).matches) {
          expect(cop !== null).toBe(powerW > 0);
          if (cop) expect(cop.value).toBeCloseTo(duty.heatW / powerW, 6);
          expect(heatRejectedW).toBeCloseTo(duty.heatW + powerW, 6);
        }
      }),
    );
  });

  it('loses no match when a limit is raised or left out', () => {
    fc.assert(
      fc.property(search, fc.double({ min: 1, max: 5, noNaN: true }), ([duty, candidates], factor) => {
        const found = searchDuty(duty, candidates).matches.map((match) => match.candidate);
        const { maxCurrentA, maxVoltageV } = duty;
        const raised = [
          { ...duty, maxCurrentA: maxCurrentA && maxCurrentA * factor },
          { ...duty, maxVoltageV: maxVoltageV && maxVoltageV * factor },
          { ...duty, maxCurrentA: undefined },
          { ...duty, maxVoltageV: undefined },
        ];
        for (const easier of raised) {
          const still = new Set(searchDuty(easier, candidates).matches.map((match) => match.candidate));
          expect(found.every((one) => still.has(one))).toBe(true);
        }
      }),
    );
  });

  it('never says that a miss reaches the heat within the limits unless something else stands against it', () => {
    fc.assert(
      fc.property(anyDuty, anyCandidate, (duty, one) => {
        const row = judge(duty, one);
        if (isMatch(row)) return;
        const other = row.reasons.some(({ kind }) => kind === 'temperature' || kind === 'flowsAnyhow');
        if (!other && row.reach.currentA > 0) expect(row.reach.heatW).toBeLessThan(duty.heatW * (1 + 1e-9));
      }),
    );
  });

  it('counts every miss once', () => {
    fc.assert(
      fc.property(search, ([duty, candidates]) => {
        const { misses, missCounts } = searchDuty(duty, candidates);
        expect(Object.values(missCounts).reduce((sum, count) => sum + count, 0)).toBe(misses.length);
      }),
    );
  });

  it('states the share of the current of the largest ΔT at the hot face of the duty', () => {
    fc.assert(
      fc.property(anyDuty, anyCandidate, (duty, one) => {
        const row = judge(duty, one);
        if (!isMatch(row)) return;
        const [alpha, R, K] = one.model.parameters;
        const { imaxLargestDeltaT } = maximaAtHotSide({ alpha, R, K }, faces(duty)[1]);
        expect(row.shareOfImax * imaxLargestDeltaT).toBeCloseTo(row.current.value, 9);
      }),
    );
  });
});
