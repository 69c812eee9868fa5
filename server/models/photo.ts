import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'

/** A photo or paper of a coupon: the untouched original in storage, its hash here. */
export class Photo extends Model<InferAttributes<Photo>, InferCreationAttributes<Photo>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare couponId: string
  declare storageKey: string
  declare thumbnailKey: string | null
  declare fileName: string
  declare mediaType: string
  declare bytes: number
  declare sha256: string
  declare width: number | null
  declare height: number | null
  declare caption: CreationOptional<string>
  declare tag: CreationOptional<string>
  declare takenAt: Date | null
  declare uploadedAt: CreationOptional<Date>
  declare uploadedBy: string
}

export function bindPhoto(sequelize: Sequelize): void {
  Photo.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      couponId: DataTypes.UUID,
      storageKey: DataTypes.TEXT,
      thumbnailKey: DataTypes.TEXT,
      fileName: DataTypes.TEXT,
      mediaType: DataTypes.TEXT,
      bytes: DataTypes.INTEGER,
      sha256: { type: DataTypes.TEXT, field: 'sha256' },
      width: DataTypes.INTEGER,
      height: DataTypes.INTEGER,
      caption: { type: DataTypes.TEXT, defaultValue: '' },
      tag: { type: DataTypes.TEXT, defaultValue: '' },
      takenAt: DataTypes.DATE,
      uploadedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      uploadedBy: DataTypes.UUID,
    },
    { sequelize, tableName: 'photos' },
  )
}
