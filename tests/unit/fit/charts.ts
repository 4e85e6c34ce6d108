import * as fc from 'fast-check';
import type { Answer, Observation } from '@/lib/fit';
import { constantModule, maximaAtHotSide, type ModuleConstants } from '@/lib/module';
import { kelvin } from '@/lib/units';

/** A chart drawn from constants: an answer over ΔT at a hot side, one curve for each current or, with `given` V, each voltage. */
export interface Drawn {
  readonly answer: Answer;
  readonly drives: readonly number[];
  readonly given?: 'I' | 'V';
  readonly Th?: number;
  readonly deltaTs?: readonly number[];
}

/** Near the middle of what is sold; not round on purpose. */
export const EXAMPLE: ModuleConstants = { alpha: 0.0523, R: 1.87, K: 0.571 };
export const HOT = 300.15;
const DELTA_TS = [0, 9, 18, 27, 36, 45];

const answers = (c: ModuleConstants, I: number, Tc: number, Th: number): Readonly<Record<Answer, number | null>> => {
  const module = constantModule(c);
  const at = [I, kelvin(Tc), kelvin(Th)] as const;
  return {
    Qc: module.heat(...at),
    Qh: module.heatRejected(...at),
    P: module.power(...at),
    COP: module.cop(...at),
    V: module.voltage(...at),
    I,
  };
};

/** Points of a chart without error; those at which a sheet would draw nothing (no COP, no positive current) are left out. */
export function draw(c: ModuleConstants, { answer, drives, given = 'I', Th = HOT, deltaTs = DELTA_TS }: Drawn, chart = 0): Observation[] {
  const points = drives.flatMap((drive, curve) =>
    deltaTs.flatMap((deltaT, point) => {
      const I = given === 'I' ? drive : (drive - c.alpha * deltaT) / c.R;
      const value = answers(c, I, Th - deltaT, Th)[answer];
      const drawn = value !== null && (given === 'I' || I > 0);
      return drawn ? [{ chart, curve, point, Tc: Th - deltaT, Th, [given]: drive, answer, value, u: 0, range: 0 }] : [];
    }),
  );
  const range = Math.max(...points.map(({ value }) => Math.abs(value)), 1e-9);
  return points.map((point) => ({ ...point, u: 0.001 * range, range }));
}

/** Several charts of one module, numbered in order. */
export const drawAll = (c: ModuleConstants, charts: readonly Drawn[]): Observation[] => charts.flatMap((chart, i) => draw(c, chart, i));

/** Currents, or voltages, at a quarter, a half, three quarters of what the module takes at most. */
export function drivesOf(c: ModuleConstants, given: 'I' | 'V' = 'I', shares: readonly number[] = [0.25, 0.5, 0.75, 1]): number[] {
  const { imaxLargestDeltaT, vmaxV } = maximaAtHotSide(c, kelvin(HOT));
  return shares.map((share) => share * (given === 'I' ? imaxLargestDeltaT : vmaxV));
}

/** Modules of any size with the figure of merit of real material. */
export const anyModule: fc.Arbitrary<ModuleConstants> = fc
  .record({
    alpha: fc.double({ min: 0.005, max: 0.15, noNaN: true }),
    R: fc.double({ min: 0.1, max: 20, noNaN: true }),
    Z: fc.double({ min: 1.5e-3, max: 3.5e-3, noNaN: true }),
  })
  .map(({ alpha, R, Z }) => ({ alpha, R, K: alpha ** 2 / (R * Z) }));
