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
import type { LearnedPair } from '#shared/grooming/learning/learnFromRecords.ts';

export type FitState = 'working' | 'done' | 'failed';

/** One learning, under way or done, kept or not. Until it is done its figures are 0. */
export class GroomFit extends Model<InferAttributes<GroomFit>, InferCreationAttributes<GroomFit>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare state: FitState;
  /** When it began. */
  declare fittedAt: Date;
  /** While working: past it, the process that learned is gone. */
  declare leaseUntil: CreationOptional<Date | null>;
  declare modelVersion: string;
  /** Pet visits learned from, and seen but left out. */
  declare records: number;
  declare leftOut: number;
  /** Visits that judged, and the mean pinball loss on them before and after, in seconds. */
  declare heldOut: number;
  declare beforeSeconds: number;
  declare afterSeconds: number;
  declare kept: boolean;
  /** null when not kept, and for fits long followed by others: visits store what they used. */
  declare pair: CreationOptional<LearnedPair | null>;
}

GroomFit.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    state: DataTypes.STRING,
    fittedAt: DataTypes.DATE(3),
    leaseUntil: DataTypes.DATE(3),
    modelVersion: DataTypes.STRING,
    records: DataTypes.INTEGER,
    leftOut: DataTypes.INTEGER,
    heldOut: DataTypes.INTEGER,
    beforeSeconds: DataTypes.INTEGER,
    afterSeconds: DataTypes.INTEGER,
    kept: DataTypes.BOOLEAN,
    pair: DataTypes.JSON,
  },
  { sequelize: database, tableName: 'groomFits' },
);
scopeModel(GroomFit);
