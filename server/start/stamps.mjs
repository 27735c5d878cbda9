/**
 * Hash stamps: whether something built from files is still up to date. No dependencies: this runs before anything is
 * installed.
 */
import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
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
export function hashOf(paths) {
  const hash = createHash('sha256')
  for (const file of paths.flatMap(filesBelow))
    hash.update(file).update('\0').update(readFileSync(file)).update('\0')
  return hash.digest('hex')
}

/**
 * Runs `make` unless `stamp` already holds the hash of `inputs`; writes the stamp only after `make` succeeded.
 * @param {{ stamp: string, inputs: string[], make: () => void }} step
 * @returns {boolean} whether it had to make
 */
export function whenChanged({ stamp, inputs, make }) {
  const hash = hashOf(inputs)
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return false
  make()
  mkdirSync(dirname(stamp), { recursive: true })
  writeFileSync(stamp, hash)
  return true
}
