/**
 * A second solver of the leg, for checks: shooting with the classical Runge-Kutta method in 400 steps over the first-law form
 *
 *     K dT/dz = α T I − q(0) − I u,   du/dz = I R + α dT/dz,   q(1) = q(0) + I u(1)
 *
 * and properties of its own, per leg: F. Meng, L. Chen, F. Sun, Energy 36 (2011), doi 10.1016/j.energy.2011.03.057. It shares no code with the product.
 */
export interface FineState {
  readonly heat: number;
  readonly rejected: number;
  readonly voltage: number;
}

/** The module of the published rows: 127 couples, legs of 1.4 by 1.4 by 1.2 mm. Area over length, m. */
export const COUPLES = 127;
export const SLENDER = 1.4e-3 ** 2 / 1.2e-3;

const alpha = (T: number) => (22224 + 930.6 * T - 0.9905 * T * T) * 1e-9;
const rho = (T: number) => (5112 + 163.4 * T + 0.6279 * T * T) * 1e-10;
const kappa = (T: number) => (62605 - 277.7 * T + 0.4131 * T * T) * 1e-4;

/** α, R and K of that module at 300.15 K: a = 2 N α, R = 2 N ρ/G, K = 2 N κ G. */
export const FINE_CONSTANTS = {
  alpha: 2 * COUPLES * alpha(300.15),
  R: (2 * COUPLES * rho(300.15)) / SLENDER,
  K: 2 * COUPLES * kappa(300.15) * SLENDER,
};

const STEPS = 400;

function shoot(I: number, Tc: number, q: number) {
  const slope = (T: number, u: number) => {
    const dT = (alpha(T) * T * I - q - I * u) / (kappa(T) * SLENDER);
    return [dT, (I * rho(T)) / SLENDER + alpha(T) * dT] as const;
  };
  let [T, u] = [Tc, 0];
  const h = 1 / STEPS;
  for (let step = 0; step < STEPS; step += 1) {
    const [a, b] = slope(T, u);
    const [c, d] = slope(T + (h / 2) * a, u + (h / 2) * b);
    const [e, f] = slope(T + (h / 2) * c, u + (h / 2) * d);
    const [g, k] = slope(T + h * e, u + h * f);
    T += (h / 6) * (a + 2 * c + 2 * e + g);
    u += (h / 6) * (b + 2 * d + 2 * f + k);
  }
  return { T, u };
}

/** Heat at both faces (W) and voltage (V) of the whole module at I (A) between faces at Tc and Th (K). */
export function fineLeg(I: number, Tc: number, Th: number): FineState {
  const middle = (Tc + Th) / 2;
  const K = kappa(middle) * SLENDER;
  let q = alpha(Tc) * Tc * I - (I * I * rho(middle)) / SLENDER / 2 - K * (Th - Tc);
  let [last, miss] = [q - 0.01 * K, shoot(I, Tc, q - 0.01 * K).T - Th];
  for (let step = 0; step < 60; step += 1) {
    const now = shoot(I, Tc, q).T - Th;
    if (Math.abs(now) < 1e-10 || now === miss) break;
    const next = q - (now * (q - last)) / (now - miss);
    [last, miss, q] = [q, now, next];
  }
  const { u } = shoot(I, Tc, q);
  const legs = 2 * COUPLES;
  return { heat: legs * q, rejected: legs * (q + I * u), voltage: legs * u };
}
