import { describe, expect, it } from 'vitest';
import { evenCurrents, familyAtHotSide } from '@/lib/duty';
import { predict } from '@/lib/fit';
import { maximaAtHotSide } from '@/lib/module';
import { celsius, toKelvin } from '@/lib/units';
import { plainModel } from './support';

const Th = toKelvin(celsius(38));
const model = { ...plainModel, misfit: { heatW: 0.2, voltageV: 0.05 } };

describe('familyAtHotSide', () => {
  it('runs from ΔT = 0 to where no heat is left', () => {
    for (const { points } of familyAtHotSide(model, Th, [1, 3, 6])) {
      expect(points[0]!.deltaTK).toBe(0);
      expect(points.at(-1)!.heat.value).toBeCloseTo(0, 9);
    }
  });

  it('reaches the largest ΔT at the current that is named for it', () => {
    const [alpha, R, K] = model.parameters;
    const { imaxLargestDeltaT, dTmaxK } = maximaAtHotSide({ alpha, R, K }, Th);
    expect(familyAtHotSide(model, Th, [imaxLargestDeltaT])[0]!.points.at(-1)!.deltaTK).toBeCloseTo(dTmaxK, 9);
  });

  it('has no points at a current that heats more than it pumps', () => {
    expect(familyAtHotSide(model, Th, [40])[0]!.points).toEqual([]);
  });

  it('gives the values and uncertainties that the fit predicts', () => {
    for (const { currentA, points } of familyAtHotSide(model, Th, [1.5, 5])) {
      for (const { deltaTK, heat, voltage, cop } of points) {
        const told = predict(model, { Tc: Th - deltaTK, Th, I: currentA });
        expect(heat.value).toBeCloseTo(told.Qc.value, 9);
        expect(heat.u! / told.Qc.uRead).toBeCloseTo(1, 5);
        expect(voltage.u! / told.V.uRead).toBeCloseTo(1, 5);
        expect(cop!.value).toBeCloseTo(told.COP!.value, 9);
        expect(cop!.u! / told.COP!.uRead).toBeCloseTo(1, 5);
      }
    }
  });
});

describe('evenCurrents', () => {
  it('are five round steps up to the largest', () => {
    expect(evenCurrents(3.5)).toEqual([0.7, 1.4, 2.1, 2.8, 3.5]);
    expect(evenCurrents(7.61)).toEqual([1.5, 3, 4.6, 6.1, 7.6]);
  });
});
