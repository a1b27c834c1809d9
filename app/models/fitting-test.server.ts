import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { sequelize } from './database.server';

export type FittingOutcome = 'follows-supply' | 'accessory-tank' | 'no-air';

/** What came of testing the fitting that the hose clips on to. */
export class FittingTest extends Model<
  InferAttributes<FittingTest>,
  InferCreationAttributes<FittingTest>
> {
  declare id: string;
  declare coachId: string;
  declare outcome: FittingOutcome;
  declare testedAt: CreationOptional<Date>;
  declare testedBy: CreationOptional<string | null>;
}

FittingTest.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    coachId: { type: DataTypes.UUID, allowNull: false, field: 'coach_id' },
    outcome: { type: DataTypes.TEXT, allowNull: false },
    testedAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'tested_at',
    },
    testedBy: { type: DataTypes.UUID, field: 'tested_by' },
  },
  { sequelize, tableName: 'fitting_tests', timestamps: false },
);
