import { describe, expect, it } from 'vitest';
import type { Px } from '@/lib/geometry';
import { followLine, type FollowOptions, type Followed } from '@/lib/trace';
import { bilevel, blank, errors, fill, grid, meanSize, noisy, shaded, stroke, turned, worst, type Drawn } from './drawing';

const BLACK = [0, 0, 0] as const;
const curve = (x: number) => 60 + 0.35 * x + 0.0006 * x * x;
const solid = { y: curve, from: 20, to: 280, thickness: 1.7, colour: BLACK };

function follow(drawn: Drawn, start: Px, options?: FollowOptions): Extract<Followed, { ok: true }> {
  const followed = followLine(drawn, start, options);
  if (!followed.ok) throw new Error(followed.message);
  return followed;
}

const at = (x: number): Px => [x, curve(x)];
const span = (points: readonly Px[]) => [Math.min(...points.map(([x]) => x)), Math.max(...points.map(([x]) => x))] as const;
const longestStep = (points: readonly Px[]) =>
  Math.max(...points.slice(1).map(([x, y], k) => Math.hypot(x - points[k]![0], y - points[k]![1])));

describe('centres', () => {
  it('are at half pixels: a one-pixel line in column 10 is at 10.5', () => {
    const drawn = fill(blank(40, 80), BLACK, (x, y) => Math.floor(x) === 10 && y > 8 && y < 72);
    const { points } = follow(drawn, [10.5, 40]);
    expect(points.length).toBeGreaterThan(60);
    for (const [x] of points) expect(x).toBe(10.5);
  });

  it('are at half pixels in rows too', () => {
    const drawn = fill(blank(80, 40), BLACK, (x, y) => Math.floor(y) === 20 && x > 8 && x < 72);
    for (const [, y] of follow(drawn, [40, 21]).points) expect(y).toBe(20.5);
  });

  it('lie on an antialiased line to a few thousandths of a pixel, at most 2 px apart, to both ends', () => {
    const { points, gaps } = follow(stroke(blank(300, 260), solid), at(150));
    expect(meanSize(errors(points, curve))).toBeLessThan(0.01);
    expect(worst(errors(points, curve))).toBeLessThan(0.06);
    expect(longestStep(points)).toBeLessThanOrEqual(2);
    expect(gaps).toEqual([]);
    expect(span(points)[0]).toBeLessThan(22.5);
    expect(span(points)[1]).toBeGreaterThan(277.5);
  });

  it('agree within 0.02 px after a quarter turn', () => {
    const drawn = stroke(grid(blank(300, 260), 50, [200, 200, 200]), solid);
    const { points } = follow(drawn, at(150));
    const [x, y] = at(150);
    const back = follow(turned(drawn), [260 - y, x]).points.map(([px, py]): Px => [py, 260 - px]);
    const byColumn = new Map(back.map(([bx, by]) => [Math.round(bx * 2), by]));
    const apart = points.flatMap(([px, py]) => (byColumn.has(Math.round(px * 2)) ? [py - byColumn.get(Math.round(px * 2))!] : []));
    expect(apart.length).toBeGreaterThan(240);
    expect(worst(apart)).toBeLessThan(0.02);
  });

  it('agree within 0.05 px after a change of hue at equal contrast', () => {
    const hues = [
      [200, 30, 30],
      [30, 200, 30],
      [30, 30, 200],
    ] as const;
    const followed = hues.map((colour) => follow(stroke(grid(blank(300, 260), 50, [200, 200, 200]), { ...solid, colour }), at(150)).points);
    for (const other of followed.slice(1)) {
      const ys = new Map(other.map(([x, y]) => [x, y]));
      const apart = followed[0]!.flatMap(([x, y]) => (ys.has(x) ? [y - ys.get(x)!] : []));
      expect(apart.length).toBeGreaterThan(240);
      expect(worst(apart)).toBeLessThan(0.05);
    }
  });
});

