import type { InitOptions, Model, Sequelize } from 'sequelize'

/** What every model has in common: snake_case columns, times set by us from the server's clock. */
export function tableOptions<M extends Model>(
  sequelize: Sequelize,
  modelName: string,
  tableName: string,
): InitOptions<M> {
  return { sequelize, modelName, tableName, underscored: true, timestamps: false }
}
