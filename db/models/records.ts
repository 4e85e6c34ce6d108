import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import { id, instant, text, whole } from './columns';
import { User } from './people';

export class TrailEntry extends Model<InferAttributes<TrailEntry>, InferCreationAttributes<TrailEntry>> {
  declare id: CreationOptional<number>;
  declare userId: string | null;
  declare action: string;
  declare object: CreationOptional<string>;
  declare detail: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
  declare user?: NonAttribute<User>;
}

export class QueuedMail extends Model<InferAttributes<QueuedMail>, InferCreationAttributes<QueuedMail>> {
  declare id: CreationOptional<number>;
  declare recipient: string;
  declare subject: string;
  declare body: string;
  declare state: CreationOptional<'queued' | 'sending' | 'sent' | 'failed'>;
  declare tries: CreationOptional<number>;
  declare nextTryAt: Date;
  declare lastError: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
  declare sentAt: CreationOptional<Date | null>;
}

export class Counter extends Model<InferAttributes<Counter>, InferCreationAttributes<Counter>> {
  declare name: string;
  declare value: number;
}

export function initRecords(sequelize: Sequelize) {
  TrailEntry.init(
    { id: id(), userId: text(), action: text(), object: text(), detail: text(), createdAt: instant('createdAt') },
    { sequelize, modelName: 'TrailEntry', tableName: 'trail', updatedAt: false },
  );
  QueuedMail.init(
    {
      id: id(),
      recipient: text(),
      subject: text(),
      body: text(),
      state: text(),
      tries: whole(),
      nextTryAt: instant('nextTryAt'),
      lastError: text(),
      createdAt: instant('createdAt'),
      sentAt: instant('sentAt'),
    },
    { sequelize, modelName: 'QueuedMail', tableName: 'mail_queue', updatedAt: false },
  );
  Counter.init(
    { name: { ...text(), primaryKey: true }, value: whole() },
    { sequelize, modelName: 'Counter', tableName: 'counters', timestamps: false },
  );
  TrailEntry.belongsTo(User, { foreignKey: 'userId', as: 'user' });
}