describe('a line goes on', () => {
  it('straight through one of its own colour', () => {
    const falling = (x: number) => 230 - 0.6 * x;
    const drawn = stroke(stroke(blank(300, 260), solid), { ...solid, y: falling });
    expect(worst(errors(follow(drawn, at(60)).points, curve))).toBeLessThan(0.25);
    expect(worst(errors(follow(drawn, [60, falling(60)]).points, falling))).toBeLessThan(0.25);
    expect(span(follow(drawn, at(60)).points)[1]).toBeGreaterThan(277);
  });

  it('through one that lies over it in another colour', () => {
    const flat = (x: number) => 100 + 0.1 * x;
    const drawn = stroke(stroke(blank(300, 260), { ...solid, colour: [20, 90, 180] }), {
      ...solid,
      y: flat,
      colour: [210, 120, 0],
      thickness: 3,
    });
    const { points } = follow(drawn, at(60));
    expect(worst(errors(points, curve))).toBeLessThan(0.25);
    expect(span(points)[1]).toBeGreaterThan(277);
  });

  it('through a grid darker than itself', () => {
    const drawn = stroke(grid(blank(300, 260), 40, BLACK), { ...solid, colour: [120, 150, 220], thickness: 2 });
    const { points } = follow(drawn, at(150));
    expect(meanSize(errors(points, curve))).toBeLessThan(0.05);
    expect(span(points)[0]).toBeLessThan(24);
    expect(span(points)[1]).toBeGreaterThan(276);
  });

  it.each<[string, (x: number) => boolean, number]>([
    ['dashes', (x) => x % 14 < 9, 12],
    ['dots', (x) => x % 6 < 3, 20],
    ['dashes and dots', (x) => x % 20 < 9 || (x % 20 > 13 && x % 20 < 16), 15],
  ])('over %s, whose gaps are counted in one entry and have no points', (_, shows, fewest) => {
    const drawn = stroke(blank(300, 260), { ...solid, thickness: 2, shows });
    const { points, gaps } = follow(drawn, at(148));
    const dashes = gaps.filter(({ why }) => why === 'dash');
    expect(dashes).toHaveLength(1);
    expect(dashes[0]!.count).toBeGreaterThanOrEqual(fewest);
    expect(worst(errors(points, curve))).toBeLessThan(0.5);
    for (const [x] of points) expect(shows(x - 1) || shows(x) || shows(x + 1)).toBe(true);
    expect(span(points)[0]).toBeLessThan(40);
    expect(span(points)[1]).toBeGreaterThan(260);
  });

  it('beyond a label set into it, with a gap that says so', () => {
    const drawn = fill(stroke(blank(300, 260), solid), [255, 255, 255], (x, y) => x > 130 && x < 152 && Math.abs(y - curve(141)) < 20);
    const { points, gaps } = follow(drawn, at(200));
    expect(gaps).toHaveLength(1);
    expect(gaps[0]!.why).toBe('label');
    expect(points.some(([x]) => x > 132 && x < 150)).toBe(false);
    expect(span(points)[0]).toBeLessThan(23);
  });

  it('through markers, with gaps that say so', () => {
    const drawn = stroke(blank(300, 260), solid);
    for (const x of [60, 110, 160, 210]) fill(drawn, BLACK, (px, py) => Math.hypot(px - x, py - curve(x)) < 4.5);
    const { points, gaps } = follow(drawn, at(135));
    expect(gaps.filter(({ why }) => why === 'marker').length).toBeGreaterThanOrEqual(3);
    expect(worst(errors(points, curve))).toBeLessThan(0.6);
    expect(meanSize(errors(points, curve))).toBeLessThan(0.06);
    expect(span(points)[0]).toBeLessThan(23);
  });

  it('around the top of a steep arch', () => {
    const arch = (x: number) => 40 + 0.03 * (x - 150) ** 2;
    const drawn = stroke(blank(300, 260), { ...solid, y: arch, from: 70, to: 230 });
    const { points } = follow(drawn, [190, arch(190)]);
    expect(span(points)[0]).toBeLessThan(73);
    expect(span(points)[1]).toBeGreaterThan(227);
    expect(meanSize(errors(points, arch))).toBeLessThan(0.03);
    expect(longestStep(points)).toBeLessThanOrEqual(2);
  });
});

describe('neighbours', () => {
  it.each([4, 5, 7])('%i px apart stay apart', (apart) => {
    const drawn = blank(300, 260);
    for (const k of [-1, 0, 1]) stroke(drawn, { ...solid, y: (x) => curve(x) + k * apart * Math.hypot(1, 0.5) });
    const { points } = follow(drawn, at(150));
    expect(worst(errors(points, curve))).toBeLessThan(0.3);
    expect(span(points)[0]).toBeLessThan(24);
    expect(span(points)[1]).toBeGreaterThan(276);
  });
});

