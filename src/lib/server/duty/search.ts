import type { Actor } from '@/lib/access';
import type { DutyAnswer, DutyMatchView, DutyMissView } from '@/lib/contracts';
import {
  coldFaceCondensation,
  DUTY_FIELDS,
  parseDuty,
  searchDuty,
  type Duty,
  type DutyMatch,
  type DutyMiss,
  type DutyTexts,
} from '@/lib/duty';
import { catalogueEntries, type CatalogueEntry } from '../catalogue';
import { requireCan } from '../people';

/** Most matches, and most misses, that a page shows. */
const ROWS = 100;

const partOf = ({ row, name }: CatalogueEntry) => ({ id: row.id, name, vendor: row.vendor.name, grade: row.grade });

const toMatchView = ({ candidate, notes, ...rest }: DutyMatch<CatalogueEntry>): DutyMatchView => ({
  ...rest,
  module: partOf(candidate),
  notes: [...notes],
});

const toMissView = ({ candidate, reasons, ...rest }: DutyMiss<CatalogueEntry>): DutyMissView => ({
  ...rest,
  module: partOf(candidate),
  reasons: [...reasons],
});

/** Which approved modules do a duty, and why the others do not: at most `rows` of either. */
export async function dutySearch(actor: Actor, duty: Duty, rows = ROWS): Promise<DutyAnswer> {
  requireCan(actor, 'duty.search');
  const entries = await catalogueEntries();
  const { matches, misses, missCounts } = searchDuty(duty, entries);
  return {
    candidates: entries.length,
    matchCount: matches.length,
    missCount: misses.length,
    missCounts,
    matches: matches.slice(0, rows).map(toMatchView),
    misses: misses.slice(0, rows).map(toMissView),
    condensation: coldFaceCondensation(duty),
  };
}

/** What an address says of a duty, as typed and as read. */
export function readDutyAddress(search: URLSearchParams) {
  const texts: DutyTexts = Object.fromEntries(
    DUTY_FIELDS.flatMap(({ param }) => {
      const text = search.get(param)?.slice(0, 60) ?? '';
      return text === '' ? [] : [[param, text]];
    }),
  );
  return { texts, ...parseDuty(texts) };
}
