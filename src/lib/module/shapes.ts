import { REFERENCE_KELVIN } from '@/lib/units';

/**
 * How Bi2Te3 changes with temperature: Seebeck coefficient, resistivity and thermal conductivity of a leg as polynomials
 * c0 + c1 T + c2 T², T in K. F. Meng, L. Chen, F. Sun, "A numerical model and comparative investigation of a thermoelectric generator with
 * multi-irreversibilities", Energy 36 (2011), doi 10.1016/j.energy.2011.03.057. Only their shapes count here: each is divided by its value at 300.15 K.
 */
const PUBLISHED = {
  alpha: [22224, 930.6, -0.9905],
  rho: [5112, 163.4, 0.6279],
  kappa: [62605, -277.7, 0.4131],
} as const;

/** A property relative to its value at 300.15 K, as a polynomial in T. */
export type Shape = readonly [c0: number, c1: number, c2: number];

const polynomial = ([c0, c1, c2]: Shape, T: number) => c0 + T * (c1 + T * c2);

function relative(published: Shape): Shape {
  const reference = polynomial(published, REFERENCE_KELVIN);
  return [published[0] / reference, published[1] / reference, published[2] / reference];
}

/** The published shapes of Seebeck coefficient, resistivity and thermal conductivity, each 1 at 300.15 K. */
export const SHAPES = { alpha: relative(PUBLISHED.alpha), R: relative(PUBLISHED.rho), K: relative(PUBLISHED.kappa) } as const;

/** A shape at T (K). */
export const shapeAt = polynomial;

/** Slope of a shape at T (K), 1/K. */
export const shapeSlope = ([, c1, c2]: Shape, T: number): number => c1 + 2 * c2 * T;

/** ∫ of a shape over temperature, K, from 0 K up to T (K). */
export const shapeIntegral = ([c0, c1, c2]: Shape, T: number): number => T * (c0 + T * (c1 / 2 + (T * c2) / 3));

/** ∫ T (d shape/dT) dT from 0 K up to T (K), K: what the Thomson heat of a leg adds up to, for a shape of the Seebeck coefficient. */
export const thomsonIntegral = ([, c1, c2]: Shape, T: number): number => T * T * (c1 / 2 + (2 * T * c2) / 3);
