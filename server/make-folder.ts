import { mkdirSync, statSync } from 'node:fs'
import { dirname } from 'node:path'

/**
 * Makes a folder and those above it. In place of Node's own recursive form, which never returns below a file system
 * that answers ENOENT to every mkdir, such as /proc.
 */
export function makeFolder(path: string): void {
  if (statSync(path, { throwIfNoEntry: false })?.isDirectory()) return
  makeFolder(dirname(path))
  mkdirSync(path)
}
