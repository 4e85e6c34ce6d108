import type { RatingKey } from '@/lib/reading';
import type { Quantity, Unit } from '@/lib/units';
import { unitsOf } from '@/lib/units';
import type { BenchChart } from './document';

/** The charts that sheets usually carry: each sets both axes and the family at once. */
export type ChartKind = 'heat-deltaT' | 'voltage-deltaT' | 'cop-deltaT' | 'heat-current' | 'voltage-current' | 'cop-current';

type Triple = { readonly x: Quantity; readonly y: Quantity; readonly family: Quantity };

const KINDS: Readonly<Record<ChartKind, Triple>> = {
  'heat-deltaT': { x: 'deltaT', y: 'Qc', family: 'I' },
  'voltage-deltaT': { x: 'deltaT', y: 'V', family: 'I' },
  'cop-deltaT': { x: 'deltaT', y: 'COP', family: 'I' },
  'heat-current': { x: 'I', y: 'Qc', family: 'deltaT' },
  'voltage-current': { x: 'I', y: 'V', family: 'deltaT' },
  'cop-current': { x: 'I', y: 'COP', family: 'deltaT' },
};

/** Every kind, in the order to offer them. */
export const CHART_KINDS = Object.keys(KINDS) as readonly ChartKind[];

/** The kind whose axes and family a chart has, or null for any other combination. */
export const kindOf = (chart: BenchChart): ChartKind | null =>
  CHART_KINDS.find((kind) => (['x', 'y', 'family'] as const).every((place) => chart[place].quantity === KINDS[kind][place])) ?? null;

/** The unit a quantity is usually printed in. */
export const usualUnit = (quantity: Quantity): Unit => unitsOf(quantity)[0] ?? '1';

/** The three quantities of a kind, each in its usual unit. */
export const kindAxes = (kind: ChartKind) => {
  const { x, y, family } = KINDS[kind];
  const of = (quantity: Quantity) => ({ quantity, unit: usualUnit(quantity) });
  return { x: of(x), y: of(y), family: of(family) };
};

const RATING_OF: Readonly<Partial<Record<Quantity, RatingKey>>> = { I: 'imaxA', V: 'vmaxV', Qc: 'qmaxW', deltaT: 'dTmaxK' };

/** The rating a quantity is normalised by on sheets, or null where that is not done. */
export const ratingOf = (quantity: Quantity | null): RatingKey | null => (quantity ? (RATING_OF[quantity] ?? null) : null);
