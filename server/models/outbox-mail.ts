import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'

/** A mail from the moment that it was asked for: sent by a job, kept afterwards. */
export class OutboxMail extends Model<InferAttributes<OutboxMail>, InferCreationAttributes<OutboxMail>> {
  declare id: CreationOptional<string>
  declare organizationId: string
  declare recipients: string[]
  declare subject: string
  /** `{link}` stands where the private link goes. */
  declare text: string
  declare kind: CreationOptional<'document' | 'account'>
  declare link: CreationOptional<string | null>
  declare state: CreationOptional<'queued' | 'sent' | 'caught' | 'failed'>
  declare attempts: CreationOptional<number>
  declare error: CreationOptional<string | null>
  declare createdAt: CreationOptional<Date>
  declare sentAt: CreationOptional<Date | null>
}

export function bindOutboxMail(sequelize: Sequelize): void {
  OutboxMail.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      organizationId: { type: DataTypes.UUID, allowNull: false },
      recipients: { type: DataTypes.ARRAY(DataTypes.TEXT), allowNull: false },
      subject: { type: DataTypes.TEXT, allowNull: false },
      text: { type: DataTypes.TEXT, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'document' },
      link: { type: DataTypes.TEXT },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'queued' },
      attempts: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      error: { type: DataTypes.TEXT },
      createdAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
      sentAt: { type: DataTypes.DATE },
    },
    { sequelize, tableName: 'outbox_mails' },
  )
}
