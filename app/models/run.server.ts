import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import type { FillSetup } from '~/air';
import type { WheelPosition } from '~/loads';
import { sequelize } from './database.server';

/** A fill: its frozen set-up and the last number of its log. */
export class Run extends Model<InferAttributes<Run>, InferCreationAttributes<Run>> {
  declare id: string;
  declare kind: 'fill';
  declare coachId: string;
  declare roundId: string;
  declare tireId: string;
  declare position: WheelPosition;
  declare setup: FillSetup;
  declare engineVersion: string;
  declare rigKey: string;
  declare startedBy: CreationOptional<string | null>;
  declare deviceId: string;
  declare startedAt: Date;
  declare receivedAt: CreationOptional<Date>;
  declare lastSeq: CreationOptional<number>;
  declare endedSeq: CreationOptional<number | null>;
  declare overlapping: CreationOptional<boolean>;
}

Run.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    kind: { type: DataTypes.TEXT, allowNull: false },
    coachId: { type: DataTypes.UUID, allowNull: false, field: 'coach_id' },
    roundId: { type: DataTypes.UUID, allowNull: false, field: 'round_id' },
    tireId: { type: DataTypes.UUID, allowNull: false, field: 'tire_id' },
    position: { type: DataTypes.TEXT, allowNull: false },
    setup: { type: DataTypes.JSONB, allowNull: false },
    engineVersion: { type: DataTypes.TEXT, allowNull: false, field: 'engine_version' },
    rigKey: { type: DataTypes.TEXT, allowNull: false, field: 'rig_key' },
    startedBy: { type: DataTypes.UUID, field: 'started_by' },
    deviceId: { type: DataTypes.UUID, allowNull: false, field: 'device_id' },
    startedAt: { type: DataTypes.DATE, allowNull: false, field: 'started_at' },
    receivedAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'received_at',
    },
    lastSeq: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0, field: 'last_seq' },
    endedSeq: { type: DataTypes.INTEGER, field: 'ended_seq' },
    overlapping: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
  },
  { sequelize, tableName: 'runs', timestamps: false },
);
