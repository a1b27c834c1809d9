import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { sequelize } from './database.server';

/** One walk round a coach: the cold check and the fills that follow. */
export class Round extends Model<InferAttributes<Round>, InferCreationAttributes<Round>> {
  declare id: string;
  declare coachId: string;
  declare startedBy: CreationOptional<string | null>;
  declare deviceId: string;
  declare place: string;
  declare altitudeM: number;
  declare ambientC: number;
  declare timeZone: string;
  declare withHelper: boolean;
  declare startedAt: Date;
  declare cautionsAt: CreationOptional<Date | null>;
  declare closedAt: CreationOptional<Date | null>;
  declare afterwards: CreationOptional<string[]>;
  declare receivedAt: CreationOptional<Date>;
}

Round.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    coachId: { type: DataTypes.UUID, allowNull: false, field: 'coach_id' },
    startedBy: { type: DataTypes.UUID, field: 'started_by' },
    deviceId: { type: DataTypes.UUID, allowNull: false, field: 'device_id' },
    place: { type: DataTypes.TEXT, allowNull: false },
    altitudeM: { type: DataTypes.DOUBLE, allowNull: false, field: 'altitude_m' },
    ambientC: { type: DataTypes.DOUBLE, allowNull: false, field: 'ambient_c' },
    timeZone: { type: DataTypes.TEXT, allowNull: false, field: 'time_zone' },
    withHelper: { type: DataTypes.BOOLEAN, allowNull: false, field: 'with_helper' },
    startedAt: { type: DataTypes.DATE, allowNull: false, field: 'started_at' },
    cautionsAt: { type: DataTypes.DATE, field: 'cautions_at' },
    closedAt: { type: DataTypes.DATE, field: 'closed_at' },
    afterwards: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false, defaultValue: [] },
    receivedAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'received_at',
    },
  },
  { sequelize, tableName: 'rounds', timestamps: false },
);
