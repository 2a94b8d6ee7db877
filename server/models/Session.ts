import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { database } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';

export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: CreationOptional<string>;
  declare userId: string;
  declare businessId: string;
  declare refreshHash: string;
  declare previousHash: CreationOptional<string | null>;
  declare generation: CreationOptional<number>;
  declare successorUsedAt: CreationOptional<Date | null>;
  declare rotatedAt: Date;
  declare expiresAt: Date;
  declare revokedAt: CreationOptional<Date | null>;
  declare createdAt: Date;
}

Session.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    userId: DataTypes.STRING,
    businessId: DataTypes.STRING,
    refreshHash: DataTypes.STRING,
    previousHash: DataTypes.STRING,
    generation: { type: DataTypes.INTEGER, defaultValue: 1 },
    successorUsedAt: DataTypes.DATE(3),
    rotatedAt: DataTypes.DATE(3),
    expiresAt: DataTypes.DATE(3),
    revokedAt: DataTypes.DATE(3),
    createdAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'sessions' },
);
