import {
  DataTypes,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type NonAttribute,
  type Sequelize,
} from 'sequelize'
import type { Design } from '#server/db/models/design.ts'
import type { Person } from '#server/db/models/person.ts'
import { tableOptions } from '#server/db/models/table-options.ts'
import type { Figures } from '#shared/figures.ts'
import type { RecordLayout, RunModeSpan } from '#shared/schemas/run.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'

/** A saved time-domain result; its record stands in `RunRecord`. */
export class Run extends Model<InferAttributes<Run>, InferCreationAttributes<Run>> {
  declare id: CreationOptional<number>
  declare designId: number
  declare authorId: number
  declare title: string
  declare note: string
  declare engineVersion: string
  declare inputs: RunInputs
  declare figures: Figures
  declare modes: RunModeSpan[]
  declare unsettled: string | null
  /** s. */
  declare sampleInterval: number
  /** Samples per column. */
  declare samples: number
  declare columns: RecordLayout['columns']
  declare createdAt: Date
  declare design?: NonAttribute<Design>
  declare author?: NonAttribute<Person>
}

export function defineRun(sequelize: Sequelize): typeof Run {
  return class extends Run {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      designId: { type: DataTypes.INTEGER, allowNull: false },
      authorId: { type: DataTypes.INTEGER, allowNull: false },
      title: { type: DataTypes.STRING, allowNull: false },
      note: { type: DataTypes.TEXT, allowNull: false },
      engineVersion: { type: DataTypes.STRING, allowNull: false },
      inputs: { type: DataTypes.JSON, allowNull: false },
      figures: { type: DataTypes.JSON, allowNull: false },
      modes: { type: DataTypes.JSON, allowNull: false },
      unsettled: { type: DataTypes.TEXT, allowNull: true },
      sampleInterval: { type: DataTypes.DOUBLE, allowNull: false },
      samples: { type: DataTypes.INTEGER, allowNull: false },
      columns: { type: DataTypes.JSON, allowNull: false },
      createdAt: { type: DataTypes.DATE, allowNull: false },
    },
    tableOptions(sequelize, 'run', 'runs'),
  )
}
