import { describe, expect, it } from 'vitest';
import { constantsOf, fitConstant, type FitOutcome } from '@/lib/fit';
import { fitReading, framesOf, observationsOf, POINT_UNCERTAINTY_PX, type ReadingDocument } from '@/lib/reading';
import { kelvin } from '@/lib/units';
import { clickedDocument } from '../../support/charts';
import { normals } from '../../support/random';
import { chartOf, documentOf, heatAt, heatChart, known, KNOWN, pixelOf, plainDocument, voltageAt, voltageChart } from './documents';

function framed(document: ReadingDocument) {
  const outcome = framesOf(document);
  if (!outcome.ok) throw new Error(outcome.message);
  return outcome.frames;
}

const observe = (json: unknown) => {
  const document = documentOf(json);
  return observationsOf(document, framed(document)).observations;
};

const HOT = 300.15;

describe('an observation', () => {
  it('has absolute faces, the current and the answer in base units', () => {
    const [point] = observe(plainDocument([heatChart({ values: [3], at: [20] })]));
    expect(point).toMatchObject({
      chart: 0,
      curve: 0,
      point: 0,
      Th: HOT,
      Tc: expect.closeTo(HOT - 20, 9),
      I: 3,
      answer: 'Qc',
      value: expect.closeTo(heatAt(27)(3, 20), 9),
      range: 50,
    });
    expect(point).not.toHaveProperty('V');
  });

  // one point of the known module at 3 A and 20 K below a hot side at 27 °C, drawn in every manner
  const Qc = heatAt(27)(3, 20);
  const V = voltageAt(27)(3, 20);
  const point = (x: object, y: object, family: object, at: readonly [number, number], value: number, side: object = { hotSideC: 27 }) =>
    chartOf({
      x: x as never,
      y: y as never,
      family: family as never,
      values: [value],
      at: [at[0]],
      right: 1000,
      top: 1000,
      of: () => at[1],
      side: side as never,
    });
  const ampere = { quantity: 'I', unit: 'A' };
  const volt = { quantity: 'V', unit: 'V' };
  const watt = { quantity: 'Qc', unit: 'W' };
  const difference = { quantity: 'deltaT', unit: 'K' };

  it.each<[string, object, Partial<Record<'I' | 'V' | 'value', number>>, string]>([
    ['heat over current for differences', point(ampere, watt, difference, [3, Qc], 20), { I: 3, value: Qc }, 'Qc'],
    ['difference over current for heats', point(ampere, difference, watt, [3, 20], Qc), { I: 3, value: Qc }, 'Qc'],
    ['current over heat for differences', point(watt, ampere, difference, [Qc, 3], 20), { I: 3, value: Qc }, 'Qc'],
    ['heat over voltage for differences', point(volt, watt, difference, [V, Qc], 20), { V, value: Qc }, 'Qc'],
    ['voltage over difference for currents', point(difference, volt, ampere, [20, V], 3), { I: 3, value: V }, 'V'],
    ['current over voltage for differences', point(volt, ampere, difference, [V, 3], 20), { V, value: 3 }, 'I'],
    ['difference over current for voltages', point(ampere, difference, volt, [3, 20], V), { I: 3, value: V }, 'V'],
    ['cold side in °C', point({ quantity: 'Tc', unit: 'C' }, watt, ampere, [7, Qc], 3), { I: 3, value: Qc }, 'Qc'],
    ['cold side in °F', point({ quantity: 'Tc', unit: 'F' }, watt, ampere, [44.6, Qc], 3), { I: 3, value: Qc }, 'Qc'],
    ['cold side in K', point({ quantity: 'Tc', unit: 'K' }, watt, ampere, [280.15, Qc], 3), { I: 3, value: Qc }, 'Qc'],
    [
      'difference in °F, scaled and not shifted',
      point({ quantity: 'deltaT', unit: 'F' }, watt, ampere, [36, Qc], 3),
      { I: 3, value: Qc },
      'Qc',
    ],
    [
      'mA and mW',
      point(difference, { quantity: 'Qc', unit: 'mW' }, { quantity: 'I', unit: 'mA' }, [20, 1000 * Qc], 3000),
      { I: 3, value: Qc },
      'Qc',
    ],
    [
      'cold side held, hot side shown',
      point({ quantity: 'Th', unit: 'C' }, watt, ampere, [27, Qc], 3, { coldSideC: 7 }),
      { I: 3, value: Qc },
      'Qc',
    ],
    ['cold side held, difference shown', point(difference, watt, ampere, [20, Qc], 3, { coldSideC: 7 }), { I: 3, value: Qc }, 'Qc'],
  ])('reads %s', (_, chart, expected, answer) => {
    const [read] = observe(plainDocument([chart as never]));
    expect(read!.answer).toBe(answer);
    expect(read!.Th).toBeCloseTo(HOT, 9);
    expect(read!.Tc).toBeCloseTo(HOT - 20, 9);
    for (const [key, value] of Object.entries(expected)) expect(read![key as 'I' | 'V' | 'value']).toBeCloseTo(value, 7);
  });

  it('undoes the normalisation by the rating at the side of the chart', () => {
    const rated = [
      { hotSideC: 50, imaxA: 9, qmaxW: 99 },
      { hotSideC: 27, imaxA: 5, qmaxW: 60, dTmaxK: 64, vmaxV: 15 },
    ];
    const chart = point(
      { quantity: 'deltaT', unit: '%', of: 'dTmaxK' },
      { quantity: 'Qc', unit: '1', of: 'qmaxW' },
      { quantity: 'I', unit: '%', of: 'imaxA' },
      [31.25, Qc / 60],
      60,
    );
    const [read] = observe(plainDocument([chart], { module: { vendor: 'x', partNumber: 'y', rated } }));
    expect(read).toMatchObject({ I: expect.closeTo(3, 9), Tc: expect.closeTo(HOT - 20, 9), value: expect.closeTo(Qc, 9) });
  });

  it('reads a log axis that runs backwards', () => {
    const chart = { ...heatChart({ values: [3] }), x: { quantity: 'deltaT', unit: 'K', scale: 'log' } };
    const marks = [
      { px: [900, 650], x: 1, y: 0 },
      { px: [100, 650], x: 100 },
      { px: [900, 50], y: 50 },
    ];
    const middle = [500, 350];
    const [read] = observe(plainDocument([{ ...chart, marks, curves: [{ value: 3, points: [middle] }] }]));
    expect(read).toMatchObject({ Tc: expect.closeTo(HOT - 10, 9), value: expect.closeTo(25, 9) });
  });
});

