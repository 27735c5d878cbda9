/** What a start makes anew, and what it leaves alone. */
import { mkdir, rm, stat, utimes, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { whileLocked } from '#server/start/lock.mjs'
import { whenChanged } from '#server/start/stamps.mjs'
import { temporaryFolder } from '#tests/support/database.ts'

let folder: Awaited<ReturnType<typeof temporaryFolder>>
const path = (...names: string[]) => join(folder.path, ...names)
beforeEach(async () => {
  folder = await temporaryFolder()
  await mkdir(path('source', 'deep'), { recursive: true })
  await writeFile(path('source', 'deep', 'a.ts'), 'first')
})
afterEach(() => folder.remove())

const step = (make: () => unknown) => ({
  stamp: path('made', '.stamp'),
  inputs: [path('source'), path('may-be-missing.json')],
  outputs: [path('out.js')],
  make,
})
const build = () => writeFile(path('out.js'), 'built')

describe('whenChanged', () => {
  it('makes once, and again after a change, a new file, a renamed file and a lost result', async () => {
    expect(await whenChanged(step(build))).toBe(true)
    expect(await whenChanged(step(build))).toBe(false)
    const changes = [
      () => writeFile(path('source', 'deep', 'a.ts'), 'second'),
      () => writeFile(path('source', 'b.ts'), ''),
      () => writeFile(path('may-be-missing.json'), '{}'),
      () => rm(path('source', 'b.ts')),
      () => rm(path('out.js')),
    ]
    for (const change of changes) {
      await change()
      expect(await whenChanged(step(build))).toBe(true)
      expect(await whenChanged(step(build))).toBe(false)
    }
  })

  it('makes anew after a failure even when the sources are what they were before', async () => {
    await whenChanged(step(build))
    await writeFile(path('source', 'deep', 'a.ts'), 'broken')
    const failing = step(() => Promise.reject(new Error('does not compile')))
    await expect(whenChanged(failing)).rejects.toThrow('does not compile')
    await writeFile(path('source', 'deep', 'a.ts'), 'first')
    expect(await whenChanged(step(build))).toBe(true)
  })
})

describe('whileLocked', () => {
  it('lets one work at a time, tells the other that it waits, and frees the lock after a failure', async () => {
    const lock = path('cache', 'lock')
    const told = vi.fn()
    let inside = 0
    const work = async () => {
      expect(++inside).toBe(1)
      await new Promise((resolve) => setTimeout(resolve, 20))
      inside -= 1
    }
    const failing = whileLocked(lock, {
      work: async () => {
        await work()
        throw new Error('failed')
      },
    })
    const waiting = whileLocked(lock, { waiting: told, work })
    await expect(failing).rejects.toThrow('failed')
    await waiting
    expect(told).toHaveBeenCalledTimes(1)
    await expect(stat(lock)).rejects.toThrow('ENOENT')
  })

  it('takes over what a killed process left', async () => {
    const lock = path('lock')
    await writeFile(lock, '')
    const longAgo = new Date(Date.now() - 60_000)
    await utimes(lock, longAgo, longAgo)
    expect(await whileLocked(lock, { work: () => Promise.resolve('done') })).toBe('done')
  })
})
