import { exact, partName, plateText } from '@/components/sheets/words';
import { moduleBody, type ModuleBody, type ModuleView, type Rating } from '@/lib/contracts/parts';
import { checkBy, type Checked, type Problems } from './checked';
import { ATMOSPHERE, BASIS, IMAX_MEANS, labelOf } from './rating-words';

export type PlateDraft = readonly [width: number | null, depth: number | null];
export interface RatingDraft extends Omit<Rating, 'hotSideC'> {
  readonly key: number;
  readonly hotSideC: number | null;
}

/** What a person types about a module; null and empty text are "not stated". */
export interface ModuleDraft extends Omit<ModuleBody, 'coldPlateMm' | 'hotPlateMm' | 'sealing' | 'ratings'> {
  readonly coldPlateMm: PlateDraft;
  readonly hotPlateMm: PlateDraft;
  readonly sealing: string;
  readonly ratings: readonly RatingDraft[];
}

const NO_PLATE: PlateDraft = [null, null];

export const emptyRating = (key: number): RatingDraft => ({
  key,
  hotSideC: null,
  imaxA: null,
  vmaxV: null,
  qmaxW: null,
  dTmaxK: null,
  imaxMeans: 'notStated',
  basis: 'notStated',
  atmosphere: 'notStated',
  tolerancePercent: null,
});

/** The next hot side of the same sheet: how it is meant is printed once for all of them. */
export const nextRating = (ratings: readonly RatingDraft[]): RatingDraft => {
  const { imaxMeans, basis, atmosphere, tolerancePercent } = ratings.at(-1) ?? emptyRating(0);
  const key = Math.max(0, ...ratings.map((rating) => rating.key)) + 1;
  return { ...emptyRating(key), imaxMeans, basis, atmosphere, tolerancePercent };
};

export const emptyModule = (vendor: string): ModuleDraft => ({
  vendor,
  partNumber: '',
  variant: '',
  stages: null,
  couples: null,
  coldPlateMm: NO_PLATE,
  hotPlateMm: NO_PLATE,
  heightMm: null,
  maxTemperatureC: null,
  leadsOhm: null,
  sealing: '',
  acResistanceOhm: null,
  acResistanceAtC: null,
  ratings: [emptyRating(1)],
});

export function draftOfModule(module: ModuleView): ModuleDraft {
  return {
    vendor: module.vendor.name,
    partNumber: module.partNumber,
    variant: module.variant,
    stages: module.stages,
    couples: module.couples,
    coldPlateMm: module.coldPlateMm ?? NO_PLATE,
    hotPlateMm: module.hotPlateMm ?? NO_PLATE,
    heightMm: module.heightMm,
    maxTemperatureC: module.maxTemperatureC,
    leadsOhm: module.leadsOhm,
    sealing: module.sealing ?? '',
    acResistanceOhm: module.acResistanceOhm,
    acResistanceAtC: module.acResistanceAtC,
    ratings: module.ratings.length > 0 ? module.ratings.map((rating, at) => ({ ...rating, key: at + 1 })) : [emptyRating(1)],
  };
}

/** A sister of a module: all that is stated of it but its name. */
export const likeModule = (module: ModuleView): ModuleDraft => ({ ...draftOfModule(module), partNumber: '', variant: '' });

const isEmptyPlate = ([width, depth]: PlateDraft) => width === null && depth === null;

function plateProblems(name: 'coldPlateMm' | 'hotPlateMm', words: string, [width, depth]: PlateDraft): Problems {
  if ((width === null) === (depth === null)) return {};
  const at = width === null ? 0 : 1;
  return { [`${name}[${at}]`]: `Enter both width and depth of the ${words}, or neither.` };
}

const rated = ({ imaxA, vmaxV, qmaxW, dTmaxK }: RatingDraft) => [imaxA, vmaxV, qmaxW, dTmaxK].some((value) => value !== null);
const isEmptyRating = (rating: RatingDraft) => rating.hotSideC === null && !rated(rating);

