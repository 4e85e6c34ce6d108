import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { impliedRatings, predict, type FittedConstants } from '@/lib/fit';
import { constantModule, maximaAtHotSide } from '@/lib/module';
import { kelvin } from '@/lib/units';
import { normals } from '../../support/random';
import { anyModule, EXAMPLE } from './charts';

/** Uncertainties of 0.4 %, 0.9 % and 1.5 %, of which α and R go together. */
const u = [0.004 * EXAMPLE.alpha, 0.009 * EXAMPLE.R, 0.015 * EXAMPLE.K] as const;
const fit: FittedConstants = {
  parameters: [EXAMPLE.alpha, EXAMPLE.R, EXAMPLE.K],
  covariance: [
    [u[0] ** 2, 0.8 * u[0] * u[1], 0],
    [0.8 * u[0] * u[1], u[1] ** 2, 0],
    [0, 0, u[2] ** 2],
  ],
};
const at = { Tc: 278, Th: 301, I: 2.6 };

describe('predict', () => {
  it('gives what the module gives', () => {
    const module = constantModule(EXAMPLE);
    const faces = [kelvin(at.Tc), kelvin(at.Th)] as const;
    const found = predict(fit, at);
    expect(found.I).toMatchObject({ value: 2.6, uRead: 0, tolerance: null });
    expect(found.Qc.value).toBeCloseTo(module.heat(2.6, ...faces), 12);
    expect(found.Qh.value).toBeCloseTo(module.heatRejected(2.6, ...faces), 12);
    expect(found.V.value).toBeCloseTo(module.voltage(2.6, ...faces), 12);
    expect(found.P.value).toBeCloseTo(module.power(2.6, ...faces), 12);
    expect(found.COP!.value).toBeCloseTo(module.cop(2.6, ...faces)!, 12);
  });

  it('gives the same at the voltage that belongs to the current', () => {
    fc.assert(
      fc.property(anyModule, fc.double({ min: 0.1, max: 8, noNaN: true }), (c, I) => {
        const constants = { parameters: [c.alpha, c.R, c.K] as const, covariance: fit.covariance };
        const one = predict(constants, { ...at, I });
        const other = predict(constants, { Tc: at.Tc, Th: at.Th, V: one.V.value });
        expect(other.I.value).toBeCloseTo(I, 9);
        expect(other.Qc.value).toBeCloseTo(one.Qc.value, 7);
      }),
    );
  });

  it('has the scatter of constants drawn from their covariance as its reading uncertainty', () => {
    const normal = normals(77);
    const draws = Array.from({ length: 4000 }, () => {
      const [a, b, c] = [normal(), normal(), normal()];
      return { alpha: EXAMPLE.alpha + u[0] * a, R: EXAMPLE.R + u[1] * (0.8 * a + 0.6 * b), K: EXAMPLE.K + u[2] * c };
    });
    const scatter = (f: (c: typeof EXAMPLE) => number) => {
      const values = draws.map(f);
      const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
      return Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / values.length);
    };
    const found = predict(fit, at);
    const faces = [kelvin(at.Tc), kelvin(at.Th)] as const;
    expect(found.Qc.uRead / scatter((c) => constantModule(c).heat(2.6, ...faces))).toBeCloseTo(1, 1);
    expect(found.V.uRead / scatter((c) => constantModule(c).voltage(2.6, ...faces))).toBeCloseTo(1, 1);
    expect(found.COP!.uRead / scatter((c) => constantModule(c).cop(2.6, ...faces)!)).toBeCloseTo(1, 1);
  });

  it('adds the misfit of the form: of heat to heat, of voltage to voltage and through it to power', () => {
    const found = predict(
      { ...fit, covariance: fit.covariance.map((row) => row.map(() => 0)), misfit: { heatW: 0.3, voltageV: 0.05 } },
      at,
    );
    expect(found.Qc.uRead).toBeCloseTo(0.3, 6);
    expect(found.V.uRead).toBeCloseTo(0.05, 6);
    expect(found.P.uRead).toBeCloseTo(0.05 * 2.6, 6);
    expect(found.Qh.uRead).toBeCloseTo(Math.hypot(0.3, 0.05 * 2.6), 6);
    const driven = predict(
      { ...fit, covariance: fit.covariance.map((row) => row.map(() => 0)), misfit: { heatW: null, voltageV: 0.05 } },
      { Tc: 278, Th: 301, V: 6 },
    );
    expect(driven.V.uRead).toBeCloseTo(0, 6);
    expect(driven.I.uRead).toBeCloseTo(0.05 / EXAMPLE.R, 6);
  });

  it('keeps the delivery tolerance apart: the stated percentage of the value, one half width', () => {
    const found = predict(fit, at, { tolerancePercent: 10 });
    expect(found.Qc.tolerance).toBeCloseTo(0.1 * found.Qc.value, 12);
    expect(found.Qc.uRead).toBe(predict(fit, at).Qc.uRead);
    expect(predict(fit, { ...at, I: 0 }, { tolerancePercent: 10 }).Qc.tolerance).toBeGreaterThan(0);
  });

  it('has no COP where no power is taken up', () => {
    expect(predict(fit, { ...at, I: 0 }).COP).toBeNull();
    expect(predict(fit, { ...at, I: -0.2 }).COP).toBeNull();
  });
});

describe('impliedRatings', () => {
  it('are the maxima of the model at the hot side, each with its unit', () => {
    const found = impliedRatings(fit, 27);
    const maxima = maximaAtHotSide(EXAMPLE, kelvin(300.15));
    expect(found.hotSideC).toBe(27);
    for (const name of Object.keys(maxima) as (keyof typeof maxima)[]) expect(found[name].value).toBeCloseTo(maxima[name], 12);
    expect(found.dTmaxK.unit).toBe('K');
    expect(found.Z.unit).toBe('1/K');
  });

  it('carry the uncertainty of the constants: Vmax = α Th as α itself, Z by its three parts', () => {
    const found = impliedRatings(fit, 27);
    expect(found.vmaxV.u).toBeCloseTo(u[0] * 300.15, 9);
    // d ln Z = 2 d ln α − d ln R − d ln K, with r(α, R) = 0.8.
    const relative = Math.sqrt(4 * 0.004 ** 2 + 0.009 ** 2 + 0.015 ** 2 - 2 * 2 * 0.8 * 0.004 * 0.009);
    expect(found.Z.u / found.Z.value).toBeCloseTo(relative, 7);
  });
});
