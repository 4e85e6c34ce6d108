import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { displacement, isotonic, spreadLabels, type LabelWish } from '@/components/plot/spread';

const wish = fc.record({ at: fc.integer({ min: -50, max: 950 }), size: fc.double({ min: 4, max: 60, noNaN: true }) });
const wishes = fc.array(wish, { minLength: 1, maxLength: 12 });
const GAP = 3;
const DUST = 1e-6;

const overlaps = (labels: readonly LabelWish[], places: readonly number[]): boolean =>
  labels.some((a, i) => labels.some((b, j) => i < j && Math.abs(places[i]! - places[j]!) < (a.size + b.size) / 2 + GAP - DUST));

describe('spreading labels', () => {
  test('leaves labels alone that stand clear of each other', () => {
    expect(
      spreadLabels(
        [
          { at: 10, size: 8 },
          { at: 40, size: 8 },
          { at: 90, size: 8 },
        ],
        { gap: GAP },
      ),
    ).toEqual([10, 40, 90]);
  });

  test('moves two labels that want one place by half the shortage each', () => {
    expect(
      spreadLabels(
        [
          { at: 50, size: 10 },
          { at: 50, size: 10 },
        ],
        { gap: 2 },
      ),
    ).toEqual([44, 56]);
  });

  test('answers in the order of the wishes, not in the order of the places', () => {
    expect(
      spreadLabels([
        { at: 90, size: 8 },
        { at: 10, size: 8 },
      ]),
    ).toEqual([90, 10]);
  });

  test('never lets two labels overlap', () => {
    fc.assert(fc.property(wishes, (labels) => !overlaps(labels, spreadLabels(labels, { gap: GAP }))));
  });

  test('keeps all labels between the ends where they fit', () => {
    fc.assert(
      fc.property(wishes, (labels) => {
        const places = spreadLabels(labels, { gap: GAP, min: 0, max: 900 });
        expect(overlaps(labels, places)).toBe(false);
        for (const [k, { size }] of labels.entries()) {
          expect(places[k]! - size / 2).toBeGreaterThanOrEqual(-DUST);
          expect(places[k]! + size / 2).toBeLessThanOrEqual(900 + DUST);
        }
      }),
    );
  });

  test('starts at the lower end and runs over at the upper one where they do not fit', () => {
    expect(
      spreadLabels(
        [
          { at: 5, size: 10 },
          { at: 5, size: 10 },
          { at: 5, size: 10 },
        ],
        { min: 0, max: 20 },
      ),
    ).toEqual([5, 15, 25]);
  });

  test('moves labels no further in squares than any other arrangement in the same order', () => {
    const squares = (labels: readonly LabelWish[], places: readonly number[]) =>
      labels.reduce((sum, { at }, k) => sum + (places[k]! - at) ** 2, 0);
    fc.assert(
      fc.property(wishes, fc.integer({ min: -30, max: 30 }), fc.double({ min: 0, max: 20, noNaN: true }), (labels, shift, stretch) => {
        const best = spreadLabels(labels, { gap: GAP });
        const other = spreadLabels(
          labels.map((label) => ({ ...label, at: label.at + shift })),
          { gap: GAP + stretch },
        );
        expect(squares(labels, best)).toBeLessThanOrEqual(squares(labels, other) + DUST);
      }),
    );
  });

  test('counts as its price how far labels had to go', () => {
    expect(
      displacement(
        [
          { at: 1, size: 1 },
          { at: 5, size: 1 },
        ],
        [0, 7],
      ),
    ).toBe(3);
  });
});

test('isotonic regression pools what runs the wrong way into its mean', () => {
  // by hand: 3, 1, 2 pool to their mean 2; 6 and 4 to 5
  expect(isotonic([3, 1, 2, 6, 4])).toEqual([2, 2, 2, 5, 5]);
});
