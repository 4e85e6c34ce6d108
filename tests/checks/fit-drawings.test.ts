import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { fitConstant, impliedRatings, predict, type Observation } from '@/lib/fit';

/*
 * Curves of an invented module, solved from the heat equation of a leg with properties that change with temperature and with
 * contacts and plates (drawings made for this project): no constants fit them exactly. Limits: those set for the constant form.
 */
interface Truth {
  readonly hotSideC: number;
  readonly Qmax: number;
  readonly Vmax: number;
  readonly Imax: number;
  readonly dTmax: number;
  readonly yRange: number;
  readonly curves: readonly { readonly value: number; readonly x: readonly number[]; readonly y: readonly number[] }[];
}

const truthOf = (name: string) =>
  JSON.parse(readFileSync(new URL(`../fixtures/charts/${name}.truth.json`, import.meta.url), 'utf8')) as Truth;

function observations(name: string, answer: 'Qc' | 'V', chart: number): Observation[] {
  const { hotSideC, yRange, curves } = truthOf(name);
  const Th = hotSideC + 273.15;
  return curves.flatMap(({ value: I, x, y }, curve) =>
    x.map((deltaT, point) => ({
      chart,
      curve,
      point,
      Tc: Th - deltaT,
      Th,
      I,
      answer,
      value: y[point]!,
      u: 0.0008 * yRange,
      range: yRange,
    })),
  );
}

const heat = observations('d01', 'Qc', 0);
const voltage = observations('d03', 'V', 1);
const outcome = fitConstant([...heat, ...voltage]);
if (!outcome.ok) throw new Error(outcome.missing);
const { fit } = outcome;
const truth = truthOf('d01');

const rms = (points: readonly Observation[], answer: 'Qc' | 'V') => {
  const squares = points.map((point) => (point.value - predict(fit, { Tc: point.Tc, Th: point.Th, I: point.I! })[answer].value) ** 2);
  return Math.sqrt(squares.reduce((sum, square) => sum + square, 0) / squares.length);
};

describe('three constants fitted to the exact curves of d01 and d03', () => {
  it('give heat within 1.5 % of Qmax and voltage within 5 % of Vmax, root mean square', () => {
    expect((100 * rms(heat, 'Qc')) / truth.Qmax).toBeLessThan(1.5);
    expect((100 * rms(voltage, 'V')) / truth.Vmax).toBeLessThan(5);
  });

  it('say so themselves, over their own Qmax and Vmax', () => {
    expect(fit.rmsPercentOfQmax! / ((100 * rms(heat, 'Qc')) / truth.Qmax)).toBeCloseTo(1, 1);
    expect(fit.rmsPercentOfVmax! / ((100 * rms(voltage, 'V')) / truth.Vmax)).toBeCloseTo(1, 1);
  });

  it('imply Qmax, Vmax and dTmax within 3 % of the truth, and an Imax well below it, as constants do', () => {
    const implied = impliedRatings(fit, truth.hotSideC);
    expect(Math.abs(implied.vmaxV.value / truth.Vmax - 1)).toBeLessThan(0.03);
    expect(Math.abs(implied.dTmaxK.value / truth.dTmax - 1)).toBeLessThan(0.03);
    expect(Math.abs(implied.qmaxW.value / truth.Qmax - 1)).toBeLessThan(0.03);
    expect(implied.imaxLargestDeltaT.value / truth.Imax).toBeLessThan(0.95);
  });

  it('state a reading uncertainty that covers what they miss at nine in ten points of the sheet', () => {
    const covered = [...heat, ...voltage].filter((point) => {
      const found = predict(fit, { Tc: point.Tc, Th: point.Th, I: point.I! })[point.answer as 'Qc' | 'V'];
      return Math.abs(found.value - point.value) <= 2 * found.uRead;
    });
    expect(covered.length / (heat.length + voltage.length)).toBeGreaterThan(0.9);
  });
});
