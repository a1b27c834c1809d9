import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import type { AxleLayout } from '~/loads';
import { sequelize } from './database.server';

export type LowerBy = 'pedal' | 'drain';

/** A motorhome. What changes from day to day belongs to its rounds. */
export class Coach extends Model<InferAttributes<Coach>, InferCreationAttributes<Coach>> {
  declare id: string;
  declare name: string;
  declare layout: AxleLayout;
  declare toleranceKpa: number;
  declare lowerBy: CreationOptional<LowerBy[]>;
  declare createdAt: CreationOptional<Date>;
  declare deletedAt: CreationOptional<Date | null>;
}

Coach.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    name: { type: DataTypes.TEXT, allowNull: false },
    layout: { type: DataTypes.TEXT, allowNull: false },
    toleranceKpa: { type: DataTypes.DOUBLE, allowNull: false, field: 'tolerance_kpa' },
    lowerBy: {
      type: DataTypes.ARRAY(DataTypes.TEXT),
      allowNull: false,
      defaultValue: [],
      field: 'lower_by',
    },
    createdAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'created_at',
    },
    deletedAt: { type: DataTypes.DATE, field: 'deleted_at' },
  },
  { sequelize, tableName: 'coaches', timestamps: false },
);
