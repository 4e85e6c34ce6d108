import { describe, expect, it } from 'vitest';
import {
  bestCop,
  constantModule,
  constantsFromRatings,
  currentForBestCop,
  currentForHeat,
  maximaAtHotSide,
  type ModuleConstants,
  type ThreeRatings,
} from '@/lib/module';
import { findRoot } from '@/lib/numeric';
import { celsius, kelvin, toCelsius, toKelvin } from '@/lib/units';

function inverse(ratings: ThreeRatings, Th: number): ModuleConstants {
  const outcome = constantsFromRatings(ratings, kelvin(Th));
  if (!outcome.ok) throw new Error(outcome.message);
  return outcome.constants;
}

/*
 * Set A: F. L. Tan, S. C. Fok, Energy Convers. Manage. 49 (2008) 1715-1723, doi 10.1016/j.enconman.2007.11.001, Tables 1 and 2: ten
 * modules, under neutral codes, and the constants extracted from their ratings. Reproduced to the printed digits with Th = t + 273.
 * The last column, Qmax of the model, was worked for this project and rounded to 0.1 W.
 */
const SET_A = [
  ['A1', 25, 6, 15.4, 67, 1.9896, 0.0517, 1.8708, 56.6],
  ['A2', 25, 8.5, 15.4, 65, 1.4166, 0.0517, 1.2702, 79.7],
  ['B1', 25, 6.1, 15.9, 70, 1.9943, 0.0534, 1.8866, 59.9],
  ['B2', 25, 7.6, 15.9, 70, 1.6007, 0.0534, 1.5143, 74.6],
  ['B3', 25, 7.9, 15.7, 69, 1.5272, 0.0527, 1.4479, 76.4],
  ['B4', 25, 8.6, 15.7, 69, 1.4029, 0.0527, 1.33, 83.1],
  ['C1', 25, 6, 17.5, 71, 2.2218, 0.0587, 1.7754, 65],
  ['C2', 25, 8.5, 17.5, 70, 1.5752, 0.0587, 1.2301, 91.8],
  ['D1', 27, 5.6, 14.7, 66, 2.0475, 0.049, 2.0558, 50.2],
  ['D2', 27, 7.4, 14.7, 66, 1.5495, 0.049, 1.5557, 66.4],
] as const;

const constantsOfSetA = (code: string) => {
  const [, hotC, imaxA, vmaxV, dTmaxK] = SET_A.find(([name]) => name === code)!;
  return inverse({ imaxA, vmaxV, dTmaxK }, hotC + 273);
};

describe('set A: constants extracted from the ratings of ten modules', () => {
  it.each(SET_A)('%s', (code, hotC, imaxA, vmaxV, dTmaxK, R, alpha, theta, qmaxW) => {
    const constants = constantsOfSetA(code);
    expect(constants.R).toBeCloseTo(R, 4);
    expect(constants.alpha).toBeCloseTo(alpha, 4);
    expect(1 / constants.K).toBeCloseTo(theta, 4);
    const maxima = maximaAtHotSide(constants, kelvin(hotC + 273));
    expect(maxima.qmaxW).toBeCloseTo(qmaxW, 1);
    expect(maxima.imaxLargestDeltaT).toBeCloseTo(imaxA, 10);
    expect(maxima.vmaxV).toBeCloseTo(vmaxV, 10);
    expect(maxima.dTmaxK).toBeCloseTo(dTmaxK, 10);
  });
});

/*
 * Set B: the case study and Table 3 of the same paper: 22 W at a cold face of 5 °C, ambient 25 °C, sink 0.15 K/W, hot face
 * Th = Tamb + θ (Qc + P). Printed to 0.1 °C, 0.1 A, 0.1 V and 0.01; C2's hot face comes to 31.35 °C, a rounding edge (0.06 allowed).
 */
const SET_B = [
  ['A1', 32.2, 3.3, 8, 0.84],
  ['A2', 31.9, 3.7, 6.6, 0.91],
  ['B1', 31.8, 3.1, 7.6, 0.95],
  ['B2', 31.5, 3.2, 6.6, 1.04],
  ['B3', 31.5, 3.3, 6.5, 1.02],
  ['B4', 31.5, 3.4, 6.2, 1.04],
  ['C1', 31.6, 2.8, 7.8, 1.01],
  ['C2', 31.3, 3.1, 6.5, 1.08],
  ['D1', 33, 3.6, 8.7, 0.71],
  ['D2', 32.1, 3.7, 7, 0.86],
] as const;

describe('set B: working points with a sink', () => {
  it.each(SET_B)('%s', (code, hotC, I, V, cop) => {
    const constants = constantsOfSetA(code);
    const module = constantModule(constants);
    const Tc = toKelvin(celsius(5));
    const current = (Th: number) => currentForHeat(constants, 22, Tc, kelvin(Th))!;
    const unbalanced = (Th: number) => 298.15 + 0.15 * module.heatRejected(current(Th), Tc, kelvin(Th)) - Th;
    const Th = kelvin(findRoot(unbalanced, 298.15, 308.15)!);
    expect(Math.abs(toCelsius(Th) - hotC)).toBeLessThanOrEqual(0.06);
    expect(Math.abs(current(Th) - I)).toBeLessThanOrEqual(0.051);
    expect(Math.abs(module.voltage(current(Th), Tc, Th) - V)).toBeLessThanOrEqual(0.051);
    expect(Math.abs(module.cop(current(Th), Tc, Th)! - cop)).toBeLessThanOrEqual(0.0051);
  });
});

