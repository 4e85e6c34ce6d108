import { describe, expect, it } from 'vitest';
import { condensation, dewPoint, isMatch, judge, saturationPressureHPa, type Candidate, type DutyMatch } from '@/lib/duty';
import { constantsFromRatings } from '@/lib/module';
import { celsius, kelvin } from '@/lib/units';

/**
 * Ten modules behind a heat sink.
 * Source: F. L. Tan, S. C. Fok, Energy Convers. Manage. 49 (2008) 1715-1723, Tables 1 and 3: ratings at 25 °C or 27 °C, and what each
 * runs at for 22 W at a cold face of 5 °C, 25 °C ambient and a sink of 0.15 K/W. Modules are given by neutral codes.
 * The paper's constants come from the ratings with T/K = t/°C + 273.
 */
const TAN_FOK = [
  { code: 'A1', hotC: 25, imaxA: 6, vmaxV: 15.4, dTmaxK: 67, runs: { hotFaceC: 32.2, I: 3.3, V: 8.0, COP: 0.84 } },
  { code: 'A2', hotC: 25, imaxA: 8.5, vmaxV: 15.4, dTmaxK: 65, runs: { hotFaceC: 31.9, I: 3.7, V: 6.6, COP: 0.91 } },
  { code: 'B1', hotC: 25, imaxA: 6.1, vmaxV: 15.9, dTmaxK: 70, runs: { hotFaceC: 31.8, I: 3.1, V: 7.6, COP: 0.95 } },
  { code: 'B2', hotC: 25, imaxA: 7.6, vmaxV: 15.9, dTmaxK: 70, runs: { hotFaceC: 31.5, I: 3.2, V: 6.6, COP: 1.04 } },
  { code: 'B3', hotC: 25, imaxA: 7.9, vmaxV: 15.7, dTmaxK: 69, runs: { hotFaceC: 31.5, I: 3.3, V: 6.5, COP: 1.02 } },
  { code: 'B4', hotC: 25, imaxA: 8.6, vmaxV: 15.7, dTmaxK: 69, runs: { hotFaceC: 31.5, I: 3.4, V: 6.2, COP: 1.04 } },
  { code: 'C1', hotC: 25, imaxA: 6, vmaxV: 17.5, dTmaxK: 71, runs: { hotFaceC: 31.6, I: 2.8, V: 7.8, COP: 1.01 } },
  { code: 'C2', hotC: 25, imaxA: 8.5, vmaxV: 17.5, dTmaxK: 70, runs: { hotFaceC: 31.3, I: 3.1, V: 6.5, COP: 1.08 } },
  { code: 'D1', hotC: 27, imaxA: 5.6, vmaxV: 14.7, dTmaxK: 66, runs: { hotFaceC: 33.0, I: 3.6, V: 8.7, COP: 0.71 } },
  { code: 'D2', hotC: 27, imaxA: 7.4, vmaxV: 14.7, dTmaxK: 66, runs: { hotFaceC: 32.1, I: 3.7, V: 7.0, COP: 0.86 } },
];
const CASE = { heatW: 22, coldFaceC: 5, ambientC: 25, sinkKPerW: 0.15 };

function candidateOf({ imaxA, vmaxV, dTmaxK, hotC }: (typeof TAN_FOK)[number]): Candidate {
  const found = constantsFromRatings({ imaxA, vmaxV, dTmaxK }, kelvin(hotC + 273));
  if (!found.ok) throw new Error(found.message);
  const { alpha, R, K } = found.constants;
  return {
    model: {
      form: 'constant',
      parameters: [alpha, R, K],
      covariance: [
        [0, 0, 0],
        [0, 0, 0],
        [0, 0, 0],
      ],
      misfit: { heatW: null, voltageV: null },
      tolerancePercent: null,
      validity: { I: [0, imaxA], deltaT: [0, dTmaxK], hotSideC: [hotC, hotC] },
    },
    maxTemperatureC: null,
    allowedCurrentA: null,
  };
}