describe('the uncertainty of an observation', () => {
  const document = documentOf(plainDocument([heatChart()]));
  const frames = framed(document);
  // 600 px for 50 W, 800 px for 60 K
  const perPixelUp = 50 / 600;
  const perPixelAlong = 60 / 800;

  it('is that of its own axis while there is no model', () => {
    for (const { u } of observationsOf(document, frames).observations) expect(u).toBeCloseTo(POINT_UNCERTAINTY_PX.hand * perPixelUp, 9);
  });

  it('takes the other axis by the slope of the model', () => {
    for (const { u, I } of observationsOf(document, frames, known).observations) {
      // ∂Qc/∂ΔT at a held hot side: −α I − K
      const slope = -KNOWN.alpha * I! - KNOWN.K;
      expect(u).toBeCloseTo(0.5 * Math.hypot(perPixelUp, slope * perPixelAlong), 9);
    }
  });

  it('is smaller for a followed curve and smaller still for a path', () => {
    const by = (how: string) => {
      const chart = heatChart();
      const curves = (chart['curves'] as object[]).map((curve) => ({ ...curve, by: how }));
      return observe(plainDocument([{ ...chart, curves }]))[0]!.u;
    };
    expect(by('hand') / by('followed')).toBeCloseTo(0.5 / 0.15, 9);
    expect(by('hand') / by('path')).toBeCloseTo(0.5 / 0.05, 9);
  });
});

describe('a point that says something impossible', () => {
  it('is left out and named', () => {
    const chart = heatChart();
    const marks = (chart['marks'] as { x?: number }[]).map((mark) => (mark.x ? { ...mark, x: 600 } : mark));
    const impossible = documentOf(plainDocument([{ ...chart, marks }]));
    const { observations, problems } = observationsOf(impossible, framed(impossible));
    expect(problems.map(({ path }) => path)).toEqual([0, 1, 2].map((curve) => `charts[0].curves[${curve}].points[4]`));
    expect(observations).toHaveLength(12);
  });
});

