import { existsSync, readFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

/** The nearest folder at or above `folder` that holds a package.json. */
function findRoot(folder: string): string {
  if (existsSync(join(folder, 'package.json'))) return folder
  const parent = dirname(folder)
  if (parent === folder) throw new Error('package.json was not found above the server')
  return findRoot(parent)
}

/** Folder of the project, the same from the sources and from the bundle. */
export const projectRoot = findRoot(dirname(fileURLToPath(import.meta.url)))

/** The product's version as package.json states it. */
export const version = (
  JSON.parse(readFileSync(join(projectRoot, 'package.json'), 'utf8')) as { version: string }
).version
