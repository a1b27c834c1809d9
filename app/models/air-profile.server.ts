import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import type { AirProfile } from '~/air';
import { sequelize } from './database.server';

/** What was learned about a coach’s supply with one hose, chuck and gauge. */
export class AirProfileRow extends Model<
  InferAttributes<AirProfileRow>,
  InferCreationAttributes<AirProfileRow>
> {
  declare id: string;
  declare coachId: string;
  declare rigKey: string;
  declare runId: CreationOptional<string | null>;
  declare schemaVersion: number;
  declare engineVersion: string;
  declare profile: AirProfile;
  declare learnedAt: CreationOptional<Date>;
}

AirProfileRow.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    coachId: { type: DataTypes.UUID, allowNull: false, field: 'coach_id' },
    rigKey: { type: DataTypes.TEXT, allowNull: false, field: 'rig_key' },
    runId: { type: DataTypes.UUID, field: 'run_id' },
    schemaVersion: { type: DataTypes.INTEGER, allowNull: false, field: 'schema_version' },
    engineVersion: { type: DataTypes.TEXT, allowNull: false, field: 'engine_version' },
    profile: { type: DataTypes.JSONB, allowNull: false },
    learnedAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'learned_at',
    },
  },
  { sequelize, tableName: 'air_profiles', timestamps: false },
);
