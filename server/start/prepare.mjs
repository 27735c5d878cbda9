/**
 * What must be there before the server can start: packages installed, client and server built. Runs before
 * `npm start` and `npm test`, installs and builds only what changed, and needs nothing but Node.js and npm.
 */
import { execFileSync } from 'node:child_process'
import { dirname } from 'node:path'
import { fileURLToPath } from 'node:url'
import { whenChanged } from './stamps.mjs'

const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))))
process.chdir(root)

const [major = 0, minor = 0] = process.versions.node.split('.').map(Number)
if (major < 20 || (major === 20 && minor < 19)) {
  console.error(`Sinewright needs Node.js 20.19 or later; this is ${process.versions.node}.`)
  process.exit(1)
}

/** @param {string[]} args */
function npm(...args) {
  try {
    execFileSync('npm', args, { stdio: 'inherit' })
  } catch {
    console.error(`\n“npm ${args.join(' ')}” failed; what it said stands above.`)
    process.exit(1)
  }
}

whenChanged({
  stamp: 'node_modules/.installed',
  inputs: ['package-lock.json'],
  make() {
    console.log('Installing packages (the database driver compiles: about a minute the first time) …')
    npm('ci', '--include=dev', '--no-fund', '--no-audit')
  },
})

whenChanged({
  stamp: 'dist/.built',
  inputs: ['package-lock.json', 'vite.config.ts', 'client', 'server', 'sim', 'shared'],
  make() {
    console.log('Building …')
    npm('run', '--silent', 'build')
  },
})
