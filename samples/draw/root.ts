/**
 * A root of a smooth, nearly straight function by the secant method.
 *
 * @param step   first step away from the start
 * @param enough the function value, absolute, that counts as zero
 */
export function rootNear(f: (x: number) => number, start: number, step: number, enough: number): number {
  let [x0, x1] = [start, start + step];
  let [f0, f1] = [f(x0), f(x1)];
  for (let turn = 0; turn < 60 && Math.abs(f1) > enough && f1 !== f0; turn++) {
    const next = x1 - (f1 * (x1 - x0)) / (f1 - f0);
    [x0, f0, x1] = [x1, f1, next];
    f1 = f(x1);
  }
  if (!(Math.abs(f1) <= enough * 1000)) throw new Error(`No root near ${start}.`);
  return x1;
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;

/** Where a function with one hump is largest in [low, high], to a given width, by golden section. */
export function peakOf(f: (x: number) => number, low: number, high: number, width: number): number {
  let [a, b] = [low, high];
  let [c, d] = [b - GOLDEN * (b - a), a + GOLDEN * (b - a)];
  let [fc, fd] = [f(c), f(d)];
  while (b - a > width) {
    if (fc > fd) {
      [b, d, fd] = [d, c, fc];
      c = b - GOLDEN * (b - a);
      fc = f(c);
    } else {
      [a, c, fc] = [c, d, fd];
      d = a + GOLDEN * (b - a);
      fd = f(d);
    }
  }
  return (a + b) / 2;
}
