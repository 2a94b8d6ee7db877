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
import type { TankKind } from '#shared/schedule/types.ts';

export type VanShape = 'square' | 'circle' | 'triangle' | 'diamond' | 'hexagon' | 'cross';
export interface VanTank {
  kind: TankKind;
  capacityMl: number;
}

export class Van extends Model<InferAttributes<Van>, InferCreationAttributes<Van>> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare name: string;
  declare shape: VanShape;
  declare startPlaceId: string;
  declare endPlaceId: string;
  declare tanks: VanTank[];
  declare tableLimitGrams: number;
  declare active: CreationOptional<boolean>;
}

Van.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    name: DataTypes.STRING,
    shape: DataTypes.STRING,
    startPlaceId: DataTypes.STRING,
    endPlaceId: DataTypes.STRING,
    tanks: DataTypes.JSON,
    tableLimitGrams: DataTypes.INTEGER,
    active: { type: DataTypes.BOOLEAN, defaultValue: true },
  },
  { sequelize: database, tableName: 'vans' },
);
scopeModel(Van);
