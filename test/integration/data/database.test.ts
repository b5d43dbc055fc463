import { setTimeout as pause } from 'node:timers/promises'
import { expect, it } from 'vitest'
import { database, type Tx } from '@/lib/data/database'
import { lockRow } from '@/lib/data/locks'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const createMachine = (tx: Tx, code: string) =>
  tx.machine.create({
    data: { code, name: code, searchKey: code.toLowerCase(), kind: 'drawing', createdAt: new Date() },
  })

const machineCodes = async () =>
  (await database().read.machine.findMany({ orderBy: { id: 'asc' } })).map(({ code }) => code)

describeOnEachEngine('database().write', (engine) => {
  useFreshDatabase('test')

  it('stores what its work wrote and returns what its work returned', async () => {
    const made = await database().write((tx) => createMachine(tx, 'M-1'))
    expect(made.code).toBe('M-1')
    expect(await machineCodes()).toEqual(['M-1'])
  })

  it('stores nothing when its work throws, and throws the same', async () => {
    const write = database().write(async (tx) => {
      await createMachine(tx, 'M-1')
      throw new Error('changed my mind')
    })
    await expect(write).rejects.toThrow('changed my mind')
    expect(await machineCodes()).toEqual([])
  })

  it('keeps an acknowledged write when another request’s transaction rolls back around it', async () => {
    const rolledBack = database().write(async (tx) => {
      await createMachine(tx, 'M-1')
      await pause(150)
      throw new Error('rolled back')
    })
    await pause(30)
    await Promise.allSettled([rolledBack, database().write((tx) => createMachine(tx, 'M-2'))])
    expect(await machineCodes()).toEqual(['M-2'])
  })

  it('hides what is not committed from database().read', async () => {
    const writing = database().write(async (tx) => {
      await createMachine(tx, 'M-1')
      await pause(150)
    })
    await pause(50)
    const seen = await machineCodes()
    await writing
    expect(seen).toEqual([])
    expect(await machineCodes()).toEqual(['M-1'])
  })

  it('refuses to commit when a call was made and not awaited', async () => {
    const write = database().write(async (tx) => {
      await createMachine(tx, 'M-1')
      void createMachine(tx, 'M-2')
    })
    await expect(write).rejects.toThrow('Not awaited inside database().write: machine.create')
    expect(await machineCodes()).toEqual([])
  })

  it('refuses to commit when a helper with several calls was not awaited', async () => {
    const write = database().write(async (tx) => {
      const helper = async () => {
        await createMachine(tx, 'M-1')
        await createMachine(tx, 'M-2')
      }
      helper().catch(() => undefined)
    })
    await expect(write).rejects.toThrow('Not awaited')
    await pause(50)
    expect(await machineCodes()).toEqual([])
  })

  it('gives a transaction’s client no life after it', async () => {
    let kept: Tx | undefined
    let later: Promise<unknown> | undefined
    await database().write(async (tx) => {
      kept = tx
      later = pause(50).then(() => createMachine(tx, 'M-9'))
      later.catch(() => undefined)
    })
    await expect(later).rejects.toThrow('machine.create after its transaction ended')
    expect(() => kept?.machine.count()).toThrow('after its transaction ended')
    expect(await machineCodes()).toEqual([])
  })

  it('refuses a call that was made inside and awaited after the end', async () => {
    let made: PromiseLike<unknown> | undefined
    await expect(
      database().write(async (tx) => {
        made = createMachine(tx, 'M-1')
      }),
    ).rejects.toThrow('Not awaited')
    expect(() => made?.then()).toThrow('after its transaction ended')
    expect(await machineCodes()).toEqual([])
  })

  it('refuses the outer client inside a transaction', async () => {
    const reading = database().write(async () => database().read.machine.count())
    await expect(reading).rejects.toThrow('database().read.machine.count inside database().write')
    const nesting = database().write(async () => database().write((tx) => createMachine(tx, 'M-1')))
    await expect(nesting).rejects.toThrow('database().write inside database().write')
    expect(await machineCodes()).toEqual([])
  })

  it('refuses a write that begins in code which its transaction did not await', async () => {
    let later: Promise<unknown> | undefined
    await database().write(async () => {
      later = pause(50).then(() => database().write((tx) => createMachine(tx, 'M-1')))
      later.catch(() => undefined)
    })
    await expect(later).rejects.toThrow('database().write after its transaction ended')
    expect(await machineCodes()).toEqual([])
  })

  it('refuses $transaction on the client it gives', async () => {
    const write = database().write(async (tx) =>
      (tx as unknown as { $transaction: (work: unknown[]) => Promise<unknown> }).$transaction([]),
    )
    await expect(write).rejects.toThrow('$transaction is not for use here')
  })

  it('follows a relation asked for through a call’s promise', async () => {
    const roles = await database().write(async (tx) => {
      const person = await tx.person.create({
        data: {
          name: 'Ada Voss',
          username: 'ada',
          searchKey: 'ada voss',
          createdAt: new Date(),
          roles: { create: { role: 'bench' } },
        },
      })
      return tx.person.findUniqueOrThrow({ where: { id: person.id } }).roles()
    })
    expect(roles.map(({ role }) => role)).toEqual(['bench'])
  })

  it('lets 20 changes of one row at once all survive', async () => {
    const { id } = await database().write((tx) => createMachine(tx, 'M-1'))
    await Promise.all(
      Array.from({ length: 20 }, () =>
        database().write(async (tx) => {
          await lockRow(tx, 'Machine', id)
          const { version } = await tx.machine.findUniqueOrThrow({ where: { id } })
          await pause(2)
          await tx.machine.update({ where: { id }, data: { version: version + 1 } })
        }),
      ),
    )
    const machine = await database().read.machine.findUniqueOrThrow({ where: { id } })
    expect(machine.version).toBe(21)
  })

  it('lets a queue of 60 writers wait without giving up on any', async () => {
    await Promise.all(
      Array.from({ length: 60 }, (_, number) =>
        database().write(async (tx) => {
          await createMachine(tx, `M-${number}`)
          await pause(engine === 'sqlite' ? 50 : 5)
        }),
      ),
    )
    expect(await database().read.machine.count()).toBe(60)
  })

  it('goes on after a transaction that failed', async () => {
    await database().write((tx) => createMachine(tx, 'M-1'))
    const clash = database().write(async (tx) => {
      await createMachine(tx, 'M-2')
      await createMachine(tx, 'M-1')
    })
    await expect(clash).rejects.toMatchObject({ problem: { code: 'conflict', where: 'code' } })
    await database().write((tx) => createMachine(tx, 'M-3'))
    expect(await machineCodes()).toEqual(['M-1', 'M-3'])
  })
})

describeOnEachEngine('database().read', () => {
  useFreshDatabase()

  it('refuses every kind of write before it reaches the database', () => {
    const { read } = database()
    expect(() => createMachine(read, 'M-1')).toThrow('database().read does not write: machine.create')
    expect(() => read.machine.deleteMany()).toThrow('machine.deleteMany')
    expect(() => read.$executeRawUnsafe('delete from "Machine"')).toThrow('$executeRawUnsafe')
  })

  it('refuses a write that is hidden in a raw query', async () => {
    const { read } = database()
    await expect(
      read.$queryRawUnsafe(
        `insert into "LedgerHead" ("id", "count", "hash") values (2, 0, '') returning "id"`,
      ),
    ).rejects.toThrow('database().read does not write: a raw query tried to')
  })
})
