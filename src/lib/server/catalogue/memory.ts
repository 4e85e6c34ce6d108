import { approvedModels, counter, decisionsOf, sheetNames } from '@db';
import { toEntry, type CatalogueEntry } from './entries';

interface Held {
  readonly version: number;
  readonly entries: Promise<readonly CatalogueEntry[]>;
}

let held: Held | undefined;

async function load(): Promise<readonly CatalogueEntry[]> {
  const approved = await approvedModels();
  const [names, decisions] = await Promise.all([
    sheetNames(approved.map(({ reading }) => reading.sheetId)),
    decisionsOf(approved.map(({ reading }) => reading.id)),
  ]);
  return approved.flatMap((one) => toEntry(one, names.get(one.reading.sheetId), decisions) ?? []);
}

/**
 * Every approved module, from memory. The counter is raised in the transaction of every change that the catalogue must show, and
 * is read before the rows: a change in between makes the copy one version too old, and the next call renews it.
 */
export async function catalogueEntries(): Promise<readonly CatalogueEntry[]> {
  const version = await counter('catalogue');
  if (held?.version === version) return held.entries;
  const entries = load();
  held = { version, entries };
  // a failed load must not be remembered
  entries.catch(() => {
    if (held?.entries === entries) held = undefined;
  });
  return entries;
}

/** Drops the copy: for a process that opens another database. */
export const forgetCatalogue = (): void => {
  held = undefined;
};
