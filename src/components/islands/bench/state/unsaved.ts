import { openDB, type DBSchema, type IDBPDatabase } from 'idb';
import { unsavedDatabase } from '@/components/shell/unsaved-work';
import type { BenchDocument } from '@/lib/editor';

/** Work that the server has not confirmed yet, as it is kept in the browser. */
export interface UnsavedWork {
  readonly readingId: number;
  /** The page load that kept it, so that another tab's save does not forget it. */
  readonly tab: string;
  /** The version on the server that the work was begun on. */
  readonly version: number;
  readonly document: BenchDocument;
  /** When it was kept, as an ISO instant. */
  readonly at: string;
}

interface Schema extends DBSchema {
  readings: { key: number; value: UnsavedWork };
}

/** Where one person's unsaved work of all readings is kept; opened at first use. Every failure is silent: a browser may refuse to keep anything. */
export interface UnsavedStore {
  readonly keep: (work: UnsavedWork) => Promise<void>;
  readonly find: (readingId: number) => Promise<UnsavedWork | null>;
  /** Forgets what this tab has kept, or with `whatever` what any has. */
  readonly forget: (readingId: number, tab: string | 'whatever') => Promise<void>;
}

export function unsavedStore(personId: string): UnsavedStore {
  let connection: Promise<IDBPDatabase<Schema>> | null = null;
  let deleted = false;
  const open = () => {
    connection ??= openDB<Schema>(unsavedDatabase(personId), 1, {
      upgrade: (database) => void database.createObjectStore('readings', { keyPath: 'readingId' }),
      blocking: (_current, next, event) => {
        (event.target as IDBDatabase).close();
        connection = null;
        // A version of null is a deletion: the person has signed out in another tab, and nothing of theirs may stay behind.
        deleted ||= next === null;
      },
      terminated: () => void (connection = null),
    });
    connection.catch(() => (connection = null));
    return connection;
  };
  const quietly = async <T>(work: (database: IDBPDatabase<Schema>) => Promise<T>): Promise<T | null> => {
    if (deleted) return null;
    try {
      return await work(await open());
    } catch {
      return null;
    }
  };
  return {
    keep: async (work) => void (await quietly((database) => database.put('readings', work))),
    find: async (readingId) => (await quietly((database) => database.get('readings', readingId))) ?? null,
    forget: async (readingId, tab) => {
      await quietly(async (database) => {
        const change = database.transaction('readings', 'readwrite');
        const kept = await change.store.get(readingId);
        if (kept && (tab === 'whatever' || kept.tab === tab)) await change.store.delete(readingId);
        await change.done;
      });
    },
  };
}
