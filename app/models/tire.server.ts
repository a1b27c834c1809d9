import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { sequelize } from './database.server';

/** A tire, wherever it is fitted. */
export class Tire extends Model<InferAttributes<Tire>, InferCreationAttributes<Tire>> {
  declare id: string;
  declare coachId: string;
  declare size: string;
  declare sidewallLimitKpa: number;
  declare volumeL: number;
  declare volumeSource: 'estimated' | 'typed';
  declare createdAt: CreationOptional<Date>;
}

Tire.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    coachId: { type: DataTypes.UUID, allowNull: false, field: 'coach_id' },
    size: { type: DataTypes.TEXT, allowNull: false },
    sidewallLimitKpa: { type: DataTypes.DOUBLE, allowNull: false, field: 'sidewall_limit_kpa' },
    volumeL: { type: DataTypes.DOUBLE, allowNull: false, field: 'volume_l' },
    volumeSource: { type: DataTypes.TEXT, allowNull: false, field: 'volume_source' },
    createdAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'created_at',
    },
  },
  { sequelize, tableName: 'tires', timestamps: false },
);
