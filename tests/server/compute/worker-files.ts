/** Worker files of the tests, as `createCompute` takes them. */
import { fileURLToPath } from 'node:url'
import { findWorkerFile, type WorkerFile } from '#server/compute/worker-file.ts'

export { behaviours } from '#tests/server/compute/odd-worker.ts'

const { execArgv } = findWorkerFile()

const worker = (name: string): WorkerFile => ({
  filename: fileURLToPath(new URL(`./${name}.ts`, import.meta.url)),
  execArgv,
})

export const oddWorker = worker('odd-worker')
export const brokenWorker = worker('broken-worker')
