import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  fitFrame,
  frameDoubt,
  isVisible,
  markResiduals,
  toPixel,
  toValue,
  valueJacobian,
  type Frame,
  type FrameKind,
  type Mark,
  type Px,
  type Scales,
} from '@/lib/geometry';
import { anyPage, corners, inside, pageOf, photographed, turnedBy, upright, valuesAt, type Page } from './pages';

const linear: Scales = { x: 'linear', y: 'linear' };

function frameOf(marks: readonly Mark[], scales: Scales = linear, force?: FrameKind): Frame {
  const outcome = fitFrame(marks, scales, force);
  if (!outcome.ok) throw new Error(outcome.message);
  return outcome.frame;
}

const far = ([ax, ay]: readonly [number, number], [bx, by]: readonly [number, number]) => Math.hypot(ax - bx, ay - by);

const LAYINGS: Readonly<Record<FrameKind, fc.Arbitrary<(square: Px) => Px>>> = {
  upright: fc.constant(upright),
  turned: fc
    .double({ min: -85, max: 85, noNaN: true })
    .filter((angle) => Math.abs(angle) > 1)
    .map(turnedBy),
  perspective: fc
    .tuple(fc.double({ min: 1e-4, max: 5e-4, noNaN: true }), fc.double({ min: -4e-4, max: 4e-4, noNaN: true }))
    .map(([a, b]) => photographed(a, b)),
};

describe.each(['upright', 'turned', 'perspective'] as const)('a %s frame', (kind) => {
  it('is the kind that is taken for marks in the four corners of such a page', () => {
    fc.assert(fc.property(anyPage(LAYINGS[kind]), (page) => frameOf(corners(page), page.scales).kind === kind));
  });

  it('finds the pixel of any value on any scale, either way round', () => {
    fc.assert(
      fc.property(anyPage(LAYINGS[kind]), inside, (page, shares) => {
        const frame = frameOf(corners(page), page.scales, kind);
        const value = valuesAt(page, shares);
        expect(far(toPixel(frame, value), page.place(value))).toBeLessThan(1e-6);
      }),
    );
  });

  it('gives a pixel back after pixel → value → pixel', () => {
    const pixel = fc.tuple(fc.double({ min: 0, max: 1000, noNaN: true }), fc.double({ min: 0, max: 720, noNaN: true }));
    fc.assert(
      fc.property(anyPage(LAYINGS[kind]), pixel, (page, px) => {
        const frame = frameOf(corners(page), page.scales, kind);
        fc.pre(isVisible(frame, px));
        expect(far(toPixel(frame, toValue(frame, px)), px)).toBeLessThan(1e-6);
      }),
    );
  });

  it('has the derivatives of its own values', () => {
    fc.assert(
      fc.property(anyPage(LAYINGS[kind]), inside, (page, shares) => {
        const frame = frameOf(corners(page), page.scales, kind);
        const px = page.place(valuesAt(page, shares));
        const jacobian = valueJacobian(frame, px);
        for (const at of [0, 1] as const) {
          const step = (size: number): Px => (at === 0 ? [px[0] + size, px[1]] : [px[0], px[1] + size]);
          const [ahead, behind] = [toValue(frame, step(0.01)), toValue(frame, step(-0.01))];
          for (const axis of [0, 1] as const) {
            const slope = (ahead[axis] - behind[axis]) / 0.02;
            const size = Math.hypot(...jacobian[axis]);
            expect(Math.abs((jacobian[axis][at] ?? NaN) - slope)).toBeLessThan(1e-5 * size);
          }
        }
      }),
    );
  });

  it('survives JSON', () => {
    fc.assert(
      fc.property(anyPage(LAYINGS[kind]), inside, (page, shares) => {
        const frame = frameOf(corners(page), page.scales, kind);
        const px = page.place(valuesAt(page, shares));
        expect(toValue(JSON.parse(JSON.stringify(frame)) as Frame, px)).toEqual(toValue(frame, px));
      }),
    );
  });
});

describe('the kind of a frame', () => {
  const page = (lay: (square: Px) => Px): Page => pageOf(linear, [0, 70], [0, 35], lay);
  const shifted = (marks: Mark[], at: number, by: Px): Mark[] =>
    marks.map((mark, index) => (index === at ? { ...mark, px: [mark.px[0] + by[0], mark.px[1] + by[1]] } : mark));

  it('stays upright while the marks lie within 1 px rms of their lines', () => {
    // 800 px wide: a turn of 0.1° moves the corners by 0.3 to 0.7 px
    const frame = frameOf(corners(page(turnedBy(0.1))));
    expect(frame.kind).toBe('upright');
    expect(frame.residualPx).toBeGreaterThan(0.4);
    expect(frame.residualPx).toBeLessThan(1);
  });

  it('turns when the upright frame leaves more than 1 px and the turned one less than a third of it', () => {
    const frame = frameOf(corners(page(turnedBy(0.3))));
    expect(frame.kind).toBe('turned');
    expect(frame.parameters[4]).toBeCloseTo((0.3 * Math.PI) / 180, 10);
  });

  it('stays upright when turning helps by less than two thirds', () => {
    const frame = frameOf(shifted(corners(page(upright)), 2, [6, -4]));
    expect(frame.kind).toBe('upright');
    expect(frame.residualPx).toBeGreaterThan(1);
    expect(frame.residualPx).toBeLessThan(3);
  });

  it('stays turned when perspective would only take away 3 px or less', () => {
    const marks = corners(page(turnedBy(4)));
    expect(frameOf(shifted(marks, 2, [6, -4])).kind).toBe('turned');
    expect(frameOf(shifted(marks, 2, [6, -4])).residualPx).toBeLessThan(3);
    expect(frameOf(shifted(marks, 2, [18, -12])).kind).toBe('perspective');
  });

  it('is the one that is asked for', () => {
    const marks = corners(page(upright));
    for (const kind of ['upright', 'turned', 'perspective'] as const) expect(frameOf(marks, linear, kind).kind).toBe(kind);
  });

  it('is turned for a picture that lies on its side, which no upright frame can show', () => {
    const quarter = page(turnedBy(90));
    const frame = frameOf(corners(quarter));
    expect(frame.kind).toBe('turned');
    expect(far(toPixel(frame, [20, 30]), quarter.place([20, 30]))).toBeLessThan(1e-6);
  });
});

