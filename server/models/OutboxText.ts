import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from 'sequelize';
import { database } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { scopeModel } from '#server/db/scopeModel.ts';

export type TextStatus =
  | 'waiting'
  | 'attempting'
  | 'queued'
  | 'sent'
  | 'delivered'
  | 'undelivered'
  | 'failed'
  | 'stale'
  | 'notSent';

export class OutboxText extends Model<
  InferAttributes<OutboxText>,
  InferCreationAttributes<OutboxText>
> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare visitId: CreationOptional<string | null>;
  declare householdId: CreationOptional<string | null>;
  declare kind: string;
  declare promiseVersion: CreationOptional<number>;
  declare recipient: string;
  declare sender: string;
  declare body: string;
  declare status: TextStatus;
  declare reason: CreationOptional<string | null>;
  declare attempts: CreationOptional<number>;
  declare dueAt: Date;
  declare staleAfter: Date;
  declare leaseUntil: CreationOptional<Date | null>;
  declare attemptedAt: CreationOptional<Date | null>;
  declare sid: CreationOptional<string | null>;
  declare createdAt: Date;
  declare statusAt: Date;
}

OutboxText.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    visitId: DataTypes.STRING,
    householdId: DataTypes.STRING,
    kind: DataTypes.STRING,
    promiseVersion: { type: DataTypes.INTEGER, defaultValue: 0 },
    recipient: DataTypes.STRING,
    sender: DataTypes.STRING,
    body: DataTypes.STRING,
    status: DataTypes.STRING,
    reason: DataTypes.STRING,
    attempts: { type: DataTypes.INTEGER, defaultValue: 0 },
    dueAt: DataTypes.DATE(3),
    staleAfter: DataTypes.DATE(3),
    leaseUntil: DataTypes.DATE(3),
    attemptedAt: DataTypes.DATE(3),
    sid: DataTypes.STRING,
    createdAt: DataTypes.DATE(3),
    statusAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'outbox' },
);
scopeModel(OutboxText);
