import type { BenchChart, BenchDocument, BenchPicture } from '@/lib/editor';
import { emptyDocument } from '@/lib/editor';
import { ZERO_CELSIUS } from '@/lib/units';

export interface Constants {
  readonly alpha: number;
  readonly R: number;
  readonly K: number;
}

const CONSTANTS: Constants = { alpha: 0.05, R: 2.2, K: 0.4 };
const HOT_SIDE_C = 27;
const CURRENTS = [1, 2, 3];
const POINTS = 12;

/** Plots of 0 to 60 K across and 0 to 30 W or 0 to 12 V up, in a picture of 800 × 600 pixels. */
const across = (dT: number) => 80 + dT * 11;
const up = (share: number) => 560 - share * 500;

const Th = HOT_SIDE_C + ZERO_CELSIUS;
const heat = ({ alpha, R, K }: Constants, I: number, dT: number) => alpha * (Th - dT) * I - (I * I * R) / 2 - K * dT;
const voltage = ({ alpha, R }: Constants, I: number, dT: number) => alpha * dT + I * R;

function chart(
  page: BenchPicture,
  first: number,
  answer: { quantity: 'Qc' | 'V'; unit: 'W' | 'V'; top: number; of: (I: number, dT: number) => number },
): BenchChart {
  const curves = CURRENTS.map((value, at) => {
    const points = Array.from({ length: POINTS }, (_, k) => (k * 60) / POINTS)
      .filter((dT) => answer.of(value, dT) > 0)
      .map((dT): [number, number] => [across(dT), up(answer.of(value, dT) / answer.top)]);
    return { id: `k${first + at}`, value, by: 'hand' as const, points, omitted: [] };
  });
  const marks = [
    { px: [across(0), up(0)], x: 0, y: 0 },
    { px: [across(60), up(0)], x: 60, y: 0 },
    { px: [across(0), up(1)], x: 0, y: answer.top },
  ] as const;
  return {
    id: `c${first}`,
    pictureId: page.id,
    pixelsSha256: page.pixelsSha256,
    width: page.width,
    height: page.height,
    title: '',
    x: { quantity: 'deltaT', unit: 'K', scale: 'linear' },
    y: { quantity: answer.quantity, unit: answer.unit, scale: 'linear' },
    family: { quantity: 'I', unit: 'A' },
    side: { kind: 'hot', celsius: HOT_SIDE_C },
    frame: null,
    marks: marks.map((mark, at) => ({ id: `m${first + at}`, ...mark })),
    curves,
  };
}

/** A finished draft: heat and voltage against ΔT at 27 °C, read without error off a module with these constants. */
export const draftOf = (page: BenchPicture, constants: Constants = CONSTANTS): BenchDocument => ({
  ...emptyDocument(),
  charts: [
    chart(page, 1, { quantity: 'Qc', unit: 'W', top: 40, of: (I, dT) => heat(constants, I, dT) }),
    chart(page, 11, { quantity: 'V', unit: 'V', top: 12, of: (I, dT) => voltage(constants, I, dT) }),
  ],
});
