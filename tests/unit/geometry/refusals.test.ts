import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitFrame, type FrameKind, type Mark, type Scales } from '@/lib/geometry';

const linear: Scales = { x: 'linear', y: 'linear' };
const logX: Scales = { x: 'log', y: 'linear' };

const origin: Mark = { px: [62, 662], x: 0, y: 0 };
const right: Mark = { px: [976, 662], x: 70 };
const top: Mark = { px: [62, 35], y: 35 };

function refusal(marks: readonly Mark[], scales: Scales = linear, force?: FrameKind) {
  const outcome = fitFrame(marks, scales, force);
  if (outcome.ok) throw new Error('a frame was found');
  return outcome;
}

describe('marks that cannot make a frame are answered with a sentence', () => {
  it.each<[string, Mark[], RegExp, number | undefined]>([
    ['none at all', [], /No mark has an x value yet: place two marks whose x values you know/, undefined],
    ['no y value', [{ px: [62, 662], x: 0 }, right], /No mark has a y value yet/, undefined],
    ['one x value', [origin, top], /Only one mark has an x value: place one more/, undefined],
    ['equal x values', [origin, { px: [500, 662], x: 0 }, top], /All marks with an x value say x = 0: place one with another/, undefined],
    ['equal y values', [origin, right, { px: [62, 35], y: 0 }], /All marks with a y value say y = 0/, undefined],
    [
      'a mark without a value',
      [origin, { px: [976, 662] }, top],
      /Mark 2 has neither an x value nor a y value: type one of them or remove the mark/,
      1,
    ],
    ['a value that is not a number', [origin, { px: [976, 662], x: NaN }, top], /Mark 2 has an x value that is not a number/, 1],
    ['a place that is not a number', [origin, right, { px: [62, Infinity], y: 35 }], /Mark 3 has no place on the picture/, 2],
    [
      'two on one spot',
      [origin, { px: [62.2, 662.1], x: 70 }, top],
      /Marks 1 and 2 stand on one spot but have different x values: move one/,
      1,
    ],
    ['x marks above one another', [origin, { px: [62.4, 300], x: 70 }, top], /stand in a line above one another/, undefined],
    ['y marks beside one another', [origin, right, { px: [500, 662.2], y: 35 }], /stand in a line beside one another/, undefined],
  ])('%s', (_, marks, message, at) => {
    const outcome = refusal(marks);
    expect(outcome.message).toMatch(message);
    expect(outcome.at).toBe(at);
  });

  it('zero on a log axis', () => {
    const outcome = refusal([origin, right, top], logX);
    expect(outcome).toMatchObject({
      at: 0,
      message: 'Mark 1 says x = 0, which a logarithmic axis does not reach: type a value above zero or make the axis linear.',
    });
  });

  it('a negative value on a log axis', () => {
    expect(refusal([{ ...origin, x: 1 }, { ...right, x: -10 }, top], logX)).toMatchObject({
      at: 1,
      message: expect.stringContaining('says x = −10'),
    });
  });

  it('too few for the kind that was asked for', () => {
    expect(refusal([origin, right, top], linear, 'turned').message).toBe(
      'A turned frame needs five known values and the marks give four: place another mark, best in a corner with both values.',
    );
    expect(refusal([origin, { ...right, y: 0 }, top], linear, 'perspective').message).toMatch(
      /needs eight known values and the marks give five/,
    );
  });

  it('four in a line for a perspective frame', () => {
    const marks = [0, 1, 2, 3].map((at): Mark => ({ px: [100 + 200 * at, 600 - 150 * at], x: 10 * at, y: 5 * at }));
    expect(refusal(marks, linear, 'perspective').message).toMatch(
      /stand too much in a line for a perspective frame: place marks in all four corners/,
    );
  });

  it('three of four in a line for a perspective frame', () => {
    const marks: Mark[] = [
      { px: [100, 600], x: 0, y: 0 },
      { px: [500, 600], x: 35, y: 0 },
      { px: [900, 600], x: 70, y: 0 },
      { px: [100, 100], x: 0, y: 35 },
    ];
    expect(refusal(marks, linear, 'perspective').message).toMatch(/place marks in all four corners/);
  });

  it('any marks whatever give a frame of finite numbers or a sentence, never an exception', () => {
    const value = fc.option(fc.oneof(fc.double(), fc.integer({ min: -3, max: 3 })), { nil: undefined });
    const place = fc.oneof(fc.double({ min: -10, max: 2000, noNaN: true }), fc.integer({ min: 0, max: 4 }), fc.double());
    const mark = fc.record({ px: fc.tuple(place, place), x: value, y: value });
    const scale = fc.constantFrom('linear' as const, 'log' as const);
    const kind = fc.constantFrom(undefined, 'upright' as const, 'turned' as const, 'perspective' as const);
    fc.assert(
      fc.property(fc.array(mark, { maxLength: 9 }), scale, scale, kind, (marks, x, y, force) => {
        const outcome = fitFrame(marks, { x, y }, force);
        if (!outcome.ok) expect(outcome.message).toMatch(/^[A-Z].*\.$/);
        else expect([...outcome.frame.parameters, ...outcome.frame.covariance.flat()].every(Number.isFinite)).toBe(true);
      }),
      { numRuns: 2000 },
    );
  });
});
