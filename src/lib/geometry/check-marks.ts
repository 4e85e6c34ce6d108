import { MINUS } from '@/lib/units';
import type { Mark, Scales } from './types';

/** A sentence about the marks, and the index of the one it means. */
export interface MarkFault {
  readonly message: string;
  readonly at?: number;
}

const AXES = ['x', 'y'] as const;
const A_VALUE = { x: 'an x value', y: 'a y value' } as const;

const print = (value: number | undefined) => String(value).replace('-', MINUS);

/** Two marks nearer than this stand on one spot: nobody can place them apart. */
const ONE_SPOT_PX = 0.5;

/** No picture is so wide, and no axis goes so far; beyond, sums of squares overflow. */
const FARTHEST_PX = 1e6;
const LARGEST_VALUE = 1e30;

const distance = (one: Mark, other: Mark) => Math.hypot(one.px[0] - other.px[0], one.px[1] - other.px[1]);

function faultOfOne(mark: Mark, at: number, scales: Scales): MarkFault | null {
  const name = `Mark ${at + 1}`;
  if (!mark.px.every((place) => Math.abs(place) < FARTHEST_PX))
    return { at, message: `${name} has no place on the picture: place it again.` };
  if (mark.x === undefined && mark.y === undefined) {
    return { at, message: `${name} has neither an x value nor a y value: type one of them or remove the mark.` };
  }
  for (const axis of AXES) {
    const value = mark[axis];
    if (value === undefined) continue;
    if (!(Math.abs(value) < LARGEST_VALUE)) return { at, message: `${name} has ${A_VALUE[axis]} that is not a number: type it again.` };
    if (scales[axis] === 'log' && value <= 0) {
      return {
        at,
        message: `${name} says ${axis} = ${print(value)}, which a logarithmic axis does not reach: type a value above zero or make the axis linear.`,
      };
    }
  }
  return null;
}

function faultOfPair(marks: readonly Mark[]): MarkFault | null {
  for (const [at, mark] of marks.entries()) {
    for (const [before, other] of marks.slice(0, at).entries()) {
      if (distance(mark, other) >= ONE_SPOT_PX) continue;
      const axis = AXES.find((name) => mark[name] !== undefined && other[name] !== undefined && mark[name] !== other[name]);
      if (axis) {
        return { at, message: `Marks ${before + 1} and ${at + 1} stand on one spot but have different ${axis} values: move one of them.` };
      }
    }
  }
  return null;
}

function faultOfAxis(marks: readonly Mark[], axis: 'x' | 'y'): MarkFault | null {
  const values = marks.flatMap((mark) => mark[axis] ?? []);
  if (values.length === 0) return { message: `No mark has ${A_VALUE[axis]} yet: place two marks whose ${axis} values you know.` };
  if (values.length === 1) return { message: `Only one mark has ${A_VALUE[axis]}: place one more mark with another ${axis} value.` };
  if (values.every((value) => value === values[0])) {
    return { message: `All marks with ${A_VALUE[axis]} say ${axis} = ${print(values[0])}: place one with another ${axis} value.` };
  }
  return null;
}

/**
 * The first thing wrong with the marks that no frame of any kind could mend, or null:
 * a value that is missing or impossible on its axis, two marks on one spot that contradict each other, an axis with fewer than two different values.
 */
export function faultOfMarks(marks: readonly Mark[], scales: Scales): MarkFault | null {
  for (const [at, mark] of marks.entries()) {
    const fault = faultOfOne(mark, at, scales);
    if (fault) return fault;
  }
  return faultOfAxis(marks, 'x') ?? faultOfAxis(marks, 'y') ?? faultOfPair(marks);
}
