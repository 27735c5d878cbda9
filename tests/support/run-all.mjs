/**
 * `npm test`: installs what tests need (packages, and Debian's Chromium when it is missing), then lint, types, unit,
 * HTTP and component tests, the build, and the browser tests. Stops at the first step that fails.
 */
import { execFileSync, spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'
import { dirname } from 'node:path'
import { fileURLToPath } from 'node:url'

process.chdir(dirname(dirname(dirname(fileURLToPath(import.meta.url)))))

/** @param {string} title @param {string} command @param {string[]} args */
function step(title, command, ...args) {
  console.log(`\n── ${title} ──`)
  const { status, error } = spawnSync(command, args, { stdio: 'inherit' })
  if (status === 0) return
  console.error(`\n${title}: failed${error ? `: ${error.message}` : ''}.`)
  process.exit(status ?? 1)
}

function installChromium() {
  if (existsSync('/usr/bin/chromium')) return
  const sudo = process.getuid?.() === 0 ? [] : ['sudo']
  const apt = [...sudo, 'apt-get']
  const environment = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }
  console.log('\n── Chromium from Debian’s packages ──')
  try {
    for (const args of [['update'], ['install', '-y', '--no-install-recommends', 'chromium']])
      execFileSync(apt[0], [...apt.slice(1), ...args], { stdio: 'inherit', env: environment })
  } catch {
    console.error(
      '\nChromium could not be installed. The browser tests need /usr/bin/chromium (apt-get install chromium).',
    )
    process.exit(1)
  }
}

step('Packages and build', process.execPath, 'server/start/prepare.mjs')
installChromium()
step('Lint and formatting', 'npm', 'run', '--silent', 'lint')
step('Types', 'npm', 'run', '--silent', 'typecheck')
step('Unit, HTTP and component tests', 'npm', 'run', '--silent', 'test:unit')
step('Browser tests', 'npm', 'run', '--silent', 'test:e2e')
