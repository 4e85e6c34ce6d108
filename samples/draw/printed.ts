import type { ModuleBody, Rating } from '@/lib/contracts';
import type { ReadingModule } from '@/lib/reading';
import type { ModulePlan } from './plan';
import type { Truth } from './truth';

const toDecimals = (value: number, digits: number) => Number(value.toFixed(digits));

/** Ratings are printed to few digits: 0.82 A, 3.4 A, 15.4 V, 144 W, whole kelvins. */
const roundings = {
  imaxA: (value: number) => toDecimals(value, value < 2 ? 2 : 1),
  vmaxV: (value: number) => toDecimals(value, value < 2 ? 2 : 1),
  qmaxW: (value: number) => toDecimals(value, value < 2 ? 2 : value < 100 ? 1 : 0),
  dTmaxK: (value: number) => toDecimals(value, 0),
};

/** What a maker who guarantees least values takes off. */
const LEAST = { qmaxW: 0.95, dTmaxK: 0.985 };

/** The ratings of one hot side as the sheet prints them: the truth by the sheet's meaning, its deliberate faults, rounded. */
export function printedRating(plan: ModulePlan, truth: Truth, hotSideC: number): Rating {
  const { imaxMeans = 'notStated', basis = 'notStated', atmosphere = 'notStated', tolerancePercent = null } = plan.rated ?? {};
  const real = truth.ratings(hotSideC);
  const mostHeat = imaxMeans === 'mostHeat';
  const least = basis === 'minimum' ? LEAST : { qmaxW: 1, dTmaxK: 1 };
  const values = {
    imaxA: mostHeat ? real.imaxMostHeat : real.imaxLargestDeltaT,
    vmaxV: real.vmaxV,
    qmaxW: (mostHeat ? real.qmaxMostHeat : real.qmaxLargestDeltaT) * least.qmaxW,
    dTmaxK: real.dTmaxK * least.dTmaxK,
  };
  const print = (key: keyof typeof values) => (plan.unrated?.includes(key) ? null : roundings[key](values[key] * (plan.fault?.[key] ?? 1)));
  return {
    hotSideC,
    imaxA: print('imaxA'),
    vmaxV: print('vmaxV'),
    qmaxW: print('qmaxW'),
    dTmaxK: print('dTmaxK'),
    imaxMeans,
    basis,
    atmosphere,
    tolerancePercent,
  };
}

/** Resistance for small alternating current, without leads: both faces at one temperature, so that no Peltier heat builds up. */
function acResistance({ build }: Truth, celsius: number): number {
  const { rho } = build.material(celsius + 273.15);
  return (2 * build.couples * (rho * build.legLengthM + 2 * build.contactOhmM2)) / build.legAreaM2;
}

/** Identity and ratings of a module as its sheet states them; null is "not stated". */
export function moduleBody(vendor: string, plan: ModulePlan, truth: Truth): ModuleBody {
  const unless = <T>(key: NonNullable<ModulePlan['leftOut']>[number], value: T) => (plan.leftOut?.includes(key) ? null : value);
  const acAt = plan.acResistanceAtC;
  return {
    vendor,
    partNumber: plan.partNumber,
    variant: plan.variant ?? '',
    stages: unless('stages', 1),
    couples: unless('couples', plan.couples),
    coldPlateMm: [...plan.plateMm],
    hotPlateMm: unless('hotPlateMm', [...(plan.hotPlateMm ?? plan.plateMm)] as [number, number]),
    heightMm: unless('heightMm', plan.heightMm),
    maxTemperatureC: plan.maxTemperatureC ?? null,
    leadsOhm: plan.leadsOhm ?? null,
    sealing: plan.sealing ?? null,
    acResistanceOhm: acAt === undefined ? null : Number(acResistance(truth, acAt).toPrecision(3)),
    acResistanceAtC: acAt ?? null,
    ratings: plan.ratedAt.map((side) => printedRating(plan, truth, side)),
  };
}

/** The fields that are stated. */
const stated = <T extends object>(fields: T) =>
  Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== null && value !== '')) as {
    [K in keyof T]?: NonNullable<T[K]>;
  };

/** The module as a reading document names it. Sealing has no place there. */
export function readingModule({ vendor, partNumber, ratings, sealing: _sealing, ...rest }: ModuleBody): ReadingModule {
  return { vendor, partNumber, ...stated(rest), rated: ratings.map(stated) };
}
