import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize'
import { tableOptions } from '#server/db/models/table-options.ts'
import type { Role } from '#shared/roles.ts'

/** Somebody who may sign in. Never deleted, only made inactive: runs and drafts keep their author. */
export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: CreationOptional<number>
  declare name: string
  declare email: string
  declare role: Role
  declare passwordHash: string
  declare active: CreationOptional<boolean>
  /** An account of the demo: refused outside demo mode and from any other machine. */
  declare demo: CreationOptional<boolean>
  declare createdAt: Date
  declare updatedAt: Date
}

export function definePerson(sequelize: Sequelize): typeof Person {
  return class extends Person {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      name: { type: DataTypes.STRING, allowNull: false },
      email: { type: DataTypes.STRING, allowNull: false },
      role: { type: DataTypes.STRING, allowNull: false },
      passwordHash: { type: DataTypes.STRING, allowNull: false },
      active: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: true },
      demo: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      updatedAt: { type: DataTypes.DATE, allowNull: false },
    },
    tableOptions(sequelize, 'person', 'people'),
  )
}
