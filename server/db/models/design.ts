import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize'
import type { Draft } from '#server/db/models/draft.ts'
import type { Person } from '#server/db/models/person.ts'
import type { Project } from '#server/db/models/project.ts'
import { tableOptions } from '#server/db/models/table-options.ts'

/** An oscillator that somebody designs; what is being edited stands in its draft. */
export class Design extends Model<InferAttributes<Design>, InferCreationAttributes<Design>> {
  declare id: CreationOptional<number>
  declare projectId: number
  declare name: string
  declare createdBy: number
  declare createdAt: Date
  /** Null while in use. */
  declare archivedAt: CreationOptional<Date | null>
  declare project?: NonAttribute<Project>
  declare creator?: NonAttribute<Person>
  declare draft?: NonAttribute<Draft>
}

export function defineDesign(sequelize: Sequelize): typeof Design {
  return class extends Design {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      projectId: { type: DataTypes.INTEGER, allowNull: false },
      name: { type: DataTypes.STRING, allowNull: false },
      createdBy: { type: DataTypes.INTEGER, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
      archivedAt: { type: DataTypes.DATE, allowNull: true },
    },
    tableOptions(sequelize, 'design', 'designs'),
  )
}
