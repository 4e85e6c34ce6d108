import { solveInPlace, spectralGrid } from '@/lib/numeric';
import { SHAPES, shapeAt, shapeIntegral, shapeSlope, thomsonIntegral } from './shapes';
import type { ModuleConstants, ModuleResponse } from './types';

/*
 * One leg, its length taken as 1, with the conductance, resistance and Seebeck coefficient of the whole module. With z from the cold face (0) to
 * the hot one (1), current I, temperature T(z) and φ = K(T) dT/dz,
 *
 *     dφ/dz = I T (dα/dT) dT/dz − I² R(T)          Thomson and Joule heat
 *     Qc = α(Tc) Tc I − φ(0),   V = ∫ α dT + I ∫ R(T) dz,   Qh = Qc + V I
 *
 * (A. F. Ioffe, Semiconductor Thermoelements and Thermoelectric Cooling, 1957, from memory; re-derived.) Integrated twice, with θ = ∫ k dT,
 * a = ∫ T (dα̂/dT) dT, and k, r, α̂ the shapes of K, R and α, that is at every z
 *
 *     θ(T) − θ(Tc) − ψ z − g ∫ (a(T) − a(Tc)) dz + h ∫∫ r(T) dz dz = 0,   ψ = φ(0)/K, g = I α/K, h = I² R/K,
 *
 * which holds no derivative any more. Unknown are T inside and ψ; asked at Chebyshev-Lobatto points it is solved by Newton's method.
 */

/** Points along the leg; with seven, heat and voltage are good to about 1e-7 of their maxima (see tests/unit/module/leg.test.ts). */
const POINTS = 7;
const N = POINTS - 1;
const { points: Z, integral: ONCE } = spectralGrid(POINTS);
const TWICE = ONCE.map((row) => Z.map((_, j) => row.reduce((sum, by, k) => sum + by * ONCE[k]![j]!, 0)));
const ACROSS = ONCE[N]!;
const once = Float64Array.from(ONCE.flat());
const twice = Float64Array.from(TWICE.flat());

/** Newton's method ends when no temperature moves by more than this any more, K; its next error would be far below rounding. */
const SETTLED_K = 1e-7;
const MOST_STEPS = 30;
/** No step moves a temperature by more than this, K. */
const LONGEST_STEP_K = 120;
/** Inside a leg that works at all. */
const [COLDEST_K, HOTTEST_K] = [40, 1200];

// room to work in, so that no state makes new arrays
const T = new Float64Array(POINTS);
const matrix = new Float64Array(N * N);
const sides = new Float64Array(2 * N);
const rises = new Float64Array(POINTS);
const rise = new Float64Array(POINTS);
const warmths = new Float64Array(POINTS);
const warmth = new Float64Array(POINTS);

/** Properties at the points of `T`: Thomson integral above the cold face and resistance, with their slopes. */
function updateProperties(): void {
  const cold = thomsonIntegral(SHAPES.alpha, T[0]!);
  for (let j = 0; j < POINTS; j += 1) {
    const t = T[j]!;
    rises[j] = thomsonIntegral(SHAPES.alpha, t) - cold;
    rise[j] = t * shapeSlope(SHAPES.alpha, t);
    warmths[j] = shapeAt(SHAPES.R, t);
    warmth[j] = shapeSlope(SHAPES.R, t);
  }
}

/** Jacobian by the inner temperatures and, last, ψ. */
function fillMatrix(g: number, h: number): void {
  for (let i = 1; i <= N; i += 1) {
    for (let j = 1; j < N; j += 1) {
      const at = i * POINTS + j;
      matrix[(i - 1) * N + j - 1] = -g * once[at]! * rise[j]! + h * twice[at]! * warmth[j]!;
    }
    if (i < N) matrix[(i - 1) * N + i - 1]! += shapeAt(SHAPES.K, T[i]!);
    matrix[(i - 1) * N + N - 1] = -Z[i]!;
  }
}

