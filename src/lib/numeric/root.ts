/** How closely and how long to look for a root. */
export interface RootOptions {
  /** Absolute tolerance of the root; 1e-12 of the bracket's larger end when left out. */
  readonly tolerance?: number | undefined;
  readonly maxIterations?: number | undefined;
}

/**
 * A root of f between a and b, where f(a) and f(b) differ in sign, or null when they do not or f is not finite there.
 * Bisection, secant and inverse quadratic interpolation after R. P. Brent, Algorithms for Minimization without
 * Derivatives, Prentice-Hall 1973, ch. 4 (procedure zero; from memory): never slower than bisection by more than a fixed factor.
 */
export function findRoot(f: (x: number) => number, a: number, b: number, options: RootOptions = {}): number | null {
  const { tolerance = 1e-12 * Math.max(Math.abs(a), Math.abs(b)), maxIterations = 200 } = options;
  let [best, fBest, last, fLast] = [b, f(b), a, f(a)];
  if (fLast === 0) return last;
  if (!(Math.sign(fBest) * Math.sign(fLast) <= 0)) return null;
  let [other, fOther, step, previous] = [last, fLast, best - last, best - last];
  for (let i = 0; i < maxIterations; i += 1) {
    if (Math.sign(fBest) === Math.sign(fOther)) {
      [other, fOther] = [last, fLast];
      step = previous = best - last;
    }
    if (Math.abs(fOther) < Math.abs(fBest)) {
      [last, best, other] = [best, other, best];
      [fLast, fBest, fOther] = [fBest, fOther, fBest];
    }
    const close = 2 * Number.EPSILON * Math.abs(best) + tolerance / 2;
    const half = (other - best) / 2;
    if (Math.abs(half) <= close || fBest === 0) return best;
    const proposal = interpolate(best, fBest, last, fLast, other, fOther);
    const trusted = Math.abs(previous) >= close && Math.abs(fLast) > Math.abs(fBest) && isTrusted(proposal, half, previous, close);
    previous = trusted ? step : half;
    step = trusted ? proposal : half;
    [last, fLast] = [best, fBest];
    best += Math.abs(step) > close ? step : Math.sign(half) * close;
    fBest = f(best);
  }
  return best;
}

/** Step from the best point by the secant through two points or the inverse parabola through three. */
function interpolate(best: number, fBest: number, last: number, fLast: number, other: number, fOther: number): number {
  const s = fBest / fLast;
  if (last === other) return ((other - best) * s) / (s - 1) || 0;
  const q = fLast / fOther;
  const r = fBest / fOther;
  const p = s * ((other - best) * q * (q - r) - (best - last) * (r - 1));
  return -p / ((q - 1) * (r - 1) * (s - 1));
}

/** A step is trusted when it stays well inside the bracket and is less than half the step before last. */
function isTrusted(step: number, half: number, previous: number, close: number): boolean {
  const inside = step / half > 0 && Math.abs(step) < 1.5 * Math.abs(half) - Math.abs(close) / 2;
  return Number.isFinite(step) && inside && Math.abs(step) < Math.abs(previous) / 2;
}
