import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '@/lib/fit';
import { observe, type Conditions } from '@/lib/fit/observable';
import { constantModule } from '@/lib/module';
import { kelvin } from '@/lib/units';
import { anyModule, drivesOf, EXAMPLE } from './charts';

const shift = (c: typeof EXAMPLE, name: keyof typeof EXAMPLE, by: number) => ({ ...c, [name]: c[name] * (1 + by) });

describe('observe', () => {
  const cases = (['Qc', 'Qh', 'P', 'COP', 'V', 'I'] as const).flatMap((answer) =>
    (['I', 'V'] as const).filter((given) => given !== answer).map((given) => [answer, given] as const),
  );

  it.each(cases)('differentiates %s at given %s', (answer: Answer, given) => {
    const share = fc.double({ min: 0.3, max: 1.2, noNaN: true });
    fc.assert(
      fc.property(anyModule, share, fc.double({ min: 0, max: 20, noNaN: true }), (c, part, deltaT) => {
        const at: Conditions = { Tc: 300 - deltaT, Th: 300, [given]: drivesOf(c, given, [part])[0]! };
        const found = observe(c, answer, at)!;
        (['alpha', 'R', 'K'] as const).forEach((name, j) => {
          const [up, down] = [observe(shift(c, name, 1e-6), answer, at)!, observe(shift(c, name, -1e-6), answer, at)!];
          const slope = (up.value - down.value) / (2e-6 * c[name]);
          expect(Math.abs(found.gradient[j]! - slope) * c[name]).toBeLessThan(
            1e-6 * (1 + Math.abs(found.value)) + 1e-5 * Math.abs(slope * c[name]),
          );
        });
      }),
    );
  });

  it('answers as the module does', () => {
    const module = constantModule(EXAMPLE);
    const at = { Tc: 281.5, Th: 303.25, I: 2.3 };
    const faces = [kelvin(at.Tc), kelvin(at.Th)] as const;
    expect(observe(EXAMPLE, 'Qc', at)!.value).toBeCloseTo(module.heat(2.3, ...faces), 10);
    expect(observe(EXAMPLE, 'Qh', at)!.value).toBeCloseTo(module.heatRejected(2.3, ...faces), 10);
    expect(observe(EXAMPLE, 'P', at)!.value).toBeCloseTo(module.power(2.3, ...faces), 10);
    expect(observe(EXAMPLE, 'COP', at)!.value).toBeCloseTo(module.cop(2.3, ...faces)!, 10);
    const V = module.voltage(2.3, ...faces);
    expect(observe(EXAMPLE, 'V', at)!.value).toBeCloseTo(V, 10);
    expect(observe(EXAMPLE, 'I', { Tc: at.Tc, Th: at.Th, V })!.value).toBeCloseTo(2.3, 10);
  });

  it('has no COP where no power is taken up', () => {
    expect(observe(EXAMPLE, 'COP', { Tc: 280, Th: 300, I: -0.1 })).toBeNull();
    expect(observe(EXAMPLE, 'COP', { Tc: 280, Th: 300, I: 0 })).toBeNull();
  });
});
