import { describe, expect, it } from 'vitest';
import type { Px } from '@/lib/geometry';
import { familyCurves, framesOf, readWithFit } from '@/lib/reading';
import { blankHost } from '../../support/charts';
import { chartOf, documentOf, heatAt, heatChart, pixelOf, plainDocument, voltageChart } from './documents';

async function familyOf(json: unknown) {
  const document = documentOf(json);
  const { fit, frames } = await readWithFit(document, blankHost);
  return familyCurves(document, frames, fit!);
}

/** Largest distance in px of a line from where the known module's curve runs. */
const farthest = (points: readonly Px[], height: (x: number) => number) => Math.max(...points.map(([x, y]) => Math.abs(y - height(x))));

describe('the fitted family over a picture', () => {
  it('follows the curve of every value across the whole axis', async () => {
    const family = await familyOf(plainDocument());
    const heat = family.filter(({ chart }) => chart === 0);
    expect(heat.map(({ curve, value }) => [curve, value])).toEqual([
      [0, 2],
      [1, 3],
      [2, 4],
    ]);
    for (const { value, points } of heat) {
      const height = (x: number) => pixelOf(0, heatAt(27)(value, ((x - 100) / 800) * 60), 60, 50)[1];
      expect(farthest(points, height)).toBeLessThan(0.01);
      expect(points[0]![0]).toBeCloseTo(100, 6);
    }
  });

  it('ends where the curve leaves the axis', async () => {
    const [lowest] = (await familyOf(plainDocument())).filter(({ chart }) => chart === 0);
    // heat at 2 A falls below the axis before 60 K
    const last = lowest!.points.at(-1)!;
    expect(last[1]).toBeLessThan(662.1);
    expect(last[0]).toBeLessThan(899);
    expect(heatAt(27)(2, 60)).toBeLessThan(0);
  });

  it('is found where the answer tells the curves apart', async () => {
    const chart = chartOf({
      x: { quantity: 'I', unit: 'A' },
      y: { quantity: 'deltaT', unit: 'K' },
      family: { quantity: 'Qc', unit: 'W' },
      values: [0, 10],
      at: [2, 3, 4],
      right: 6,
      top: 80,
      of: (Q, I) => (heatAt(27)(I, 0) - Q) / (0.05 * I + 0.5),
    });
    const family = (await familyOf(plainDocument([chart, voltageChart()]))).filter(({ chart: at }) => at === 0);
    expect(family.map(({ value }) => value)).toEqual([0, 10]);
    for (const { value, points } of family) {
      const height = (x: number) => {
        const I = ((x - 100) / 800) * 6;
        return pixelOf(0, (heatAt(27)(I, 0) - value) / (0.05 * I + 0.5), 6, 80)[1];
      };
      expect(points.length).toBeGreaterThan(50);
      expect(farthest(points, height)).toBeLessThan(0.05);
    }
  });

  it('takes, of two currents that pump the same heat, the one that was read', async () => {
    // Qc = 30 W at ΔT = 10 K lies at a small and at a large current
    const small = (Q: number, dT: number) => {
      const [a, b] = [0.05 * (300.15 - dT), Q + 0.5 * dT];
      return (a - Math.sqrt(a * a - 2 * 2 * b)) / 2;
    };
    const chart = chartOf({
      x: { quantity: 'deltaT', unit: 'K' },
      y: { quantity: 'I', unit: 'A' },
      family: { quantity: 'Qc', unit: 'W' },
      values: [10, 20],
      at: [0, 10, 20],
      right: 40,
      top: 15,
      of: small,
    });
    const family = (await familyOf(plainDocument([chart, voltageChart()]))).filter(({ chart: at }) => at === 0);
    const [first] = family;
    const height = (x: number) => pixelOf(0, small(10, ((x - 100) / 800) * 40), 40, 15)[1];
    expect(farthest(first!.points.slice(0, 60), height)).toBeLessThan(0.1);
  });

  it('has the charts and curves of the document', async () => {
    const document = documentOf(plainDocument([heatChart(), voltageChart()]));
    const frames = framesOf(document);
    expect(frames.ok).toBe(true);
    expect(new Set((await familyOf(plainDocument())).map(({ chart, curve }) => `${chart}/${curve}`)).size).toBe(6);
  });
});
