import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'

/** A released, digitally signed PDF: made once, then the same bytes for ever. */
export class ReleasedDocument extends Model<InferAttributes<ReleasedDocument>, InferCreationAttributes<ReleasedDocument>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare revisionId: string | null
  declare couponId: string | null
  declare recordState: string
  declare paper: 'A4' | 'Letter'
  declare units: 'SI' | 'US' | 'both'
  declare storageKey: string
  declare fileName: string
  declare sha256: string
  declare bytes: number
  declare signedAt: Date
  declare createdAt: CreationOptional<Date>
}

export function bindReleasedDocument(sequelize: Sequelize): void {
  ReleasedDocument.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      revisionId: DataTypes.UUID,
      couponId: DataTypes.UUID,
      recordState: DataTypes.TEXT,
      paper: DataTypes.TEXT,
      units: DataTypes.TEXT,
      storageKey: DataTypes.TEXT,
      fileName: DataTypes.TEXT,
      sha256: { type: DataTypes.TEXT, field: 'sha256' },
      bytes: DataTypes.INTEGER,
      signedAt: DataTypes.DATE,
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'documents' },
  )
}
