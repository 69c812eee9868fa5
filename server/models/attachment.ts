import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'

/** A paper or picture of a machine, a heat or a bead; exactly one of the three is set. The untouched original is in storage, its hash here. */
export class Attachment extends Model<InferAttributes<Attachment>, InferCreationAttributes<Attachment>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare machineId: string | null
  declare heatId: string | null
  declare beadId: string | null
  declare storageKey: string
  declare thumbnailKey: string | null
  declare fileName: string
  declare mediaType: string
  declare bytes: number
  declare sha256: string
  declare width: number | null
  declare height: number | null
  declare uploadedAt: CreationOptional<Date>
  declare uploadedBy: string
}

export function bindAttachment(sequelize: Sequelize): void {
  Attachment.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      machineId: DataTypes.UUID,
      heatId: DataTypes.UUID,
      beadId: DataTypes.UUID,
      storageKey: DataTypes.TEXT,
      thumbnailKey: DataTypes.TEXT,
      fileName: DataTypes.TEXT,
      mediaType: DataTypes.TEXT,
      bytes: DataTypes.INTEGER,
      sha256: { type: DataTypes.TEXT, field: 'sha256' },
      width: DataTypes.INTEGER,
      height: DataTypes.INTEGER,
      uploadedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      uploadedBy: DataTypes.UUID,
    },
    { sequelize, tableName: 'attachments' },
  )
}
