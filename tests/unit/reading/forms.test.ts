import { describe, expect, it } from 'vitest';
import { fitForm, moduleOfFit } from '@/lib/fit';
import { fitFrame, type Frame } from '@/lib/geometry';
import { moduleOfForm, temperatureCoefficients, type ModelForm } from '@/lib/module';
import { familyCurves, fitReading, framesOf, moduleOf, observationsOf, read, readWithFit, type ReadingDocument } from '@/lib/reading';
import { kelvin } from '@/lib/units';
import { blankHost } from '../../support/charts';
import { normals } from '../../support/random';
import { documentOf, heatChart, KNOWN, plainDocument, voltageChart } from './documents';

const HOT = 300.15;

/** Two charts drawn by a form of the model, and what else the document says. */
function drawnBy(form: ModelForm, rest: Record<string, unknown> = {}): ReadingDocument {
  const module = moduleOfForm(form, KNOWN);
  const of = (answer: 'heat' | 'voltage') => (I: number, deltaT: number) => module[answer](I, kelvin(HOT - deltaT), kelvin(HOT));
  return documentOf(plainDocument([heatChart({ of: of('heat') }), voltageChart({ of: of('voltage') })], rest));
}

describe.each(['shaped', 'leg'] as const)('a document that asks for the %s form', (form) => {
  const document = drawnBy(form, { model: { form }, predict: [{ hotSideC: 35, deltaT: 25, I: 3 }] });

  it('gets α, R and K at 300.15 K with their temperature coefficients, and no choice', async () => {
    const { model } = await read(document, blankHost);
    expect(model).toMatchObject({
      form,
      at: '300.15 K',
      rmsPercentOfQmax: expect.closeTo(0, 6),
    });
    const coefficients = temperatureCoefficients(form);
    for (const key of ['alphaPerK', 'RPerK', 'KPerK'] as const) expect(model!.temperature[key]).toBeCloseTo(coefficients[key], 11);
    expect(model!.alpha).toEqual({ value: expect.closeTo(KNOWN.alpha, 8), u: expect.any(Number), unit: 'V/K' });
    expect(model!.R.value).toBeCloseTo(KNOWN.R, 6);
    expect(model!.K.value).toBeCloseTo(KNOWN.K, 6);
    expect(model!.parameters).toEqual([
      { name: 'alpha', value: model!.alpha.value, unit: 'V/K' },
      { name: 'R', value: model!.R.value, unit: 'ohm' },
      { name: 'K', value: model!.K.value, unit: 'W/K' },
    ]);
    model!.covariance.forEach((row, k) => expect(Math.sqrt(row[k]!)).toBeCloseTo([model!.alpha, model!.R, model!.K][k]!.u, 10));
    expect(model).not.toHaveProperty('choice');
  });

  it('is predicted by that form, also through the one door for models', async () => {
    const { model, predictions } = await read(document, blankHost);
    const at = [3, kelvin(308.15 - 25), kelvin(308.15)] as const;
    expect(predictions[0]).toMatchObject({ Qc: { value: expect.closeTo(moduleOfForm(form, KNOWN).heat(...at), 5) }, inside: true });
    expect(moduleOf(model!).heat(...at)).toBeCloseTo((predictions[0] as { Qc: { value: number } }).Qc.value, 8);
  });

  it('is drawn back over its own points', async () => {
    const { fit, frames } = await readWithFit(document, blankHost);
    const family = familyCurves(document, frames, fit!);
    expect(new Set(family.map(({ chart, curve }) => `${chart}/${curve}`)).size).toBe(6);
    for (const [chart, { curves }] of document.charts.entries()) {
      for (const [curve, { points }] of curves!.entries()) {
        const line = family.filter((one) => one.chart === chart && one.curve === curve).flatMap((one) => one.points);
        for (const [x, y] of points!) {
          const next = line.findIndex(([at]) => at >= x - 1e-6);
          const [a, b] = [line[Math.max(0, next - 1)]!, line[Math.max(0, next)]!];
          const between = b[0] === a[0] ? b[1] : a[1] + ((x - a[0]) / (b[0] - a[0])) * (b[1] - a[1]);
          expect(Math.abs(between - y)).toBeLessThan(0.05);
        }
      }
    }
  });
});

describe('a document that leaves the form to the program', () => {
  it.each(['constant', 'shaped', 'leg'] as const)(
    'gets the %s form where that drew its charts, with the numbers of the choice',
    async (form) => {
      const { model } = await read(drawnBy(form), blankHost);
      expect(model).toMatchObject({ form, at: form === 'constant' ? 'effective' : '300.15 K', choice: { leftOut: 'curve' } });
      expect(model!.choice!.scores.map((score) => score.form)).toEqual(['constant', 'shaped', 'leg']);
    },
  );

  it('may be overruled', async () => {
    const { model } = await read(drawnBy('leg', { model: { form: 'constant' } }), blankHost);
    expect(model).toMatchObject({ form: 'constant', at: 'effective' });
    expect(model).not.toHaveProperty('choice');
  });
});

describe('the covariance from the marks', () => {
  it('is what moved marks scatter the leg form by', () => {
    const document = drawnBy('leg', { model: { form: 'leg' } });
    const framed = framesOf(document);
    if (!framed.ok) throw new Error(framed.message);
    const { outcome } = fitReading(document, framed.frames);
    if (!outcome.ok) throw new Error(outcome.missing);
    // points without error: what the sandwich adds is nothing, the information covariance of the points is subtracted
    const alone = fitForm('leg', observationsOf(document, framed.frames, moduleOfFit(outcome.fit)).observations);
    if (!alone.ok) throw new Error(alone.missing);
    const normal = normals(17);
    const draws = Array.from({ length: 200 }, () => {
      const frames = document.charts.map((chart): Frame => {
        const marks = chart.marks!.map((mark) => ({ ...mark, px: [mark.px[0] + 0.5 * normal(), mark.px[1] + 0.5 * normal()] as const }));
        const moved = fitFrame(marks, { x: 'linear', y: 'linear' }, 'upright');
        if (!moved.ok) throw new Error(moved.message);
        return moved.frame;
      });
      const fit = fitForm('leg', observationsOf(document, frames, moduleOfFit(outcome.fit)).observations);
      if (!fit.ok) throw new Error(fit.missing);
      return fit.fit.parameters;
    });
    [0, 1, 2].forEach((k) => {
      const mean = draws.reduce((sum, draw) => sum + draw[k]!, 0) / draws.length;
      const variance = draws.reduce((sum, draw) => sum + (draw[k]! - mean) ** 2, 0) / (draws.length - 1);
      const stated = outcome.fit.covariance[k]![k]! - alone.fit.covariance[k]![k]!;
      // 200 draws tell a variance to ten per cent
      expect(stated / variance).toBeGreaterThan(0.7);
      expect(stated / variance).toBeLessThan(1.4);
    });
  });
});