describe('marks with one value', () => {
  it('lie anywhere on the line of that value', () => {
    const marks: Mark[] = [
      { px: [62, 661.7], x: 0, y: 0 },
      { px: [976.1, 700], x: 70 },
      { px: [10, 35.3], y: 35 },
    ];
    const frame = frameOf(marks);
    expect(frame.kind).toBe('upright');
    expect(frame.residualPx).toBeNull();
    expect(toPixel(frame, [70, 35])).toEqual([expect.closeTo(976.1, 9), expect.closeTo(35.3, 9)]);
  });

  it('serve a turned frame and a perspective frame as well', () => {
    for (const [kind, lay] of [
      ['turned', turnedBy(7)],
      ['perspective', photographed(4e-4, 2e-4)],
    ] as const) {
      const page = pageOf(linear, [10, 70], [5, -35], lay);
      const places = (values: readonly (readonly [number, number])[]) => values.map((value) => ({ px: page.place(value), value }));
      const withX = places([
        [10, 5],
        [70, -3],
        [30, -35],
        [55, -20],
      ]).map(({ px, value }): Mark => ({ px, x: value[0] }));
      const withY = places([
        [12, 5],
        [70, -35],
        [40, -11],
        [22, -28],
      ]).map(({ px, value }): Mark => ({ px, y: value[1] }));
      const frame = frameOf([...withX, ...withY]);
      expect(frame.kind).toBe(kind);
      expect(far(toPixel(frame, [33, -9]), page.place([33, -9]))).toBeLessThan(1e-6);
    }
  });
});

describe('the residual of a frame', () => {
  it('is null when there are no more values than unknowns', () => {
    const page = pageOf(linear, [0, 70], [0, 35], photographed(3e-4, 1e-4));
    expect(frameOf(corners(page)).residualPx).toBeNull();
    expect(frameOf(corners(page), linear, 'upright').residualPx).toBeGreaterThan(3);
  });

  it('is the rms distance over all known values, in pixels and in the units of each axis', () => {
    // three x values on a line whose middle one is 3 px off: residuals 1, −2, 1 px; y exact; (1 + 4 + 1) / 5 values = 1.2 px²
    const marks: Mark[] = [
      { px: [100, 600], x: 0, y: 0 },
      { px: [503, 300], x: 40 },
      { px: [900, 100], x: 80, y: 50 },
    ];
    const frame = frameOf(marks, linear, 'upright');
    expect(frame.residualPx).toBeCloseTo(Math.sqrt(1.2), 10);
    expect(frame.residualInUnits.x).toBeCloseTo(Math.sqrt(2) / 10, 10);
    expect(frame.residualInUnits.y).toBeCloseTo(0, 10);
    expect(frame.markUncertaintyPx).toBeCloseTo(Math.sqrt(1.2), 10);
    expect(markResiduals(frame, marks).map(({ x }) => x?.toFixed(6))).toEqual(['-1.000000', '2.000000', '-1.000000']);
    expect(markResiduals(frame, marks)[1]?.y).toBeNull();
  });
});

describe('a doubt about a frame', () => {
  const typed = (x: number) => corners(pageOf(linear, [0, 70], [0, 35], upright)).map((mark, at) => (at === 1 ? { ...mark, x } : mark));

  it('is raised when one of four corners has a mistyped value, which a steep perspective explains without residual', () => {
    const frame = frameOf(typed(7));
    expect(frame.kind).toBe('perspective');
    expect(frameDoubt(frame, typed(7))).toMatch(/check the values typed/);
  });

  it('is raised when the marks lie far from their lines', () => {
    const frame = frameOf(typed(60), linear, 'upright');
    expect(frameDoubt(frame, typed(60))).toMatch(/^The marks lie \d+\.\d\u00A0px from the lines of their values/);
  });

  it('is not raised for a good frame or a fair photograph', () => {
    expect(frameDoubt(frameOf(typed(70)), typed(70))).toBeNull();
    const photo = corners(pageOf(linear, [0, 70], [0, 35], photographed(3e-4, 1e-4)));
    expect(frameDoubt(frameOf(photo), photo)).toBeNull();
  });
});
