import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { constantModule, MODEL_FORMS, moduleOfForm, responseOf, temperatureCoefficients } from '@/lib/module';
import { celsius, kelvin, toKelvin } from '@/lib/units';
import { FINE_CONSTANTS as c, fineLeg } from '../../support/fine-leg';

/** Imax and Qmax of the module: 8.4 A, 74 W. Currents of either sign, either face the warmer one. */
const anyState = fc.record({
  I: fc.double({ min: -8.4, max: 10, noNaN: true }),
  Tc: fc.double({ min: 230, max: 340, noNaN: true }),
  Th: fc.double({ min: 250, max: 360, noNaN: true }),
});
const faces = (Tc: number, Th: number) => [kelvin(Tc), kelvin(Th)] as const;

describe('the leg form', () => {
  it('agrees with a fine-grid shooting solver to a millionth of Qmax and Vmax, whatever the signs of current and ΔT', () => {
    const module = moduleOfForm('leg', c);
    fc.assert(
      fc.property(anyState, ({ I, Tc, Th }) => {
        const fine = fineLeg(I, Tc, Th);
        // far from any design (a heater at full current between hot faces) the seven points give a little less
        const slack = Math.abs(fine.heat) > 75 ? 5 : 1;
        expect(Math.abs(module.heat(I, ...faces(Tc, Th)) - fine.heat)).toBeLessThan(slack * 74e-6);
        expect(Math.abs(module.heatRejected(I, ...faces(Tc, Th)) - fine.rejected)).toBeLessThan(slack * 74e-6);
        expect(Math.abs(module.voltage(I, ...faces(Tc, Th)) - fine.voltage)).toBeLessThan(slack * 16e-6);
      }),
      { numRuns: 60 },
    );
  });

  it('has no steady state at several times the largest current, and then gives no number', () => {
    const module = moduleOfForm('leg', c);
    expect(module.heat(40, ...faces(280, 300))).toBeNaN();
    expect(module.voltage(40, ...faces(280, 300))).toBeNaN();
    expect(module.cop(40, ...faces(280, 300))).toBeNull();
  });
});

describe.each(MODEL_FORMS)('every form: %s', (form) => {
  const module = moduleOfForm(form, c);

  it('turns round: with the faces exchanged and the current reversed, heat absorbed is heat given off', () => {
    fc.assert(
      fc.property(anyState, ({ I, Tc, Th }) => {
        const [cold, hot] = faces(Tc, Th);
        expect(module.heat(-I, hot, cold)).toBeCloseTo(-module.heatRejected(I, cold, hot), 3);
        expect(module.voltage(-I, hot, cold)).toBeCloseTo(-module.voltage(I, cold, hot), 4);
      }),
    );
  });

  it('has α, R and K at a mean of 300.15 K as dV/dΔT and heat per kelvin without current, and dV/dI without ΔT', () => {
    const T = toKelvin(celsius(27));
    const [cold, hot] = faces(T - 0.05, T + 0.05);
    expect(module.voltage(0, cold, hot) / 0.1 / c.alpha).toBeCloseTo(1, 6);
    expect(-module.heat(0, cold, hot) / 0.1 / c.K).toBeCloseTo(1, 6);
    expect((module.voltage(1e-3, T, T) - module.voltage(-1e-3, T, T)) / 2e-3 / c.R).toBeCloseTo(1, 6);
  });

  it('tells its derivatives by α, R, K and the current', () => {
    fc.assert(
      fc.property(anyState, ({ I, Tc, Th }) => {
        const found = responseOf(form, c, I, Tc, Th)!;
        const slope = (of: 'heat' | 'voltage', change: (by: number) => Parameters<typeof responseOf>, size: number) =>
          (responseOf(...change(1e-5 * size))![of] - responseOf(...change(-1e-5 * size))![of]) / (2e-5 * size);
        for (const of of ['heat', 'voltage'] as const) {
          const by = of === 'heat' ? found.heatBy : found.voltageBy;
          (['alpha', 'R', 'K'] as const).forEach((name, k) => {
            const numeric = slope(of, (step) => [form, { ...c, [name]: c[name] + step }, I, Tc, Th], c[name]);
            expect(Math.abs(by[k]! - numeric) * c[name]).toBeLessThan(1e-4);
          });
          const byCurrent = of === 'heat' ? found.heatByCurrent : found.voltageByCurrent;
          expect(byCurrent).toBeCloseTo(
            slope(of, (step) => [form, c, I + step, Tc, Th], 1),
            3,
          );
        }
      }),
      { numRuns: 30 },
    );
  });

  it('finds the current at a voltage', () => {
    fc.assert(
      fc.property(anyState, ({ I, Tc, Th }) => {
        const V = module.voltage(I, ...faces(Tc, Th));
        expect(module.currentAtVoltage(V, ...faces(Tc, Th))).toBeCloseTo(I, 7);
      }),
    );
  });

  it('tells its temperature coefficients as the change of α and K between 295 and 305 K', () => {
    const log = (of: (T: number) => number) => (Math.log(of(305.15)) - Math.log(of(295.15))) / 10;
    const { alphaPerK, KPerK, RPerK } = temperatureCoefficients(form);
    expect(log((T) => module.voltage(0, ...faces(T - 0.1, T + 0.1)))).toBeCloseTo(alphaPerK, 5);
    expect(log((T) => -module.heat(0, ...faces(T - 0.1, T + 0.1)))).toBeCloseTo(KPerK, 5);
    expect(log((T) => module.voltage(1e-3, ...faces(T, T)))).toBeCloseTo(RPerK, 5);
  });
});

describe('the shaped form', () => {
  it('is the constant form with α, R and K of the mean temperature', () => {
    const [Tc, Th] = faces(270, 300);
    // physics: values at 285 K of the published polynomials, from those at 300.15 K
    const at = { alpha: fineAlpha(285) * c.alpha, R: fineRho(285) * c.R, K: fineKappa(285) * c.K };
    expect(moduleOfForm('shaped', c).heat(3, Tc, Th)).toBeCloseTo(constantModule(at).heat(3, Tc, Th), 9);
    expect(moduleOfForm('shaped', c).voltage(3, Tc, Th)).toBeCloseTo(constantModule(at).voltage(3, Tc, Th), 9);
  });
});

const over = (of: (T: number) => number) => (T: number) => of(T) / of(300.15);
const fineAlpha = over((T) => 22224 + 930.6 * T - 0.9905 * T * T);
const fineRho = over((T) => 5112 + 163.4 * T + 0.6279 * T * T);
const fineKappa = over((T) => 62605 - 277.7 * T + 0.4131 * T * T);