/*
 * Set C: A. V. da Rosa, Fundamentals of Renewable Energy Processes, ch. 5, eqs 5.95-5.97: a couple between −15 °C and 40 °C,
 * α = 6·10⁻⁴ V/K, K R = 1.2·10⁻⁴ V²/K, 0.1 W a couple at best COP.
 */
describe('set C: a textbook couple at best COP', () => {
  const couple = { alpha: 6e-4, R: 0.033534934, K: 0.003578358 };
  const [Tc, Th] = [kelvin(258.15), kelvin(313.15)];
  const I = currentForBestCop(couple, Tc, Th)!;

  it('has the printed product K R', () => expect(couple.K * couple.R).toBeCloseTo(1.2e-4, 11));
  it('takes the printed current', () => expect(I).toBeCloseTo(2.7131231, 6));
  it('pumps 0.1 W', () => expect(constantModule(couple).heat(I, Tc, Th)).toBeCloseTo(0.1, 7));
  it('takes the printed power', () => expect(constantModule(couple).power(I, Tc, Th)).toBeCloseTo(0.33638495, 7));
  it('has the printed COP, by the module and by the closed form', () => {
    expect(constantModule(couple).cop(I, Tc, Th)).toBeCloseTo(0.29727846, 7);
    expect(bestCop(couple, Tc, Th)).toBeCloseTo(0.29727846, 7);
  });
});

/*
 * Set D: a published problem statement (tutorsglobe.com, question 5721364) without printed answers: R = 4 ohm, K = 0.3 W/K; 80 K give
 * 1.71 V on a 3 ohm load. The answers were worked for this project.
 */
describe('set D: a problem with worked answers', () => {
  const constants = { alpha: (1.71 * (1 + 4 / 3)) / 80, R: 4, K: 0.3 };
  const module = constantModule(constants);
  const [Tc, Th] = [kelvin(300), kelvin(350)];

  it('generates 1.71 V on the load, which gives the Seebeck coefficient', () => {
    expect(constants.alpha).toBeCloseTo(0.049875, 12);
    expect(module.voltage(-1.71 / 3, kelvin(300), kelvin(380))).toBeCloseTo(1.71, 12);
  });

  it('pumps 10 W from 300 K to 350 K', () => {
    const I = currentForHeat(constants, 10, Tc, Th)!;
    expect(I).toBeCloseTo(2.519038, 6);
    expect(module.voltage(I, Tc, Th)).toBeCloseTo(12.5699, 4);
    expect(module.power(I, Tc, Th)).toBeCloseTo(31.6641, 4);
    expect(module.heatRejected(I, Tc, Th) / module.power(I, Tc, Th)).toBeCloseTo(1.315816, 6);
  });

  it('has its best COP at the worked current', () => {
    const I = currentForBestCop(constants, Tc, Th)!;
    expect(I).toBeCloseTo(2.122583, 6);
    expect(module.heat(I, Tc, Th)).toBeCloseTo(7.7484319, 6);
    expect(bestCop(constants, Tc, Th)).toBeCloseTo(0.332342, 6);
  });
});

/*
 * Set E: S. Lineykin, S. Ben-Yaakov, IEEE Trans. Ind. Appl. 43(2) (2007) 505, ratings and rounded constants (0.053, 1.6, 1.5) from
 * memory; the further digits by hand: 15.9/300, (15.9/7.6)(230/300) and 70·600/(7.6·15.9·230).
 */
describe('set E: the published inverse', () => {
  it('gives the constants of the example', () => {
    const { alpha, R, K } = inverse({ imaxA: 7.6, vmaxV: 15.9, dTmaxK: 70 }, 300);
    expect([alpha, R, 1 / K].map((value, i) => value.toFixed([4, 5, 5][i]!))).toEqual(['0.0530', '1.60395', '1.51116']);
  });
});

/* A round trip worked for this project: constants of set A's B2 and the maxima that belong to them at 298 K. */
describe('round trip of the closed forms', () => {
  it('has the worked maxima', () => {
    const maxima = maximaAtHotSide({ alpha: 15.9 / 298, R: 1.6006711409, K: 0.6603911793 }, kelvin(298));
    expect(maxima.imaxLargestDeltaT).toBeCloseTo(7.6, 7);
    expect(maxima.dTmaxK).toBeCloseTo(70, 7);
    expect(maxima.vmaxV).toBeCloseTo(15.9, 10);
    expect(maxima.qmaxW).toBeCloseTo(74.612617, 5);
    expect(maxima.qMostHeatW).toBeCloseTo(78.97, 2);
    expect(maxima.imaxMostHeat).toBeCloseTo(9.9333, 4);
  });
});
