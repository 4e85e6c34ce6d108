import fc from 'fast-check';
import { expect, test } from 'vitest';
import { printDate, readDate } from '@/components/sheets/dates';
import { printedDate } from '@/lib/contracts';

test.each([
  ['2026-03-15', '2026-03-15'],
  ['2026/3/5', '2026-03-05'],
  ['2026.3.5', '2026-03-05'],
  ['15.3.2026', '2026-03-15'],
  ['15. 3. 2026', '2026-03-15'],
  ['15 March 2026', '2026-03-15'],
  ['15 Sept 2026', '2026-09-15'],
  ['1. Juni 2026', '2026-06-01'],
  ['March 5, 2026', '2026-03-05'],
  ['Mar. 2026', '2026-03'],
  ['03/2026', '2026-03'],
  ['2026-3', '2026-03'],
  ['2026', '2026'],
  ['  2026-03-15  ', '2026-03-15'],
])('%s is read as %s', (typed, date) => {
  expect(readDate(typed)).toBe(date);
});

test.each(['03/04/2026', 'soon', 'Smarch 2026', '2026-03-15 or so', ''])('“%s” leaves a doubt and stays as typed', (typed) => {
  expect(readDate(typed)).toBe(typed);
});

test('a date that is read once is read the same again', () => {
  const day = fc.date({ min: new Date('1950-01-01'), max: new Date('2090-12-31'), noInvalidDate: true });
  fc.assert(
    fc.property(day, (date) => {
      const iso = date.toISOString().slice(0, 10);
      const [year, month, dayOfMonth] = iso.split('-').map(Number);
      expect(readDate(iso)).toBe(iso);
      expect(readDate(`${dayOfMonth}.${month}.${year}`)).toBe(iso);
      expect(readDate(printDate(iso).replace(/\u00a0/g, ' '))).toBe(iso);
    }),
  );
});

test('dates are printed as far as they are stated', () => {
  expect(printDate('2026-03-05')).toBe('5\u00a0Mar\u00a02026');
  expect(printDate('2026-03')).toBe('Mar\u00a02026');
  expect(printDate('2026')).toBe('2026');
  expect(printDate('')).toBe('');
});

test.each(['', '2026', '2026-03', '2026-03-31', '2024-02-29'])('the contract takes “%s” as the date of a sheet', (date) => {
  expect(printedDate.safeParse(date).success).toBe(true);
});

test.each(['26', '2026-13', '2026-02-30', '2025-02-29', '15.3.2026', 'soon'])(
  'the contract refuses “%s” and says how to write it',
  (date) => {
    expect(printedDate.safeParse(date).error?.issues[0]?.message).toContain('2026-03-15');
  },
);
