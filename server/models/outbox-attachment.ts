import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'

/** A file that goes with a mail, kept as it was when the mail was asked for. */
export class OutboxAttachment extends Model<InferAttributes<OutboxAttachment>, InferCreationAttributes<OutboxAttachment>> {
  declare organizationId: string
  declare mailId: string
  declare position: number
  declare name: string
  declare mediaType: string
  declare bytes: Buffer
}

export function bindOutboxAttachment(sequelize: Sequelize): void {
  OutboxAttachment.init(
    {
      organizationId: { type: DataTypes.UUID, allowNull: false },
      mailId: { type: DataTypes.UUID, primaryKey: true },
      position: { type: DataTypes.INTEGER, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      mediaType: { type: DataTypes.TEXT, allowNull: false },
      bytes: { type: DataTypes.BLOB, allowNull: false },
    },
    { sequelize, tableName: 'outbox_attachments' },
  )
}
