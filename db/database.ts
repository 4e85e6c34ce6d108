import { QueryTypes } from 'sequelize';
import { openConnection, type SerialSequelize } from './connection';
import { migrator } from './migrations';
import { initModels } from './models';

const held = globalThis as unknown as { coupletDatabase?: SerialSequelize };

/** Opens the one database of this process. Opening another file first closes the last. `OFF` is for a file still in the making. */
export async function openDatabase(file: string, synchronous: 'FULL' | 'OFF' = 'FULL'): Promise<void> {
  await closeDatabase();
  held.coupletDatabase = openConnection(file, synchronous);
  initModels(held.coupletDatabase);
}

/** For the server's bundle: binds the models to `file` the first time, and does nothing after. */
export function ensureDatabase(file: string): void {
  if (held.coupletDatabase && modelsAreBound) return;
  held.coupletDatabase ??= openConnection(file);
  initModels(held.coupletDatabase);
  modelsAreBound = true;
}
let modelsAreBound = false;

export function connection(): SerialSequelize {
  if (!held.coupletDatabase) throw new Error('The database is not open.');
  return held.coupletDatabase;
}

export async function closeDatabase(): Promise<void> {
  const open = held.coupletDatabase;
  if (!open) return;
  delete held.coupletDatabase;
  modelsAreBound = false;
  await open.query('PRAGMA optimize').catch(() => undefined);
  await open.close();
}

/** One transaction: everything that is awaited inside belongs to it, or nothing of it happens. */
export const inTransaction = <T>(work: () => Promise<T>): Promise<T> => connection().inTransaction(work);

/** Runs what migrations are missing and answers their names. */
export async function migrate(): Promise<string[]> {
  return (await migrator(connection()).up()).map((migration) => migration.name);
}

export interface SelfCheck {
  readonly sqlite: string;
  readonly journal: string;
  readonly synchronous: number;
  readonly foreignKeys: number;
}

/** SQLite releases this program was tried on; another one may lose data in ways nobody here has seen. */
const TRIED_SQLITE = /^3\.(5[2-9]|[6-9]\d)\./;
const FULL = 2;

const pragma = async (name: string) =>
  Object.values((await connection().query<Record<string, string | number>>(`PRAGMA ${name}`, { type: QueryTypes.SELECT }))[0] ?? {})[0];

async function settings(): Promise<SelfCheck> {
  const [version] = await connection().query<{ v: string }>('SELECT sqlite_version() AS v', { type: QueryTypes.SELECT });
  return {
    sqlite: version?.v ?? '',
    journal: String(await pragma('journal_mode')),
    synchronous: Number(await pragma('synchronous')),
    foreignKeys: Number(await pragma('foreign_keys')),
  };
}

function faults(found: SelfCheck, where: string): string[] {
  return [
    ...(TRIED_SQLITE.test(found.sqlite) ? [] : [`SQLite ${found.sqlite} has not been tried with Couplet.`]),
    ...(found.journal === 'delete' ? [] : [`${where}: journal_mode is ${found.journal}, not delete (the rollback journal).`]),
    ...(found.synchronous === FULL ? [] : [`${where}: synchronous is ${found.synchronous}, not FULL.`]),
    ...(found.foreignKeys === 1 ? [] : [`${where}: foreign keys are off.`]),
  ];
}

/**
 * Looks at SQLite's version and the settings that keep data safe, outside and inside a transaction (which
 * has a connection of its own), and at the file itself. Throws with a list of what is wrong.
 */
export async function selfCheck(): Promise<SelfCheck> {
  const outside = await settings();
  const inside = await inTransaction(settings);
  const quick = String(await pragma('quick_check'));
  const orphans = await connection().query('PRAGMA foreign_key_check', { type: QueryTypes.SELECT });
  const wrong = [
    ...faults(outside, 'the connection'),
    ...faults(inside, 'inside a transaction'),
    ...(quick === 'ok' ? [] : [`quick_check says: ${quick}`]),
    ...(orphans.length === 0 ? [] : [`${orphans.length} rows name something that is gone.`]),
  ];
  if (wrong.length > 0) throw new Error(`The database is not safe to use:\n- ${wrong.join('\n- ')}`);
  return outside;
}

/** Puts a file back to the rollback journal, which the file itself remembers. */
export async function useRollbackJournal(): Promise<void> {
  await connection().query('PRAGMA journal_mode = DELETE');
}
