import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { sequelize } from './database.server';

/** What was computed from a run’s log by one version of the engine. */
export class RunResult extends Model<
  InferAttributes<RunResult>,
  InferCreationAttributes<RunResult>
> {
  declare id: string;
  declare runId: string;
  declare engineVersion: string;
  declare lastSeq: number;
  declare result: unknown;
  declare computedAt: CreationOptional<Date>;
}

RunResult.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    runId: { type: DataTypes.UUID, allowNull: false, field: 'run_id' },
    engineVersion: { type: DataTypes.TEXT, allowNull: false, field: 'engine_version' },
    lastSeq: { type: DataTypes.INTEGER, allowNull: false, field: 'last_seq' },
    result: { type: DataTypes.JSONB, allowNull: false },
    computedAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'computed_at',
    },
  },
  { sequelize, tableName: 'run_results', timestamps: false },
);
