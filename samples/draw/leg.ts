import type { Material } from './material';
import { rootNear } from './root';

/**
 * The truth behind the drawings: the one-dimensional heat equation of a leg whose properties change with temperature. It is
 * the drawing's truth and not the product's: no lumped model, and nothing of `src/lib`, gives exactly these curves.
 *
 * With z from the cold end (0) to the hot end (1) of a leg of area A and length L, current I and heat flow q from cold to hot,
 *
 *     q = α T I − (κ A / L) dT/dz            Peltier heat less conduction
 *     du/dz = I ρ L / A + α dT/dz            voltage along the leg
 *     q(z) = q(0) + I u(z)                   first law, which carries Joule and Thomson heat
 *
 * Each junction adds a contact resistance that is heated at the junction, and each plate a thermal resistance between the
 * junctions and the outer face. The heat taken up is found so that the far face comes out at its temperature (shooting).
 */
export interface Build {
  readonly couples: number;
  readonly legAreaM2: number;
  readonly legLengthM: number;
  /** Contact resistance times area of one junction, Ω m². */
  readonly contactOhmM2: number;
  /** Thermal resistance of one plate, K/W for the whole module. */
  readonly plateKelvinPerWatt: number;
  readonly material: Material;
}

/** Heat taken up and given off at the outer faces, W, and voltage, V, of the whole module. */
export interface State {
  readonly heat: number;
  readonly rejected: number;
  readonly voltage: number;
}

const STEPS = 16;

/** Carries temperature (K) and voltage (V) along one leg by the classical Runge–Kutta method of fourth order. */
function alongLeg(build: Build, current: number, coldEnd: number, heatIn: number) {
  const { legAreaM2, legLengthM, material } = build;
  const slopes = (t: number, u: number) => {
    const { alpha, rho, kappa } = material(t);
    const dT = ((alpha * t * current - heatIn - current * u) * legLengthM) / (kappa * legAreaM2);
    return [dT, (current * rho * legLengthM) / legAreaM2 + alpha * dT] as const;
  };
  const h = 1 / STEPS;
  let t = coldEnd;
  let u = 0;
  for (let step = 0; step < STEPS; step++) {
    const [t1, u1] = slopes(t, u);
    const [t2, u2] = slopes(t + (h / 2) * t1, u + (h / 2) * u1);
    const [t3, u3] = slopes(t + (h / 2) * t2, u + (h / 2) * u2);
    const [t4, u4] = slopes(t + h * t3, u + h * u3);
    t += (h / 6) * (t1 + 2 * t2 + 2 * t3 + t4);
    u += (h / 6) * (u1 + 2 * u2 + 2 * u3 + u4);
  }
  return { hotEnd: t, voltage: u };
}

/** The module at a current in A with its outer faces at two temperatures in K. */
export function stateOf(build: Build, current: number, cold: number, hot: number): State {
  const legs = 2 * build.couples;
  const contact = build.contactOhmM2 / build.legAreaM2;
  const plate = build.plateKelvinPerWatt * legs;
  const outward = (heat: number) => {
    const intoLeg = heat + current * current * contact;
    const leg = alongLeg(build, current, cold - heat * plate, intoLeg);
    const voltage = leg.voltage + 2 * current * contact;
    const rejected = heat + current * voltage;
    return { voltage, rejected, face: leg.hotEnd - rejected * plate };
  };
  const { alpha, rho, kappa } = build.material((cold + hot) / 2);
  const slender = build.legAreaM2 / build.legLengthM;
  const guess = alpha * cold * current - (current * current * rho) / slender / 2 - kappa * slender * (hot - cold);
  const heat = rootNear((q) => outward(q).face - hot, guess, 0.02 * (Math.abs(guess) + kappa * slender), 1e-9);
  const { voltage, rejected } = outward(heat);
  return { heat: legs * heat, rejected: legs * rejected, voltage: legs * voltage };
}
