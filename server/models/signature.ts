import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { Signature as SignatureRecord } from '@shared/schemas/records.ts'

/** What somebody did to a record, in the exact words they agreed to; only ever added. */
export class Signature extends Model<InferAttributes<Signature>, InferCreationAttributes<Signature>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare revisionId: string | null
  declare couponId: string | null
  declare personId: string
  declare personName: string
  declare role: string
  declare meaning: SignatureRecord['meaning']
  declare statement: string
  declare reason: string | null
  declare contentSha256: string
  declare signedAt: CreationOptional<Date>
}

export function bindSignature(sequelize: Sequelize): void {
  Signature.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      revisionId: DataTypes.UUID,
      couponId: DataTypes.UUID,
      personId: DataTypes.UUID,
      personName: DataTypes.TEXT,
      role: DataTypes.TEXT,
      meaning: DataTypes.TEXT,
      statement: DataTypes.TEXT,
      reason: DataTypes.TEXT,
      contentSha256: { type: DataTypes.TEXT, field: 'content_sha256' },
      signedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'signatures' },
  )
}