/** The hot face settles where ambient + sink · heat rejected brings it. */
function behindSink(candidate: Candidate): { hotFaceC: number; match: DutyMatch } {
  let hotFaceC = CASE.ambientC;
  for (let turn = 0; turn < 100; turn += 1) {
    const row = judge({ heatW: CASE.heatW, coldFaceC: CASE.coldFaceC, hotFaceC }, candidate);
    if (!isMatch(row)) throw new Error(row.reasons[0]!.text);
    const next = CASE.ambientC + CASE.sinkKPerW * row.heatRejectedW;
    if (Math.abs(next - hotFaceC) < 1e-10) return { hotFaceC, match: row };
    hotFaceC = next;
  }
  throw new Error('the hot face did not settle');
}

describe('the duty search behind a heat sink, against Tan and Fok 2008', () => {
  it.each(TAN_FOK)('runs $code at the printed hot face, current, voltage and COP', (entry) => {
    const { hotFaceC, match } = behindSink(candidateOf(entry));
    // C2 is 31.35 °C and printed 31.3, a rounding edge: allow 0.06
    expect(Math.abs(hotFaceC - entry.runs.hotFaceC)).toBeLessThanOrEqual(0.06);
    expect(Math.abs(match.current.value - entry.runs.I)).toBeLessThanOrEqual(0.0501);
    expect(Math.abs(match.voltageV - entry.runs.V)).toBeLessThanOrEqual(0.0501);
    expect(Math.abs(match.cop!.value - entry.runs.COP)).toBeLessThanOrEqual(0.00501);
  });
});

/**
 * Dew points with the constants of O. A. Alduchov, R. E. Eskridge, J. Appl. Meteor. 35 (1996) 601, eq. 21, worked out by hand; the WMO form
 * (Sonntag 1990: 611.2 Pa, 17.62, 243.12) is an independent second voice that they must agree with to 0.01 K.
 */
const DEW = [
  { airC: 25, humidity: 50, dewC: 13.858, wmoC: 13.852 },
  { airC: 30, humidity: 60, dewC: 21.39, wmoC: 21.385 },
  { airC: 20, humidity: 80, dewC: 16.444, wmoC: 16.442 },
  { airC: 35, humidity: 90, dewC: 33.111, wmoC: 33.11 },
];

describe('the dew point, against worked values', () => {
  it.each(DEW)('is $dewC °C in air of $airC °C and $humidity %', ({ airC, humidity, dewC, wmoC }) => {
    expect(dewPoint(celsius(airC), humidity)).toBeCloseTo(dewC, 3);
    expect(Math.abs(dewPoint(celsius(airC), humidity) - wmoC)).toBeLessThan(0.01);
  });

  it('rests on a saturation pressure of 31.617 hPa at 25 °C', () => {
    expect(saturationPressureHPa(celsius(25))).toBeCloseTo(31.617, 3);
  });

  it('agrees over ice with the formula of Murphy and Koop to 0.1 K between −40 and 0 °C', () => {
    // D. M. Murphy, T. Koop, Q. J. R. Meteorol. Soc. 131 (2005) 1539, eq. 7: ln(e/Pa) = 9.550426 − 5723.265/T + 3.53068 ln T − 0.00728332 T
    const overIceHPa = (T: number) => Math.exp(9.550426 - 5723.265 / T + 3.53068 * Math.log(T) - 0.00728332 * T) / 100;
    for (const frostC of [-40, -30, -20, -10, -1]) {
      const humidity = (100 * overIceHPa(frostC + 273.15)) / saturationPressureHPa(celsius(5));
      expect(condensation(celsius(5), humidity).kind).toBe('frost');
      expect(Math.abs(condensation(celsius(5), humidity).celsius - frostC)).toBeLessThan(0.1);
    }
  });
});
