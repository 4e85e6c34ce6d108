import { describe, expect, it } from 'vitest';
import { isMatch, judge, searchDuty, type Duty, type DutyMatch, type DutyMiss } from '@/lib/duty';
import { candidate, plainModel, type Named } from './support';

const duty: Duty = { heatW: 20, coldFaceC: 5, hotFaceC: 40 };

function matchOf(one: Named, asked: Duty = duty): DutyMatch<Named> {
  const row = judge(asked, one);
  if (!isMatch(row)) throw new Error(`a miss: ${row.reasons.map(({ text }) => text).join('; ')}`);
  return row;
}
function missOf(one: Named, asked: Duty): DutyMiss<Named> {
  const row = judge(asked, one);
  if (isMatch(row)) throw new Error('a match');
  return row;
}
const ordinarySpaces = ({ text }: { text: string }) => text.replaceAll('\u00A0', ' ');
const texts = (one: Named, asked: Duty) => missOf(one, asked).reasons.map(ordinarySpaces);

describe('why a module does not do a duty', () => {
  it('says what it reaches at its current of most heat', () => {
    expect(texts(candidate(), { ...duty, heatW: 60 })).toEqual(['reaches 44.6 W at 9.17 A']);
  });

  it('says that the ΔT is above its largest, with both', () => {
    expect(texts(candidate(), { ...duty, coldFaceC: -40 })).toEqual(['ΔT 80 K is above its largest, 75.2 K']);
  });

  it('says what current and voltage it needs and what the limits are', () => {
    expect(texts(candidate(), { ...duty, maxCurrentA: 3, maxVoltageV: 7 })).toEqual([
      'needs 3.64 A, the limit is 3 A',
      'needs 7.72 V, the limit is 7 V',
    ]);
  });

  it('never shows the needed value and the limit as the same number', () => {
    const needed = matchOf(candidate()).current.value;
    const [text] = texts(candidate(), { ...duty, maxCurrentA: needed * (1 - 1e-6) });
    const [, needs, limit] = /needs (.*), the limit is (.*)/.exec(text!)!;
    expect(needs).not.toBe(limit);
  });

  it('holds the hot face against the highest temperature of the sheet', () => {
    expect(texts(candidate({ maxTemperatureC: 35 }), duty)).toEqual(['its sheet allows 35 °C, the duty has 40 °C']);
  });

  it('holds the current against what the sheet allows', () => {
    expect(texts(candidate({ allowedCurrentA: 2.5 }), duty)).toEqual(['needs 3.64 A, its sheet allows 2.5 A']);
  });

  it('says that no pumping is wanted where more heat flows by itself', () => {
    expect(texts(candidate(), { heatW: 2, coldFaceC: 30, hotFaceC: 20 })).toEqual(['lets 6.6 W through without any current']);
  });

  it('lists the misses closest first and counts them by their first reason', () => {
    const small = candidate({ name: 'small', model: { parameters: [0.0531 / 4, 1.61 / 4, 0.66 / 4] } });
    const half = candidate({ name: 'half', model: { parameters: [0.0531 / 2, 1.61 / 2, 0.66 / 2] } });
    const plain = candidate({ maxTemperatureC: 39 });
    const { matches, misses, missCounts } = searchDuty({ ...duty, heatW: 40 }, [small, half, plain]);
    expect(matches).toEqual([]);
    expect(misses.map((miss) => miss.candidate.name)).toEqual(['plain', 'half', 'small']);
    expect(missCounts).toMatchObject({ heat: 2, temperature: 1, current: 0 });
  });
});

describe('a module that takes no power', () => {
  const warm: Duty = { heatW: 8, coldFaceC: 30, hotFaceC: 20 };

  it('is a match without a COP where a little current helps a downhill flow', () => {
    const match = matchOf(candidate(), warm);
    expect(match.cop).toBeNull();
    expect(match.powerW).toBeLessThanOrEqual(0);
  });

  it('comes before every COP', () => {
    const stiff = candidate({ name: 'stiff', model: { parameters: [0.05, 9, 0.1] } });
    expect(searchDuty(warm, [stiff, candidate()]).matches.map((match) => match.candidate.name)).toEqual(['plain', 'stiff']);
  });
});

describe('notes on a match', () => {
  const notes = (one: Named, asked: Duty = duty) => matchOf(one, asked).notes.map(ordinarySpaces);

  it('has none where the model holds', () => {
    expect(notes(candidate())).toEqual([]);
    expect(matchOf(candidate()).inside).toBe(true);
  });

  it('says where it leaves the currents, ΔT and hot sides that the model holds for', () => {
    const narrow = candidate({ model: { validity: { I: [1, 3], deltaT: [0, 30], hotSideC: [27, 27] } } });
    expect(notes(narrow)).toEqual([
      'current 3.64 A, the model holds from 1 A to 3 A',
      'ΔT 35 K, the model holds from 0 K to 30 K',
      'hot side 40 °C, the model holds at 27 °C',
    ]);
    expect(matchOf(narrow).inside).toBe(false);
  });

  it('says when the sheet states no highest temperature', () => {
    expect(notes(candidate({ maxTemperatureC: null }))).toEqual(['highest temperature not stated']);
  });

  it('says when a module at the low end of its tolerance may fail', () => {
    expect(notes(candidate(), { ...duty, maxCurrentA: 3.8 })).toEqual(['may not do it at the low end of its tolerance, ± 10 %']);
    expect(notes(candidate({ model: { tolerancePercent: null } }), { ...duty, maxCurrentA: 3.8 })).toEqual([]);
  });

  it('says when it runs above its current of largest ΔT', () => {
    const roomy = candidate({ model: { validity: { ...plainModel.validity, I: [0, 12] }, tolerancePercent: null } });
    expect(notes(roomy, { ...duty, heatW: 44.6 })).toEqual(['runs above its current of largest ΔT']);
    expect(matchOf(roomy, { ...duty, heatW: 44.6 }).shareOfImax).toBeGreaterThan(1);
  });
});
