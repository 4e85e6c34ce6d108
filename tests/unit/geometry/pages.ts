import * as fc from 'fast-check';
import { laidOut } from '@/lib/geometry/scale';
import type { Mark, Px, Scale, Scales } from '@/lib/geometry';

/** A page that was laid on a picture in a known way: where its values stand, for marks and for judging. */
export interface Page {
  readonly scales: Scales;
  readonly x: readonly [number, number];
  readonly y: readonly [number, number];
  readonly place: (value: readonly [number, number]) => Px;
}

const share = (value: number, [from, to]: readonly [number, number], scale: Scale) =>
  (laidOut(value, scale) - laidOut(from, scale)) / (laidOut(to, scale) - laidOut(from, scale));

/** A page whose unit square is laid on the picture by `lay`. */
export function pageOf(scales: Scales, x: Page['x'], y: Page['y'], lay: (square: Px) => Px): Page {
  return { scales, x, y, place: ([vx, vy]) => lay([share(vx, x, scales.x), share(vy, y, scales.y)]) };
}

/** Lays the unit square upright, 800 by 600 pixels, its lower left corner at (90, 640). */
export const upright = ([u, v]: Px): Px => [90 + 800 * u, 640 - 600 * v];

/** The same, turned about the middle of the picture by an angle in degrees. */
export const turnedBy =
  (degrees: number) =>
  (square: Px): Px => {
    const [x, y] = upright(square);
    const [cos, sin] = [Math.cos((degrees * Math.PI) / 180), Math.sin((degrees * Math.PI) / 180)];
    return [500 + cos * (x - 500) - sin * (y - 360), 360 + sin * (x - 500) + cos * (y - 360)];
  };

/** The same page photographed from the side: a projective map of the upright picture. */
export const photographed =
  (left: number, down: number) =>
  (square: Px): Px => {
    const [x, y] = turnedBy(2)(square);
    const w = 1 + left * (x - 500) + down * (y - 360);
    return [500 + (x - 500) / w, 360 + (y - 360) / w];
  };

/** Marks in the four corners of a page, with both values. */
export function corners({ x, y, place }: Page): Mark[] {
  const values = [
    [x[0], y[0]],
    [x[1], y[0]],
    [x[1], y[1]],
    [x[0], y[1]],
  ] as const;
  return values.map((value) => ({ px: place(value), x: value[0], y: value[1] }));
}

const range = (scale: Scale): fc.Arbitrary<readonly [number, number]> => {
  const rising = (
    scale === 'log'
      ? fc.tuple(fc.double({ min: 0.01, max: 5, noNaN: true }), fc.double({ min: 2, max: 1000, noNaN: true }))
      : fc.tuple(fc.double({ min: -500, max: 500, noNaN: true }), fc.double({ min: 0.5, max: 400, noNaN: true }))
  ).map(([from, size]) => [from, scale === 'log' ? from * size : from + size] as const);
  return fc.tuple(rising, fc.boolean()).map(([[from, to], reversed]) => (reversed ? [to, from] : [from, to]));
};

const scale = fc.constantFrom<Scale>('linear', 'log');

/** Any page laid by one of the given ways: both scales on both axes, either axis running either way. */
export const anyPage = (lay: fc.Arbitrary<(square: Px) => Px>): fc.Arbitrary<Page> =>
  fc
    .tuple(scale, scale, lay)
    .chain(([x, y, how]) => fc.tuple(range(x), range(y)).map(([rangeX, rangeY]) => pageOf({ x, y }, rangeX, rangeY, how)));

/** A value inside the page, as shares of both ranges. */
export const inside = fc.tuple(fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }));

/** The values at shares of both ranges of a page. */
export function valuesAt({ scales, x, y }: Page, [u, v]: readonly [number, number]): [number, number] {
  const between = ([from, to]: readonly [number, number], at: number, how: Scale) =>
    how === 'log' ? from * (to / from) ** at : from + at * (to - from);
  return [between(x, u, scales.x), between(y, v, scales.y)];
}
