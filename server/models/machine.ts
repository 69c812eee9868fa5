import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { WriteMachine } from '@shared/schemas/machines.ts'

/** A power source with its feeder; what is searched and reminded of stands in columns beside the content. */
export class Machine extends Model<InferAttributes<Machine>, InferCreationAttributes<Machine>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare number: string
  declare name: string
  declare location: string
  declare retired: boolean
  /** YYYY-MM-DD */
  declare calibrationDueOn: string | null
  declare content: WriteMachine
  declare version: CreationOptional<number>
  declare createdAt: CreationOptional<Date>
  declare updatedAt: CreationOptional<Date>
  /** The due date of which the last reminder went out. */
  declare remindedDueOn: CreationOptional<string | null>
}

export function bindMachine(sequelize: Sequelize): void {
  Machine.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      number: DataTypes.TEXT,
      name: DataTypes.TEXT,
      location: DataTypes.TEXT,
      retired: DataTypes.BOOLEAN,
      calibrationDueOn: DataTypes.DATEONLY,
      content: DataTypes.JSONB,
      version: { type: DataTypes.INTEGER, defaultValue: 1 },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      updatedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      remindedDueOn: { type: DataTypes.DATEONLY, defaultValue: null },
    },
    { sequelize, tableName: 'machines' },
  )
}
