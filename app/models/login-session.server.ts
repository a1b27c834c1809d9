import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { sequelize } from './database.server';

/** One browser that is signed in; only a hash of its token is kept. */
export class LoginSession extends Model<
  InferAttributes<LoginSession>,
  InferCreationAttributes<LoginSession>
> {
  declare id: string;
  declare tokenHash: string;
  declare userId: string;
  declare userAgent: CreationOptional<string>;
  declare createdAt: CreationOptional<Date>;
  declare seenAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare endedAt: CreationOptional<Date | null>;
}

LoginSession.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    tokenHash: { type: DataTypes.TEXT, allowNull: false, field: 'token_hash' },
    userId: { type: DataTypes.UUID, allowNull: false, field: 'user_id' },
    userAgent: { type: DataTypes.TEXT, allowNull: false, defaultValue: '', field: 'user_agent' },
    createdAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'created_at',
    },
    seenAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'seen_at',
    },
    expiresAt: { type: DataTypes.DATE, allowNull: false, field: 'expires_at' },
    endedAt: { type: DataTypes.DATE, field: 'ended_at' },
  },
  { sequelize, tableName: 'login_sessions', timestamps: false },
);
