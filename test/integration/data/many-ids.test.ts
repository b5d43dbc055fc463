import { expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { machines } from '@/lib/data/machines'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

describeOnEachEngine('a reading that takes several queries', () => {
  useFreshDatabase()

  it('goes through the reader, which may not write', async () => {
    await database().write((tx) =>
      machines.insert(tx, 'DM-1', { name: 'Drawing machine 1', kind: 'drawing machine' }, 1),
    )
    // More ids than one query may carry: they are asked in pieces, within one transaction.
    const ids = Array.from({ length: 80_000 }, (_, index) => index + 1)
    const found = await database().read.machine.findMany({
      where: { id: { in: ids } },
      select: { code: true },
    })
    expect(found).toEqual([{ code: 'DM-1' }])
  })
})
