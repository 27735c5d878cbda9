/** One preparing process at a time in a checkout: two installing or building into the same folders ruin both. */
import { mkdirSync, rmSync, statSync, utimesSync, writeFileSync } from 'node:fs'
import { dirname } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'

/** Between two signs of life of whoever holds a lock, ms. */
const heartbeat = 1000
/** A lock that gave no sign of life for so long was left by a process that was killed, ms. */
const abandonedAfter = 6000
/** Between two looks at a lock that another holds, ms. */
const patience = 200

/** @param {string} file @returns {boolean} whether it is ours now */
function take(file) {
  try {
    writeFileSync(file, '', { flag: 'wx' })
    return true
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code === 'EEXIST') return false
    throw error
  }
}

/** @param {string} file */
function isAbandoned(file) {
  const lock = statSync(file, { throwIfNoEntry: false })
  return lock !== undefined && Date.now() - lock.mtimeMs > abandonedAfter
}

/**
 * Runs `work` while holding `file` as the lock, waiting for another process that holds it.
 * @template T
 * @param {string} file
 * @param {{ waiting?: () => void, work: () => Promise<T> }} step `waiting` is called once if there is need to wait
 * @returns {Promise<T>}
 */
export async function whileLocked(file, { waiting, work }) {
  mkdirSync(dirname(file), { recursive: true })
  for (let told = false; !take(file); told = true) {
    if (!told) waiting?.()
    if (isAbandoned(file)) rmSync(file, { force: true })
    else await pause(patience)
  }
  const beat = setInterval(() => utimesSync(file, new Date(), new Date()), heartbeat)
  try {
    return await work()
  } finally {
    clearInterval(beat)
    rmSync(file, { force: true })
  }
}
