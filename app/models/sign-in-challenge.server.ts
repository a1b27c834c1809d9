import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { sequelize } from './database.server';

/** One sign-in code that was sent, bound to the browser that asked. */
export class SignInChallenge extends Model<
  InferAttributes<SignInChallenge>,
  InferCreationAttributes<SignInChallenge>
> {
  declare id: string;
  declare email: string;
  declare codeHmac: string;
  declare client: string;
  declare tries: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
}

SignInChallenge.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true },
    email: { type: DataTypes.TEXT, allowNull: false },
    codeHmac: { type: DataTypes.TEXT, allowNull: false, field: 'code_hmac' },
    client: { type: DataTypes.TEXT, allowNull: false },
    tries: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
    createdAt: {
      type: DataTypes.DATE,
      allowNull: false,
      defaultValue: DataTypes.NOW,
      field: 'created_at',
    },
    expiresAt: { type: DataTypes.DATE, allowNull: false, field: 'expires_at' },
    usedAt: { type: DataTypes.DATE, field: 'used_at' },
  },
  { sequelize, tableName: 'sign_in_challenges', timestamps: false },
);
