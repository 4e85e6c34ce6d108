import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize';
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
      id: { type: DataTypes.TEXT, primaryKey: true },
      email: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      passwordHash: { type: DataTypes.TEXT, allowNull: false },
      disabledAt: DataTypes.DATE,
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'User', tableName: 'users' },
  );
  UserRole.init(
    { userId: { type: DataTypes.TEXT, primaryKey: true }, role: { type: DataTypes.TEXT, primaryKey: true } },
    { sequelize, modelName: 'UserRole', tableName: 'user_roles', timestamps: false },
  );
  Session.init(
    {
      id: { type: DataTypes.TEXT, primaryKey: true },
      userId: { type: DataTypes.TEXT, allowNull: false },
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      agent: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: 'Session', tableName: 'sessions', updatedAt: false },
  );
  User.hasMany(UserRole, { foreignKey: 'userId', as: 'roleRows' });
  Session.belongsTo(User, { foreignKey: 'userId', as: 'user' });
}
