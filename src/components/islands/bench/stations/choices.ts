import type { Choice } from '@/components/ui/Select';
import { ratingOf, type BenchFamily, type ChartKind } from '@/lib/editor';
import type { RatingKey } from '@/lib/reading';
import { QUANTITIES, quantityName, quantitySymbol, unitsOf, unitSymbol, type Quantity, type Unit } from '@/lib/units';
import { RATING_SYMBOLS } from '../points/words';

/** The kinds of chart in words, and "something else". */
export const KIND_CHOICES: readonly Choice<ChartKind>[] = [
  { id: 'heat-deltaT', label: 'Heat over temperature difference' },
  { id: 'voltage-deltaT', label: 'Voltage over temperature difference' },
  { id: 'cop-deltaT', label: 'COP over temperature difference' },
  { id: 'heat-current', label: 'Heat over current' },
  { id: 'voltage-current', label: 'Voltage over current' },
  { id: 'cop-current', label: 'COP over current' },
];

/** Every quantity an axis may show, with its symbol. */
export const QUANTITY_CHOICES: readonly Choice<Quantity>[] = QUANTITIES.map((quantity) => ({
  id: quantity,
  label:
    quantityName(quantity) === quantitySymbol(quantity) ? quantityName(quantity) : `${quantitySymbol(quantity)}, ${quantityName(quantity)}`,
}));

/** A unit, or a share of a rating, as one choice: "W", "%:qmaxW". */
export type UnitChoice = string;

/** The unit of an axis or a family as its choice; null while nothing is stated. */
export const unitChoiceOf = ({ unit, of }: BenchFamily): UnitChoice | null => (unit ? (of ? `${unit}:${of}` : unit) : null);

/** What a choice of unit means for an axis or a family. */
export const unitOfChoice = (choice: UnitChoice): { unit: Unit; of: RatingKey | undefined } => {
  const [unit, of] = choice.split(':');
  return { unit: unit as Unit, of: of as RatingKey | undefined };
};

/** The units of a quantity, and its shares of the rating that sheets normalise it by. */
export const unitChoices = (quantity: Quantity | null): readonly Choice<UnitChoice>[] => {
  if (!quantity) return [];
  const rating = ratingOf(quantity);
  const plain = unitsOf(quantity).map((unit) => ({ id: unit, label: unitSymbol(unit) || 'no unit' }));
  if (!rating) return plain;
  const symbol = RATING_SYMBOLS[rating];
  return [...plain, { id: `1:${rating}`, label: `share of ${symbol}` }, { id: `%:${rating}`, label: `% of ${symbol}` }];
};
