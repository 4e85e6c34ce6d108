import { laidOut } from './scale';
import type { Mark, Px, Scales } from './types';

/** One known value of one mark: the pixel lies on the line where the axis has this place. */
export interface Known {
  readonly axis: 'x' | 'y';
  /** Index of the mark. */
  readonly mark: number;
  /** Pixel relative to the origin of the frame. */
  readonly d: Px;
  /** The value as the axis lays it out. */
  readonly place: number;
}

/** Mean place of the marks, which becomes the origin of the frame: there its parameters are least correlated. */
export function meanPlace(marks: readonly Mark[]): Px {
  const sum = marks.reduce<Px>((total, { px }) => [total[0] + px[0], total[1] + px[1]], [0, 0]);
  return [sum[0] / marks.length, sum[1] / marks.length];
}

/** Every known value of the marks, in the order of the marks, x before y; each is one equation. */
export function knownsOf(marks: readonly Mark[], scales: Scales, origin: Px): readonly Known[] {
  return marks.flatMap(({ px, x, y }, mark) => {
    const d: Px = [px[0] - origin[0], px[1] - origin[1]];
    const known = (axis: 'x' | 'y', value: number | undefined): Known[] =>
      value === undefined ? [] : [{ axis, mark, d, place: laidOut(value, scales[axis]) }];
    return [...known('x', x), ...known('y', y)];
  });
}
