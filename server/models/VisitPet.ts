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

export class VisitPet extends Model<InferAttributes<VisitPet>, InferCreationAttributes<VisitPet>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare visitId: string;
  declare petId: string;
  declare position: number;
}

VisitPet.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    visitId: DataTypes.STRING,
    petId: DataTypes.STRING,
    position: DataTypes.INTEGER,
  },
  { sequelize: database, tableName: 'visitPets' },
);
scopeModel(VisitPet);
