import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { WriteHeat } from '@shared/schemas/heats.ts'

/** A heat of base metal or a lot of filler metal; what is searched stands in columns beside the content. */
export class Heat extends Model<InferAttributes<Heat>, InferCreationAttributes<Heat>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare kind: WriteHeat['kind']
  declare number: string
  declare grade: string
  /** Key of the library row that it is of. */
  declare libraryKey: string | null
  declare content: WriteHeat
  declare version: CreationOptional<number>
  declare createdAt: CreationOptional<Date>
  declare updatedAt: CreationOptional<Date>
}

export function bindHeat(sequelize: Sequelize): void {
  Heat.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      kind: DataTypes.TEXT,
      number: DataTypes.TEXT,
      grade: DataTypes.TEXT,
      libraryKey: DataTypes.TEXT,
      content: DataTypes.JSONB,
      version: { type: DataTypes.INTEGER, defaultValue: 1 },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      updatedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'heats' },
  )
}
