import { expect, test } from 'vitest';
import { checkBy, isPartOf, only, without } from '@/components/islands/sheets/checked';
import { differences } from '@/components/islands/sheets/differences';
import { checkSheet, draftOfSheet, emptySheet, sheetLines } from '@/components/islands/sheets/sheet-draft';
import { moduleBody, type SheetBody } from '@/lib/contracts';

const draft = { ...emptySheet('2026-11-12', 'Ormsund Cold'), number: 'OC-118', dated: 'March 2026' };

test('dates are sent as the contract writes them', () => {
  expect(checkSheet(draft)).toMatchObject({ ok: true, body: { dated: '2026-03', obtainedOn: '2026-11-12' } });
});

test('each field that is wrong gets its own sentence', () => {
  expect(checkSheet({ ...draft, vendor: '  ', dated: '03/04/2026', obtainedOn: '2026-03' })).toEqual({
    ok: false,
    problems: {
      vendor: 'Enter the vendor as printed.',
      dated: 'Write the date as far as the sheet gives it: 2026-03-15, 2026-03 or 2026.',
      obtainedOn: 'Write the date as year-month-day, like 2026-03-15.',
    },
  });
});

test('a sheet that is opened for editing is typed as it was saved', () => {
  const body: SheetBody = {
    vendor: 'Veltrane',
    title: 'Larks',
    number: '7',
    revision: 'B',
    dated: '2025',
    obtainedFrom: 'fair',
    obtainedOn: '',
  };
  expect(draftOfSheet(body)).toEqual(body);
  expect(checkSheet(draftOfSheet(body))).toEqual({ ok: true, body });
});

test('two versions of a sheet differ where they differ, and what is empty is not stated', () => {
  const theirs = { ...draft, dated: '2026-03', title: 'Brimstead', number: '' };
  expect(differences(sheetLines({ ...draft, dated: '2026-03' }), sheetLines(theirs))).toEqual([
    { name: 'Title', mine: null, theirs: 'Brimstead' },
    { name: 'Number', mine: 'OC-118', theirs: null },
  ]);
});

test('problems deep inside are named as the API names them', () => {
  const checked = checkBy(moduleBody, { vendor: 'V', partNumber: 'P', ratings: [{ hotSideC: 'warm' }] });
  expect(checked).toMatchObject({ ok: false, problems: { 'ratings[0].hotSideC': 'The hot side must be a number, like 2.5.' } });
});

test('a field owns what is inside it and nothing that only begins alike', () => {
  expect(['ratings', 'ratings[0].imaxA', 'ratingsNote', 'rating'].map((field) => isPartOf(field, 'ratings'))).toEqual([
    true,
    true,
    false,
    false,
  ]);
  const problems = { 'ratings[1].imaxA': 'a', partNumber: 'b' };
  expect(without(problems, ['ratings[1]'])).toEqual({ partNumber: 'b' });
  expect(only(problems, ['ratings'])).toEqual({ 'ratings[1].imaxA': 'a' });
});
