import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { rm } from 'node:fs/promises'
import { join } from 'node:path'
import { build } from 'esbuild'
import { projectRoot } from '#server/root.ts'

/** The server's commands bundled as for a release, in a folder of this test process. */
export interface BundledServer {
  main: string
  createAdmin: string
  remove(): Promise<void>
}

/** Bundles the commands once, so that starting them takes a fraction of a second. */
export async function bundleServer(): Promise<BundledServer> {
  // Below the project, where the packages are found.
  const outdir = join(projectRoot, '.cache', `server-under-test-${process.pid}`)
  await build({
    entryPoints: ['server/main.ts', 'server/create-admin.ts'].map((file) => join(projectRoot, file)),
    outdir,
    bundle: true,
    packages: 'external',
    platform: 'node',
    format: 'esm',
    target: 'node20',
  })
  return {
    main: join(outdir, 'main.js'),
    createAdmin: join(outdir, 'create-admin.js'),
    remove: () => rm(outdir, { recursive: true, force: true }),
  }
}

/** A command running in a process of its own. */
export interface SpawnedProcess {
  output(): { stdout: string; stderr: string }
  /** Resolves when standard output matches; rejects when the process ends before. */
  printed(pattern: RegExp): Promise<RegExpExecArray>
  signal(name: NodeJS.Signals): void
  /** Resolves with the exit code when the process has ended and its output is complete. */
  ended: Promise<number | null>
}

/**
 * Runs a file with nothing of this process's environment but the path.
 * @param input what its standard input holds
 */
export function spawnNode(
  file: string,
  environment: Record<string, string>,
  { args = [], input = '' }: { args?: string[]; input?: string } = {},
): SpawnedProcess {
  const child = spawn(process.execPath, [file, ...args], {
    env: { PATH: process.env.PATH, ...environment },
  })
  child.stdin.end(input)
  let stdout = ''
  let stderr = ''
  child.stdout.on('data', (chunk: Buffer) => (stdout += chunk.toString()))
  child.stderr.on('data', (chunk: Buffer) => (stderr += chunk.toString()))
  const ended = once(child, 'close').then(([code]) => code as number | null)
  return {
    output: () => ({ stdout, stderr }),
    printed: (pattern) =>
      new Promise((resolve, reject) => {
        const look = () => {
          const match = pattern.exec(stdout)
          if (match) resolve(match)
        }
        child.stdout.on('data', look)
        look()
        void ended.then((code) => reject(new Error(`ended with ${code}:\n${stdout}\n${stderr}`)))
      }),
    signal: (name) => void child.kill(name),
    ended,
  }
}
