import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import type { WheelPosition } from '~/loads';
import { sequelize } from './database.server';

/** A tire at a wheel position, from when until when, with that wheel’s limit. */
export class Fitting extends Model<InferAttributes<Fitting>, InferCreationAttributes<Fitting>> {
  declare id: string;
  declare tireId: string;
  declare coachId: string;
  declare position: WheelPosition;
  declare wheelLimitKpa: number;
  declare fittedFrom: CreationOptional<Date>;
  declare fittedUntil: CreationOptional<Date | null>;
}

Fitting.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    tireId: { type: DataTypes.UUID, allowNull: false, field: 'tire_id' },
    coachId: { type: DataTypes.UUID, allowNull: false, field: 'coach_id' },
    position: { type: DataTypes.TEXT, allowNull: false },
    wheelLimitKpa: { type: DataTypes.DOUBLE, allowNull: false, field: 'wheel_limit_kpa' },
    fittedFrom: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'fitted_from',
    },
    fittedUntil: { type: DataTypes.DATE, field: 'fitted_until' },
  },
  { sequelize, tableName: 'fittings', timestamps: false },
);
