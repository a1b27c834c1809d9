import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import type { Role } from '~/access/can';
import { sequelize } from './database.server';

/** What a person is to a coach, from when until when. */
export class Membership extends Model<
  InferAttributes<Membership>,
  InferCreationAttributes<Membership>
> {
  declare id: string;
  declare userId: string;
  declare coachId: string;
  declare role: Role;
  declare validFrom: CreationOptional<Date>;
  declare validUntil: CreationOptional<Date | null>;
}

Membership.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    userId: { type: DataTypes.UUID, allowNull: false, field: 'user_id' },
    coachId: { type: DataTypes.UUID, allowNull: false, field: 'coach_id' },
    role: { type: DataTypes.TEXT, allowNull: false },
    validFrom: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'valid_from',
    },
    validUntil: { type: DataTypes.DATE, field: 'valid_until' },
  },
  { sequelize, tableName: 'memberships', timestamps: false },
);
