import fc from 'fast-check';
import type { Candidate, CandidateModel, Duty } from '@/lib/duty';
import { constantsFromRatings } from '@/lib/module';
import { celsius, toKelvin } from '@/lib/units';

/** A module of 40 mm or so: 7.6 A, 15.9 V, 70 K at 27 °C. */
export const plainModel: CandidateModel = {
  form: 'constant',
  parameters: [0.0531, 1.61, 0.66],
  covariance: [
    [4e-8, 1e-8, -2e-8],
    [1e-8, 4e-5, 1e-6],
    [-2e-8, 1e-6, 1e-5],
  ],
  misfit: { heatW: null, voltageV: null },
  tolerancePercent: 10,
  validity: { I: [1, 7.6], deltaT: [0, 68], hotSideC: [27, 50] },
};

export interface Named extends Candidate {
  readonly name: string;
}

export const candidate = (changes: Partial<Omit<Named, 'model'>> & { model?: Partial<CandidateModel> } = {}): Named => ({
  name: 'plain',
  maxTemperatureC: 120,
  allowedCurrentA: null,
  ...changes,
  model: { ...plainModel, ...changes.model },
});

/** Modules as the trade sells them: 0.5 to 20 A, 1 to 40 V, 45 to 80 K. */
export const anyCandidate: fc.Arbitrary<Named> = fc
  .record({
    name: fc.string({ minLength: 1, maxLength: 4 }),
    imaxA: fc.double({ min: 0.5, max: 20, noNaN: true }),
    vmaxV: fc.double({ min: 1, max: 40, noNaN: true }),
    dTmaxK: fc.double({ min: 45, max: 80, noNaN: true }),
    relative: fc.tuple(...Array.from({ length: 3 }, () => fc.double({ min: 1e-4, max: 0.03, noNaN: true }))),
    tolerancePercent: fc.option(fc.double({ min: 0, max: 20, noNaN: true })),
    maxTemperatureC: fc.option(fc.double({ min: 60, max: 200, noNaN: true })),
    allowedCurrentA: fc.option(fc.double({ min: 0.5, max: 20, noNaN: true })),
  })
  .map(({ name, imaxA, vmaxV, dTmaxK, relative, tolerancePercent, maxTemperatureC, allowedCurrentA }) => {
    const found = constantsFromRatings({ imaxA, vmaxV, dTmaxK }, toKelvin(celsius(27)));
    if (!found.ok) throw new Error(found.message);
    const { alpha, R, K } = found.constants;
    const parameters = [alpha, R, K] as const;
    const covariance = parameters.map((_, i) => parameters.map((value, j) => (i === j ? (relative[i]! * value) ** 2 : 0)));
    return candidate({ name, maxTemperatureC, allowedCurrentA, model: { parameters, covariance, tolerancePercent } });
  });

/** Nobody writes −0 °C: it is read as 0. */
const withoutMinusZero = (value: number) => value + 0;

export const anyDuty: fc.Arbitrary<Duty> = fc.record(
  {
    heatW: fc.double({ min: 0.1, max: 200, noNaN: true }),
    coldFaceC: fc.double({ min: -60, max: 60, noNaN: true }).map(withoutMinusZero),
    hotFaceC: fc.double({ min: 0, max: 110, noNaN: true }),
    maxCurrentA: fc.double({ min: 0.1, max: 25, noNaN: true }),
    maxVoltageV: fc.double({ min: 0.5, max: 48, noNaN: true }),
  },
  { requiredKeys: ['heatW', 'coldFaceC', 'hotFaceC'] },
);
