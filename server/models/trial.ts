import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { BeadContent } from '@shared/schemas/trials.ts'

/** A trial of the dial-in log: beads on the way to a setting, and the procedure that came of them. */
export class Trial extends Model<InferAttributes<Trial>, InferCreationAttributes<Trial>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare number: string
  declare title: string
  declare goal: string | null
  declare procedureId: CreationOptional<string | null>
  declare createdBy: string
  declare version: CreationOptional<number>
  declare createdAt: CreationOptional<Date>
  declare updatedAt: CreationOptional<Date>
}

/** One trial bead; what lists ask for stands in columns beside the content. */
export class Bead extends Model<InferAttributes<Bead>, InferCreationAttributes<Bead>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare trialId: string
  declare number: number
  declare machineId: string | null
  declare score: number | null
  declare content: BeadContent
  declare version: CreationOptional<number>
  declare weldedBy: string
  declare weldedAt: CreationOptional<Date>
  declare updatedAt: CreationOptional<Date>
}

export function bindTrial(sequelize: Sequelize): void {
  Trial.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      number: DataTypes.TEXT,
      title: DataTypes.TEXT,
      goal: DataTypes.TEXT,
      procedureId: { type: DataTypes.UUID, defaultValue: null },
      createdBy: DataTypes.UUID,
      version: { type: DataTypes.INTEGER, defaultValue: 1 },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      updatedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'trials' },
  )
}

export function bindBead(sequelize: Sequelize): void {
  Bead.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      trialId: DataTypes.UUID,
      number: DataTypes.INTEGER,
      machineId: DataTypes.UUID,
      score: DataTypes.INTEGER,
      content: DataTypes.JSONB,
      version: { type: DataTypes.INTEGER, defaultValue: 1 },
      weldedBy: DataTypes.UUID,
      weldedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      updatedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'beads' },
  )
}
