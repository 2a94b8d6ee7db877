import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { database } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';

export class PasswordReset extends Model<
  InferAttributes<PasswordReset>,
  InferCreationAttributes<PasswordReset>
> {
  declare id: CreationOptional<string>;
  declare userId: string;
  declare tokenHash: string;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
}

PasswordReset.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    userId: DataTypes.STRING,
    tokenHash: DataTypes.STRING,
    expiresAt: DataTypes.DATE(3),
    usedAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'passwordResets' },
);
