import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { sequelize } from './database.server';

/** One event of a run. Append-only; `seq` gives the order. */
export class RunEvent extends Model<InferAttributes<RunEvent>, InferCreationAttributes<RunEvent>> {
  declare runId: string;
  declare seq: number;
  declare id: string;
  declare type: string;
  declare atMs: number;
  declare body: Record<string, unknown>;
  declare side: 'wheel' | 'cab';
  declare actorId: CreationOptional<string | null>;
  declare deviceId: string;
  declare deviceSeq: number;
  declare deviceTime: Date;
  declare offsetMs: CreationOptional<number | null>;
  declare suspect: CreationOptional<boolean>;
  declare receivedAt: CreationOptional<Date>;
}

RunEvent.init(
  {
    runId: { type: DataTypes.UUID, primaryKey: true, field: 'run_id' },
    seq: { type: DataTypes.INTEGER, primaryKey: true },
    id: { type: DataTypes.UUID, allowNull: false },
    type: { type: DataTypes.TEXT, allowNull: false },
    atMs: { type: DataTypes.INTEGER, allowNull: false, field: 'at_ms' },
    body: { type: DataTypes.JSONB, allowNull: false },
    side: { type: DataTypes.TEXT, allowNull: false },
    actorId: { type: DataTypes.UUID, field: 'actor_id' },
    deviceId: { type: DataTypes.UUID, allowNull: false, field: 'device_id' },
    deviceSeq: { type: DataTypes.INTEGER, allowNull: false, field: 'device_seq' },
    deviceTime: { type: DataTypes.DATE, allowNull: false, field: 'device_time' },
    offsetMs: { type: DataTypes.INTEGER, field: 'offset_ms' },
    suspect: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
    receivedAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'received_at',
    },
  },
  { sequelize, tableName: 'run_events', timestamps: false },
);
