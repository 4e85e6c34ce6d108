import { describe, expect, it } from 'vitest';
import {
  fitFrame,
  toValue,
  valueCovariance,
  valueUncertainty,
  type Frame,
  type FrameKind,
  type Mark,
  type Px,
  type Scales,
} from '@/lib/geometry';
import { corners, pageOf, photographed, turnedBy, upright } from './pages';
import { normals } from '../../support/random';

function frameOf(marks: readonly Mark[], scales: Scales, kind: FrameKind): Frame {
  const outcome = fitFrame(marks, scales, kind);
  if (!outcome.ok) throw new Error(outcome.message);
  return outcome.frame;
}

const variance = (values: readonly number[]) => {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  return values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1);
};

describe.each<[FrameKind, (square: Px) => Px]>([
  ['upright', upright],
  ['turned', turnedBy(5)],
  ['perspective', photographed(3e-4, -2e-4)],
])('the uncertainty of a value in a %s frame', (kind, lay) => {
  const scales: Scales = { x: 'linear', y: 'log' };
  const page = pageOf(scales, [0, 70], [0.5, 50], lay);
  const marks = corners(page);
  const px = page.place([52, 3]);

  it('is the scatter that scattered marks and a scattered point give', () => {
    const normal = normals(20260000 + kind.length);
    const scatter = (place: Px, u: number): Px => [place[0] + u * normal(), place[1] + u * normal()];
    const read = Array.from({ length: 4000 }, () => {
      const frame = frameOf(
        marks.map((mark) => ({ ...mark, px: scatter(mark.px, 0.5) })),
        scales,
        kind,
      );
      return toValue(frame, scatter(px, 0.3));
    });
    const expected = valueUncertainty(frameOf(marks, scales, kind), px, 0.3);
    // 4000 draws: the standard deviation is known to 1.1 %, so 5 % is far outside chance
    expect(Math.sqrt(variance(read.map(([x]) => x))) / expected.x).toBeCloseTo(1, 1);
    expect(Math.abs(Math.sqrt(variance(read.map(([x]) => x))) / expected.x - 1)).toBeLessThan(0.05);
    expect(Math.abs(Math.sqrt(variance(read.map(([, y]) => y))) / expected.y - 1)).toBeLessThan(0.05);
  });

  it('grows with the point and never falls below what the marks give', () => {
    const frame = frameOf(marks, scales, kind);
    const [none, some] = [valueUncertainty(frame, px, 0), valueUncertainty(frame, px, 1)];
    expect(none.x).toBeGreaterThan(0);
    expect(some.x).toBeGreaterThan(none.x);
    expect(some.y).toBeGreaterThan(none.y);
  });

  it('comes with the covariance of both values', () => {
    const { xx, xy, yy } = valueCovariance(frameOf(marks, scales, kind), px, 0.5);
    expect(xy * xy).toBeLessThan(xx * yy);
  });
});

describe('the uncertainty of the marks', () => {
  it('is half a pixel, or the residual where that is larger', () => {
    const page = pageOf({ x: 'linear', y: 'linear' }, [0, 70], [0, 35], upright);
    expect(frameOf(corners(page), page.scales, 'upright').markUncertaintyPx).toBe(0.5);
    const moved = corners(page).map((mark, at): Mark => (at === 2 ? { ...mark, px: [mark.px[0] + 4, mark.px[1]] } : mark));
    const frame = frameOf(moved, page.scales, 'upright');
    expect(frame.markUncertaintyPx).toBe(frame.residualPx);
    expect(frame.residualPx).toBeGreaterThan(0.5);
  });
});
