import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { Interval } from '@shared/schemas/common.ts'
import type { JobJoint as JobJointRecord } from '@shared/schemas/records.ts'

/** A joint of a job and the approved revision that it is welded by. */
export class JobJoint extends Model<InferAttributes<JobJoint>, InferCreationAttributes<JobJoint>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare jobId: string
  declare ordinal: number
  declare number: string
  declare mark: string | null
  declare metalA: string | null
  declare metalB: string | null
  declare process: JobJointRecord['process']
  declare weld: JobJointRecord['weld']
  declare product: JobJointRecord['product']
  declare thickness: Interval | null
  declare diameter: Interval | null
  declare position: JobJointRecord['position']
  declare length: string | null
  declare count: number
  declare revisionId: string | null
}

export function bindJobJoint(sequelize: Sequelize): void {
  JobJoint.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      ordinal: DataTypes.INTEGER,
      number: DataTypes.TEXT,
      mark: DataTypes.TEXT,
      metalA: DataTypes.TEXT,
      metalB: DataTypes.TEXT,
      process: DataTypes.TEXT,
      weld: DataTypes.TEXT,
      product: DataTypes.TEXT,
      thickness: DataTypes.JSONB,
      diameter: DataTypes.JSONB,
      position: DataTypes.TEXT,
      length: DataTypes.TEXT,
      count: DataTypes.INTEGER,
      revisionId: DataTypes.UUID,
    },
    { sequelize, tableName: 'job_joints' },
  )
}
