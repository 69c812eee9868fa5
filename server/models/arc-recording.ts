import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { ArcFigures, ArcLayout, ArcPlot } from '@shared/schemas/arc-data.ts'

/** Sampled volts and amperes: the untouched file in storage, what was computed from it here. */
export class ArcRecording extends Model<InferAttributes<ArcRecording>, InferCreationAttributes<ArcRecording>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare storageKey: string
  declare fileName: string
  /** A bigint, which the driver gives as text. */
  declare bytes: number | string
  declare sha256: string
  declare layout: ArcLayout
  declare figures: ArcFigures
  declare plot: ArcPlot
  declare couponId: string | null
  declare runRowId: string | null
  declare beadId: string | null
  declare weldLength: number | null
  declare version: CreationOptional<number>
  declare uploadedBy: string
  declare uploadedAt: CreationOptional<Date>
}

export function bindArcRecording(sequelize: Sequelize): void {
  ArcRecording.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      storageKey: DataTypes.TEXT,
      fileName: DataTypes.TEXT,
      bytes: DataTypes.BIGINT,
      sha256: { type: DataTypes.TEXT, field: 'sha256' },
      layout: DataTypes.JSONB,
      figures: DataTypes.JSONB,
      plot: DataTypes.JSONB,
      couponId: DataTypes.UUID,
      runRowId: DataTypes.TEXT,
      beadId: DataTypes.UUID,
      weldLength: DataTypes.DOUBLE,
      version: { type: DataTypes.INTEGER, defaultValue: 1 },
      uploadedBy: DataTypes.UUID,
      uploadedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'arc_recordings' },
  )
}
