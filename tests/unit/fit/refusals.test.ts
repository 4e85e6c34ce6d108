import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitConstant, type Observation } from '@/lib/fit';
import { anyModule, draw, drawAll, drivesOf, EXAMPLE, type Drawn } from './charts';

const ONE_CURRENT =
  'One current of heat alone cannot tell Seebeck coefficient from resistance: add a voltage chart or curves at more currents.';
const COP_ALONE =
  'COP alone gives only ratios of Seebeck coefficient, resistance and thermal conductance: add a chart of heat pumped or a voltage chart.';
const NO_DIFFERENCE =
  'All points of heat stand at no temperature difference, which cannot tell thermal conductance: add points or a chart at larger temperature differences.';

const missing = (observations: readonly Observation[]) => {
  const outcome = fitConstant(observations);
  return outcome.ok ? null : outcome.missing;
};
const missingFrom = (...charts: readonly Drawn[]) => missing(drawAll(EXAMPLE, charts));

describe('fitConstant refuses with the chart that is missing', () => {
  it('when there are no points at all, or only omitted ones', () => {
    const none = 'There are no points to fit yet: frame a chart and put points on its curves.';
    expect(missing([])).toBe(none);
    expect(missing(draw(EXAMPLE, { answer: 'Qc', drives: [1, 2, 3] }).map((point) => ({ ...point, omitted: true })))).toBe(none);
  });

  it('for heat at one current, of whatever module', () => {
    fc.assert(
      fc.property(anyModule, fc.double({ min: 0.1, max: 1.2, noNaN: true }), (c, share) => {
        const outcome = fitConstant(draw(c, { answer: 'Qc', drives: drivesOf(c, 'I', [share]) }));
        expect(outcome).toMatchObject({ ok: false, missing: ONE_CURRENT, rank: 2, condition: Infinity });
        expect('fit' in outcome).toBe(false);
      }),
      { numRuns: 40 },
    );
  });

  it('for heat at one current at two hot sides, though its rank is full', () => {
    const outcome = fitConstant(
      drawAll(EXAMPLE, [
        { answer: 'Qc', drives: [2.5] },
        { answer: 'Qc', drives: [2.5], Th: 323.15 },
      ]),
    );
    expect(outcome).toMatchObject({ ok: false, missing: ONE_CURRENT, rank: 3 });
  });

  it('for heat at two currents that are the same but for a slip of the pen', () => {
    expect(missingFrom({ answer: 'Qc', drives: [2.5, 2.51] })).toBe(ONE_CURRENT);
  });

  it('for heat at one voltage', () => {
    expect(missingFrom({ answer: 'Qc', given: 'V', drives: [9] })).toBe(
      'One voltage of heat alone cannot tell Seebeck coefficient from resistance: add a current chart or curves at more voltages.',
    );
  });

  it.each([
    ['V', 'I', 'Voltage'],
    ['P', 'I', 'Electrical power'],
    ['I', 'V', 'Current'],
  ] as const)('for %s alone', (answer, given, name) => {
    expect(missingFrom({ answer, given, drives: drivesOf(EXAMPLE, given) })).toBe(
      `${name} alone cannot tell thermal conductance: add a chart of heat pumped.`,
    );
  });

  it('for COP alone, over ΔT and at any number of currents', () => {
    expect(missingFrom({ answer: 'COP', drives: [1, 2, 3, 4], deltaTs: [5, 15, 25, 35] })).toBe(COP_ALONE);
  });

  it('for heat without any temperature difference, with or without voltage', () => {
    expect(missingFrom({ answer: 'Qc', drives: [1, 2, 3, 4], deltaTs: [0] })).toBe(NO_DIFFERENCE);
    expect(missingFrom({ answer: 'Qc', drives: [1, 2, 3, 4], deltaTs: [0] }, { answer: 'V', drives: [1, 2, 3] })).toBe(NO_DIFFERENCE);
  });

  it('for fewer than three points', () => {
    const points = drawAll(EXAMPLE, [
      { answer: 'Qc', drives: [2], deltaTs: [10] },
      { answer: 'V', drives: [2], deltaTs: [10] },
    ]);
    expect(missing(points)).toBe('Three constants need at least three points: put more points on the curves.');
  });

  it('for kinds of charts that would do but whose points do not', () => {
    const points = drawAll(EXAMPLE, [
      { answer: 'Qc', drives: [2], deltaTs: [10] },
      { answer: 'V', drives: [2], deltaTs: [10] },
    ]);
    const again = points.flatMap((point) => [point, { ...point, point: 9 }]);
    expect(missing(again)).toBe(
      'These charts together cannot tell thermal conductance: add a chart of heat pumped, a voltage chart or curves at more currents and temperature differences.',
    );
  });

  it('when the points are too uncertain to tell, though rank and condition would do', () => {
    const points = draw(EXAMPLE, { answer: 'Qc', drives: [2, 2.2] }).map((point) => ({ ...point, u: 0.3 * point.range }));
    const outcome = fitConstant(points);
    expect(outcome).toMatchObject({ ok: false, rank: 3 });
    expect(outcome.ok ? '' : outcome.missing).toMatch(/^Heat at these few currents alone cannot tell/);
  });
});

describe('fitConstant refuses charts that contradict each other', () => {
  it('and names the constant that would not be positive', () => {
    const upside = draw(EXAMPLE, { answer: 'Qc', drives: [1, 2, 3, 4] }).map((point) => ({ ...point, Tc: point.Th, Th: point.Tc }));
    expect(missing(upside)).toBe(
      'Together these charts give no positive thermal conductance: check the quantities, the units, the values of the curves and which side is held.',
    );
  });

  it('and points of COP that no module can show', () => {
    const points = draw(EXAMPLE, { answer: 'COP', drives: [1, 2, 3], deltaTs: [5, 15] }).map((point) => ({ ...point, I: 0 }));
    expect(missing(points)).toMatch(/^No module can show all of these points: /);
  });
});
