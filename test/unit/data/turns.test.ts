import { describe, expect, it } from 'vitest'
import { createTurns } from '@/lib/data/turns'

const tick = () => new Promise<void>((done) => setImmediate(done))

describe('createTurns', () => {
  it('gives turns one at a time, in the order of asking', async () => {
    const turns = createTurns()
    const seen: string[] = []
    const work = (name: string) => async () => {
      seen.push(`${name} begins`)
      await tick()
      seen.push(`${name} ends`)
    }
    await Promise.all([turns.run(work('a')), turns.run(work('b')), turns.run(work('c'))])
    expect(seen).toEqual(['a begins', 'a ends', 'b begins', 'b ends', 'c begins', 'c ends'])
  })

  it('hands the turn on when work fails, and throws its error', async () => {
    const turns = createTurns()
    const failing = turns.run(async () => {
      await tick()
      throw new Error('no')
    })
    const next = turns.run(async () => 'yes')
    await expect(failing).rejects.toThrow('no')
    expect(await next).toBe('yes')
  })

  it('lets as many in at once as it was told', async () => {
    const turns = createTurns(3)
    let inside = 0
    let most = 0
    await Promise.all(
      Array.from({ length: 10 }, () =>
        turns.run(async () => {
          inside += 1
          most = Math.max(most, inside)
          await tick()
          inside -= 1
        }),
      ),
    )
    expect(most).toBe(3)
    expect(inside).toBe(0)
  })

  it('is not given twice by a turn that is handed on twice', async () => {
    const turns = createTurns()
    const handOn = await turns.take()
    handOn()
    handOn()
    await turns.take()
    let third = false
    void turns.take().then(() => {
      third = true
    })
    await tick()
    expect(third).toBe(false)
  })
})
