import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { DUTY_FIELDS, dutyTexts, missSummary, parseDuty } from '@/lib/duty';
import { anyDuty } from './support';

const complete = { heat: '12,5', cold: '\u22125 °C', hot: '45' };

describe('parseDuty', () => {
  it('reads numbers as people type them', () => {
    expect(parseDuty(complete).duty).toEqual({ heatW: 12.5, coldFaceC: -5, hotFaceC: 45 });
    expect(parseDuty({ ...complete, current: '6 A', voltage: '12', air: '30', humidity: '60 %' }).duty).toEqual({
      heatW: 12.5,
      coldFaceC: -5,
      hotFaceC: 45,
      maxCurrentA: 6,
      maxVoltageV: 12,
      ambientC: 30,
      humidityPercent: 60,
    });
  });

  it('names what is still to be filled in, without a complaint', () => {
    expect(parseDuty({ hot: '45' })).toEqual({ duty: null, problems: {}, missing: ['heat to pump', 'cold face'] });
  });

  it('gives no duty while a field is wrong, even one that may be left out', () => {
    const { duty, problems } = parseDuty({ ...complete, current: 'much' });
    expect(duty).toBeNull();
    expect(problems.current).toMatch(/not a number/);
  });

  it('refuses what no duty can have: no heat, more than 100 % humidity', () => {
    const { problems } = parseDuty({ ...complete, heat: '0', humidity: '101' });
    expect(Object.keys(problems).sort()).toEqual(['heat', 'humidity']);
  });

  it('reads back every duty from its address to the last bit', () => {
    fc.assert(
      fc.property(anyDuty, (duty) => {
        const query = new URLSearchParams({ ...dutyTexts(duty) }).toString();
        expect(parseDuty(Object.fromEntries(new URLSearchParams(query))).duty).toEqual(duty);
      }),
    );
  });

  it('has one field for every value of a duty', () => {
    expect(new Set(DUTY_FIELDS.map(({ param }) => param)).size).toBe(DUTY_FIELDS.length);
    expect(new Set(DUTY_FIELDS.map(({ key }) => key)).size).toBe(7);
  });
});

describe('missSummary', () => {
  const none = { deltaT: 0, heat: 0, current: 0, allowedCurrent: 0, voltage: 0, temperature: 0, flowsAnyhow: 0 };

  it('counts by reason with the limits in it, one and several', () => {
    const duty = { heatW: 20, coldFaceC: 5, hotFaceC: 45, maxCurrentA: 6 };
    const text = missSummary(duty, { ...none, heat: 12, current: 1 }).replaceAll('\u00A0', ' ');
    expect(text).toBe('12 reach too little heat, 1 needs more than 6 A');
  });

  it('is empty when nothing misses', () => {
    expect(missSummary({ heatW: 20, coldFaceC: 5, hotFaceC: 45 }, none)).toBe('');
  });
});
