/** One axis: its ends, its numbers, and where a value stands in pixels. */
export interface Axis {
  readonly scale: 'linear' | 'log';
  readonly min: number;
  readonly max: number;
  readonly ticks: readonly number[];
  readonly fine: readonly number[];
  readonly place: (value: number) => number;
  readonly format: (value: number) => string;
}

const STEPS = [1, 2, 2.5, 5, 10];

/** A step that cuts a span into about so many parts. */
function niceStep(span: number, parts: number): number {
  const power = 10 ** Math.floor(Math.log10(span / parts));
  return power * (STEPS.find((step) => step * power * (parts + 1) >= span) ?? 10);
}

const decimalsOf = (step: number) =>
  [0, 1, 2, 3].find((digits) => Math.abs(step * 10 ** digits - Math.round(step * 10 ** digits)) < 1e-6) ?? 3;

const clean = (value: number) => Math.round(value * 1e9) / 1e9 + 0;

/** A linear axis from a round value at or below `low` to one at or above `high`, laid from pixel `from` to pixel `to`. */
export function linearAxis(low: number, high: number, parts: number, fineParts: number, [from, to]: readonly [number, number]): Axis {
  const step = niceStep(high - low, parts);
  const [first, last] = [Math.floor(low / step + 1e-6), Math.ceil(high / step - 1e-6)];
  const [min, max] = [clean(first * step), clean(last * step)];
  const ticks = Array.from({ length: last - first + 1 }, (_, at) => clean((first + at) * step));
  const fine = Array.from({ length: (last - first) * fineParts + 1 }, (_, at) => clean(min + (at * step) / fineParts));
  return {
    scale: 'linear',
    min,
    max,
    ticks,
    fine,
    place: (value) => from + ((value - min) / (max - min)) * (to - from),
    format: (value) => value.toFixed(decimalsOf(step)).replace('-', '−'),
  };
}

/** A logarithmic axis of whole decades. */
export function logAxis(low: number, high: number, [from, to]: readonly [number, number]): Axis {
  const [first, last] = [Math.floor(Math.log10(low)), Math.ceil(Math.log10(high))];
  const decades = Array.from({ length: last - first + 1 }, (_, at) => clean(10 ** (first + at)));
  return {
    scale: 'log',
    min: 10 ** first,
    max: 10 ** last,
    ticks: decades,
    fine: decades.slice(0, -1).flatMap((decade) => [2, 3, 4, 5, 6, 7, 8, 9].map((times) => clean(times * decade))),
    place: (value) => from + ((Math.log10(value) - first) / (last - first)) * (to - from),
    format: (value) => String(value),
  };
}
