import { describe, expect, it } from 'vitest';
import { fitConstant, type ConstantFit, type Observation } from '@/lib/fit';
import { remainderOf } from '@/lib/fit/residuals';
import { maximaAtHotSide } from '@/lib/module';
import { kelvin } from '@/lib/units';
import { draw, drawAll, EXAMPLE, HOT } from './charts';

const drives = [1, 2, 3, 4];
const shifted = (points: readonly Observation[], by: number) => points.map((point) => ({ ...point, value: point.value + by }));
const remainder = (points: readonly Observation[]) => remainderOf(EXAMPLE, points, 0.005);

describe('what a fit leaves', () => {
  it('is read minus model, in base units, in percent of the axis range and in standard uncertainties', () => {
    const point = { ...draw(EXAMPLE, { answer: 'Qc', drives: [2] })[0]!, range: 40, u: 0.15 };
    const { residuals } = remainder([{ ...point, value: point.value + 0.5 }]);
    expect(residuals[0]).toMatchObject({ chart: 0, curve: 0, point: 0, omitted: false });
    expect(residuals[0]!.residual).toBeCloseTo(0.5, 10);
    expect(residuals[0]!.percentOfRange).toBeCloseTo(1.25, 10);
    expect(residuals[0]!.standardized).toBeCloseTo(0.5 / Math.hypot(0.15, 0.005 * 40), 10);
  });

  it('is summed up for each curve, omitted points not counted', () => {
    const points = draw(EXAMPLE, { answer: 'Qc', drives: [2, 3], deltaTs: [0, 10, 20] });
    const off = points.map((point, i) => ({ ...point, value: point.value + [1, -1, 3, 0, 0, 9][i]!, omitted: i === 5 }));
    const [first, second] = remainder(off).byCurve;
    expect(first).toMatchObject({ chart: 0, curve: 0, answer: 'Qc', points: 3 });
    expect(first!.mean).toBeCloseTo(1, 10);
    expect(first!.rms).toBeCloseTo(Math.sqrt(11 / 3), 10);
    expect(first!.rmsPercentOfRange).toBeCloseTo((100 * Math.sqrt(11 / 3)) / points[0]!.range, 10);
    expect(second).toMatchObject({ points: 2 });
    expect(second!.rms).toBeCloseTo(0, 10);
  });

  it('is told as percent of the Qmax and Vmax that the model has at the hot side of each chart', () => {
    const [cool, warm] = [draw(EXAMPLE, { answer: 'Qc', drives }), draw(EXAMPLE, { answer: 'Qc', drives, Th: 323.15 }, 1)];
    const volts = draw(EXAMPLE, { answer: 'V', drives }, 2);
    const found = remainder([...shifted(cool, 1), ...shifted(warm, 1), ...shifted(volts, 0.2)]);
    const share = (Th: number) => 100 / maximaAtHotSide(EXAMPLE, kelvin(Th)).qmaxW;
    expect(found.rmsPercentOfQmax).toBeCloseTo(Math.sqrt((share(HOT) ** 2 + share(323.15) ** 2) / 2), 9);
    expect(found.rmsPercentOfVmax).toBeCloseTo(20 / maximaAtHotSide(EXAMPLE, kelvin(HOT)).vmaxV, 9);
  });

  it('takes the cold side where that is what a chart holds', () => {
    const points = draw(EXAMPLE, { answer: 'Qc', drives }).map((point) => ({ ...point, Tc: 280, Th: 280 + point.Th - point.Tc, value: 1 }));
    const residuals = remainder(points).residuals.map(({ residual }) => residual);
    const rms = Math.sqrt(residuals.reduce((sum, r) => sum + r * r, 0) / residuals.length);
    expect(remainder(points).rmsPercentOfQmax).toBeCloseTo((100 * rms) / maximaAtHotSide(EXAMPLE, kelvin(280)).qmaxW, 9);
  });

  it('has no percentage for a kind of chart that is not there', () => {
    expect(remainder(draw(EXAMPLE, { answer: 'V', drives }))).toMatchObject({ rmsPercentOfQmax: null, misfit: { heatW: null } });
    expect(remainder(draw(EXAMPLE, { answer: 'Qc', drives }))).toMatchObject({ rmsPercentOfVmax: null, misfit: { voltageV: null } });
  });

  it('turns residuals of COP into heat and those of power and current into voltage', () => {
    const at = { deltaTs: [12] };
    const cop = draw(EXAMPLE, { answer: 'COP', drives: [2], ...at });
    const power = EXAMPLE.alpha * 12 * 2 + 4 * EXAMPLE.R;
    expect(remainder(shifted(cop, 0.1)).misfit.heatW).toBeCloseTo(0.1 * power, 9);
    expect(remainder(shifted(draw(EXAMPLE, { answer: 'P', drives: [2], ...at }), 0.6)).misfit.voltageV).toBeCloseTo(0.3, 9);
    expect(remainder(shifted(draw(EXAMPLE, { answer: 'I', given: 'V', drives: [8], ...at }), 0.1)).misfit.voltageV).toBeCloseTo(0.187, 9);
  });

  it('comes back whole through JSON, as it is kept and sent', () => {
    const outcome = fitConstant(
      drawAll(EXAMPLE, [
        { answer: 'Qc', drives },
        { answer: 'V', drives },
      ]),
    );
    const fit: ConstantFit | null = outcome.ok ? outcome.fit : null;
    expect(JSON.parse(JSON.stringify(fit))).toEqual(fit);
  });
});
