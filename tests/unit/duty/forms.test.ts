import { describe, expect, it } from 'vitest';
import { familyAtHotSide, isMatch, judge, type Duty } from '@/lib/duty';
import { maximaOf, moduleOfForm, numericCurrents } from '@/lib/module';
import { propagate } from '@/lib/numeric';
import { celsius, kelvin, toKelvin } from '@/lib/units';
import { candidate, plainModel } from './support';

const duty: Duty = { heatW: 20, coldFaceC: 5, hotFaceC: 40 };
const [Tc, Th] = [toKelvin(celsius(5)), toKelvin(celsius(40))];
const [alpha, R, K] = plainModel.parameters;

describe.each(['shaped', 'leg'] as const)('a model of the %s form', (form) => {
  const one = candidate({ model: { form } });
  const module = moduleOfForm(form, { alpha, R, K });

  it('runs at the smaller current that pumps the heat', () => {
    const row = judge(duty, one);
    if (!isMatch(row)) throw new Error('no match');
    expect(module.heat(row.current.value, Tc, Th)).toBeCloseTo(20, 9);
    expect(row.voltageV).toBeCloseTo(module.voltage(row.current.value, Tc, Th), 12);
    expect(row.shareOfImax).toBeCloseTo(row.current.value / maximaOf(form, { alpha, R, K }, Th).imaxLargestDeltaT, 12);
    expect(row.shareOfImax).toBeLessThan(1);
  });

  it('has the uncertainty that propagation by finite differences gives', () => {
    const row = judge(duty, one);
    if (!isMatch(row)) throw new Error('no match');
    const { u } = propagate(
      ([a, r, k]) => {
        const constants = { alpha: a!, R: r!, K: k! };
        const I = numericCurrents(form, constants).forHeat(20, Tc, Th)!;
        return [I, moduleOfForm(form, constants).cop(I, Tc, Th)!];
      },
      plainModel.parameters,
      plainModel.covariance,
    );
    expect(row.current.u! / u[0]!).toBeCloseTo(1, 4);
    expect(row.cop!.u! / u[1]!).toBeCloseTo(1, 4);
  });

  it('says what it reaches where the heat is too much, and its largest ΔT where that is', () => {
    const tooMuch = judge({ ...duty, heatW: 500 }, one);
    expect(isMatch(tooMuch)).toBe(false);
    if (isMatch(tooMuch)) return;
    expect(tooMuch.reasons[0]!.kind).toBe('heat');
    const most = numericCurrents(form, { alpha, R, K }).mostHeat(Tc, Th)!;
    expect(tooMuch.reach.heatW).toBeCloseTo(module.heat(most, Tc, Th), 9);
    const tooCold = judge({ ...duty, coldFaceC: -60 }, one);
    expect(!isMatch(tooCold) && tooCold.reasons[0]!.kind).toBe('deltaT');
  });

  it('keeps within the supply: its voltage limit is turned into a current by the form itself', () => {
    const row = judge({ ...duty, heatW: 500, maxVoltageV: 6 }, one);
    if (isMatch(row)) throw new Error('a match');
    expect(module.voltage(row.reach.currentA, Tc, Th)).toBeCloseTo(6, 9);
  });

  it('draws curves from ΔT = 0 to where no heat is left', () => {
    const [curve, none] = familyAtHotSide(one.model, Th, [4, 0], 11);
    expect(curve!.points).toHaveLength(11);
    const last = curve!.points.at(-1)!;
    expect(last.heat.value).toBeCloseTo(0, 6);
    expect(module.heat(4, kelvin(Th - last.deltaTK), Th)).toBeCloseTo(0, 6);
    expect(curve!.points[0]!.heat.value).toBeCloseTo(module.heat(4, Th, Th), 9);
    expect(none!.points).toEqual([]);
  });
});
