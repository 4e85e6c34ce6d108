import { normals } from './random';

/** Properties of one leg at a temperature in K: Seebeck coefficient V/K, resistivity Ω m, conductivity W/(m K). */
export interface Properties {
  readonly alpha: number;
  readonly rho: number;
  readonly kappa: number;
}

export type Material = (kelvin: number) => Properties;

/**
 * Bi2Te3 leg: F. Meng, L. Chen, F. Sun, "A numerical model and comparative investigation of a thermoelectric generator with
 * multi-irreversibilities", Energy 36 (2011), doi 10.1016/j.energy.2011.03.057. The n leg is taken as the p leg's mirror.
 */
export const publishedMaterial: Material = (t) => ({
  alpha: (22224 + 930.6 * t - 0.9905 * t * t) * 1e-9,
  rho: (5112 + 163.4 * t + 0.6279 * t * t) * 1e-10,
  kappa: (62605 - 277.7 * t + 0.4131 * t * t) * 1e-4,
});

/** How one maker's material differs from the published one: a factor and a tilt (1/K about 300 K) for each property. */
export interface Scatter {
  readonly factor: Properties;
  readonly tilt: Properties;
}

/** The scatter of material that follows from a text: factors within some percent, tilts within some 0.01 % per kelvin. */
export function scatterOf(text: string): Scatter {
  const normal = normals(`material ${text}`);
  const about = (centre: number, spread: number) => centre + spread * Math.max(-2, Math.min(2, normal()));
  return {
    factor: { alpha: about(1, 0.015), rho: about(1, 0.03), kappa: about(1, 0.03) },
    tilt: { alpha: about(0, 0.0002), rho: about(0, 0.0005), kappa: about(0, 0.0004) },
  };
}

/** The published material with a scatter laid on it: property · factor · (1 + tilt (T − 300 K)). */
export const scattered =
  ({ factor, tilt }: Scatter): Material =>
  (t) => {
    const { alpha, rho, kappa } = publishedMaterial(t);
    const away = t - 300;
    return {
      alpha: alpha * factor.alpha * (1 + tilt.alpha * away),
      rho: rho * factor.rho * (1 + tilt.rho * away),
      kappa: kappa * factor.kappa * (1 + tilt.kappa * away),
    };
  };
