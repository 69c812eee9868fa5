import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'

/** A single-use link that was e-mailed; only its SHA-256 is kept. */
export class PersonToken extends Model<InferAttributes<PersonToken>, InferCreationAttributes<PersonToken>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare personId: string
  declare kind: 'invite' | 'reset'
  declare tokenSha256: Buffer
  declare expiresAt: Date
  declare usedAt: CreationOptional<Date | null>
  declare createdAt: CreationOptional<Date>
}

export function bindPersonToken(sequelize: Sequelize): void {
  PersonToken.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: { type: DataTypes.UUID, allowNull: false },
      personId: { type: DataTypes.UUID, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      tokenSha256: { type: DataTypes.BLOB, allowNull: false, field: 'token_sha256' },
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      usedAt: { type: DataTypes.DATE },
      createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'person_tokens' },
  )
}
