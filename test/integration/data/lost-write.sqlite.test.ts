/** The trap that the write lock is for, shown with the bare client, and closed at each door. */
import { setTimeout as pause } from 'node:timers/promises'
import { PrismaBetterSqlite3 } from '@prisma/adapter-better-sqlite3'
import { expect, it } from 'vitest'
import { openSqlite } from '@/lib/data/connections'
import { database, openDatabase } from '@/lib/data/database'
import { storageProblem } from '@/lib/data/db-errors'
import { filePath, requireEnvironment } from '@/lib/data/env'
import { PrismaClient } from '@/lib/data/generated/sqlite/client'
import { signInClient } from '@/lib/data/sign-in-client'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const machine = (code: string) => ({
  data: { code, name: code, searchKey: code.toLowerCase(), kind: 'drawing', createdAt: new Date() },
})

const user = (id: string) => ({
  data: { id, name: id, email: `${id}@example.org`, createdAt: new Date(), updatedAt: new Date() },
})

const machineCodes = async () =>
  (await database().read.machine.findMany({ orderBy: { id: 'asc' } })).map(({ code }) => code)

const signal = () => {
  let give = () => {}
  const given = new Promise<void>((resolve) => {
    give = resolve
  })
  return { give, given }
}

/** A request whose transaction writes, lets the other one come, and rolls back. */
const thenRollBack = async (write: PromiseLike<unknown>, begun: () => void, until: Promise<unknown>) => {
  await write
  begun()
  await until
  throw new Error('rolled back')
}

describeOnEachEngine('an acknowledged write', () => {
  useFreshDatabase('test')

  it('is lost by the bare client when another request’s transaction rolls back around it', async () => {
    const bare = new PrismaClient({
      adapter: new PrismaBetterSqlite3(
        { url: process.env.DATABASE_URL ?? '' },
        { timestampFormat: 'unixepoch-ms' },
      ),
    })
    const begun = signal()
    const acknowledged = begun.given.then(() => bare.machine.create(machine('M-2')))
    await Promise.allSettled([
      bare.$transaction((tx) => thenRollBack(tx.machine.create(machine('M-1')), begun.give, acknowledged)),
      acknowledged,
    ])
    await bare.$disconnect()
    expect((await acknowledged).code).toBe('M-2')
    expect(await machineCodes()).toEqual([])
  })

  it('is kept by database().write', async () => {
    const begun = signal()
    const outcomes = await Promise.allSettled([
      database().write((tx) => thenRollBack(tx.machine.create(machine('M-1')), begun.give, pause(200))),
      begun.given.then(() => database().write((tx) => tx.machine.create(machine('M-2')))),
    ])
    expect(outcomes.map(({ status }) => status)).toEqual(['rejected', 'fulfilled'])
    expect(await machineCodes()).toEqual(['M-2'])
  })

  it('of the sign-in library is kept when its own transaction rolls back around it', async () => {
    const client = signInClient()
    const begun = signal()
    const outcomes = await Promise.allSettled([
      client.$transaction((tx) => thenRollBack(tx.user.create(user('one')), begun.give, pause(200))),
      begun.given.then(() => client.user.create(user('two'))),
    ])
    expect(outcomes.map(({ status }) => status)).toEqual(['rejected', 'fulfilled'])
    expect((await database().read.user.findMany()).map(({ id }) => id)).toEqual(['two'])
  })

  it('of the sign-in library waits for the works’ transaction, without stopping the server', async () => {
    let longestStall = 0
    let last = Date.now()
    const heartbeat = setInterval(() => {
      longestStall = Math.max(longestStall, Date.now() - last)
      last = Date.now()
    }, 5)
    const begun = signal()
    const order: string[] = []
    await Promise.allSettled([
      database()
        .write(async (tx) => {
          await tx.machine.create(machine('M-1'))
          last = Date.now()
          longestStall = 0
          begun.give()
          await pause(600)
          throw new Error('rolled back')
        })
        .catch(() => order.push('works rolled back')),
      begun.given
        .then(() => signInClient().user.create(user('one')))
        .then(() => order.push('sign-in stored')),
    ])
    clearInterval(heartbeat)
    expect(order).toEqual(['works rolled back', 'sign-in stored'])
    expect((await database().read.user.findMany()).map(({ id }) => id)).toEqual(['one'])
    // Stopped, the server would stand still until the other transaction’s end.
    expect(longestStall).toBeLessThan(400)
  })

  it('of the works waits for the sign-in library’s transaction', async () => {
    const client = signInClient()
    const begun = signal()
    const outcomes = await Promise.allSettled([
      client.$transaction((tx) => thenRollBack(tx.user.create(user('one')), begun.give, pause(200))),
      begun.given.then(() => database().write((tx) => tx.machine.create(machine('M-1')))),
    ])
    expect(outcomes.map(({ status }) => status)).toEqual(['rejected', 'fulfilled'])
    expect(await machineCodes()).toEqual(['M-1'])
  })

  it('waits its turn at the lock: inside the client a queue gives up', async () => {
    // The client begins a transaction within a second or not at all; this queue takes twice as long.
    const impatient = openDatabase(requireEnvironment(), { transaction: 5_000, busy: 5_000, begin: 1_000 })
    await Promise.all(
      Array.from({ length: 12 }, (_, number) =>
        impatient.write(async (tx) => {
          await tx.machine.create(machine(`M-${number}`))
          await pause(170)
        }),
      ),
    )
    await impatient.close()
    expect(await machineCodes()).toHaveLength(12)
  })

  it('says busy, and stores nothing, when another process keeps the file', async () => {
    const other = openSqlite(filePath(process.env.DATABASE_URL ?? ''))
    other.exec('BEGIN IMMEDIATE')
    const impatient = openDatabase(requireEnvironment(), { transaction: 5_000, busy: 300, begin: 5_000 })
    await expect(impatient.write((tx) => tx.machine.create(machine('M-1')))).rejects.toMatchObject({
      problem: { code: 'busy' },
    })
    const patient = database().write((tx) => tx.machine.create(machine('M-2')))
    await pause(150)
    other.exec('COMMIT')
    other.close()
    await patient
    await impatient.close()
    expect(await machineCodes()).toEqual(['M-2'])
  })

  it('of others goes on after a transaction that hangs', async () => {
    const short = openDatabase(requireEnvironment(), { transaction: 300, busy: 5_000, begin: 5_000 })
    const hanging = short.write(async (tx) => {
      await tx.machine.create(machine('M-1'))
      await new Promise(() => {})
    })
    const next = short.write((tx) => tx.machine.create(machine('M-2')))
    await expect(hanging).rejects.toThrow('took too long')
    await next
    await short.close()
    expect(await machineCodes()).toEqual(['M-2'])
  })

  it('that finds the file held says busy on a plain connection, too', () => {
    const path = filePath(process.env.DATABASE_URL ?? '')
    const [one, other] = [openSqlite(path), openSqlite(path)]
    other.pragma('busy_timeout = 1')
    one.exec('BEGIN IMMEDIATE')
    let error: unknown
    try {
      other.exec('BEGIN IMMEDIATE')
    } catch (thrown) {
      error = thrown
    }
    one.close()
    other.close()
    expect(storageProblem(error)?.problem.code).toBe('busy')
  })
})
