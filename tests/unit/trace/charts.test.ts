import { describe, expect, it } from 'vitest';
import { CHARTS, scoreChart } from '../../bench/trace';

/**
 * Floors for the drawn charts, a bit looser than measured: mean distance in % of the y range, coverage in %. The marks of d04 lie up to half a pixel beside its
 * drawn axes, which is all of its distance; the labels set into the lines of d12 are longer than 3 % of the axis on two curves.
 */
const FLOORS: Readonly<Record<string, readonly [mean: number, coverage: number]>> = {
  d01: [0.002, 99],
  d02: [0.002, 99],
  d03: [0.006, 99],
  d04: [0.15, 98],
  d05: [0.025, 98],
  d06: [0.012, 99],
  d07: [0.012, 99],
  d08: [0.006, 99],
  d09: [0.005, 99],
  d10: [0.02, 99],
  d11: [0.004, 98],
  d12: [0.003, 89],
  d13: [0.005, 98],
  d14: [0.01, 98],
};

describe('a drawn chart', () => {
  it.each(CHARTS)('%s is followed as well as it was', async (name) => {
    const rows = await scoreChart(name);
    const [most, least] = FLOORS[name]!;
    for (const { score, scattered } of rows) {
      expect(score).not.toBeNull();
      expect(scattered).not.toBeNull();
      expect(Math.min(score!.coverage, scattered!.coverage)).toBeGreaterThan(least);
      expect(Math.max(score!.p95, scattered!.p95)).toBeLessThan(0.25);
      expect(score!.beyond).toBe(0);
    }
    const means = rows.map(({ score }) => score!.mean);
    expect(means.reduce((sum, value) => sum + value, 0) / means.length).toBeLessThan(most);
  });
});
