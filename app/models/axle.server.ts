import { DataTypes, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize';
import type { Axle as AxleKind } from '~/loads';
import { sequelize } from './database.server';

/** One axle of a coach. */
export class Axle extends Model<InferAttributes<Axle>, InferCreationAttributes<Axle>> {
  declare id: string;
  declare coachId: string;
  declare kind: AxleKind;
}

Axle.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    coachId: { type: DataTypes.UUID, allowNull: false, field: 'coach_id' },
    kind: { type: DataTypes.TEXT, allowNull: false },
  },
  { sequelize, tableName: 'axles', timestamps: false },
);
