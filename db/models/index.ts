import type { Sequelize } from 'sequelize';
import { initPeople } from './people';
import { initParts } from './parts';
import { initReadings } from './readings';
import { initRecords } from './records';

export * from './people';
export * from './parts';
export * from './readings';
export * from './records';

/** Binds every model to this connection. One connection a process, as SQLite wants it. */
export function initModels(connection: Sequelize) {
  initPeople(connection);
  initParts(connection);
  initReadings(connection);
  initRecords(connection);
}
