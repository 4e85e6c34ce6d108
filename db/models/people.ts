import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
import { instant, required, text } from './columns';
import type { Role } from '@/lib/access';

export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: string;
  declare email: string;
  declare name: string;
  declare passwordHash: string;
  declare disabledAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
  declare roleRows?: NonAttribute<UserRole[]>;
}

export class UserRole extends Model<InferAttributes<UserRole>, InferCreationAttributes<UserRole>> {
  declare userId: string;
  declare role: Role;
}

export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: string;
  declare userId: string;
  declare expiresAt: Date;
  declare createdAt: CreationOptional<Date>;
  declare agent: CreationOptional<string>;
  declare user?: NonAttribute<User>;
}

export function initPeople(sequelize: Sequelize) {
  User.init(
    {
      id: { ...text(), primaryKey: true },
      email: required(),
      name: required(),
      passwordHash: required(),
      disabledAt: instant('disabledAt'),
      createdAt: instant('createdAt'),
      updatedAt: instant('updatedAt'),
    },
    { sequelize, modelName: 'User', tableName: 'users' },
  );
  UserRole.init(
    { userId: { ...text(), primaryKey: true }, role: { ...text(), primaryKey: true } },
    { sequelize, modelName: 'UserRole', tableName: 'user_roles', timestamps: false },
  );
  Session.init(
    {
      id: { ...text(), primaryKey: true },
      userId: required(),
      expiresAt: instant('expiresAt'),
      agent: text(),
      createdAt: instant('createdAt'),
    },
    { sequelize, modelName: 'Session', tableName: 'sessions', updatedAt: false },
  );
  User.hasMany(UserRole, { foreignKey: 'userId', as: 'roleRows' });
  Session.belongsTo(User, { foreignKey: 'userId', as: 'user' });
}
