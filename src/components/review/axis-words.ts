import type { BenchAxis, BenchChart, BenchFamily } from '@/lib/editor';
import type { RatingKey } from '@/lib/reading';
import { formatWithUnit, quantityName, quantitySymbol, unitSymbol } from '@/lib/units';

const RATINGS: Readonly<Record<RatingKey, string>> = { imaxA: 'Imax', vmaxV: 'Vmax', qmaxW: 'Qmax', dTmaxK: 'ΔTmax' };

/** What a rating is called: "Imax", "ΔTmax". */
export const ratingName = (key: RatingKey): string => RATINGS[key];

const symbolOf = (quantity: NonNullable<BenchFamily['quantity']>) =>
  quantitySymbol(quantity) === quantityName(quantity) ? '' : ` ${quantitySymbol(quantity)}`;

function shown({ quantity, unit, of }: BenchFamily): string {
  if (!quantity) return 'not said';
  const symbol = unit ? unitSymbol(unit) : '';
  const measure = of ? ` as a share of ${RATINGS[of]}` : '';
  return `${quantityName(quantity)}${symbolOf(quantity)}${measure}${symbol && ` in ${symbol}`}`;
}

/** "heat pumped Qc in W", "current I as a share of Imax in %, logarithmic". */
export const axisText = (axis: BenchAxis): string => `${shown(axis)}${axis.scale === 'log' ? ', logarithmic' : ''}`;

/** "curves by current I in A". */
export const familyText = ({ family }: Pick<BenchChart, 'family'>): string => `curves by ${shown(family)}`;

/** "hot side at 27 °C". */
export const sideText = ({ side }: Pick<BenchChart, 'side'>): string =>
  side.celsius === null ? `${side.kind} side not said` : `${side.kind} side at ${formatWithUnit(side.celsius, 'C')}`;
