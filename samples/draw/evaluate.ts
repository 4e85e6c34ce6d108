import { fromBase, toBase, type Unit } from '@/lib/units';
import type { Layer, Made, Panel, XQuantity } from './plan';

/** A curve in the units of its axes, densely, in order along the line. */
export interface DataCurve {
  readonly value: number;
  readonly points: readonly (readonly [x: number, y: number])[];
}

const SAMPLES = 160;
const ratingOf = ({ body }: Made, hotSideC: number, key: keyof (typeof body.ratings)[number]) => {
  const rating = body.ratings.find((row) => row.hotSideC === hotSideC)?.[key];
  if (typeof rating !== 'number') throw new Error(`${body.partNumber} prints no ${key} at ${hotSideC} °C.`);
  return rating;
};

const share = (unit: Unit) => (unit === '%' ? 100 : 1);

/** A family value in A or K. */
export function familyInBase(made: Made, layer: Layer, value: number): number {
  if (layer.familyOf) return (value / share(layer.familyUnit)) * ratingOf(made, layer.hotSideC, layer.familyOf);
  return toBase(value, layer.family, layer.familyUnit);
}

const answerInUnit = (made: Made, layer: Layer, value: number) =>
  layer.yOf ? (value / ratingOf(made, layer.hotSideC, layer.yOf)) * share(layer.unit) : fromBase(value, layer.answer, layer.unit);

/** Current and temperature difference where x (base units) and the family value (base units) meet. */
const stateAt = (layer: Layer, x: XQuantity, at: number, family: number) => {
  if (x === 'I') return { current: at, deltaT: family };
  return { current: family, deltaT: x === 'Tc' ? layer.hotSideC + 273.15 - at : at };
};

function answerAt({ truth }: Made, { answer, hotSideC }: Layer, current: number, deltaT: number): number {
  if (answer === 'V') return truth.voltage(current, hotSideC, deltaT);
  const heat = truth.heat(current, hotSideC, deltaT);
  return answer === 'Qc' ? heat : heat / (current * truth.voltage(current, hotSideC, deltaT));
}

/** The stretch of x (base units) over which a maker draws a curve: while heat is pumped, and voltage up to the largest difference. */
function stretchOf(made: Made, layer: Layer, x: XQuantity, family: number): readonly [number, number] {
  const { truth } = made;
  const side = layer.hotSideC;
  if (x === 'I') {
    const most = truth.ratings(side).imaxLargestDeltaT;
    return layer.answer === 'V' ? [0, most] : [truth.leastCurrent(side, family), most];
  }
  const reach = layer.answer === 'V' ? Math.floor(truth.ratings(side).dTmaxK) : truth.reach(family, side) * 0.996;
  return x === 'Tc' ? [side + 273.15 - reach, side + 273.15] : [0, reach];
}

/** The curves of one layer of a panel, from the truth. */
export function curvesOf(made: Made, { x, xUnit }: Panel, layer: Layer): readonly DataCurve[] {
  return layer.values.map((value) => {
    const family = familyInBase(made, layer, value);
    const [from, to] = stretchOf(made, layer, x, family);
    const points = Array.from({ length: SAMPLES + 1 }, (_, at) => {
      const where = from + ((to - from) * at) / SAMPLES;
      const { current, deltaT } = stateAt(layer, x, where, family);
      const known = current > 0 || layer.answer === 'V';
      const y = known ? answerInUnit(made, layer, answerAt(made, layer, current, deltaT)) : 0;
      return [fromBase(where, x, xUnit), y] as const;
    });
    return { value, points };
  });
}
