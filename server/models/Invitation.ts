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
import type { RoleName } from './Membership.ts';

export class Invitation extends Model<
  InferAttributes<Invitation>,
  InferCreationAttributes<Invitation>
> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare email: string;
  declare roles: RoleName[];
  declare groomerId: CreationOptional<string | null>;
  declare tokenHash: string;
  declare expiresAt: Date;
  declare closedAt: CreationOptional<Date | null>;
}

Invitation.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    email: DataTypes.STRING,
    roles: DataTypes.JSON,
    groomerId: DataTypes.STRING,
    tokenHash: DataTypes.STRING,
    expiresAt: DataTypes.DATE(3),
    closedAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'invitations' },
);
scopeModel(Invitation);
