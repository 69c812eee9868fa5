import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { RevisionState } from '@shared/schemas/records.ts'
import type { ProcedureContent } from '@shared/schemas/welding.ts'
import { projectionColumns, type Projections } from './projection-columns.ts'

/** One revision of a procedure; closed by the database once it is approved. `number` is the procedure's. */
export class ProcedureRevision extends Model<InferAttributes<ProcedureRevision>, InferCreationAttributes<ProcedureRevision>> implements Projections {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare procedureId: string
  declare number: string
  declare revision: string
  declare ordinal: number
  declare state: RevisionState
  declare content: ProcedureContent
  declare contentSha256: string
  declare version: CreationOptional<number>
  declare authorId: string
  /** Everybody who saved this revision; none of them may approve it. */
  declare contributors: string[]
  declare deviationReason: CreationOptional<string | null>
  declare title: string
  declare processes: string[]
  declare metals: string[]
  declare metalsLabel: string
  declare positions: string[]
  declare standards: string[]
  declare weld: string
  declare thicknessMin: number | null
  declare thicknessMax: number | null
  declare diameterMin: number | null
  declare diameterMax: number | null
  declare createdAt: CreationOptional<Date>
  declare updatedAt: CreationOptional<Date>
  declare submittedAt: CreationOptional<Date | null>
  declare decidedAt: CreationOptional<Date | null>
}

export function bindProcedureRevision(sequelize: Sequelize): void {
  ProcedureRevision.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      procedureId: DataTypes.UUID,
      number: DataTypes.TEXT,
      revision: DataTypes.TEXT,
      ordinal: DataTypes.INTEGER,
      state: DataTypes.TEXT,
      content: DataTypes.JSONB,
      contentSha256: { type: DataTypes.TEXT, field: 'content_sha256' },
      version: { type: DataTypes.INTEGER, defaultValue: 1 },
      authorId: DataTypes.UUID,
      contributors: DataTypes.ARRAY(DataTypes.UUID),
      deviationReason: DataTypes.TEXT,
      ...projectionColumns(),
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      updatedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      submittedAt: DataTypes.DATE,
      decidedAt: DataTypes.DATE,
    },
    { sequelize, tableName: 'procedure_revisions' },
  )
}
