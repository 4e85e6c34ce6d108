/** Where a function is smallest, and how small. */
export interface Minimum {
  readonly x: number;
  readonly value: number;
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * The minimum of f between a and b, where f falls and then rises, by golden section (J. Kiefer, Proc. AMS 4 (1953) 502-506; from
 * memory). `tolerance` is the absolute width of the last bracket, 1e-9 of |b − a| when left out; rounding of f keeps x from being
 * found closer than about the square root of the machine precision.
 */
export function minimise(f: (x: number) => number, a: number, b: number, tolerance = 1e-9 * Math.abs(b - a)): Minimum {
  let [low, high] = a < b ? [a, b] : [b, a];
  let [x1, x2] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
  let [f1, f2] = [f(x1), f(x2)];
  while (high - low > tolerance && low < x1 && x1 < x2 && x2 < high) {
    if (f1 <= f2) {
      [high, x2, f2] = [x2, x1, f1];
      x1 = high - GOLDEN * (high - low);
      f1 = f(x1);
    } else {
      [low, x1, f1] = [x1, x2, f2];
      x2 = low + GOLDEN * (high - low);
      f2 = f(x2);
    }
  }
  return f1 <= f2 ? { x: x1, value: f1 } : { x: x2, value: f2 };
}
