import {
  DataTypes,
  Model,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize'
import type { Person } from '#server/db/models/person.ts'
import { tableOptions } from '#server/db/models/table-options.ts'
import type { DraftContent } from '#shared/schemas/simulation.ts'

/** A design's working content. `version` grows by one with every save. */
export class Draft extends Model<InferAttributes<Draft>, InferCreationAttributes<Draft>> {
  declare designId: number
  declare version: number
  declare content: DraftContent
  declare savedBy: number
  declare savedAt: Date
  declare saver?: NonAttribute<Person>
}

export function defineDraft(sequelize: Sequelize): typeof Draft {
  return class extends Draft {}.init(
    {
      designId: { type: DataTypes.INTEGER, primaryKey: true },
      version: { type: DataTypes.INTEGER, allowNull: false },
      content: { type: DataTypes.JSON, allowNull: false },
      savedBy: { type: DataTypes.INTEGER, allowNull: false },
      savedAt: { type: DataTypes.DATE, allowNull: false },
    },
    tableOptions(sequelize, 'draft', 'drafts'),
  )
}