function ratingProblems(ratings: readonly RatingDraft[]): Problems {
  const found = ratings.flatMap((rating): (readonly [string, string])[] => {
    if (isEmptyRating(rating)) return [];
    if (rating.hotSideC === null) return [[`ratings[${rating.key}].hotSideC`, 'Enter the hot side at which these ratings hold, like 27.']];
    return rated(rating) ? [] : [[`ratings[${rating.key}].imaxA`, 'Enter at least one rating at this hot side, or remove the hot side.']];
  });
  return Object.fromEntries(found);
}

/** On the form a hot side keeps its key when another is removed; the API counts those that are sent. */
const onForm = (problems: Problems, sent: readonly RatingDraft[]): Problems =>
  Object.fromEntries(
    Object.entries(problems).map(([field, sentence]) => [
      field.replace(/^ratings\[(\d+)\]/, (_, at: string) => `ratings[${sent[Number(at)]?.key ?? at}]`),
      sentence,
    ]),
  );

const withoutKey = ({ key: _, ...rating }: RatingDraft) => rating;

/** Holds a module against the contract of the API; hot sides left wholly empty are not sent. */
export function checkModule(draft: ModuleDraft): Checked<ModuleBody> {
  const sent = draft.ratings.filter((rating) => !isEmptyRating(rating));
  const beyond = {
    ...plateProblems('coldPlateMm', 'cold plate', draft.coldPlateMm),
    ...plateProblems('hotPlateMm', 'hot plate', draft.hotPlateMm),
    ...ratingProblems(draft.ratings),
  };
  const checked = checkBy(moduleBody, {
    ...draft,
    coldPlateMm: isEmptyPlate(draft.coldPlateMm) ? null : draft.coldPlateMm,
    hotPlateMm: isEmptyPlate(draft.hotPlateMm) ? null : draft.hotPlateMm,
    sealing: draft.sealing.trim() === '' ? null : draft.sealing,
    ratings: sent.map(withoutKey),
  });
  const problems = { ...(checked.ok ? {} : onForm(checked.problems, sent)), ...beyond };
  return checked.ok && Object.keys(beyond).length === 0 ? checked : { ok: false, problems };
}

const stated = (value: number | null, unit: string) => (value === null ? '' : exact(value, unit));
const whole = (value: number | null) => (value === null ? '' : String(value));

function ratingLines(rating: Rating): (readonly [string, string])[] {
  const at = `at ${exact(rating.hotSideC, 'C')}`;
  const meant = (label: string) => (label === 'not stated' ? '' : label);
  return [
    [`Imax ${at}`, stated(rating.imaxA, 'A')],
    [`Vmax ${at}`, stated(rating.vmaxV, 'V')],
    [`Qmax ${at}`, stated(rating.qmaxW, 'W')],
    [`ΔTmax ${at}`, stated(rating.dTmaxK, 'K')],
    [`Imax means ${at}`, meant(labelOf(IMAX_MEANS, rating.imaxMeans))],
    [`Basis ${at}`, meant(labelOf(BASIS, rating.basis))],
    [`Atmosphere ${at}`, meant(labelOf(ATMOSPHERE, rating.atmosphere))],
    [`Tolerance ${at}`, stated(rating.tolerancePercent, '%')],
  ];
}

/** Name and words of everything stated about a module, for two versions side by side. */
export const moduleLines = (module: Omit<ModuleBody, 'vendor'>): (readonly [string, string])[] => [
  ['Part', partName(module)],
  ['Stages', whole(module.stages)],
  ['Couples', whole(module.couples)],
  ['Cold plate', plateText(module.coldPlateMm) ?? ''],
  ['Hot plate', plateText(module.hotPlateMm) ?? ''],
  ['Height', stated(module.heightMm, 'mm')],
  ['Highest temperature', stated(module.maxTemperatureC, 'C')],
  ['Resistance of the leads', stated(module.leadsOhm, 'ohm')],
  ['Sealing', module.sealing ?? ''],
  ['AC resistance', stated(module.acResistanceOhm, 'ohm')],
  ['AC resistance measured at', stated(module.acResistanceAtC, 'C')],
  ...module.ratings.flatMap(ratingLines),
];
