import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'

/** A job: what is welded for whom, under which code. */
export class Job extends Model<InferAttributes<Job>, InferCreationAttributes<Job>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare number: string
  declare title: string
  declare customer: string
  declare code: string
  declare toughnessRequired: boolean
  declare notes: string
  declare version: CreationOptional<number>
  declare createdAt: CreationOptional<Date>
  declare updatedAt: CreationOptional<Date>
}

export function bindJob(sequelize: Sequelize): void {
  Job.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      number: DataTypes.TEXT,
      title: DataTypes.TEXT,
      customer: DataTypes.TEXT,
      code: DataTypes.TEXT,
      toughnessRequired: DataTypes.BOOLEAN,
      notes: DataTypes.TEXT,
      version: { type: DataTypes.INTEGER, defaultValue: 1 },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      updatedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'jobs' },
  )
}
