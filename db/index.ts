/** The one door to the database. Queries answer plain records; nobody outside sees a row. */
export {
  closeDatabase,
  ensureDatabase,
  inTransaction,
  migrate,
  openDatabase,
  selfCheck,
  useRollbackJournal,
  type SelfCheck,
} from './database';
export * from './queries/people';
export * from './queries/parts';
export * from './queries/sheets';
export * from './queries/readings';
export * from './queries/records';
export { READING_STATES, type DecisionKind, type ReadingState } from './models';
