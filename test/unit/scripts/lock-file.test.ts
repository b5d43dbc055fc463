import { existsSync, mkdtempSync, rmSync, utimesSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { withLockFile } from '@/scripts/lib/lock-file.mjs'

let folder = ''
let path = ''
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'ledgerline-test-'))
  path = join(folder, 'install.lock')
})
afterEach(() => rmSync(folder, { recursive: true }))

const pause = (ms: number) => new Promise((done) => setTimeout(done, ms))

describe('withLockFile(path, work)', () => {
  it('lets one work at a time', async () => {
    let inside = 0
    let most = 0
    const work = async () => {
      inside += 1
      most = Math.max(most, inside)
      await pause(20)
      inside -= 1
    }
    await Promise.all([1, 2, 3].map(() => withLockFile(path, work)))
    expect(most).toBe(1)
    expect(existsSync(path)).toBe(false)
  })

  it('hands the answer back, and gives the lock back when the work fails', async () => {
    expect(await withLockFile(path, async () => 7)).toBe(7)
    await expect(
      withLockFile(path, async () => {
        throw new Error('no room')
      }),
    ).rejects.toThrow('no room')
    expect(existsSync(path)).toBe(false)
  })

  it('takes over from a holder that is gone', async () => {
    writeFileSync(path, '4194304 1')
    expect(await withLockFile(path, async () => 'mine', 2_000)).toBe('mine')
  })

  it('takes over from a later process that only has the holder’s number', async () => {
    writeFileSync(path, `${process.pid} 1`)
    expect(await withLockFile(path, async () => 'mine', 2_000)).toBe('mine')
  })

  it('waits for a lock that is just being written, not for one that stayed empty', async () => {
    writeFileSync(path, '')
    await expect(withLockFile(path, async () => 'mine', 200)).rejects.toThrow(/held .* for too long/)
    const before = new Date(Date.now() - 60_000)
    utimesSync(path, before, before)
    expect(await withLockFile(path, async () => 'mine', 2_000)).toBe('mine')
  })
})
