import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'

/** A procedure: its number; what it says is in its revisions. */
export class Procedure extends Model<InferAttributes<Procedure>, InferCreationAttributes<Procedure>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare number: string
  declare createdBy: string
  declare createdAt: CreationOptional<Date>
}

export function bindProcedure(sequelize: Sequelize): void {
  Procedure.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      number: DataTypes.TEXT,
      createdBy: DataTypes.UUID,
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'procedures' },
  )
}
