import { listPeople, listTrail, type TrailRecord } from '@db';
import type { TrailEntry, TrailPage } from '@/lib/contracts';
import { requireCan, type SignedInPerson } from './people';

const PAGE = 100;

const toEntry = (record: TrailRecord, names: ReadonlyMap<string, string>): TrailEntry => ({
  ...record,
  at: record.at.toISOString(),
  objectName: names.get(record.object) ?? '',
  detail: { ...record.detail },
});

/** A page of the trail, newest first; `before` is the entry that the page before ended with. */
export async function trail(actor: SignedInPerson, before?: number): Promise<TrailPage> {
  requireCan(actor, 'trail.see');
  const [records, people] = await Promise.all([listTrail(PAGE + 1, before), listPeople()]);
  const names = new Map(people.map((person) => [`person/${person.id}`, person.name]));
  const shown = records.slice(0, PAGE);
  return {
    entries: shown.map((record) => toEntry(record, names)),
    before: records.length > PAGE ? (shown.at(-1)?.id ?? null) : null,
  };
}
