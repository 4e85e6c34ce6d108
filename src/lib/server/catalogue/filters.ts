import type { CatalogueQuery, CatalogueSort } from '@/lib/contracts';
import type { CatalogueEntry } from './entries';
import { found, wordsOf } from './words';

/** A filter says yes or no, or that the sheet does not state what it asks for. */
type Verdict = boolean | 'unstated';
type Filter = (entry: CatalogueEntry) => Verdict;

const THREE_OR_MORE = 3;

const between = (value: number | null, from: number | undefined, to: number | undefined): Verdict =>
  value === null ? 'unstated' : value >= (from ?? -Infinity) && value <= (to ?? Infinity);

function stagesAre(stages: number | null, wanted: number): Verdict {
  if (stages === null) return 'unstated';
  return wanted === THREE_OR_MORE ? stages >= wanted : stages === wanted;
}

/** The filters that a query asks for; none for what it leaves open. */
function filtersOf(query: CatalogueQuery): Filter[] {
  const { vendor, heatFrom, heatTo, sideFrom, sideTo, stages, grade } = query;
  const words = wordsOf(query.q);
  const filters: (Filter | false)[] = [
    words.length > 0 && (({ haystack }) => found(haystack, words)),
    vendor !== undefined && (({ row }) => row.vendor.id === vendor),
    (heatFrom ?? heatTo) !== undefined && (({ row }) => between(row.qmax.value, heatFrom, heatTo)),
    (sideFrom ?? sideTo) !== undefined && (({ sideMm }) => between(sideMm, sideFrom, sideTo)),
    stages !== undefined && (({ row }) => stagesAre(row.stages, Number(stages))),
    grade !== undefined && (({ row }) => row.grade === grade),
  ];
  return filters.filter((filter) => filter !== false);
}

/** Entries that pass every filter, and how many fail only because a sheet does not state something; those come too when they are asked for. */
export function filterEntries(entries: readonly CatalogueEntry[], query: CatalogueQuery): { passed: CatalogueEntry[]; unstated: number } {
  const filters = filtersOf(query);
  const judged = entries.map((entry) => ({ entry, verdicts: filters.map((filter) => filter(entry)) }));
  const open = judged.filter(({ verdicts }) => !verdicts.includes(false));
  const unstated = open.filter(({ verdicts }) => verdicts.includes('unstated')).length;
  const passed = open.filter(({ verdicts }) => query.unstated === 'show' || !verdicts.includes('unstated'));
  return { passed: passed.map(({ entry }) => entry), unstated };
}

type Key = (entry: CatalogueEntry) => number | string | null;

const KEYS: Readonly<Record<CatalogueSort, Key>> = {
  module: ({ name }) => name,
  vendor: ({ row }) => row.vendor.name,
  stages: ({ row }) => row.stages,
  couples: ({ row }) => row.couples,
  side: ({ sideMm }) => sideMm,
  height: ({ row }) => row.heightMm,
  imax: ({ row }) => row.imax.value,
  vmax: ({ row }) => row.vmax.value,
  qmax: ({ row }) => row.qmax.value,
  dtmax: ({ row }) => row.dtmax.value,
  approved: ({ row }) => row.approvedAt,
};

const collator = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

function compare(a: number | string, b: number | string): number {
  return typeof a === 'number' && typeof b === 'number' ? a - b : collator.compare(String(a), String(b));
}

/** Sorted by one column; what is missing comes last in both directions, equals by name. */
export function sortEntries(
  entries: readonly CatalogueEntry[],
  sort: CatalogueSort = 'module',
  order: 'ascending' | 'descending' = 'ascending',
) {
  const key = KEYS[sort];
  const turn = order === 'ascending' ? 1 : -1;
  return [...entries].sort((one, other) => {
    const [a, b] = [key(one), key(other)];
    if (a === null || b === null) return a === b ? collator.compare(one.name, other.name) : a === null ? 1 : -1;
    return turn * compare(a, b) || collator.compare(one.name, other.name);
  });
}
