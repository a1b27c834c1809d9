import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import type { PressureUnit } from '~/units';
import { sequelize } from './database.server';

/** Somebody who signs in, known by an e-mail address in lower case. */
export class User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: string;
  declare email: string;
  declare name: CreationOptional<string>;
  declare pressureUnit: CreationOptional<PressureUnit>;
  declare createdAt: CreationOptional<Date>;
}

User.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    email: { type: DataTypes.TEXT, allowNull: false },
    name: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
    pressureUnit: {
      type: DataTypes.TEXT,
      allowNull: false,
      defaultValue: 'psi',
      field: 'pressure_unit',
    },
    createdAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'created_at',
    },
  },
  { sequelize, tableName: 'users', timestamps: false },
);
