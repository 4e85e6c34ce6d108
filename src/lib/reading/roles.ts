import type { Answer } from '@/lib/fit';
import { quantityName, toKelvin, celsius, type Kelvin, type Quantity } from '@/lib/units';

/** Where a quantity stands on a chart. */
export type Place = 'x' | 'y' | 'family';

/** What each of the three quantities of a chart is for: one electrical and one thermal are given, the third is the answer. */
export interface ChartRoles {
  readonly electrical: { readonly place: Place; readonly quantity: 'I' | 'V' };
  readonly thermal: { readonly place: Place; readonly quantity: 'deltaT' | 'Tc' | 'Th' };
  readonly answer: { readonly place: Place; readonly quantity: Answer };
  /** The side that the whole chart holds at one temperature. */
  readonly side: { readonly kind: 'hot' | 'cold'; readonly kelvin: Kelvin };
}

/** As much of a chart as its roles depend on. */
export interface ChartQuantities {
  readonly x: { readonly quantity: Quantity };
  readonly y: { readonly quantity: Quantity };
  readonly family: { readonly quantity: Quantity };
  readonly hotSideC?: number | undefined;
  readonly coldSideC?: number | undefined;
}

/** The roles of a chart's quantities, or one sentence on why they make no chart. */
export type RolesOutcome = { readonly ok: true; readonly roles: ChartRoles } | { readonly ok: false; readonly message: string };

const PLACES: readonly Place[] = ['x', 'y', 'family'];
const isElectrical = (quantity: Quantity): quantity is 'I' | 'V' => quantity === 'I' || quantity === 'V';
const isThermal = (quantity: Quantity): quantity is 'deltaT' | 'Tc' | 'Th' =>
  quantity === 'deltaT' || quantity === 'Tc' || quantity === 'Th';

const RULE =
  'Of x, y and family one must be electrical (current or voltage), one thermal (temperature difference, cold side or hot side) and the third the answer (heat pumped, heat rejected, power, COP, or the other of current and voltage).';

const refuse = (message: string): RolesOutcome => ({ ok: false, message });

function sideOf({ hotSideC, coldSideC }: ChartQuantities): ChartRoles['side'] | string {
  if (hotSideC !== undefined && coldSideC !== undefined)
    return 'A chart is drawn for one side at one temperature: give hotSideC or coldSideC, not both.';
  if (hotSideC !== undefined) return { kind: 'hot', kelvin: toKelvin(celsius(hotSideC)) };
  if (coldSideC !== undefined) return { kind: 'cold', kelvin: toKelvin(celsius(coldSideC)) };
  return 'Say which side of the module the chart holds at one temperature: give hotSideC or coldSideC.';
}

/**
 * Which of a chart's three quantities is electrical, which thermal and which the answer. Of current and voltage the one that is given is the
 * family or stands on x where the other stands on y; with a thermal y axis the voltage is the answer.
 */
export function rolesOf(chart: ChartQuantities): RolesOutcome {
  const side = sideOf(chart);
  if (typeof side === 'string') return refuse(side);
  const shown = PLACES.map((place) => ({ place, quantity: chart[place].quantity }));
  const twice = shown.find(({ quantity }, at) => shown.findIndex((other) => other.quantity === quantity) !== at);
  if (twice) return refuse(`The ${quantityName(twice.quantity)} stands on two of x, y and family. ${RULE}`);

  const thermal = shown.filter(({ quantity }) => isThermal(quantity));
  const electrical = shown.filter(({ quantity }) => isElectrical(quantity));
  const [hot] = thermal;
  if (thermal.length !== 1 || !hot || electrical.length === 0) {
    return refuse(`This chart shows ${shown.map(({ quantity }) => quantityName(quantity)).join(', ')}. ${RULE}`);
  }
  const held = side.kind === 'hot' ? 'Th' : 'Tc';
  if (hot.quantity === held) {
    return refuse(
      `The ${quantityName(held)} is held at one temperature for the whole chart, so it cannot be on an axis or tell the curves apart as well.`,
    );
  }
  const answer = shown.find(({ quantity }) => !isThermal(quantity) && !isElectrical(quantity)) ?? answerOfTwo(electrical);
  const given = electrical.find(({ place }) => place !== answer.place);
  if (!given) return refuse(RULE);
  return { ok: true, roles: { electrical: given, thermal: hot, answer, side } as ChartRoles };
}

type Shown = { readonly place: Place; readonly quantity: Quantity };

/** Of current and voltage on one chart: the one on y is the answer, else the voltage. */
const answerOfTwo = (electrical: readonly Shown[]): Shown =>
  electrical.find(({ place }) => place === 'y') ?? electrical.find(({ quantity }) => quantity === 'V') ?? electrical[0]!;
