import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { Role } from '../../shared/schemas/people.ts'

/** Somebody with an account. People are never deleted: signatures point at them. */
export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare name: string
  declare email: string
  declare roles: Role[]
  declare passwordHash: CreationOptional<string | null>
  declare state: CreationOptional<'invited' | 'active' | 'inactive'>
  declare unitSystem: CreationOptional<'SI' | 'US'>
  declare theme: CreationOptional<'day' | 'night'>
  declare sessionEpoch: CreationOptional<number>
  declare version: CreationOptional<number>
  declare createdAt: CreationOptional<Date>
  declare lastSignInAt: CreationOptional<Date | null>
}

export function bindPerson(sequelize: Sequelize): void {
  Person.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: { type: DataTypes.UUID, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      email: { type: DataTypes.TEXT, allowNull: false },
      roles: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false },
      passwordHash: { type: DataTypes.TEXT },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'invited' },
      unitSystem: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'SI' },
      theme: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'day' },
      sessionEpoch: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
      version: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
      createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      lastSignInAt: { type: DataTypes.DATE },
    },
    { sequelize, tableName: 'people' },
  )
}
