import { expect, it, vi } from 'vitest'
import { database } from '@/lib/data/database'
import { problem } from '@/lib/domain/errors'
import { refusalOf } from '../../support/refusal-of'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

/** A second copy of every module of the product, as the bundler makes one for pages and one for routes. */
const secondCopy = async () => {
  vi.resetModules()
  return {
    ...(await import('@/lib/data/database')),
    ...(await import('@/lib/data/guarded-client')),
    ...(await import('@/lib/data/locks')),
  }
}

describeOnEachEngine('two copies of the modules in one server', () => {
  useFreshDatabase()

  it('share one database, and know each other’s transactions', async () => {
    const engine = process.env.LEDGERLINE_TEST_ENGINE
    const first = database()
    const other = await secondCopy()
    expect(other.database).not.toBe(database)
    expect(other.database()).toBe(first)
    await first.write(async (tx) => {
      expect(other.engineOf(tx)).toBe(engine)
      await other.lockRow(tx, 'Lot', 1)
    })
    expect(other.engineOf(first.read)).toBe(engine)
  })

  it('wait for each other’s writes', async () => {
    const other = await secondCopy()
    const order: string[] = []
    const pause = () => new Promise((resolve) => setTimeout(resolve, 30))
    await Promise.all([
      database().write(async (tx) => {
        await tx.ledgerEntry.count()
        order.push('first begins')
        await pause()
        order.push('first ends')
      }),
      other.database().write(async (tx) => {
        await tx.ledgerEntry.count()
        order.push('second begins')
        await pause()
        order.push('second ends')
      }),
    ])
    if (process.env.LEDGERLINE_TEST_ENGINE === 'sqlite')
      expect(order).toEqual(['first begins', 'first ends', 'second begins', 'second ends'])
    else expect(order).toHaveLength(4)
  })

  it('tell refusals alike', async () => {
    const other = await secondCopy()
    expect(
      await refusalOf(other.database().write(() => Promise.reject(problem('not-ready', 'Not yet.')))),
    ).toMatchObject({ code: 'not-ready' })
  })
})
