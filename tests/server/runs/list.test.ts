/** The list of runs: paging, sorting, filters and search. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Design } from '#server/db/models/design.ts'
import type { Person } from '#server/db/models/person.ts'
import type { Page } from '#shared/schemas/paging.ts'
import type { RunSummary } from '#shared/schemas/run.ts'
import { storeRun } from '#tests/server/runs/saving.ts'
import type { Agent } from '#tests/support/agent.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
let technician: Agent
let anna: Person
let zoe: Person
let exciter: Design
let tracer: Design
beforeAll(async () => {
  server = await startTestServer()
  technician = await server.signInAs('technician')
  anna = await server.createPerson('engineer', { name: 'Anna' })
  zoe = await server.createPerson('engineer', { name: 'Zoe' })
  exciter = await server.createDesign({ name: 'Exciter 100%', author: anna })
  tracer = await server.createDesign({ name: 'Tracer', author: zoe })
  for (let number = 1; number <= 130; number++) {
    const even = number % 2 === 0
    server.clock.advance(1000)
    await storeRun(server, even ? tracer : exciter, number % 5 === 0 ? zoe : anna, {
      title: `Run ${String(number).padStart(3, '0')}`,
      note: number === 77 ? 'Rail of 50_% and more' : '',
    })
  }
}, 60_000)
afterAll(() => server.close())

async function list(query: string): Promise<Page<RunSummary>> {
  const answer = await technician.get(`/api/runs?${query}`)
  expect(answer.status).toBe(200)
  return answer.body as Page<RunSummary>
}
const titles = ({ items }: Page<RunSummary>) => items.map(({ title }) => title)

describe('GET /api/runs', () => {
  it('shows the newest first, twenty to a page', async () => {
    const first = await list('')
    expect(first).toMatchObject({ total: 130, page: 1, pageSize: 20 })
    expect(titles(first).slice(0, 2)).toEqual(['Run 130', 'Run 129'])
    expect(first.items).toHaveLength(20)
    expect(first.items[0]).toMatchObject({
      design: { id: tracer.id, name: 'Tracer' },
      project: { id: tracer.projectId },
      author: { id: zoe.id, name: 'Zoe' },
      engineVersion: '0.0.0-test',
    })
  })

  it('gives every run exactly once over its pages', async () => {
    const pages = await Promise.all(
      [1, 2, 3, 4].map((page) => list(`pageSize=40&page=${page}&sort=author&order=asc`)),
    )
    expect(pages.map(({ items }) => items.length)).toEqual([40, 40, 40, 10])
    expect(new Set(pages.flatMap(titles)).size).toBe(130)
    const authors = pages.flatMap(({ items }) => items.map(({ author }) => author.name))
    expect(authors).toEqual([...authors].sort())
  })

  it('has an empty page behind the last', async () => {
    expect(await list('page=99')).toEqual({ items: [], total: 130, page: 99, pageSize: 20 })
  })

  it('keeps inputs, spans and record out of the list', async () => {
    const { items } = await list('pageSize=1')
    expect(Object.keys(items[0]!).sort()).toEqual(
      ['author', 'createdAt', 'design', 'engineVersion', 'figures', 'id', 'note', 'project', 'title'].sort(),
    )
  })

  it.each([
    ['sort=title&order=asc', 'Run 001'],
    ['sort=title&order=desc', 'Run 130'],
    ['sort=createdAt&order=asc', 'Run 001'],
    ['sort=design&order=asc', 'Run 001'],
    ['sort=design&order=desc', 'Run 130'],
    ['sort=author&order=desc', 'Run 130'],
  ])('sorts by %s', async (query, first) => {
    expect(titles(await list(query))[0]).toBe(first)
  })

  it('filters by design and by author, both at once too', async () => {
    expect((await list(`designId=${exciter.id}`)).total).toBe(65)
    expect((await list(`authorId=${zoe.id}`)).total).toBe(26)
    const both = await list(`designId=${exciter.id}&authorId=${zoe.id}`)
    expect(both.total).toBe(13)
    expect(both.items.every(({ design, author }) => design.id === exciter.id && author.id === zoe.id)).toBe(
      true,
    )
    expect((await list('designId=999999')).total).toBe(0)
  })

  it('searches in title, note and design, and takes no character for a wildcard', async () => {
    expect(titles(await list('search=rUn%20042'))).toEqual(['Run 042'])
    expect(titles(await list('search=rail%20of'))).toEqual(['Run 077'])
    expect((await list('search=tracer')).total).toBe(65)
    expect((await list('search=100%25')).total).toBe(65)
    expect(titles(await list('search=50_%25'))).toEqual(['Run 077'])
    expect((await list('search=Run%20_42')).total).toBe(0)
    expect((await list(`search=${encodeURIComponent("' OR 1=1 --")}`)).total).toBe(0)
  })

  it.each([
    ['page=0', 'page'],
    ['pageSize=101', 'pageSize'],
    ['sort=note', 'sort'],
    ['order=up', 'order'],
    ['designId=abc', 'designId'],
  ])('answers 422 to %s', async (query, field) => {
    const answer = await technician.get(`/api/runs?${query}`)
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({ code: 'invalid', errors: [{ path: [field] }] })
  })
})
