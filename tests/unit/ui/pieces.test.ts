import { describe, expect, test } from 'vitest';
import { describeAgent } from '@/components/account/agent';
import { readWish } from '@/components/account/act';
import { sectionsFor } from '@/components/shell/sections';
import { nextPath } from '@/components/shell/next-path';
import { chipClass, gradeWords, stateWords } from '@/components/ui/chip-tones';
import { editableNumber, stepped } from '@/components/ui/quantity-text';
import { compareValues, nextSort, sortGlyph } from '@/components/ui/sort';
import { formatDate, formatInstant } from '@/components/when';
import { parseNumber } from '@/lib/units';

const form = (entries: Record<string, string>) => {
  const data = new FormData();
  for (const [name, value] of Object.entries(entries)) data.set(name, value);
  return data;
};

describe('the way back after signing in', () => {
  test('leads to a path of our own, with its question and its place', () => {
    expect(nextPath('/duty?heat=12#rows')).toBe('/duty?heat=12#rows');
  });

  test.each([
    null,
    '',
    'duty',
    '//evil.example',
    '/\\evil.example',
    'https://evil.example/',
    '/sign-in',
    '/.//evil.example',
    'javascript:alert(1)',
  ])('leads to the first page instead of %j', (wanted) => {
    expect(nextPath(wanted)).toBe('/');
  });
});

describe('navigation', () => {
  const shown = (...roles: ('engineer' | 'librarian' | 'designer' | 'administrator')[]) =>
    sectionsFor({ id: '1', roles }).map(({ section }) => section);

  test('shows each role the screens it may use', () => {
    expect(shown('engineer')).toEqual(['today', 'sheets', 'catalogue', 'duty']);
    expect(shown('librarian')).toEqual(['today', 'sheets', 'review', 'catalogue', 'duty']);
    expect(shown('designer')).toEqual(['today', 'catalogue', 'duty']);
    expect(shown('administrator')).toEqual(['today', 'catalogue', 'team', 'outbox', 'trail']);
  });

  test('shows nothing to who is not signed in', () => {
    expect(sectionsFor(null)).toEqual([]);
  });
});

describe('sorting a table', () => {
  test('turns a column round at the second press and starts another afresh', () => {
    const once = nextSort(null, 'cop', 'descending');
    expect(once).toEqual({ key: 'cop', direction: 'descending' });
    expect(nextSort(once, 'cop', 'descending').direction).toBe('ascending');
    expect(nextSort(once, 'name')).toEqual({ key: 'name', direction: 'ascending' });
  });

  test.each(['ascending', 'descending'] as const)('puts what is missing last when %s', (direction) => {
    const sorted = [3, null, 1, undefined, 20].sort((a, b) => compareValues(a, b, direction));
    expect(sorted.slice(0, 3)).toEqual(direction === 'ascending' ? [1, 3, 20] : [20, 3, 1]);
    expect(sorted.slice(3).every((value) => value == null)).toBe(true);
  });

  test('orders words with numbers in them by the number', () => {
    expect(['Haff 50', 'Haff 8', 'Haff 40'].sort((a, b) => compareValues(a, b, 'ascending'))).toEqual(['Haff 8', 'Haff 40', 'Haff 50']);
  });

  test('marks sorted and unsorted columns by different shapes', () => {
    const now = { key: 'cop', direction: 'descending' } as const;
    expect(new Set([sortGlyph(now, 'cop'), sortGlyph(now, 'name'), sortGlyph({ ...now, direction: 'ascending' }, 'cop')]).size).toBe(3);
  });
});

describe('a number in a field', () => {
  test.each([12, -0.5, 0, 1e-9, 4.2e15, 273.15, 0.1 + 0.2])('reads back as it was: %d', (value) => {
    expect(parseNumber(editableNumber(value))).toEqual({ ok: true, value: Number(value.toPrecision(12)) });
  });

  test('stands without dust, with a true minus, and empty when not stated', () => {
    expect(editableNumber(0.1 + 0.2)).toBe('0.3');
    expect(editableNumber(-2.5)).toBe('\u22122.5');
    expect(editableNumber(-0)).toBe('0');
    expect(editableNumber(null)).toBe('');
  });

  test('steps without the dust of binary fractions', () => {
    expect(stepped(0.2, 0.1, 1)).toBe(0.3);
    expect(stepped(1, 0.1, -10)).toBe(0);
  });
});

describe('the account page', () => {
  test('reads a new password, and says field by field what is wrong with one', () => {
    expect(readWish(form({ do: 'password', current: 'old words here', next: 'three unrelated words' }))).toEqual({
      ok: true,
      wish: { do: 'password', current: 'old words here', next: 'three unrelated words' },
    });
    const faulty = readWish(form({ do: 'password', current: '', next: 'short' }));
    expect(faulty.ok === false && Object.keys(faulty.problems).sort()).toEqual(['current', 'next']);
  });

  test('takes no theme but its own two, and does nothing unasked', () => {
    expect(readWish(form({ do: 'theme', theme: 'dark' }))).toEqual({ ok: true, wish: { do: 'theme', theme: 'dark' } });
    expect(readWish(form({ do: 'theme', theme: 'plaid' }))).toEqual({ ok: true, wish: { do: 'theme', theme: null } });
    expect(readWish(form({}))).toEqual({ ok: true, wish: { do: 'nothing' } });
  });

  test.each([
    ['Mozilla/5.0 (X11; Linux x86_64; rv:128.0) Gecko/20100101 Firefox/128.0', 'Firefox on Linux'],
    [
      'Mozilla/5.0 (iPhone; CPU iPhone OS 17_0 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/17.0 Safari/604.1',
      'Safari on iOS',
    ],
    ['Mozilla/5.0 (Windows NT 10.0) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/126.0 Safari/537.36', 'Chrome or Chromium on Windows'],
    ['node', 'An unknown program'],
  ])('names the device of %s', (agent, words) => {
    expect(describeAgent(agent)).toBe(words);
  });
});

describe('chips', () => {
  test('say the state of a reading in the words of the product', () => {
    expect(stateWords('handed-in').text).toBe('handed in');
    expect(chipClass(stateWords('approved').tone)).toBe('chip chip-approved');
    expect(chipClass(stateWords('draft').tone)).toBe('chip');
  });

  test('tell grades apart by tone as well as by word', () => {
    expect(new Set((['measured', 'curves', 'ratings'] as const).map((grade) => gradeWords(grade).tone)).size).toBe(3);
  });
});

describe('instants', () => {
  test('are written for everybody alike, in UTC', () => {
    expect(formatInstant('2026-11-12T23:05:09Z')).toBe('12 Nov 2026, 23:05 UTC');
    expect(formatDate('2026-03-01')).toBe('1 Mar 2026');
  });

  test('that are none print as an en dash', () => {
    expect(formatInstant('soon')).toBe('–');
  });
});
