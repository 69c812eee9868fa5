import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'

/** A firm that shares the installation with others and sees nothing of them. */
export class Organization extends Model<InferAttributes<Organization>, InferCreationAttributes<Organization>> {
  declare id: string
  declare name: string
  declare address: CreationOptional<string>
  declare defaultUnitSystem: CreationOptional<'SI' | 'US'>
  declare version: CreationOptional<number>
  declare createdAt: CreationOptional<Date>
}

export function bindOrganization(sequelize: Sequelize): void {
  Organization.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      address: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
      defaultUnitSystem: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'SI' },
      version: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
      createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'organizations' },
  )
}
