import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { bringIntoView, FIT_MARGIN, fitViewport, keepInReach, pinch, SCALES, toPicture, toStage, zoomAbout } from '@/lib/editor';

const seed = 20260615;
const stage = { width: 860, height: 620 };
const picture = { width: 1000, height: 700 };
const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const viewport = fc.record({ scale: number(SCALES.least, SCALES.most), x: number(-5000, 5000), y: number(-5000, 5000) });
const point = fc.tuple(number(0, 860), number(0, 620));

const expectNear = (actual: readonly [number, number], expected: readonly [number, number]) => {
  expect(actual[0]).toBeCloseTo(expected[0], 6);
  expect(actual[1]).toBeCloseTo(expected[1], 6);
};

describe('the viewport', () => {
  test('fits the whole picture in the middle with a margin on the tighter side', () => {
    const fitted = fitViewport(picture, stage);
    const [left, top] = toStage(fitted, [0, 0]);
    const [right, bottom] = toStage(fitted, [1000, 700]);
    expect(Math.min(left, top)).toBeCloseTo(FIT_MARGIN, 9);
    expect(left).toBeCloseTo(stage.width - right, 9);
    expect(top).toBeCloseTo(stage.height - bottom, 9);
  });

  test(`keeps the picture under the pointer when it zooms (seed ${seed})`, () => {
    fc.assert(
      fc.property(viewport, point, number(0.1, 10), (before, about, factor) => {
        expectNear(toStage(zoomAbout(before, about, factor), toPicture(before, about)), about);
      }),
      { seed },
    );
  });

  test(`stage to picture and back is where it was (seed ${seed})`, () => {
    fc.assert(
      fc.property(viewport, point, (at, where) => {
        expectNear(toStage(at, toPicture(at, where)), where);
      }),
      { seed },
    );
  });

  test(`two fingers that move in step move the picture with them and do not zoom (seed ${seed})`, () => {
    fc.assert(
      fc.property(viewport, point, point, number(-200, 200), number(-200, 200), (at, a, b, dx, dy) => {
        const after = pinch(
          at,
          [a, b],
          [
            [a[0] + dx, a[1] + dy],
            [b[0] + dx, b[1] + dy],
          ],
        );
        expect(after.scale).toBeCloseTo(at.scale, 9);
        expectNear(toStage(after, toPicture(at, a)), [a[0] + dx, a[1] + dy]);
      }),
      { seed },
    );
  });

  test(`never loses the picture (seed ${seed})`, () => {
    fc.assert(
      fc.property(viewport, (at) => {
        const kept = keepInReach(at, picture, stage);
        const [left, top] = toStage(kept, [0, 0]);
        const [right, bottom] = toStage(kept, [1000, 700]);
        const overlap = (from: number, to: number, room: number) => Math.min(to, room) - Math.max(from, 0);
        expect(overlap(left, right, stage.width)).toBeGreaterThanOrEqual(Math.min(48, right - left) - 1e-6);
        expect(overlap(top, bottom, stage.height)).toBeGreaterThanOrEqual(Math.min(48, bottom - top) - 1e-6);
      }),
      { seed },
    );
  });

  test('moves for a place that is off the stage and stays for one that is on it', () => {
    const fitted = fitViewport(picture, stage);
    expect(bringIntoView(fitted, [500, 350], stage)).toBe(fitted);
    const close = zoomAbout(fitted, [430, 310], 8);
    const [x, y] = toStage(bringIntoView(close, [0, 700], stage), [0, 700]);
    expect([x, y]).toEqual([expect.closeTo(40, 6), expect.closeTo(580, 6)]);
  });
});
