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

export class InboundText extends Model<
  InferAttributes<InboundText>,
  InferCreationAttributes<InboundText>
> {
  declare id: CreationOptional<string>;
  declare businessId: CreationOptional<string>;
  declare householdId: CreationOptional<string | null>;
  declare sender: string;
  declare recipient: string;
  declare body: string;
  declare sid: string;
  declare receivedAt: Date;
}

InboundText.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: newId },
    businessId: DataTypes.UUID,
    householdId: DataTypes.STRING,
    sender: DataTypes.STRING,
    recipient: DataTypes.STRING,
    body: DataTypes.STRING,
    sid: DataTypes.STRING,
    receivedAt: DataTypes.DATE(3),
  },
  { sequelize: database, tableName: 'inboundTexts' },
);
scopeModel(InboundText);
