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

export class GateOpening extends Model<
  InferAttributes<GateOpening>,
  InferCreationAttributes<GateOpening>
> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare householdId: string;
  declare userId: string;
  declare at: Date;
}

GateOpening.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    householdId: DataTypes.STRING,
    userId: DataTypes.STRING,
    at: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'gateOpenings' },
);
scopeModel(GateOpening);
