/** Where the worker thread's code is: beside the bundled server, or the source itself under tsx and vitest. */
import { existsSync } from 'node:fs'
import { createRequire } from 'node:module'
import { fileURLToPath, pathToFileURL } from 'node:url'

export interface WorkerFile {
  /** Absolute path. */
  filename: string
  /** Node options that the thread needs to read it. */
  execArgv: string[]
}

export function findWorkerFile(): WorkerFile {
  const bundled = fileURLToPath(new URL('./worker.js', import.meta.url))
  if (existsSync(bundled)) return { filename: bundled, execArgv: [] }
  const source = fileURLToPath(new URL('./worker.ts', import.meta.url))
  const tsx = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href
  return { filename: source, execArgv: ['--import', tsx] }
}
