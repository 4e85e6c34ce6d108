import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import { id, instant, required, text, whole } from './columns';
import { Module, Sheet } from './parts';
import { User } from './people';

export const READING_STATES = ['draft', 'handed-in', 'returned', 'approved', 'superseded', 'withdrawn'] as const;
export type ReadingState = (typeof READING_STATES)[number];
export type DecisionKind = 'handed-in' | 'taken-back' | 'returned' | 'approved' | 'superseded' | 'withdrawn' | 'restored';

export class Reading extends Model<InferAttributes<Reading>, InferCreationAttributes<Reading>> {
  declare id: CreationOptional<number>;
  declare moduleId: number;
  declare sheetId: number;
  declare ownerId: string;
  declare state: ReadingState;
  declare version: CreationOptional<number>;
  /** The bench document as JSON text, kept to the byte so that the identical body can be recognised. */
  declare document: string;
  declare savedBy: string;
  declare savedAt: Date;
  declare createdAt: CreationOptional<Date>;
  declare module?: NonAttribute<Module>;
  declare sheet?: NonAttribute<Sheet>;
  declare owner?: NonAttribute<User>;
  declare saver?: NonAttribute<User>;
  declare editors?: NonAttribute<ReadingEditor[]>;
  declare models?: NonAttribute<FittedModel[]>;
  declare decisions?: NonAttribute<Decision[]>;
}

export class ReadingEditor extends Model<InferAttributes<ReadingEditor>, InferCreationAttributes<ReadingEditor>> {
  declare readingId: number;
  declare userId: string;
}

export class ReadingPicture extends Model<InferAttributes<ReadingPicture>, InferCreationAttributes<ReadingPicture>> {
  declare readingId: number;
  declare pictureId: number;
}

/** A row of `models`. */
export class FittedModel extends Model<InferAttributes<FittedModel>, InferCreationAttributes<FittedModel>> {
  declare id: CreationOptional<number>;
  declare readingId: number;
  declare moduleId: number;
  /** The reading document as it was read, JSON text. */
  declare document: string;
  /** The whole result, JSON text. */
  declare result: string;
  declare engine: string;
  declare hash: string;
  declare createdAt: CreationOptional<Date>;
}

export class Decision extends Model<InferAttributes<Decision>, InferCreationAttributes<Decision>> {
  declare id: CreationOptional<number>;
  declare readingId: number;
  declare what: DecisionKind;
  declare reason: CreationOptional<string>;
  declare userId: string;
  declare modelId: number | null;
  declare createdAt: CreationOptional<Date>;
  declare user?: NonAttribute<User>;
}

export function initReadings(sequelize: Sequelize) {
  Reading.init(
    {
      id: id(),
      moduleId: whole(),
      sheetId: whole(),
      ownerId: required(),
      state: required(),
      version: { ...whole(), defaultValue: 1 },
      document: required(),
      savedBy: required(),
      savedAt: instant('savedAt'),
      createdAt: instant('createdAt'),
    },
    { sequelize, modelName: 'Reading', tableName: 'readings', updatedAt: false },
  );
  ReadingEditor.init(
    { readingId: { ...whole(), primaryKey: true }, userId: { ...text(), primaryKey: true } },
    { sequelize, modelName: 'ReadingEditor', tableName: 'reading_editors', timestamps: false },
  );
  ReadingPicture.init(
    { readingId: { ...whole(), primaryKey: true }, pictureId: { ...whole(), primaryKey: true } },
    { sequelize, modelName: 'ReadingPicture', tableName: 'reading_pictures', timestamps: false },
  );
  FittedModel.init(
    {
      id: id(),
      readingId: whole(),
      moduleId: whole(),
      document: required(),
      result: required(),
      engine: required(),
      hash: required(),
      createdAt: instant('createdAt'),
    },
    { sequelize, modelName: 'FittedModel', tableName: 'models', updatedAt: false },
  );
  Decision.init(
    {
      id: id(),
      readingId: whole(),
      what: required(),
      reason: text(),
      userId: required(),
      modelId: whole(),
      createdAt: instant('createdAt'),
    },
    { sequelize, modelName: 'Decision', tableName: 'decisions', updatedAt: false },
  );
  Reading.belongsTo(Module, { foreignKey: 'moduleId', as: 'module' });
  Reading.belongsTo(Sheet, { foreignKey: 'sheetId', as: 'sheet' });
  Reading.belongsTo(User, { foreignKey: 'ownerId', as: 'owner' });
  Reading.belongsTo(User, { foreignKey: 'savedBy', as: 'saver' });
  Reading.hasMany(ReadingEditor, { foreignKey: 'readingId', as: 'editors' });
  Reading.hasMany(FittedModel, { foreignKey: 'readingId', as: 'models' });
  Reading.hasMany(Decision, { foreignKey: 'readingId', as: 'decisions' });
  Decision.belongsTo(Reading, { foreignKey: 'readingId', as: 'reading' });
  Decision.belongsTo(User, { foreignKey: 'userId', as: 'user' });
}
