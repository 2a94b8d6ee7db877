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

export class ArrivalLink extends Model<
  InferAttributes<ArrivalLink>,
  InferCreationAttributes<ArrivalLink>
> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare visitId: string;
  declare runId: CreationOptional<string | null>;
  declare tokenHash: string;
  declare expiresAt: Date;
  declare createdAt: Date;
}

ArrivalLink.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    visitId: DataTypes.STRING,
    runId: DataTypes.STRING,
    tokenHash: DataTypes.STRING,
    expiresAt: DataTypes.DATE(3),
    createdAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'arrivalLinks' },
);
scopeModel(ArrivalLink);
