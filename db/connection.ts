import { AsyncLocalStorage } from 'node:async_hooks';
import sqlite3 from 'sqlite3';
import { Sequelize, Transaction, type TransactionOptions } from 'sequelize';

/**
 * Sequelize opens one more SQLite connection for every transaction and gives no hook for it,
 * so per-connection settings are made where the connection is made.
 */
const databaseWith = (synchronous: 'FULL' | 'OFF') =>
  class Database extends sqlite3.Database {
    constructor(file: string, mode: number, done: (error: Error | null) => void) {
      super(file, mode, (error) => {
        if (error) return done(error);
        this.serialize(); // one statement, so one libuv thread, per connection
        this.configure('busyTimeout', 5000);
        this.exec(`PRAGMA foreign_keys = ON; PRAGMA synchronous = ${synchronous};`, done);
      });
    }
  };

/**
 * Sequelize finds the transaction of the running request here, so that no query can be left out of it
 * by forgetting to pass it on.
 */
const store = new AsyncLocalStorage<Map<string, unknown>>();
Sequelize.useCLS({
  run: (work: (context: unknown) => unknown) => store.run(new Map(), () => work({})),
  bind: (work: unknown) => work,
  get: (key: string) => store.getStore()?.get(key),
  set: (key: string, value: unknown) => store.getStore()?.set(key, value),
} as never);

type Work<T> = (transaction: Transaction) => PromiseLike<T>;

/**
 * One transaction at a time in this process. SQLite has one writer anyway, and waiting inside
 * SQLite's busy handler holds a libuv thread: four waiters starve the COMMIT they wait for.
 */
export class SerialSequelize extends Sequelize {
  #last: Promise<void> = Promise.resolve();

  /** Runs `work` in one IMMEDIATE transaction; refuses to be nested. */
  async inTransaction<T>(work: () => Promise<T>): Promise<T> {
    if (store.getStore()?.get('transaction')) throw new Error('Already in a transaction: call the inner work directly.');
    const turn = this.#last;
    let release!: () => void;
    this.#last = new Promise<void>((resolve) => (release = resolve));
    await turn;
    try {
      return await super.transaction(() => work());
    } finally {
      release();
    }
  }

  override transaction<T>(options: TransactionOptions, work: Work<T>): Promise<T>;
  override transaction<T>(work: Work<T>): Promise<T>;
  override transaction(options?: TransactionOptions): Promise<Transaction>;
  override transaction(): Promise<never> {
    return Promise.reject(new Error('Use inTransaction: it keeps writers in line.'));
  }
}

/**
 * Opens a database file (never `:memory:`, whose one connection hides transaction errors). `OFF` is for a file that
 * is thrown away if anything goes wrong while it is made.
 */
export const openConnection = (storage: string, synchronous: 'FULL' | 'OFF' = 'FULL'): SerialSequelize =>
  new SerialSequelize({
    dialect: 'sqlite',
    storage,
    dialectModule: { ...sqlite3, Database: databaseWith(synchronous) },
    logging: false,
    transactionType: Transaction.TYPES.IMMEDIATE, // the write lock at BEGIN: a later upgrade could only fail
    retry: { max: 0 }, // the default retries SQLITE_BUSY five times on top of the busy timeout
    define: { underscored: true },
  });
