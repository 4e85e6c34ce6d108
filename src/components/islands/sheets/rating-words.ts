import type { Rating } from '@/lib/contracts';
import type { Choice } from '@/components/ui/Select';

/** A way of choosing, and one line on what the trade means by it. */
export interface Meaning<Id extends string> extends Choice<Id> {
  readonly means: string;
}

/** Sheets mean three things by Imax; they differ by a few per cent with real material, by more as makers count. */
export const IMAX_MEANS: readonly Meaning<Rating['imaxMeans']>[] = [
  { id: 'notStated', label: 'not stated', means: 'Sheets mean different currents by Imax; leave it so when yours does not say which.' },
  { id: 'largestDeltaT', label: 'largest ΔT', means: 'The current that gives the largest temperature difference at this hot side.' },
  {
    id: 'mostHeat',
    label: 'most heat',
    means: 'The current that pumps the most heat without a temperature difference; a few per cent above the other.',
  },
  { id: 'allowed', label: 'allowed', means: 'The current that the maker allows, whatever it does for cooling.' },
];

export const BASIS: readonly Meaning<Rating['basis']>[] = [
  {
    id: 'notStated',
    label: 'not stated',
    means: 'Whether these are typical or guaranteed values; leave it so when the sheet does not say.',
  },
  { id: 'typical', label: 'typical', means: 'What a usual module does; some do more and some less.' },
  { id: 'minimum', label: 'minimum', means: 'What every delivered module does at least.' },
  { id: 'calculated', label: 'calculated', means: 'Worked out from constants of the material, not measured on modules.' },
  { id: 'measured', label: 'measured', means: 'Measured on modules of this kind.' },
];

export const ATMOSPHERE: readonly Meaning<Rating['atmosphere']>[] = [
  { id: 'notStated', label: 'not stated', means: 'What is between the faces carries heat back; leave it so when the sheet does not say.' },
  { id: 'vacuum', label: 'vacuum', means: 'Nothing between the faces carries heat back: ΔTmax is at its largest.' },
  { id: 'dryNitrogen', label: 'dry nitrogen', means: 'The gas carries some heat back: ΔTmax is smaller than in vacuum.' },
  { id: 'air', label: 'air', means: 'As in use: carries some heat back like nitrogen, and brings water with it.' },
];

/** One line for each number that is printed. */
export const RATED = {
  hotSideC: 'The temperature of the hot side at which all of these hold.',
  imaxA: 'The largest current of the sheet; say below which one is meant.',
  vmaxV: 'The voltage at Imax and ΔTmax.',
  qmaxW: 'The heat pumped at Imax without a temperature difference.',
  dTmaxK: 'The temperature difference at Imax when no heat is pumped.',
  tolerancePercent: 'How far a delivered module may differ from these, either way; not how well the sheet was read.',
} as const;

export const meaningOf = <Id extends string>(choices: readonly Meaning<Id>[], id: Id): string =>
  choices.find((choice) => choice.id === id)?.means ?? '';
export const labelOf = <Id extends string>(choices: readonly Meaning<Id>[], id: Id): string =>
  choices.find((choice) => choice.id === id)?.label ?? '';
