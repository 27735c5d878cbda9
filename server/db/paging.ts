import type { Page } from '#shared/schemas/paging.ts'

type Asked = Pick<Page<unknown>, 'page' | 'pageSize'>

/** The rows of one page, as Sequelize is asked for them; limits count joined rows, of which each row here has one. */
export function rowsOf({ page, pageSize }: Asked) {
  return { limit: pageSize, offset: (page - 1) * pageSize, subQuery: false }
}

/** The rows that were found, as the client reads a page of them. */
export function presentPage<Row, Item>(
  { page, pageSize }: Asked,
  { rows, count }: { rows: Row[]; count: number },
  present: (row: Row) => Item,
): Page<Item> {
  return { items: rows.map(present), total: count, page, pageSize }
}
