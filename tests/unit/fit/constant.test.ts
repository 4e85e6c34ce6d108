import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constantsOf, fitConstant, type ConstantFit, type Observation } from '@/lib/fit';
import type { ModuleConstants } from '@/lib/module';
import { normals } from '../../support/random';
import { anyModule, draw, drawAll, drivesOf, EXAMPLE, type Drawn } from './charts';

function fitted(observations: readonly Observation[]): ConstantFit {
  const outcome = fitConstant(observations);
  if (!outcome.ok) throw new Error(outcome.missing);
  return outcome.fit;
}

function expectConstants(fit: ConstantFit, c: ModuleConstants, relative: number): void {
  const found = constantsOf(fit);
  for (const name of ['alpha', 'R', 'K'] as const) expect(Math.abs(found[name] / c[name] - 1), name).toBeLessThan(relative);
}

type Charts = (c: ModuleConstants) => readonly Drawn[];
const ENOUGH: readonly [string, Charts][] = [
  ['heat at several currents', (c) => [{ answer: 'Qc', drives: drivesOf(c) }]],
  [
    'heat and voltage',
    (c) => [
      { answer: 'Qc', drives: drivesOf(c) },
      { answer: 'V', drives: drivesOf(c) },
    ],
  ],
  [
    'heat and voltage at one and the same current',
    (c) => [
      { answer: 'Qc', drives: drivesOf(c, 'I', [0.6]) },
      { answer: 'V', drives: drivesOf(c, 'I', [0.6]) },
    ],
  ],
  ['heat rejected at several currents', (c) => [{ answer: 'Qh', drives: drivesOf(c) }]],
  [
    'heat rejected and power',
    (c) => [
      { answer: 'Qh', drives: drivesOf(c) },
      { answer: 'P', drives: drivesOf(c) },
    ],
  ],
  [
    'COP and voltage',
    (c) => [
      { answer: 'COP', drives: drivesOf(c), deltaTs: [5, 15, 25, 35] },
      { answer: 'V', drives: drivesOf(c) },
    ],
  ],
  [
    'COP and heat',
    (c) => [
      { answer: 'COP', drives: drivesOf(c), deltaTs: [5, 15, 25, 35] },
      { answer: 'Qc', drives: drivesOf(c) },
    ],
  ],
  [
    'COP and one current of heat',
    (c) => [
      { answer: 'COP', drives: drivesOf(c), deltaTs: [5, 15, 25] },
      { answer: 'Qc', drives: drivesOf(c, 'I', [0.6]) },
    ],
  ],
  ['heat at several voltages', (c) => [{ answer: 'Qc', given: 'V', drives: drivesOf(c, 'V', [0.4, 0.6, 0.8, 1]) }]],
  [
    'heat and current at several voltages',
    (c) => [
      { answer: 'Qc', given: 'V', drives: drivesOf(c, 'V', [0.4, 0.7, 1]) },
      { answer: 'I', given: 'V', drives: drivesOf(c, 'V', [0.4, 0.7, 1]) },
    ],
  ],
  [
    'heat at currents and current at voltages',
    (c) => [
      { answer: 'Qc', drives: drivesOf(c) },
      { answer: 'I', given: 'V', drives: drivesOf(c, 'V') },
    ],
  ],
  [
    'two hot sides',
    (c) => [
      { answer: 'Qc', drives: drivesOf(c) },
      { answer: 'Qc', drives: drivesOf(c), Th: 323.15 },
      { answer: 'V', drives: drivesOf(c), Th: 323.15 },
    ],
  ],
];

describe('fitConstant finds the constants of exact charts of', () => {
  it.each(ENOUGH)('%s', (_, charts) => {
    fc.assert(
      fc.property(anyModule, (c) => {
        const fit = fitted(drawAll(c, charts(c)));
        expectConstants(fit, c, 1e-6);
        expect(fit).toMatchObject({ form: 'constant', rank: 3, converged: true, why: 'Converged.' });
      }),
      { numRuns: 40 },
    );
  });
});

