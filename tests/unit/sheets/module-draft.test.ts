import { expect, test } from 'vitest';
import { differences } from '@/components/islands/sheets/differences';
import {
  checkModule,
  draftOfModule,
  emptyModule,
  emptyRating,
  likeModule,
  moduleLines,
  nextRating,
  type ModuleDraft,
} from '@/components/islands/sheets/module-draft';
import type { ModuleBody, ModuleView } from '@/lib/contracts';

const draft: ModuleDraft = { ...emptyModule('Ormsund Cold'), partNumber: 'Brimstead 40-C' };
const problemsOf = (typed: ModuleDraft) => {
  const checked = checkModule(typed);
  return checked.ok ? {} : checked.problems;
};
const bodyOf = (typed: ModuleDraft): ModuleBody => {
  const checked = checkModule(typed);
  if (!checked.ok) throw new Error(JSON.stringify(checked.problems));
  return checked.body;
};

test('everything but the part number may be left empty, and is then not stated', () => {
  expect(bodyOf(draft)).toMatchObject({ couples: null, coldPlateMm: null, sealing: null, ratings: [] });
  expect(problemsOf(emptyModule('Ormsund Cold'))).toEqual({ partNumber: 'Enter the part number as printed.' });
});

test('half a plate is asked for its other half', () => {
  expect(problemsOf({ ...draft, coldPlateMm: [40, null] })).toEqual({
    'coldPlateMm[1]': 'Enter both width and depth of the cold plate, or neither.',
  });
  expect(problemsOf({ ...draft, hotPlateMm: [null, 40] })).toHaveProperty(['hotPlateMm[0]']);
});

test('a hot side left wholly empty is not sent', () => {
  const ratings = [emptyRating(1), { ...emptyRating(2), hotSideC: 50, imaxA: 3.4 }];
  expect(bodyOf({ ...draft, ratings }).ratings).toEqual([expect.objectContaining({ hotSideC: 50, imaxA: 3.4 })]);
});

test('a problem of a rating is told at its own block, whatever is empty before it', () => {
  const ratings = [emptyRating(1), { ...emptyRating(4), hotSideC: 50, imaxA: 5000 }];
  expect(problemsOf({ ...draft, ratings })).toEqual({ 'ratings[4].imaxA': 'Imax must be between 0.001 and 1000\u00A0A.' });
});

test('ratings without their hot side, and a hot side without ratings, are asked for', () => {
  expect(problemsOf({ ...draft, ratings: [{ ...emptyRating(1), imaxA: 3 }] })).toMatchObject({
    'ratings[1].hotSideC': 'Enter the hot side at which these ratings hold, like 27.',
  });
  expect(problemsOf({ ...draft, ratings: [{ ...emptyRating(1), hotSideC: 27 }] })).toHaveProperty(['ratings[1].imaxA']);
});

test('two blocks of one hot side are told at the ratings as a whole', () => {
  const ratings = [1, 2].map((key) => ({ ...emptyRating(key), hotSideC: 27, imaxA: 3 }));
  expect(problemsOf({ ...draft, ratings })).toEqual({ ratings: 'Two rows name the same hot side: keep one.' });
});

test('another hot side of a sheet is meant as the one before it, with a key of its own', () => {
  const first = { ...emptyRating(3), hotSideC: 27, imaxMeans: 'mostHeat', tolerancePercent: 10 } as const;
  expect(nextRating([first])).toEqual({ ...emptyRating(4), imaxMeans: 'mostHeat', tolerancePercent: 10 });
});

const body = bodyOf({ ...draft, couples: 127, heightMm: 3.6, ratings: [{ ...emptyRating(1), hotSideC: 27, imaxA: 3.4321987 }] });
const { vendor: _, ...identity } = body;
const module: ModuleView = { ...identity, id: 5, vendor: { id: 1, name: 'Ormsund Cold' }, version: 2 };

test('a module that is opened and sent again is what it was', () => {
  expect(bodyOf(draftOfModule(module))).toEqual(body);
});

test('a sister has all of it but the name', () => {
  expect(likeModule(module)).toEqual({ ...draftOfModule(module), partNumber: '', variant: '' });
});

test('two versions differ in what is worded differently, to the last digit', () => {
  const theirs = { ...identity, couples: null, ratings: identity.ratings.map((rating) => ({ ...rating, imaxA: 3.4321988 })) };
  expect(differences(moduleLines(identity), moduleLines(theirs))).toEqual([
    { name: 'Couples', mine: '127', theirs: null },
    { name: 'Imax at 27\u00a0°C', mine: '3.4321987\u00a0A', theirs: '3.4321988\u00a0A' },
  ]);
  expect(differences(moduleLines(identity), moduleLines(module))).toEqual([]);
});

test('a hot side that only one version has is shown on its side', () => {
  expect(differences(moduleLines({ ...identity, ratings: [] }), moduleLines(identity))).toEqual([
    { name: 'Imax at 27\u00a0°C', mine: null, theirs: '3.4321987\u00a0A' },
  ]);
});
