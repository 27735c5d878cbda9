import { describe, expect, it } from 'vitest'
import { parseListParams, writeListParams } from '#client/lib/list-params.ts'
import { listDesignsSchema } from '#shared/schemas/design.ts'

const parse = (text: string) => parseListParams(listDesignsSchema, new URLSearchParams(text))
const defaults = listDesignsSchema.parse({})

describe('list parameters in the address', () => {
  it('come out as they went in, defaults unwritten', () => {
    const params = {
      ...defaults,
      search: 'kHz & Ω',
      projectId: 3,
      sort: 'name',
      order: 'asc',
      page: 2,
    } as const
    const written = writeListParams(listDesignsSchema, params)
    expect(parse(written.toString())).toEqual(params)
    expect(written.has('pageSize')).toBe(false)
    expect(writeListParams(listDesignsSchema, defaults).toString()).toBe('')
  })

  it('fall back one by one where the address is wrong', () => {
    expect(parse('page=-3&sort=colour&search=tone&other=1&order=asc')).toEqual({
      ...defaults,
      search: 'tone',
      order: 'asc',
    })
  })
})
