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

export type RoleName = 'operator' | 'dispatcher' | 'groomer';

export class Membership extends Model<
  InferAttributes<Membership>,
  InferCreationAttributes<Membership>
> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare userId: string;
  declare roles: RoleName[];
  declare groomerId: CreationOptional<string | null>;
  declare createdAt: Date;
}

Membership.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    userId: DataTypes.STRING,
    roles: DataTypes.JSON,
    groomerId: DataTypes.STRING,
    createdAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'memberships' },
);
scopeModel(Membership);
