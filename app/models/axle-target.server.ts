import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { sequelize } from './database.server';

/** A target cold pressure of an axle; the newest counts, the older stay. */
export class AxleTarget extends Model<
  InferAttributes<AxleTarget>,
  InferCreationAttributes<AxleTarget>
> {
  declare id: string;
  declare axleId: string;
  declare targetKpa: number;
  declare source: 'typed';
  declare setBy: CreationOptional<string | null>;
  declare setAt: CreationOptional<Date>;
}

AxleTarget.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    axleId: { type: DataTypes.UUID, allowNull: false, field: 'axle_id' },
    targetKpa: { type: DataTypes.DOUBLE, allowNull: false, field: 'target_kpa' },
    source: { type: DataTypes.TEXT, allowNull: false },
    setBy: { type: DataTypes.UUID, field: 'set_by' },
    setAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW, field: 'set_at' },
  },
  { sequelize, tableName: 'axle_targets', timestamps: false },
);
