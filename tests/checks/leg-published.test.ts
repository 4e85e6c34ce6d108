import { describe, expect, it } from 'vitest';
import { moduleOfForm } from '@/lib/module';
import { kelvin } from '@/lib/units';
import { FINE_CONSTANTS } from '../support/fine-leg';

/*
 * Solutions of the full leg equation and of constants at the mean temperature for 127 couples of 1.4 × 1.4 × 1.2 mm with the properties of F. Meng, L. Chen,
 * F. Sun, Energy 36 (2011), doi 10.1016/j.energy.2011.03.057: worked out for this project by another program, printed to a mW and a mV.
 */
const ROWS: readonly (readonly [Th: number, Tc: number, I: number, Qc: number, V: number, meanQc: number, meanV: number])[] = [
  [300, 300, 4, 51.051, 6.998, 50.932, 6.882],
  [300, 270, 3, 14.446, 6.4, 14.224, 6.368],
  [300, 270, 6, 36.076, 11.474, 35.254, 11.158],
  [323, 283, 4, 20.653, 9.248, 20.155, 9.15],
  [300, 250, 5, 10.192, 10.295, 9.312, 10.165],
  [300, 240, 6, 4.282, 12.143, 2.865, 11.932],
];

describe.each(ROWS)('the row of Th %d K, Tc %d K, %d A', (Th, Tc, I, Qc, V, meanQc, meanV) => {
  it('is given by the leg form, by the shaped form as constants at the mean temperature', () => {
    const [leg, shaped] = [moduleOfForm('leg', FINE_CONSTANTS), moduleOfForm('shaped', FINE_CONSTANTS)];
    const at = [I, kelvin(Tc), kelvin(Th)] as const;
    expect(Math.abs(leg.heat(...at) - Qc)).toBeLessThan(0.0006);
    expect(Math.abs(leg.voltage(...at) - V)).toBeLessThan(0.0006);
    expect(Math.abs(shaped.heat(...at) - meanQc)).toBeLessThan(0.0006);
    expect(Math.abs(shaped.voltage(...at) - meanV)).toBeLessThan(0.0006);
  });
});