/** What g and h are multiplied by in equation i: first integral of the Thomson heat, second of the Joule heat. */
function integralsAt(i: number): readonly [thomson: number, joule: number] {
  let [thomson, joule] = [0, 0];
  for (let j = 0; j < POINTS; j += 1) {
    thomson += once[i * POINTS + j]! * rises[j]!;
    joule += twice[i * POINTS + j]! * warmths[j]!;
  }
  return [thomson, joule];
}

/** Brings `T` to the temperatures along the leg and gives ψ; NaN where the leg has no steady state (currents far above any use). */
function settle(g: number, h: number, Tc: number, Th: number): number {
  const base = shapeIntegral(SHAPES.K, Tc);
  for (let j = 0; j < POINTS; j += 1) T[j] = Tc + (Th - Tc) * Z[j]! + Math.min(h / 2, 400) * Z[j]! * (1 - Z[j]!);
  let psi = Th - Tc + h / 2;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    updateProperties();
    fillMatrix(g, h);
    for (let i = 1; i <= N; i += 1) {
      const [thomson, joule] = integralsAt(i);
      sides[i - 1] = -(shapeIntegral(SHAPES.K, T[i]!) - base - psi * Z[i]! - g * thomson + h * joule);
    }
    if (!solveInPlace(matrix, N, sides, 1)) return NaN;
    let largest = 0;
    for (let i = 0; i < N - 1; i += 1) largest = Math.max(largest, Math.abs(sides[i]!));
    const part = largest > LONGEST_STEP_K ? LONGEST_STEP_K / largest : 1;
    psi += part * sides[N - 1]!;
    for (let i = 1; i < N; i += 1) {
      T[i]! += part * sides[i - 1]!;
      if (!(T[i]! > COLDEST_K && T[i]! < HOTTEST_K)) return NaN;
    }
    if (largest < SETTLED_K) return psi;
  }
  return NaN;
}

/**
 * Heat and voltage of a module whose legs change along their length, with their derivatives by α, R, K (values at 300.15 K) and by the current, from the
 * heat equation above; any sign of I (A) and of Th − Tc (K). Null where a leg has no steady state. About ten microseconds.
 */
export function legResponse({ alpha, R, K }: ModuleConstants, I: number, Tc: number, Th: number): ModuleResponse | null {
  const [g, h] = [(I * alpha) / K, (I * I * R) / K];
  const psi = settle(g, h, Tc, Th);
  if (!Number.isFinite(psi)) return null;
  updateProperties();
  fillMatrix(g, h);
  for (let i = 1; i <= N; i += 1) {
    const [thomson, joule] = integralsAt(i);
    sides[i - 1] = thomson;
    sides[N + i - 1] = -joule;
  }
  if (!solveInPlace(matrix, N, sides, 2)) return null;
  const [psiG, psiH] = [sides[N - 1]!, sides[2 * N - 1]!];
  let [mean, meanG, meanH] = [0, 0, 0];
  for (let j = 0; j < POINTS; j += 1) {
    mean += ACROSS[j]! * warmths[j]!;
    if (j === 0 || j === N) continue;
    meanG += ACROSS[j]! * warmth[j]! * sides[j - 1]!;
    meanH += ACROSS[j]! * warmth[j]! * sides[N + j - 1]!;
  }
  const peltier = shapeAt(SHAPES.alpha, Tc) * Tc;
  const open = shapeIntegral(SHAPES.alpha, Th) - shapeIntegral(SHAPES.alpha, Tc);
  const drop = (I * R) / K;
  return {
    heat: alpha * peltier * I - K * psi,
    voltage: alpha * open + I * R * mean,
    heatBy: [I * (peltier - psiG), -I * I * psiH, g * psiG + h * psiH - psi],
    voltageBy: [open + drop * I * meanG, I * mean + drop * I * I * meanH, -drop * (g * meanG + h * meanH)],
    heatByCurrent: alpha * (peltier - psiG) - 2 * I * R * psiH,
    voltageByCurrent: R * mean + drop * (alpha * meanG + 2 * I * R * meanH),
  };
}
