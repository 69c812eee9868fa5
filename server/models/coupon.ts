import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { CouponState } from '@shared/schemas/records.ts'
import type { CouponContent } from '@shared/schemas/welding.ts'
import { projectionColumns, type Projections } from './projection-columns.ts'

/** A test coupon and, once certified, the procedure qualification record made of it. */
export class Coupon extends Model<InferAttributes<Coupon>, InferCreationAttributes<Coupon>> implements Projections {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare number: string
  declare state: CouponState
  declare revisionId: string | null
  declare content: CouponContent
  declare contentSha256: string
  declare version: CreationOptional<number>
  declare inspectorId: string
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
  declare weldedOn: string | null
  declare createdAt: CreationOptional<Date>
  declare updatedAt: CreationOptional<Date>
  declare decidedAt: CreationOptional<Date | null>
}

export function bindCoupon(sequelize: Sequelize): void {
  Coupon.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: DataTypes.UUID,
      number: DataTypes.TEXT,
      state: DataTypes.TEXT,
      revisionId: DataTypes.UUID,
      content: DataTypes.JSONB,
      contentSha256: { type: DataTypes.TEXT, field: 'content_sha256' },
      version: { type: DataTypes.INTEGER, defaultValue: 1 },
      inspectorId: DataTypes.UUID,
      ...projectionColumns(),
      weldedOn: DataTypes.DATEONLY,
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      updatedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      decidedAt: DataTypes.DATE,
    },
    { sequelize, tableName: 'coupons' },
  )
}
