import {
  DataTypes,
  Model,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize'
import { tableOptions } from '#server/db/models/table-options.ts'

/** A run's record: gzip of the bytes of `shared/record-codec.ts`. */
export class RunRecord extends Model<InferAttributes<RunRecord>, InferCreationAttributes<RunRecord>> {
  declare runId: number
  declare bytes: Buffer
}

export function defineRunRecord(sequelize: Sequelize): typeof RunRecord {
  return class extends RunRecord {}.init(
    {
      runId: { type: DataTypes.INTEGER, primaryKey: true },
      bytes: { type: DataTypes.BLOB, allowNull: false },
    },
    tableOptions(sequelize, 'runRecord', 'run_records'),
  )
}
