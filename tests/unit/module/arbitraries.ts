import * as fc from 'fast-check';
import type { ModuleConstants } from '@/lib/module';
import { kelvin } from '@/lib/units';

/** From a few couples to a large module, with a figure of merit from poor to better than any material yet. */
export const anyConstants: fc.Arbitrary<ModuleConstants> = fc
  .record({
    alpha: fc.double({ min: 0.002, max: 0.2, noNaN: true }),
    R: fc.double({ min: 0.05, max: 30, noNaN: true }),
    Z: fc.double({ min: 2e-4, max: 6e-3, noNaN: true }),
  })
  .map(({ alpha, R, Z }) => ({ alpha, R, K: alpha ** 2 / (R * Z) }));

/** A face between −50 °C and 150 °C. */
export const anyFace = fc.double({ min: 223.15, max: 423.15, noNaN: true }).map(kelvin);
