import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'

/** A signed-in browser. The session library writes these rows; requests may only see whose they are, and end them. */
export class UserSession extends Model<InferAttributes<UserSession>, InferCreationAttributes<UserSession>> {
  declare sid: string
  declare organizationId: string
  declare personId: string
  declare expire: Date
}

export function bindUserSession(sequelize: Sequelize): void {
  UserSession.init(
    {
      sid: { type: DataTypes.TEXT, primaryKey: true },
      organizationId: { type: DataTypes.UUID },
      personId: { type: DataTypes.UUID },
      expire: { type: DataTypes.DATE },
    },
    { sequelize, tableName: 'session' },
  )
}
