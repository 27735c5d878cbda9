/**
 * Hash stamps: whether something built from files is still up to date. No dependencies: this runs before anything is
 * installed.
 */
import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { dirname, join } from 'node:path'

/** @param {string} path @returns {string[]} the file itself, or every file below the folder, sorted */
function filesBelow(path) {
  if (!existsSync(path)) return []
  if (statSync(path).isFile()) return [path]
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesBelow(join(path, name)))
}

/** One hash over the contents and names of files and folders. @param {string[]} paths */
function hashOf(paths) {
  const hash = createHash('sha256')
  for (const file of paths.flatMap(filesBelow))
    hash.update(file).update('\0').update(readFileSync(file)).update('\0')
  return hash.digest('hex')
}

/**
 * Something made from files: `stamp` holds the hash of `inputs` when `outputs` were made from them.
 * @typedef {{ stamp: string, inputs: string[], outputs?: string[], make: () => unknown }} Step
 */

/** @param {Step} step */
export function isUpToDate({ stamp, inputs, outputs = [] }) {
  return existsSync(stamp) && readFileSync(stamp, 'utf8') === hashOf(inputs) && outputs.every(existsSync)
}

/**
 * Runs `make` unless everything is up to date. The stamp is taken away before and written only after `make` succeeded:
 * what failed halfway is made anew, whatever the inputs are by then.
 * @param {Step} step
 * @returns {Promise<boolean>} whether it had to make
 */
export async function whenChanged(step) {
  if (isUpToDate(step)) return false
  const hash = hashOf(step.inputs)
  rmSync(step.stamp, { force: true })
  await step.make()
  mkdirSync(dirname(step.stamp), { recursive: true })
  writeFileSync(step.stamp, hash)
  return true
}
