import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize'
import { tableOptions } from '#server/db/models/table-options.ts'

/** A named holder of designs. */
export class Project extends Model<InferAttributes<Project>, InferCreationAttributes<Project>> {
  declare id: CreationOptional<number>
  declare name: string
  declare createdAt: Date
  declare updatedAt: Date
}

export function defineProject(sequelize: Sequelize): typeof Project {
  return class extends Project {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      name: { type: DataTypes.STRING, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      updatedAt: { type: DataTypes.DATE, allowNull: false },
    },
    tableOptions(sequelize, 'project', 'projects'),
  )
}
