import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize'
import type { Person } from '#server/db/models/person.ts'
import { tableOptions } from '#server/db/models/table-options.ts'

/** One sign-in. The cookie carries the random id, the table only its hash. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare idHash: string
  declare personId: number
  declare userAgent: string
  declare createdAt: Date
  declare lastSeenAt: Date
  declare expiresAt: Date
  declare revokedAt: CreationOptional<Date | null>
  declare person?: NonAttribute<Person>
}

export function defineSession(sequelize: Sequelize): typeof Session {
  return class extends Session {}.init(
    {
      idHash: { type: DataTypes.STRING, primaryKey: true },
      personId: { type: DataTypes.INTEGER, allowNull: false },
      userAgent: { type: DataTypes.STRING, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      lastSeenAt: { type: DataTypes.DATE, allowNull: false },
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      revokedAt: { type: DataTypes.DATE, allowNull: true },
    },
    tableOptions(sequelize, 'session', 'sessions'),
  )
}
