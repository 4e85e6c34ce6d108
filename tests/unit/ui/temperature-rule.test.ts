import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { layoutRule, RULE_WIDTHS, ruleSummary, type RulePoint } from '@/components/temperature-rule';
import { textWidth } from '@/components/plot/text-width';

const NB = '\u00A0';
const duty: RulePoint[] = [
  { label: 'hot face', celsius: 44.6, role: 'hot' },
  { label: 'cold face', celsius: 1.9, role: 'cold' },
  { label: 'load', celsius: 4, role: 'cold' },
  { label: 'air', celsius: 30, role: 'ambient' },
];
const WIDE = 1120;

describe('the temperature rule', () => {
  test('stands its points by their temperature', () => {
    const { marks } = layoutRule(
      [
        { label: 'a', celsius: 0, role: 'cold' },
        { label: 'b', celsius: 25, role: 'ambient' },
        { label: 'c', celsius: 100, role: 'hot' },
      ],
      WIDE,
    );
    const [a, b, c] = marks.map((mark) => mark.pointPercent) as [number, number, number];
    expect((b - a) / (c - a)).toBeCloseTo(0.25, 9);
    expect(a).toBeGreaterThan(0);
    expect(c).toBeLessThan(100);
  });

  test('puts a label right above its point where there is room', () => {
    const air = layoutRule(duty, WIDE).marks.find((mark) => mark.name === 'air')!;
    expect(air.labelPercent).toBeCloseTo(air.pointPercent, 9);
  });

  test('never lets labels of one row overlap or leave the line, at any of its widths', () => {
    const point = fc.record({
      label: fc.constantFrom('cold face', 'load', 'air', 'hot face', 'sink', 'dew point'),
      celsius: fc.double({ min: -60, max: 180, noNaN: true }),
      role: fc.constantFrom('cold' as const, 'hot' as const, 'ambient' as const),
    });
    fc.assert(
      fc.property(fc.array(point, { minLength: 1, maxLength: 6 }), fc.constantFrom(...RULE_WIDTHS.map(({ px }) => px)), (points, width) => {
        const { marks } = layoutRule(points, width);
        const boxes = marks.map((mark) => {
          const half = Math.max(textWidth(mark.name, 11), textWidth(mark.value, 15)) / 2;
          const middle = (mark.labelPercent / 100) * width;
          return { row: mark.nameY, from: middle - half, to: middle + half };
        });
        for (const [i, a] of boxes.entries()) {
          expect(a.from).toBeGreaterThanOrEqual(-1e-6);
          for (const b of boxes.slice(i + 1)) if (a.row === b.row) expect(a.to <= b.from + 1e-6 || b.to <= a.from + 1e-6).toBe(true);
        }
      }),
    );
  });

  test('uses both sides of the line only where one is too short', () => {
    const rows = (width: number) => new Set(layoutRule(duty, width).marks.map((mark) => mark.nameY)).size;
    expect(rows(WIDE)).toBe(1);
    expect(rows(240)).toBe(2);
  });

  test('stays whole when all temperatures are one, and when there is none', () => {
    const same = layoutRule(
      duty.map((point) => ({ ...point, celsius: 20 })),
      WIDE,
    );
    expect(same.marks.every((mark) => mark.pointPercent === 50)).toBe(true);
    expect(layoutRule([], WIDE).marks).toEqual([]);
  });

  test('says its temperatures from the coldest to the hottest', () => {
    expect(ruleSummary(duty)).toBe(`Temperatures: cold face 1.9${NB}°C, load 4.0${NB}°C, air 30.0${NB}°C, hot face 44.6${NB}°C.`);
  });
});
