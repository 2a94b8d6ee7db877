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
import type { Plan } from '#shared/schedule/types.ts';

export type ProposalScope = 'day' | 'notPlaced';
export type ProposalState = 'working' | 'ready' | 'failed' | 'kept' | 'dropped';

export class Proposal extends Model<InferAttributes<Proposal>, InferCreationAttributes<Proposal>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare dayId: string;
  declare scope: ProposalScope;
  declare state: ProposalState;
  declare progressPermille: CreationOptional<number>;
  declare runVersions: Record<string, number>;
  declare plan: CreationOptional<Plan | null>;
  declare message: CreationOptional<string | null>;
  declare seed: number;
  declare iterations: CreationOptional<number | null>;
  declare leaseUntil: CreationOptional<Date | null>;
  declare createdAt: Date;
  declare createdBy: string;
}

Proposal.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    dayId: DataTypes.STRING,
    scope: DataTypes.STRING,
    state: DataTypes.STRING,
    progressPermille: { type: DataTypes.INTEGER, defaultValue: 0 },
    runVersions: DataTypes.JSON,
    plan: DataTypes.JSON,
    message: DataTypes.STRING,
    seed: DataTypes.INTEGER,
    iterations: DataTypes.INTEGER,
    leaseUntil: DataTypes.DATE(3),
    createdAt: DataTypes.DATE(3),
    createdBy: DataTypes.STRING,
  },
  { sequelize: database, tableName: 'proposals' },
);
scopeModel(Proposal);