describe('the fit of a reading', () => {
  const at = { Tc: kelvin(280), Th: kelvin(300) };

  it.each<[string, () => Record<string, unknown>]>([
    [
      'heat over current for differences',
      () =>
        chartOf({
          x: { quantity: 'I', unit: 'A' },
          y: { quantity: 'Qc', unit: 'W' },
          family: { quantity: 'deltaT', unit: 'K' },
          values: [0, 20, 40],
          at: [1, 2, 3, 4, 5],
          right: 6,
          top: 60,
          of: (dT, I) => heatAt(27)(I, dT),
        }),
    ],
    [
      'differences over current for heats',
      () =>
        chartOf({
          x: { quantity: 'I', unit: 'A' },
          y: { quantity: 'deltaT', unit: 'K' },
          family: { quantity: 'Qc', unit: 'W' },
          values: [0, 10, 20],
          at: [2, 3, 4, 5],
          right: 6,
          top: 80,
          of: (Q, I) => (known.heat(I, kelvin(HOT), kelvin(HOT)) - Q) / (KNOWN.alpha * I + KNOWN.K),
        }),
    ],
    [
      'COP over current for differences',
      () =>
        chartOf({
          x: { quantity: 'I', unit: 'A' },
          y: { quantity: 'COP', unit: '1' },
          family: { quantity: 'deltaT', unit: 'K' },
          values: [10, 25, 40],
          at: [1.5, 2, 3, 4, 5],
          right: 6,
          top: 3,
          of: (dT, I) => heatAt(27)(I, dT) / (I * voltageAt(27)(I, dT)),
        }),
    ],
  ])('finds the module in %s beside a voltage chart', (_, chart) => {
    const document = documentOf(plainDocument([chart(), voltageChart()]));
    const { outcome } = fitReading(document, framed(document));
    if (!outcome.ok) throw new Error(outcome.missing);
    const { alpha, R, K } = constantsOf(outcome.fit);
    expect([alpha, R, K]).toEqual([expect.closeTo(KNOWN.alpha, 6), expect.closeTo(KNOWN.R, 4), expect.closeTo(KNOWN.K, 4)]);
    expect(known.heat(3, at.Tc, at.Th)).toBeGreaterThan(0);
  });

  it('is as uncertain as marks and points scattered anew make it', () => {
    const document = documentOf(plainDocument([heatChart(), voltageChart()]));
    const normal = normals(77);
    const scatter = ([x, y]: readonly [number, number]) => [x + 0.5 * normal(), y + 0.5 * normal()] as const;
    const again = (): ReadingDocument => ({
      ...document,
      charts: document.charts.map((chart) => ({
        ...chart,
        marks: chart.marks!.map((mark) => ({ ...mark, px: scatter(mark.px) })),
        curves: chart.curves!.map((curve) => ({ ...curve, points: curve.points!.map(scatter) })),
      })),
    });
    const fitted = (outcome: FitOutcome) => {
      if (!outcome.ok) throw new Error(outcome.missing);
      return outcome.fit;
    };
    const parametersOf = (of: ReadingDocument) => fitted(fitConstant(observationsOf(of, framed(of), known).observations)).parameters;
    const drawn = Array.from({ length: 400 }, () => parametersOf(again()));
    const { covariance } = fitted(fitReading(document, framed(document)).outcome);
    for (const at of [0, 1, 2] as const) {
      const mean = drawn.reduce((sum, one) => sum + one[at], 0) / drawn.length;
      const spread = Math.sqrt(drawn.reduce((sum, one) => sum + (one[at] - mean) ** 2, 0) / (drawn.length - 1));
      const stated = Math.sqrt(covariance[at]![at]!);
      // never overconfident; the floor for misfit, which exact data do not need, makes it up to four times too careful
      expect(stated).toBeGreaterThan(0.95 * spread);
      expect(stated).toBeLessThan(4 * spread);
    }
  });

  it('is more uncertain with the marks than the points alone would say', () => {
    const document = clickedDocument(['d01', 'd03'], { count: 40, scatterPx: 0.2, seed: 5 });
    const sure = framed(document).map((frame) => ({
      ...frame,
      covariance: frame.covariance.map((row) => row.map((value) => value * 1e-12)),
    }));
    const u = (frames: Parameters<typeof fitReading>[1]) => {
      const { outcome } = fitReading(document, frames);
      if (!outcome.ok) throw new Error(outcome.missing);
      return Math.sqrt(outcome.fit.covariance[0]![0]!);
    };
    expect(u(framed(document))).toBeGreaterThan(u(sure));
  });
});

describe('pixels of the charts used here', () => {
  it('run from 100 to 900 and from 650 up to 50', () => {
    expect([pixelOf(0, 0, 60, 50), pixelOf(60, 50, 60, 50)]).toEqual([
      [100, 650],
      [900, 50],
    ]);
  });
});
