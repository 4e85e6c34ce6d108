import { baseUnitsPer, fromBase, toBase, toFraction, unitsOf, type Quantity } from '@/lib/units';
import type { ReadingChart, ReadingFamily, ReadingModule } from './document';
import type { RatingKey } from './quantities';
import type { Place } from './roles';

/** From a chart's own numbers to base units and back: base = toBase(value); `perUnit` is the slope, in base units per unit of the chart. */
export interface Conversion {
  readonly toBase: (value: number) => number;
  readonly fromBase: (value: number) => number;
  readonly perUnit: number;
}

/** Which quantities a rating can be the measure of. */
const MEASURES: Readonly<Record<RatingKey, readonly Quantity[]>> = {
  imaxA: ['I'],
  vmaxV: ['V'],
  qmaxW: ['Qc', 'Qh', 'P'],
  dTmaxK: ['deltaT'],
};

/** Two printed temperatures of one side are the same within this, K. */
const SAME_SIDE_K = 0.05;

/** The rating of a module at a chart's hot side; undefined when it is not stated there. */
export function ratingAt(module: ReadingModule, chart: Pick<ReadingChart, 'hotSideC'>, key: RatingKey): number | undefined {
  const { hotSideC } = chart;
  if (hotSideC === undefined) return undefined;
  return module.rated?.find(
    (rated) => rated.hotSideC !== undefined && Math.abs(rated.hotSideC - hotSideC) <= SAME_SIDE_K && rated[key] !== undefined,
  )?.[key];
}

/** What is wrong with the unit or the normalisation of an axis or family: the key meant and a sentence; null when nothing is. */
export function unitFault(
  shown: ReadingFamily,
  chart: ReadingChart,
  module: ReadingModule,
): { key: 'unit' | 'of'; message: string } | null {
  const { quantity, unit, of } = shown;
  const isShare = (unit === '%' || unit === '1') && Object.values(MEASURES).some((quantities) => quantities.includes(quantity));
  if (of === undefined) {
    if (unitsOf(quantity).includes(unit)) return null;
    return isShare
      ? {
          key: 'of',
          message: `A share needs the rating it is a share of: add "of", for instance "imaxA", or use one of: ${unitsOf(quantity).join(', ')}.`,
        }
      : { key: 'unit', message: `${quantity} cannot be in ${unit}; use one of: ${unitsOf(quantity).join(', ')}.` };
  }
  if (unit !== '1' && unit !== '%') return { key: 'unit', message: `A share of ${of} has the unit "1" or "%".` };
  if (!MEASURES[of].includes(quantity))
    return { key: 'of', message: `${quantity} is not a share of ${of}: that rating measures ${MEASURES[of].join(', ')}.` };
  if (ratingAt(module, chart, of) !== undefined) return null;
  return chart.hotSideC === undefined
    ? { key: 'of', message: 'Ratings are printed for a hot side, so only a chart with hotSideC can be in shares of one.' }
    : {
        key: 'of',
        message: `The module has no ${of} rated at ${chart.hotSideC}\u00A0°C: add it to "rated", or give the axis in its own unit.`,
      };
}

/** The conversion of an axis or the family of a chart that has no {@link unitFault}. */
export function conversionOf(chart: ReadingChart, place: Place, module: ReadingModule): Conversion {
  const { quantity, unit, of } = chart[place];
  if (of === undefined) {
    return {
      toBase: (value) => toBase(value, quantity, unit),
      fromBase: (value) => fromBase(value, quantity, unit),
      perUnit: baseUnitsPer(quantity, unit),
    };
  }
  const perUnit = (ratingAt(module, chart, of) ?? NaN) * toFraction(1, unit === '%' ? '%' : '1');
  return { toBase: (value) => value * perUnit, fromBase: (value) => value / perUnit, perUnit };
}
