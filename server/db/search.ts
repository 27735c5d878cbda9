import { col, fn, where } from 'sequelize'

/**
 * Condition: `column` holds `text` somewhere, without regard to the case of A–Z. Nothing in `text` is a wildcard.
 * @param column qualified by its model's alias, e.g. "design.name"
 */
export function containsText(column: string, text: string) {
  return where(fn('instr', fn('lower', col(column)), fn('lower', text)), '>', 0)
}
