import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constantsOf, fitBest, fitConstant, fitForm, fitLeg, fitShaped, gainOf, moduleOfFit, predict, type Observation } from '@/lib/fit';
import { MODEL_FORMS, moduleOfForm, type ModelForm, type ModuleConstants } from '@/lib/module';
import { kelvin } from '@/lib/units';
import { normals } from '../../support/random';
import { anyModule, EXAMPLE, HOT } from './charts';

const DELTA_TS = [0, 8, 16, 24, 32, 40, 48];

/** A chart of heat or voltage over ΔT, drawn exactly by a form of the model; currents as shares of α Th/R. */
function chart(form: ModelForm, c: ModuleConstants, answer: 'Qc' | 'V', number: number, Th = HOT): Observation[] {
  const module = moduleOfForm(form, c);
  const points = [0.2, 0.35, 0.5, 0.65].flatMap((share, curve) =>
    DELTA_TS.map((deltaT, point): Observation => {
      const I = (share * c.alpha * Th) / c.R;
      const at = [I, kelvin(Th - deltaT), kelvin(Th)] as const;
      const value = answer === 'Qc' ? module.heat(...at) : module.voltage(...at);
      return { chart: number, curve, point, Tc: Th - deltaT, Th, I, answer, value, u: 0, range: 1 };
    }),
  );
  const range = Math.max(...points.map(({ value }) => Math.abs(value)));
  return points.map((point) => ({ ...point, u: 0.001 * range, range }));
}

const sheet = (form: ModelForm, c: ModuleConstants = EXAMPLE) => [...chart(form, c, 'Qc', 0), ...chart(form, c, 'V', 1)];

/** The same points, each curve moved by its own error and each point by another, as shares of the axis. */
function scattered(points: readonly Observation[], share: number, seed: number): Observation[] {
  const normal = normals(seed);
  const offsets = new Map<string, number>();
  return points.map((point) => {
    const curve = `${point.chart}/${point.curve}`;
    if (!offsets.has(curve)) offsets.set(curve, normal());
    return { ...point, value: point.value + share * point.range * (offsets.get(curve)! + 0.5 * normal()) };
  });
}

describe.each(['shaped', 'leg'] as const)('the %s form', (form) => {
  it('gives back the constants of a module drawn by it', () => {
    fc.assert(
      fc.property(anyModule, (c) => {
        const outcome = fitForm(form, sheet(form, c));
        if (!outcome.ok) throw new Error(outcome.missing);
        const { alpha, R, K } = constantsOf(outcome.fit);
        expect([alpha / c.alpha, R / c.R, K / c.K]).toEqual([expect.closeTo(1, 7), expect.closeTo(1, 7), expect.closeTo(1, 6)]);
        expect(outcome.fit).toMatchObject({ form, rank: 3, converged: true });
        expect(outcome.fit.rmsPercentOfQmax).toBeLessThan(1e-5);
      }),
      { numRuns: 20 },
    );
  });

  it('gives them back from COP with voltage, and from heat and current at given voltages', () => {
    const module = moduleOfForm(form, EXAMPLE);
    const cop = chart(form, EXAMPLE, 'Qc', 0).map((point): Observation => {
      const at = [point.I!, kelvin(point.Tc), kelvin(point.Th)] as const;
      return { ...point, answer: 'COP', value: module.cop(...at)!, u: 0.002, range: 4 };
    });
    const atVoltage = (answer: 'Qc' | 'I') =>
      chart(form, EXAMPLE, 'Qc', answer === 'Qc' ? 0 : 1).map((point): Observation => {
        const V = module.voltage(point.I!, kelvin(point.Tc), kelvin(point.Th));
        const value = answer === 'Qc' ? point.value : point.I!;
        return { ...point, I: undefined, V, answer, value, range: answer === 'Qc' ? point.range : 6, u: 0.001 };
      });
    for (const points of [
      [...cop, ...chart(form, EXAMPLE, 'V', 1)],
      [...atVoltage('Qc'), ...atVoltage('I')],
    ]) {
      const outcome = fitForm(form, points);
      if (!outcome.ok) throw new Error(outcome.missing);
      const found = constantsOf(outcome.fit);
      expect(found.alpha / EXAMPLE.alpha).toBeCloseTo(1, 6);
      expect(found.R / EXAMPLE.R).toBeCloseTo(1, 6);
      expect(found.K / EXAMPLE.K).toBeCloseTo(1, 5);
    }
  });

  it('refuses what constants refuse, with the same sentence', () => {
    const oneCurrent = chart(form, EXAMPLE, 'Qc', 0).filter(({ curve }) => curve === 1);
    const [ours, theirs] = [fitForm(form, oneCurrent), fitConstant(oneCurrent)];
    expect(ours).toEqual(theirs);
    expect(ours.ok).toBe(false);
  });

  it('foretells with an uncertainty that holds the truth in most of forty scattered sheets', () => {
    const truth = moduleOfForm(form, EXAMPLE).heat(3, kelvin(265), kelvin(HOT));
    const held = Array.from({ length: 40 }, (_, seed) => {
      const outcome = fitForm(form, scattered(sheet(form), 0.004, 100 + seed));
      if (!outcome.ok) throw new Error(outcome.missing);
      const { Qc } = predict(outcome.fit, { Tc: 265, Th: HOT, I: 3 });
      return Math.abs(Qc.value - truth) <= 2 * Qc.uRead;
    });
    expect(held.filter(Boolean).length).toBeGreaterThanOrEqual(36);
  });

  it('answers every point of its own residuals', () => {
    const outcome = (form === 'leg' ? fitLeg : fitShaped)(scattered(sheet(form), 0.01, 7));
    if (!outcome.ok) throw new Error(outcome.missing);
    const module = moduleOfFit(outcome.fit);
    const points = scattered(sheet(form), 0.01, 7);
    outcome.fit.residuals.forEach(({ residual }, i) => {
      const { answer, value, I, Tc, Th } = points[i]!;
      const model = answer === 'Qc' ? module.heat(I!, kelvin(Tc), kelvin(Th)) : module.voltage(I!, kelvin(Tc), kelvin(Th));
      expect(residual).toBeCloseTo(value - model, 9);
    });
  });
});

