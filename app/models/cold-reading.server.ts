import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import type { WheelPosition } from '~/loads';
import { sequelize } from './database.server';

/** What a gauge showed on a tire in the cold check; the newest of a tire counts. */
export class ColdReading extends Model<
  InferAttributes<ColdReading>,
  InferCreationAttributes<ColdReading>
> {
  declare id: string;
  declare roundId: string;
  declare tireId: string;
  declare position: WheelPosition;
  declare pressureKpa: number;
  declare targetKpa: number;
  declare warm: boolean;
  declare readAt: Date;
  declare receivedAt: CreationOptional<Date>;
}

ColdReading.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    roundId: { type: DataTypes.UUID, allowNull: false, field: 'round_id' },
    tireId: { type: DataTypes.UUID, allowNull: false, field: 'tire_id' },
    position: { type: DataTypes.TEXT, allowNull: false },
    pressureKpa: { type: DataTypes.DOUBLE, allowNull: false, field: 'pressure_kpa' },
    targetKpa: { type: DataTypes.DOUBLE, allowNull: false, field: 'target_kpa' },
    warm: { type: DataTypes.BOOLEAN, allowNull: false },
    readAt: { type: DataTypes.DATE, allowNull: false, field: 'read_at' },
    receivedAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'received_at',
    },
  },
  { sequelize, tableName: 'cold_readings', timestamps: false },
);
