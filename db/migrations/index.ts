import type { QueryInterface } from 'sequelize';
import { SequelizeStorage, Umzug, type RunnableMigration } from 'umzug';
import type { SerialSequelize } from '../connection';
import { spine } from './001-spine';

export type Migration = RunnableMigration<QueryInterface>;

/** In the order they run. A plain list: no files are looked up at run time, so it bundles. */
export const migrations: readonly Migration[] = [spine];

export const migrator = (connection: SerialSequelize) =>
  new Umzug({
    migrations: [...migrations],
    context: connection.getQueryInterface(),
    storage: new SequelizeStorage({ sequelize: connection, tableName: 'migrations' }),
    logger: undefined,
  });