describe('the choice of the form', () => {
  it.each(MODEL_FORMS)('finds the %s form where the sheet was drawn by it', (form) => {
    const best = fitBest(sheet(form));
    if ('ok' in best) throw new Error(best.missing);
    expect(best.outcome.fit.form).toBe(form);
    expect(best.choice.leftOut).toBe('curve');
    expect(best.choice.scores.map((score) => score.form)).toEqual(MODEL_FORMS);
    const own = best.choice.scores.find((score) => score.form === form)!.percentOfRange!;
    for (const score of best.choice.scores) expect(score.percentOfRange).toBeGreaterThanOrEqual(own);
  });

  it('leaves out a hot side where charts are drawn for two', () => {
    const best = fitBest([...sheet('constant'), ...chart('constant', EXAMPLE, 'Qc', 2, 323.15)]);
    if ('ok' in best) throw new Error(best.missing);
    expect(best.choice.leftOut).toBe('hotSide');
    expect(best.outcome.fit.form).toBe('constant');
  });

  const chosen = (points: readonly Observation[]) => {
    const best = fitBest(points);
    return 'ok' in best ? null : best.outcome.fit.form;
  };

  it.each([false, true])('finds the leg form in nine of ten sheets read to 0.3 % of the axis; two hot sides: %s', (two) => {
    const points = [...sheet('leg'), ...(two ? chart('leg', EXAMPLE, 'Qc', 2, 323.15) : [])];
    const forms = Array.from({ length: 30 }, (_, seed) => chosen(scattered(points, 0.003, seed)));
    expect(forms.filter((form) => form === 'leg').length).toBeGreaterThanOrEqual(27);
  });

  it('leans to the leg form where scatter hides which is better', () => {
    const forms = Array.from({ length: 30 }, (_, seed) => chosen(scattered(sheet('shaped'), 0.1, seed)));
    expect(forms.filter((form) => form === 'leg').length).toBeGreaterThan(15);
  });

  it('has nothing to leave out with one curve of each kind, and says so', () => {
    const one = sheet('leg').filter(({ curve }) => curve === 2);
    const best = fitBest(one);
    if ('ok' in best) throw new Error(best.missing);
    expect(best.choice).toMatchObject({ leftOut: null });
    expect(best.outcome.fit.form).toBe('leg');
  });

  it('refuses as constants do', () => {
    expect(fitBest(chart('leg', EXAMPLE, 'V', 0))).toEqual(fitConstant(chart('leg', EXAMPLE, 'V', 0)));
  });
});

describe('the linear response of a fit', () => {
  it.each(MODEL_FORMS)('of the %s form is what fitting again gives, to first order', (form) => {
    const points = scattered(sheet('leg'), 0.002, 5);
    const outcome = fitForm(form, points);
    if (!outcome.ok) throw new Error(outcome.missing);
    // a chart whose y axis is half a permille too long and whose x axis is shifted by 0.05 K
    const moved = points.map((point) => (point.chart === 0 ? { ...point, value: point.value * 1.0005, Tc: point.Tc - 0.05 } : point));
    const again = fitForm(form, moved);
    if (!again.ok) throw new Error(again.missing);
    const change = gainOf(outcome.fit, points)!.changeBy(moved);
    const scale = Math.max(...change.map((value, k) => Math.abs(value / outcome.fit.parameters[k]!)));
    change.forEach((value, k) => {
      const real = again.fit.parameters[k]! - outcome.fit.parameters[k]!;
      expect(Math.abs(value - real) / Math.abs(outcome.fit.parameters[k]!)).toBeLessThan(0.05 * scale);
    });
  });
});
