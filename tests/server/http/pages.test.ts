import { mkdir, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startTestServer, type TestServer } from '#tests/support/server.ts'

let server: TestServer
let unbuilt: TestServer
beforeAll(async () => {
  server = await startTestServer()
  unbuilt = await startTestServer()
  const directory = server.context.config.clientDirectory
  await mkdir(join(directory, 'assets'), { recursive: true })
  await writeFile(join(directory, 'index.html'), '<!doctype html><title>Sinewright</title>')
  await writeFile(join(directory, 'favicon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>')
  await writeFile(join(directory, 'assets', 'main-4f2a.js'), `${'export {}\n'.repeat(500)}`)
})
afterAll(() => Promise.all([server.close(), unbuilt.close()]))

const get = (path: string) => request(server.url).get(path)
const openPage = (path: string) => get(path).set('Accept', 'text/html,application/xhtml+xml')

describe('the client', () => {
  it.each(['/', '/designs', '/designs/3/start-up?from=0', '/runs/compare?a=1&b=2'])(
    'is served for the page %s and asked anew each time',
    async (path) => {
      const answer = await openPage(path)
      expect(answer.status).toBe(200)
      expect(answer.type).toBe('text/html')
      expect(answer.text).toContain('<title>Sinewright</title>')
      expect(answer.get('Cache-Control')).toBe('no-cache')
    },
  )

  it('keeps files with a hash in their name for ever, compressed', async () => {
    const answer = await get('/assets/main-4f2a.js')
    expect(answer.get('Cache-Control')).toBe('public, max-age=31536000, immutable')
    expect(answer.get('Content-Encoding')).toBe('gzip')
    expect(answer.type).toMatch(/javascript/)
  })

  it('asks for other files anew', async () => {
    expect((await get('/favicon.svg')).get('Cache-Control')).toBe('no-cache')
  })

  it('answers 404 for a file that is not there, never the page', async () => {
    for (const path of ['/assets/gone-1234.js', '/gone.svg'])
      for (const accept of ['*/*', 'text/html'])
        expect((await get(path).set('Accept', accept)).status).toBe(404)
  })

  it('is there for whoever takes anything, and for HEAD', async () => {
    // What curl and a monitor send (RFC 9110 §12.5.1: no preference stated; §9.3.2).
    const anything = await get('/designs').set('Accept', '*/*')
    expect([anything.status, anything.type]).toEqual([200, 'text/html'])
    const head = await request(server.url).head('/').set('Accept', '*/*')
    expect([head.status, head.type, head.text]).toEqual([200, 'text/html', undefined])
    expect((await get('/').set('Accept', 'application/json')).status).toBe(404)
  })

  it('does not answer anything else than GET with the page', async () => {
    expect((await request(server.url).post('/designs').set('Accept', 'text/html')).status).toBe(404)
  })

  it.each(['/../package.json', '/..%2Fpackage.json', '/assets/..%2F..%2Ftest.sqlite', '/.env'])(
    'does not give away files outside its folder: %s',
    async (path) => {
      expect((await get(path)).status).toBeGreaterThanOrEqual(400)
    },
  )

  it('says what to do when it is not built', async () => {
    const answer = await request(unbuilt.url).get('/').set('Accept', 'text/html')
    expect(answer.status).toBe(404)
    expect(answer.body).toMatchObject({ title: 'The client is not built. Run "npm run build:client".' })
  })
})

describe('every answer', () => {
  it.each(['/', '/api/health', '/api/nothing'])('of %s carries the security headers', async (path) => {
    const answer = await openPage(path)
    // Fetch directives of W3C Content Security Policy Level 3; no inline code or style, no frames.
    const policy = answer.get('Content-Security-Policy')!
    expect(policy.split(';').sort()).toEqual([
      ...["base-uri 'none'", "connect-src 'self'", "default-src 'none'", "font-src 'self'"],
      ...["form-action 'self'", "frame-ancestors 'none'", "img-src 'self' data:", "manifest-src 'self'"],
      ...["script-src 'self'", "style-src 'self'", "worker-src 'self'"],
    ])
    expect(answer.get('X-Content-Type-Options')).toBe('nosniff')
    expect(answer.get('X-Frame-Options')).toBe('DENY')
    expect(answer.get('X-Powered-By')).toBeUndefined()
    expect(answer.get('Strict-Transport-Security')).toBeUndefined()
  })

  it('asks for encryption when there is a proxy that does it', async () => {
    const secure = await startTestServer({ config: { mode: 'production', trustProxy: 1 } })
    try {
      const answer = await request(secure.url).get('/api/health')
      expect(answer.body).toMatchObject({ status: 'ok', mode: 'production' })
      expect(answer.get('Strict-Transport-Security')).toMatch(/^max-age=\d{8}/)
      expect(answer.get('Content-Security-Policy')).toContain('upgrade-insecure-requests')
    } finally {
      await secure.close()
    }
  })

  it('of the API stays out of caches', async () => {
    const answer = await get('/api/health')
    expect(answer.get('Cache-Control')).toBe('no-store')
    expect(answer.body).toMatchObject({ status: 'ok', mode: 'demo' })
  })
})

describe('the demo', () => {
  it.each(['evil.example', 'localhost.evil.example', '192.0.2.1:4173'])(
    'does not answer to the name %s (DNS rebinding)',
    async (host) => {
      const answer = await get('/api/health').set('Host', host)
      expect(answer.status).toBe(421)
      expect(answer.body).toMatchObject({ code: 'wrong-host' })
    },
  )

  it.each(['localhost:4173', '127.0.0.1', '[::1]:4173'])('answers to %s', async (host) => {
    expect((await get('/api/health').set('Host', host)).status).toBe(200)
  })
})