describe('an end', () => {
  it('is where the ink ends, though another line lies on beyond', () => {
    const drawn = stroke(stroke(blank(300, 260), { ...solid, to: 150 }), { ...solid, y: (x) => curve(x) + 12, from: 165 });
    const { points } = follow(drawn, at(80));
    expect(span(points)[1]).toBeGreaterThan(147);
    expect(span(points)[1]).toBeLessThanOrEqual(150.5);
  });

  it('is above the axis that the line stops short of', () => {
    const drawn = fill(stroke(blank(300, 260), { ...solid, to: 200 }), BLACK, (_, y) => Math.floor(y) === Math.floor(curve(200)) + 3);
    const { points } = follow(drawn, at(80));
    expect(span(points)[1]).toBeLessThanOrEqual(201);
    expect(worst(errors(points, curve))).toBeLessThan(0.3);
  });

  it('may be given by bounds', () => {
    const { points } = follow(stroke(blank(300, 260), solid), at(150), { bounds: { left: 100, top: 0, right: 200, bottom: 260 } });
    expect(span(points)[0]).toBeGreaterThanOrEqual(100);
    expect(span(points)[1]).toBeLessThanOrEqual(200);
  });
});

describe('bad pictures', () => {
  const clean = stroke(grid(blank(300, 260), 50, [200, 200, 200]), { ...solid, thickness: 2.4 });
  it.each<[string, Drawn, number]>([
    ['noise', noisy(clean, 14, 3), 0.06],
    ['a bilevel fax', bilevel(clean), 0.12],
    ['uneven light', shaded(clean), 0.03],
    ['one-pixel lines without antialiasing', bilevel(stroke(blank(300, 260), { ...solid, thickness: 1 })), 0.15],
  ])('%s: the centre line is still found', (_, drawn, most) => {
    const { points } = follow(drawn, at(150));
    expect(meanSize(errors(points, curve))).toBeLessThan(most);
    expect(span(points)[0]).toBeLessThan(25);
    expect(span(points)[1]).toBeGreaterThan(275);
  });
});

describe('a start', () => {
  it('on blank paper is refused with a sentence', () => {
    const followed = followLine(stroke(blank(300, 260), solid), [150, 30]);
    expect(followed).toEqual({ ok: false, message: expect.stringMatching(/^There is no line within 6 pixels of 150\.0, 30\.0: .+\.$/) });
  });

  it('4 px beside the line takes the line, one 9 px beside is refused', () => {
    const drawn = stroke(blank(300, 260), solid);
    expect(meanSize(errors(follow(drawn, [150, curve(150) + 4]).points, curve))).toBeLessThan(0.02);
    expect(followLine(drawn, [150, curve(150) + 11]).ok).toBe(false);
  });

  it('gives the same points wherever on the line it is', () => {
    const drawn = stroke(blank(300, 260), solid);
    const [one, other] = [follow(drawn, at(70)).points, follow(drawn, at(240)).points];
    const ys = new Map(other.map(([x, y]) => [x, y]));
    const apart = one.flatMap(([x, y]) => (ys.has(x) ? [y - ys.get(x)!] : []));
    expect(apart.length).toBeGreaterThan(245);
    expect(worst(apart)).toBeLessThan(0.02);
  });
});

describe('a place to pass', () => {
  it('leads the curve on over a gap that following does not dare', () => {
    const drawn = stroke(blank(500, 500), { ...solid, to: 480, shows: (x) => x < 150 || x > 320 });
    expect(span(follow(drawn, at(100)).points)[1]).toBeLessThan(152);
    const { points, gaps, doubts } = follow(drawn, at(100), { through: [at(400)] });
    expect(span(points)[1]).toBeGreaterThan(476);
    expect(span(points)[0]).toBeLessThan(23);
    expect(points.some(([x]) => x > 152 && x < 318)).toBe(false);
    expect(gaps).toHaveLength(1);
    expect(doubts.map(({ why }) => why)).toContain('gap');
  });

  it('on blank paper is refused', () => {
    expect(followLine(stroke(blank(300, 260), solid), at(100), { through: [[200, 20]] })).toMatchObject({ ok: false });
  });
});
