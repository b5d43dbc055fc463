import { expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { isUniqueViolation, storageProblem, uniqueViolation } from '@/lib/data/db-errors'
import { problem } from '@/lib/domain/errors'
import { storeOneOfEach } from '../../support/one-of-each'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const caught = (work: Promise<unknown>): Promise<unknown> =>
  work.then(
    () => expect.unreachable('nothing was thrown'),
    (error: unknown) => error,
  )

const machine = (code: string) => ({
  data: { code, name: code, searchKey: code, kind: 'drawing', createdAt: new Date() },
})

describeOnEachEngine('storageProblem', (engine) => {
  useFreshDatabase('test')

  it('names table and field of a broken unique constraint', async () => {
    await database().write((tx) => tx.machine.create(machine('M-1')))
    const error = await caught(database().write((tx) => tx.machine.create(machine('M-1'))))
    expect(error).toMatchObject({
      problem: { code: 'conflict', message: 'A machine with this code exists already.', where: 'code' },
    })
    expect(uniqueViolation(error)).toEqual({ table: 'Machine', fields: ['code'] })
    expect(isUniqueViolation(error, 'code')).toBe(true)
    expect(isUniqueViolation(error, 'name')).toBe(false)
  })

  it('names all fields of one over several', async () => {
    const { lot } = await storeOneOfEach()
    const error = await caught(
      database().write((tx) =>
        tx.specimen.create({ data: { clientId: 'other', lotId: lot.id, number: 1, createdAt: new Date() } }),
      ),
    )
    expect(uniqueViolation(error)).toEqual({ table: 'Specimen', fields: ['lotId', 'number'] })
  })

  it('names a primary key that is taken', async () => {
    const error = await caught(
      database().write(async (tx) => {
        await tx.machine.create({ data: { id: 7, ...machine('M-1').data } })
        await tx.machine.create({ data: { id: 7, ...machine('M-2').data } })
      }),
    )
    expect(uniqueViolation(error)).toEqual({ table: 'Machine', fields: ['id'] })
  })

  it('says that what was to be changed is gone', async () => {
    const error = await caught(
      database().write((tx) => tx.machine.update({ where: { id: 99 }, data: { name: 'x' } })),
    )
    expect(error).toMatchObject({ problem: { code: 'not-found' } })
  })

  it('says that a reference leads nowhere', async () => {
    const error = await caught(
      database().write((tx) =>
        tx.specimen.create({ data: { clientId: 'x', lotId: 99, number: 1, createdAt: new Date() } }),
      ),
    )
    expect(error).toMatchObject({
      problem: {
        code: 'conflict',
        message: 'Something that this refers to does not exist, or is still referred to.',
      },
    })
  })

  it('says that the disk is full, and stores nothing', async () => {
    if (engine === 'postgresql') {
      // The server's code for a full disk, as its driver reports it.
      const full = Object.assign(new Error('could not extend file'), { code: '53100' })
      expect(storageProblem(full)?.problem.code).toBe('storage')
      return
    }
    const error = await caught(
      database().write(async (tx) => {
        // As much room as the file has now, and no more.
        await tx.$queryRawUnsafe('PRAGMA max_page_count = 1')
        await tx.machine.create(machine('x'.repeat(200_000)))
      }),
    )
    expect(error).toMatchObject({
      problem: { code: 'storage', message: expect.stringContaining('is full; nothing of this was stored') },
    })
    expect(await database().read.machine.count()).toBe(0)
  })

  it('says that the database can’t be reached', async () => {
    const { openDatabase } = await import('@/lib/data/database')
    const nowhere = openDatabase(
      engine === 'sqlite'
        ? { engine, databaseUrl: 'file:/nonexistent/ledgerline.db' }
        : { engine, databaseUrl: 'postgresql://nobody@127.0.0.1:1/nothing' },
    )
    expect(await caught(nowhere.read.machine.count())).toMatchObject({ problem: { code: 'storage' } })
    expect(await caught(nowhere.write((tx) => tx.machine.count()))).toMatchObject({
      problem: { code: 'storage' },
    })
    await nowhere.close()
  })

  it('leaves a problem of the domain, and what it does not know, as they are', async () => {
    const known = problem('not-ready', 'The plan is not complete.')
    expect(await caught(database().write(() => Promise.reject(known)))).toBe(known)
    const unknown = new RangeError('a programmer’s error')
    expect(await caught(database().write(() => Promise.reject(unknown)))).toBe(unknown)
    expect(storageProblem(undefined)).toBeUndefined()
    expect(storageProblem('text')).toBeUndefined()
  })
})
