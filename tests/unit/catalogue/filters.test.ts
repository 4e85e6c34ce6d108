import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CATALOGUE_SORTS, catalogueQuery } from '@/lib/contracts';
import { filterEntries, sortEntries } from '@/lib/server/catalogue/filters';
import { entry } from './support';

const small = entry({ id: 1, partNumber: 'Wren 8', sideMm: 8, qmaxW: 3, stages: 1 });
const plain = entry({ id: 2 });
const tall = entry({ id: 3, partNumber: 'Haff 50', vendor: 'Thistlecap', sideMm: 50, qmaxW: 90, stages: 3 });
const silent = entry({ id: 4, partNumber: 'Lark 62', vendor: 'Veltrane', sideMm: null, stages: null });
const all = [small, plain, tall, silent];

const query = (texts: Record<string, string> = {}) => catalogueQuery.parse(texts);
const passed = (texts: Record<string, string>) => filterEntries(all, query(texts)).passed.map(({ row }) => row.id);

describe('filters of the catalogue', () => {
  it('pass everything when none is set, even as empty fields of a form', () => {
    expect(passed({})).toEqual([1, 2, 3, 4]);
    expect(passed({ q: '', vendor: '', heatFrom: '', sideTo: ' ', stages: '', grade: '', unstated: '' })).toEqual([1, 2, 3, 4]);
  });

  it('keep what lies between two numbers, ends included', () => {
    expect(passed({ heatFrom: '60' })).toEqual([2, 3, 4]);
    expect(passed({ heatFrom: '60', heatTo: '60 W' })).toEqual([2, 4]);
    expect(passed({ sideTo: '40 mm' })).toEqual([1, 2]);
  });

  it('never pass silently what a sheet does not state, and count it', () => {
    expect(filterEntries(all, query({ sideTo: '500' }))).toMatchObject({ unstated: 1 });
    expect(passed({ sideTo: '500' })).toEqual([1, 2, 3]);
    expect(passed({ sideTo: '500', unstated: 'show' })).toEqual([1, 2, 3, 4]);
  });

  it('count as not stated only what passes every other filter', () => {
    expect(filterEntries(all, query({ sideTo: '500', heatFrom: '80' }))).toMatchObject({ unstated: 0 });
  });

  it('know three stages and more, one vendor, grade and words', () => {
    expect(passed({ stages: '3' })).toEqual([3]);
    expect(passed({ vendor: String(tall.row.vendor.id) })).toEqual([3]);
    expect(passed({ grade: 'measured' })).toEqual([]);
    expect(passed({ q: 'wren' })).toEqual([1]);
  });

  it('refuse numbers that are none, with a sentence', () => {
    const parsed = catalogueQuery.safeParse({ heatFrom: 'lots' });
    expect(parsed.error?.issues[0]?.message).toMatch(/not a number/);
  });
});

describe('the order of the catalogue', () => {
  it('is by name unless another is asked for, numbers in names as numbers', () => {
    const names = [entry({ partNumber: 'Sel 100' }), entry({ partNumber: 'Sel 30' }), plain];
    expect(sortEntries(names).map(({ name }) => name)).toEqual(['Brimstead 40-C', 'Sel 30', 'Sel 100']);
  });

  it('turns round, and leaves what is missing last both ways', () => {
    expect(sortEntries(all, 'side', 'ascending').map(({ row }) => row.id)).toEqual([1, 2, 3, 4]);
    expect(sortEntries(all, 'side', 'descending').map(({ row }) => row.id)).toEqual([3, 2, 1, 4]);
  });

  it('keeps every entry, whatever it sorts by', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...CATALOGUE_SORTS),
        fc.constantFrom('ascending', 'descending'),
        fc.shuffledSubarray(all),
        (sort, order, some) => {
          expect(new Set(sortEntries(some, sort, order))).toEqual(new Set(some));
          expect(some).toHaveLength(sortEntries(some, sort, order).length);
        },
      ),
    );
  });
});
