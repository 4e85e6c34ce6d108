import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { coldFaceCondensation, condensation, dewPoint, frostPoint, saturationPressureHPa } from '@/lib/duty';
import { celsius } from '@/lib/units';

const air = fc.double({ min: -30, max: 60, noNaN: true }).map(celsius);
const humidity = fc.double({ min: 1, max: 100, noNaN: true });

describe('dew point', () => {
  it('is the air temperature at 100 % and below it otherwise', () => {
    fc.assert(
      fc.property(air, (t) => {
        expect(dewPoint(t, 100)).toBeCloseTo(t, 9);
      }),
    );
    fc.assert(
      fc.property(air, fc.double({ min: 1, max: 99, noNaN: true }), (t, rh) => {
        expect(dewPoint(t, rh)).toBeLessThan(t);
      }),
    );
  });

  it('gives back the vapour pressure it was made from', () => {
    fc.assert(
      fc.property(air, humidity, (t, rh) => {
        expect(saturationPressureHPa(dewPoint(t, rh)) / ((saturationPressureHPa(t) * rh) / 100)).toBeCloseTo(1, 10);
      }),
    );
  });

  it('rises with the humidity', () => {
    fc.assert(
      fc.property(air, humidity, (t, rh) => {
        expect(dewPoint(t, rh + 0.01)).toBeGreaterThan(dewPoint(t, rh));
      }),
    );
  });
});

describe('what settles on a cold surface', () => {
  it('is ice, at a frost point above the dew point, where the dew point lies below 0 °C', () => {
    const found = condensation(celsius(5), 40);
    expect(found.kind).toBe('frost');
    expect(found.celsius).toBe(frostPoint(celsius(5), 40));
    expect(found.celsius).toBeGreaterThan(dewPoint(celsius(5), 40));
    expect(found.celsius).toBeLessThan(0);
  });

  it('goes from water to ice without a step larger than 0.01 K', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 40, noNaN: true }).map(celsius), (t) => {
        const atZero = (100 * saturationPressureHPa(celsius(0))) / saturationPressureHPa(t);
        expect(Math.abs(frostPoint(t, atZero))).toBeLessThan(0.01);
      }),
    );
  });

  it('tells by how many kelvin the cold face of a duty stays clear', () => {
    const duty = { heatW: 10, coldFaceC: 5, hotFaceC: 40, ambientC: 30, humidityPercent: 60 };
    expect(coldFaceCondensation(duty)).toMatchObject({ kind: 'dew' });
    expect(coldFaceCondensation(duty)!.reserveK).toBeCloseTo(5 - 21.39, 2);
  });

  it('tells nothing while the air or its humidity is not stated', () => {
    expect(coldFaceCondensation({ heatW: 10, coldFaceC: 5, hotFaceC: 40, ambientC: 30 })).toBeNull();
    expect(coldFaceCondensation({ heatW: 10, coldFaceC: 5, hotFaceC: 40, humidityPercent: 50 })).toBeNull();
  });
});
