import { col, fn, literal, where } from 'sequelize'

/**
 * Condition: `column` holds `text` somewhere, without regard to the case of A–Z. Nothing in `text` is a wildcard.
 * The text goes into the statement as a hexadecimal literal: Sequelize would double every `$` in a quoted one.
 * @param column qualified by its model's alias, e.g. "design.name"
 */
export function containsText(column: string, text: string) {
  const sought = literal(`CAST(X'${Buffer.from(text).toString('hex')}' AS TEXT)`)
  return where(fn('instr', fn('lower', col(column)), fn('lower', sought)), '>', 0)
}
