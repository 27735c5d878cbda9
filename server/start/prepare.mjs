/**
 * What must be there before the server can start: packages installed, client and server built. Runs before
 * `npm start` and `npm test`, installs and builds only what changed, and needs nothing but Node.js and npm.
 */
import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { dirname } from 'node:path'
import { fileURLToPath } from 'node:url'
import { whileLocked } from './lock.mjs'
import { isUpToDate, whenChanged } from './stamps.mjs'

const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))))
process.chdir(root)

const [major = 0, minor = 0] = process.versions.node.split('.').map(Number)
if (major < 20 || (major === 20 && minor < 19)) {
  console.error(`Sinewright needs Node.js 20.19 or later; this is ${process.versions.node}.`)
  process.exit(1)
}

/** @type {import('node:child_process').ChildProcess | undefined} */
let underWay

// npm and what it starts stand in a process group of their own, which ends with this process.
for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP']))
  process.on(signal, () => {
    if (underWay?.pid !== undefined) process.kill(-underWay.pid, signal)
    else process.exit(1)
  })

/** @param {string[]} args */
async function npm(...args) {
  underWay = spawn('npm', args, { stdio: ['ignore', 'inherit', 'inherit'], detached: true })
  const [code, signal] = await once(underWay, 'close').catch((error) => [String(error)])
  underWay = undefined
  if (code === 0) return
  const why = signal ? `was ended by ${signal}` : 'failed; what it said stands above'
  throw new Error(`“npm ${args.join(' ')}” ${why}.`)
}

const installed = {
  stamp: 'node_modules/.installed',
  inputs: ['package-lock.json'],
  make() {
    console.log('Installing packages (the database driver compiles: about a minute the first time) …')
    return npm('ci', '--include=dev', '--no-fund', '--no-audit')
  },
}

const built = {
  stamp: 'dist/.built',
  inputs: ['package-lock.json', 'package.json', 'vite.config.ts', 'client', 'server', 'sim', 'shared'],
  outputs: ['dist/client/index.html', 'dist/server/main.js', 'dist/server/worker.js'],
  make() {
    console.log('Building …')
    return npm('run', '--silent', 'build')
  },
}

async function prepare() {
  if (isUpToDate(installed) && isUpToDate(built)) return
  await whileLocked('.cache/preparing', {
    waiting: () => console.log('Another start is installing or building; waiting for it …'),
    async work() {
      await whenChanged(installed)
      await whenChanged(built)
    },
  })
}

await prepare().catch((error) => {
  console.error(`\n${error.message}`)
  process.exit(1)
})
