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

export class RunEvent extends Model<InferAttributes<RunEvent>, InferCreationAttributes<RunEvent>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare runId: string;
  declare userId: CreationOptional<string | null>;
  declare deviceId: string;
  declare deviceSeq: number;
  declare deviceAt: Date;
  declare offsetMs: number;
  declare happenedAt: Date;
  declare receivedAt: Date;
  declare runVersion: number;
  declare stopId: string;
  declare kind: string;
  declare v: number;
  declare data: Record<string, unknown>;
}

RunEvent.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    runId: DataTypes.STRING,
    userId: DataTypes.STRING,
    deviceId: DataTypes.STRING,
    deviceSeq: DataTypes.INTEGER,
    deviceAt: DataTypes.DATE(3),
    offsetMs: DataTypes.BIGINT,
    happenedAt: DataTypes.DATE(3),
    receivedAt: DataTypes.DATE(3),
    runVersion: DataTypes.INTEGER,
    stopId: DataTypes.STRING,
    kind: DataTypes.STRING,
    v: DataTypes.INTEGER,
    data: DataTypes.JSON,
  },
  { sequelize: database, tableName: 'runEvents' },
);
scopeModel(RunEvent);
