import { describe, expect, it } from 'vitest'
import {
  changeListQuery,
  readListQuery,
  readPicked,
  togglePicked,
} from '#client/features/runs/lib/list-params.ts'

const params = (text: string) => new URLSearchParams(text)

describe('readListQuery', () => {
  it('reads what the address says', () => {
    expect(readListQuery(params('search=lamp&page=3&sort=title&order=asc&designId=4'))).toMatchObject({
      search: 'lamp',
      page: 3,
      sort: 'title',
      order: 'asc',
      designId: 4,
    })
  })

  it('falls back field by field where the address makes no sense', () => {
    expect(readListQuery(params('page=0&sort=colour&authorId=x&search=ok'))).toEqual({
      search: 'ok',
      order: 'desc',
      page: 1,
      pageSize: 20,
      designId: undefined,
      authorId: undefined,
      sort: 'createdAt',
    })
  })
})

describe('changeListQuery', () => {
  it('begins again at page 1 when anything but the page changes', () => {
    expect(changeListQuery(params('page=3&sort=title'), { search: 'lamp' }).toString()).toBe(
      'sort=title&search=lamp',
    )
    expect(changeListQuery(params('page=3&sort=title'), { page: 2 }).toString()).toBe('page=2&sort=title')
  })

  it('leaves usual and emptied values out, and the picked runs alone', () => {
    expect(
      changeListQuery(params('search=x&designId=4&pick=1'), {
        search: '',
        designId: undefined,
        page: 1,
      }).toString(),
    ).toBe('pick=1')
  })
})

describe('picking runs to compare', () => {
  it('keeps two in the order picked; a third replaces the second', () => {
    let address = params('')
    for (const id of [9, 4, 5]) address = togglePicked(address, id)
    expect(readPicked(address)).toEqual([9, 5])
    expect(readPicked(togglePicked(address, 9))).toEqual([5])
    expect(togglePicked(params('pick=5'), 5).has('pick')).toBe(false)
  })

  it('ignores what is no identifier', () => {
    expect(readPicked(params('pick=0,-1,abc,7,8,9'))).toEqual([7, 8])
  })
})
