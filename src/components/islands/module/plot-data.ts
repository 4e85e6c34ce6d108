import type { Pair, PlotCurve, PlotData } from '@/components/plot';
import { familyAtHotSide, isMatch, judge, type CandidateModel, type Duty, type FamilyPoint } from '@/lib/duty';
import { celsius, formatWithUnit, toKelvin } from '@/lib/units';

/** What a plot of a module can show. */
export const SHOWS = ['heat', 'voltage', 'cop'] as const;
export type Show = (typeof SHOWS)[number];

export const SHOW_NAMES: Readonly<Record<Show, string>> = { heat: 'Heat pumped', voltage: 'Voltage', cop: 'COP' };

/** Bands are this many standard uncertainties wide on either side. */
export const BAND_U = 2;

const Y_AXES: Readonly<Record<Show, PlotData['y']>> = {
  heat: { name: 'heat pumped', symbol: 'Qc', unit: 'W' },
  voltage: { name: 'voltage', symbol: 'V', unit: 'V' },
  cop: { name: 'COP', unit: '1' },
};

const label = (currentA: number) => formatWithUnit(Number(currentA.toPrecision(3)), 'A');

interface Drawn {
  readonly deltaTK: number;
  readonly value: number;
  readonly u: number;
}

/** A curve's values, none below zero: its end is where heat is zero but for rounding. */
const drawn = (points: readonly FamilyPoint[], show: Show): Drawn[] =>
  points.flatMap(({ deltaTK, ...values }) => {
    const read = values[show];
    return read === null ? [] : [{ deltaTK, value: Math.max(0, read.value), u: read.u ?? 0 }];
  });

/** A curve with its band, cut off above `highest` and below zero. */
function curve(points: readonly Drawn[], currentA: number, strong: boolean, highest: number): PlotCurve {
  const kept = points.filter(({ value }) => value <= highest);
  return {
    label: label(currentA),
    points: kept.map(({ deltaTK, value }): Pair => [deltaTK, value]),
    band: kept.map(({ deltaTK, value, u }) => [deltaTK, Math.max(0, value - BAND_U * u), Math.min(highest, value + BAND_U * u)] as const),
    strong,
  };
}

/** COP grows steeply towards ΔT = 0, where nobody needs a cooler: the plot ends at its largest value from this ΔT on, K. */
const COP_FROM_K = 15;

const highestCop = (families: readonly (readonly Drawn[])[]): number =>
  Math.max(0, ...families.flatMap((points) => points.flatMap(({ deltaTK, value }) => (deltaTK >= COP_FROM_K ? [value] : []))));

/** The current at which a module does a duty, A; null when it does not. */
export function currentAtDuty(model: CandidateModel, duty: Duty): number | null {
  const row = judge(duty, { model, maxTemperatureC: null, allowedCurrentA: null });
  return isMatch(row) ? row.current.value : null;
}

/** Where a duty lies in a plot against ΔT: at the value that the module has there; null where there is none. */
function dutyPoint(model: CandidateModel, duty: Duty, show: Show): PlotData['duty'] {
  const row = judge(duty, { model, maxTemperatureC: null, allowedCurrentA: null });
  const y = show === 'heat' ? duty.heatW : !isMatch(row) ? null : show === 'voltage' ? row.voltageV : (row.cop?.value ?? null);
  return y === null ? null : { x: duty.hotFaceC - duty.coldFaceC, y, label: 'duty' };
}

const POINTS = 61;

/** Curves of a module against ΔT with its hot side at `hotSideC`, smallest current first; the current of the duty drawn heavier. */
export function plotData(model: CandidateModel, hotSideC: number, currents: readonly number[], show: Show, duty: Duty | null): PlotData {
  const wanted = duty && currentAtDuty(model, duty);
  const all = [...new Set([...currents, ...(wanted === null ? [] : [wanted])])].sort((a, b) => a - b);
  const families = familyAtHotSide(model, toKelvin(celsius(hotSideC)), all, POINTS).map(({ points }) => drawn(points, show));
  const highest = (show === 'cop' && highestCop(families)) || Infinity;
  const curves = families.map((points, k) => curve(points, all[k]!, all[k] === wanted, highest));
  const point = duty && dutyPoint(model, duty, show);
  return {
    x: { name: 'temperature difference', symbol: 'ΔT', unit: 'K' },
    y: Y_AXES[show],
    curves: curves.filter(({ points }) => points.length > 1),
    duty: point && point.y <= highest ? point : null,
  };
}
