import { request as httpRequest } from 'node:http'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest'
import { problemSchema } from '#shared/schemas/problem.ts'
import type { Design } from '#shared/schemas/design.ts'
import type { Agent } from '#tests/support/agent.ts'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
let engineer: Agent
beforeAll(async () => {
  server = await startTestServer({ config: { logLevel: 'info' } })
  engineer = await server.signInAs('engineer')
})
afterAll(() => server.close())

/** Sends raw bytes with the given type. */
const sendRaw = (body: string | Buffer, type = 'application/json') =>
  engineer.post('/api/projects').set('Content-Type', type).send(body)

interface Answer {
  status: number
  type: string
  body: unknown
}

function expectProblem(answer: Answer, status: number, code: string): void {
  expect(answer.status).toBe(status)
  expect(answer.type).toBe('application/problem+json')
  expect(problemSchema.parse(answer.body)).toMatchObject({ status, code, type: 'about:blank' })
}

describe('an error answer (RFC 9457)', () => {
  it('says that JSON is malformed', async () => {
    for (const text of ['{"name": ', '{name: 1}', 'null', '"text"'])
      expectProblem(await sendRaw(text), 400, 'malformed')
  })

  it.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x'])(
    'refuses a body of type %s',
    async (type) => {
      expectProblem(await sendRaw('name=x', type), 415, 'unsupported-type')
    },
  )

  it('refuses an encoding of the body that nobody understands', async () => {
    const answer = await sendRaw('{}').set('Content-Encoding', 'rot13')
    expectProblem(answer, 415, 'unsupported-type')
  })

  it('refuses a body of 50 MB, and goes on serving', async () => {
    const answer = await sendRaw(JSON.stringify({ name: 'x'.repeat(50 * 1024 * 1024) }))
    expectProblem(answer, 413, 'too-large')
    expect((await engineer.get('/api/projects')).status).toBe(200)
  })

  it('refuses a body that turns out too large without saying so first', async () => {
    const { hostname, port } = new URL(server.url)
    const status = await new Promise<number | undefined>((resolve, reject) => {
      const sent = httpRequest(
        {
          ...{ hostname, port, method: 'POST', path: '/api/session' },
          headers: { 'Content-Type': 'application/json', 'Transfer-Encoding': 'chunked' },
        },
        (answer) => {
          answer.resume()
          resolve(answer.statusCode)
        },
      )
      sent.on('error', reject)
      sent.write('{"email": "')
      for (let count = 0; count < 8; count++) sent.write('x'.repeat(64 * 1024))
      sent.end('"}')
    })
    expect(status).toBe(413)
  })

  it('names every field that is wrong', async () => {
    const answer = await engineer.post('/api/designs', { projectId: 'one', name: '  ', extra: 1 })
    expectProblem(answer, 422, 'invalid')
    const { errors } = answer.body as { errors: { path: unknown[]; message: string }[] }
    expect(errors.map(({ path }) => path)).toEqual([['projectId'], ['name'], []])
    expect(errors[1]!.message).toBe('Name is missing.')
  })

  it('refuses a body that is missing altogether, field by field', async () => {
    const answer = await engineer.post('/api/projects')
    expectProblem(answer, 422, 'invalid')
    expect(answer.body).toMatchObject({ errors: [{ path: ['name'], message: 'Name is missing.' }] })
  })

  it.each(['abc', '0', '-1', '1.5', '1e3', '999999999999999999999', '1%20OR%201=1', '%00', '..%2F1', 'NaN'])(
    'says that nothing has the id %s',
    async (id) => {
      for (const path of [`/api/designs/${id}`, `/api/runs/${id}`])
        expectProblem(await engineer.get(path), 404, 'not-found')
      expectProblem(await engineer.patch(`/api/projects/${id}`, { name: 'Renamed' }), 404, 'not-found')
    },
  )

  it('says that a whole id names nothing', async () => {
    expectProblem(await engineer.get('/api/designs/424242'), 404, 'not-found')
    expectProblem(await engineer.put('/api/designs/424242/draft', {}), 422, 'invalid')
  })

  it('survives a path that cannot be decoded', async () => {
    expectProblem(await engineer.get('/api/designs/%E0%A4%A'), 400, 'malformed')
  })

  it('says that an address below /api does not exist, signed in or not', async () => {
    for (const agent of [engineer, server.agent()])
      expectProblem(await agent.get('/api/nothing/here'), 404, 'not-found')
  })

  it('refuses query values that cannot be', async () => {
    const answer = await engineer.get('/api/designs?page=0&pageSize=5000&sort=secret&order=up')
    expectProblem(answer, 422, 'invalid')
    const { errors } = answer.body as { errors: { path: unknown[] }[] }
    expect(errors.map(({ path }) => path[0]).sort()).toEqual(['order', 'page', 'pageSize', 'sort'])
    expectProblem(await engineer.get('/api/designs?search=%00'), 422, 'invalid')
    expectProblem(await engineer.get('/api/designs?page=1&page=2'), 422, 'invalid')
  })

  it('hides what it did not foresee, and logs it under the same number', async () => {
    const { Project } = server.context.database.models
    const broken = vi.spyOn(Project, 'findAll').mockRejectedValueOnce(new Error('SELECT secret FROM people'))
    try {
      const answer = await engineer.get('/api/projects')
      expectProblem(answer, 500, 'internal')
      const { requestId } = answer.body as { requestId: string }
      expect(answer.text).not.toMatch(/SELECT|secret|\.ts/)
      expect(answer.get('X-Request-Id')).toBe(requestId)
      const line = server.logged.find((text) => text.includes('SELECT secret'))
      expect(JSON.parse(line!)).toMatchObject({ level: 50, requestId })
    } finally {
      broken.mockRestore()
    }
  })

  it('says 503 when the database does not answer', async () => {
    const broken = vi.spyOn(server.context.database, 'ping').mockRejectedValueOnce(new Error('gone'))
    try {
      expectProblem(await request(server.url).get('/api/health'), 503, 'database')
    } finally {
      broken.mockRestore()
    }
  })
})

describe('text that looks like code', () => {
  it.each([
    "Robert'); DROP TABLE designs; --",
    '<script>alert(1)</script>',
    '${7*7} {{7*7}} %s $1 :name ?',
    'Ωmega — 正弦波 🎛 é',
    '\\" \\u0000 `',
  ])('is kept as it is: %s', async (name) => {
    const project = await server.createProject()
    const made = await engineer.post('/api/designs', { projectId: project.id, name })
    expect(made.status).toBe(201)
    expect(made.type).toBe('application/json')
    const { id } = made.body as Design
    expect((await engineer.get(`/api/designs/${id}`)).body).toMatchObject({ name })
    const listed = await engineer.get('/api/designs').query({ search: name })
    expect(listed.body).toMatchObject({ total: 1, items: [{ id, name }] })
  })

  it.each(['two\nlines', 'nul\u0000', 'bell\u0007'])('may not hold control characters: %j', async (name) => {
    const answer = await engineer.post('/api/projects', { name })
    expectProblem(answer, 422, 'invalid')
    expect(answer.body).toMatchObject({
      errors: [{ message: 'Name may not contain line breaks or control characters.' }],
    })
  })
})