describe('fitConstant', () => {
  const heatAndVoltage = (c: ModuleConstants) => drawAll(c, ENOUGH[1]![1](c));

  it('needs no iteration where every chart is linear in the constants, and some where one is not', () => {
    expect(fitted(heatAndVoltage(EXAMPLE)).iterations).toBe(0);
    expect(fitted(drawAll(EXAMPLE, ENOUGH[8]![1](EXAMPLE))).iterations).toBeGreaterThan(0);
  });

  it('gives the same fit in whatever order the points come', () => {
    const points = heatAndVoltage(EXAMPLE).map((point, i) => ({ ...point, value: point.value + 0.1 * Math.sin(7 * i) }));
    const mixed = points.map((_, i) => points[(i * 11) % points.length]!);
    fitted(mixed).parameters.forEach((value, j) => expect(value / fitted(points).parameters[j]!).toBeCloseTo(1, 10));
    expect(fitted(mixed).covariance[0]![0]! / fitted(points).covariance[0]![0]!).toBeCloseTo(1, 8);
  });

  it('weighs charts over their own axis ranges: a change of unit of one chart changes nothing', () => {
    const noisy = heatAndVoltage(EXAMPLE).map((point, i) => ({ ...point, value: point.value + 0.01 * point.range * Math.cos(5 * i) }));
    const wider = noisy.map((point) => (point.answer === 'V' ? { ...point, range: point.range * 3 } : point));
    expect(fitted(wider).parameters[1]).not.toBeCloseTo(fitted(noisy).parameters[1]!, 6);
    const milli = (point: Observation) => (point.answer === 'V' ? { ...point, curve: point.curve + 10 } : point);
    expect(fitted(noisy.map(milli)).parameters).toEqual(fitted(noisy).parameters);
  });

  it('lets no curve weigh more than fifteen points: reading one curve four times as densely moves nothing', () => {
    const dense = Array.from({ length: 60 }, (_, i) => i * 0.75);
    const sparse = Array.from({ length: 15 }, (_, i) => i * 3.2);
    const fit = (deltaTs: readonly number[]) =>
      fitted([
        ...draw(EXAMPLE, { answer: 'Qc', drives: [1, 2, 3], deltaTs }),
        ...draw(EXAMPLE, { answer: 'V', drives: [1, 2, 3], deltaTs }, 1),
      ]);
    const ratio = fit(dense).covariance[1]![1]! / fit(sparse).covariance[1]![1]!;
    expect(ratio).toBeGreaterThan(0.8);
    expect(ratio).toBeLessThan(1.25);
  });

  it('believes a point with a larger uncertainty less', () => {
    const points = draw(EXAMPLE, { answer: 'Qc', drives: [1, 2, 3, 4] });
    const off = (u: number) => points.map((point, i) => (i === 8 ? { ...point, value: point.value + 3, u } : point));
    const miss = (observations: readonly Observation[]) => Math.abs(fitted(observations).parameters[0] / EXAMPLE.alpha - 1);
    expect(miss(off(50))).toBeLessThan(miss(off(0.05)) / 20);
  });

  it('does not fit an omitted point but tells its residual', () => {
    const points = heatAndVoltage(EXAMPLE).map((point, i) => (i === 4 ? { ...point, value: point.value + 5, omitted: true } : point));
    const fit = fitted(points);
    expectConstants(fit, EXAMPLE, 1e-9);
    expect(fit.residuals[4]).toMatchObject({ omitted: true });
    expect(fit.residuals[4]!.residual).toBeCloseTo(5, 8);
    expect(fit.rmsPercentOfQmax).toBeLessThan(1e-8);
  });

  it.each<[string, Partial<Observation>]>([
    ['chart 0, curve 0, point 2: face temperatures must be above 0 K', { Tc: -3 }],
    ['chart 0, curve 0, point 2: either the current or the voltage must be given', { V: 3 }],
    ['chart 0, curve 0, point 2: either the current or the voltage must be given', { I: undefined }],
    ['chart 0, curve 0, point 2: the current or voltage must be finite', { I: NaN }],
    ['chart 0, curve 0, point 2: a voltage answers to a current', { answer: 'V', I: undefined, V: 3 }],
    ['chart 0, curve 0, point 2: a current answers to a voltage', { answer: 'I' }],
    ['chart 0, curve 0, point 2: the value must be finite', { value: Infinity }],
    ['chart 0, curve 0, point 2: the uncertainty must be finite and not negative', { u: -1 }],
    ['chart 0, curve 0, point 2: the range of the axis must be positive', { range: 0 }],
  ])('takes no observation that is none: %s', (message, fault) => {
    const points = draw(EXAMPLE, { answer: 'Qc', drives: [1, 2, 3] });
    expect(() => fitConstant(points.map((point, i) => (i === 2 ? { ...point, ...fault } : point)))).toThrow(new RangeError(message));
  });
});

