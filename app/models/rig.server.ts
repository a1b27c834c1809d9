import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { sequelize } from './database.server';

/** Hose, chuck and gauge as they are used now; the air profile is keyed by the three names. */
export class Rig extends Model<InferAttributes<Rig>, InferCreationAttributes<Rig>> {
  declare id: string;
  declare coachId: string;
  declare hose: string;
  declare chuck: string;
  declare gauge: string;
  declare gaugePlace: 'at-chuck' | 'above-valve' | 'below-valve' | 'dash-only';
  declare hasValve: boolean;
  declare stepKpa: number;
  declare createdAt: CreationOptional<Date>;
  declare retiredAt: CreationOptional<Date | null>;
}

Rig.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    coachId: { type: DataTypes.UUID, allowNull: false, field: 'coach_id' },
    hose: { type: DataTypes.TEXT, allowNull: false },
    chuck: { type: DataTypes.TEXT, allowNull: false },
    gauge: { type: DataTypes.TEXT, allowNull: false },
    gaugePlace: { type: DataTypes.TEXT, allowNull: false, field: 'gauge_place' },
    hasValve: { type: DataTypes.BOOLEAN, allowNull: false, field: 'has_valve' },
    stepKpa: { type: DataTypes.DOUBLE, allowNull: false, field: 'step_kpa' },
    createdAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'created_at',
    },
    retiredAt: { type: DataTypes.DATE, field: 'retired_at' },
  },
  { sequelize, tableName: 'rigs', timestamps: false },
);