describe('the covariance of a fit', () => {
  const modules = 250;
  const shares = [0.2, 0.4, 0.6, 0.8, 1];
  const exact = drawAll(EXAMPLE, [
    { answer: 'Qc', drives: drivesOf(EXAMPLE, 'I', shares) },
    { answer: 'V', drives: drivesOf(EXAMPLE, 'I', shares) },
  ]);
  const truth = [EXAMPLE.alpha, EXAMPLE.R, EXAMPLE.K];

  /** One standard normal number for each label, the same whenever it is asked again. */
  function remembered(normal: () => number): (label: string) => number {
    const known = new Map<string, number>();
    return (label) => known.get(label) ?? known.set(label, normal()).get(label)!;
  }

  /** Share of constants found within two standard uncertainties of the truth, over many readings of one module. */
  function covered(
    seed: number,
    misread: (point: Observation, normal: () => number, error: (label: string) => number) => Observation,
  ): number {
    const normal = normals(seed);
    let inside = 0;
    for (let trial = 0; trial < modules; trial += 1) {
      const error = remembered(normal);
      const fit = fitted(exact.map((point) => misread(point, normal, error)));
      inside += truth.filter((value, j) => Math.abs(fit.parameters[j]! - value) <= 2 * Math.sqrt(fit.covariance[j]![j]!)).length;
    }
    return inside / (modules * truth.length);
  }

  it.each([
    ['a tenth of a percent of the axis', 0.001],
    ['one percent of the axis', 0.01],
    ['three percent of the axis', 0.03],
  ])('holds the truth within two standard uncertainties when each curve is off by %s', (_, offset) => {
    const found = covered(11, (point, normal, error) => {
      const curve = error(`${point.chart}/${point.curve}`);
      return { ...point, value: point.value + point.range * (offset * curve + 0.001 * normal()) };
    });
    expect(found).toBeGreaterThan(0.9);
  });

  it('grows in proportion once the errors of whole curves exceed what every point is granted', () => {
    const wavy = (share: number) =>
      drawAll(EXAMPLE, ENOUGH[1]![1](EXAMPLE)).map((point) => ({
        ...point,
        value: point.value + share * point.range * Math.cos(3 * point.curve + point.chart),
      }));
    const u = (share: number) => Math.sqrt(fitted(wavy(share)).covariance[2]![2]!);
    expect(u(0.2) / u(0.1)).toBeGreaterThan(1.7);
    expect(u(0.2) / u(0.1)).toBeLessThan(2.3);
  });

  it('is never below that of the granted uncertainties, however well the curves happen to fit', () => {
    const exact = draw(EXAMPLE, { answer: 'Qc', drives: [1, 2, 3, 4] });
    const doubled = exact.map((point) => ({ ...point, u: 2 * point.u }));
    expect(fitted(exact).covariance[0]![0]).toBeGreaterThan(0);
    expect(fitted(doubled).covariance[0]![0]).toBeGreaterThan(fitted(exact).covariance[0]![0]!);
  });
});
