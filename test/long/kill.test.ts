import { type ChildProcess, spawn } from 'node:child_process'
import { createInterface } from 'node:readline'
import { setTimeout as pause } from 'node:timers/promises'
import { beforeAll, describe, expect, it } from 'vitest'
import { openSqlite } from '@/lib/data/connections'
import { filePath } from '@/lib/data/env'
import { verifyLedgerOf } from '@/lib/data/verify-ledger'
import { seededUniform } from '../support/seeded-random'
import { openSteelLot, requestOf, type SteelWorks, setUpSteelWorks, thick } from '../support/steel-works'
import { closeConnections, useFreshDatabase } from '../support/template-database'

const share = Number(process.env.LEDGERLINE_SHARE ?? '1')
const kills = Math.max(2, Math.round(25 * share))
const seed = 20_261_201

interface Acknowledged {
  readonly specimen: string
  readonly reading: string
}

async function start(works: SteelWorks): Promise<{ readonly child: ChildProcess; readonly address: string }> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'test/support/kill-server.ts'], {
    stdio: ['ignore', 'pipe', 'inherit'],
    env: { ...process.env, NODE_OPTIONS: '', ACTOR: JSON.stringify(works.bench) },
  })
  const lines = createInterface({ input: child.stdout as NodeJS.ReadableStream })
  for await (const port of lines) return { child, address: `http://127.0.0.1:${port}` }
  throw new Error('the server ended before it listened')
}

/** Posts one specimen after the other until the server is gone; keeps what was acknowledged. */
async function post(address: string, lot: string, kept: Acknowledged[]): Promise<void> {
  for (let number = 1; number < 180; number += 1) {
    const request = requestOf(lot, [thick(`0.25${40 + (number % 7)}`)], number)
    const [entry] = request.entries
    if (!entry) throw new Error('no entry')
    try {
      const reply = await fetch(`${address}/record`, { method: 'POST', body: JSON.stringify(request) })
      if (!reply.ok) throw new Error(await reply.text())
      kept.push({ specimen: entry.specimen.clientId, reading: entry.reading.clientId })
    } catch (error) {
      // The connection that broke with the server; anything else the server said is a fault of this test.
      if (error instanceof TypeError) return
      throw error
    }
  }
}

async function rollBack(address: string, round: number): Promise<number> {
  for (let count = 0; ; count += 1) {
    try {
      const reply = await fetch(`${address}/roll-back`, { method: 'POST', body: `ROLLED-${round}-${count}` })
      if (!/on purpose/.test(await reply.text())) throw new Error('a write that rolls back was acknowledged')
    } catch (error) {
      if (error instanceof TypeError) return count
      throw error
    }
  }
}

const killed = (child: ChildProcess): Promise<void> =>
  new Promise((resolve) => {
    child.once('exit', () => resolve())
    child.kill('SIGKILL')
  })

describe('a server that is killed while four clients post and roll back', () => {
  useFreshDatabase()
  let works: SteelWorks
  const lots = (round: number) => [1, 2, 3].map((client) => `K-${round}-${client}`)
  beforeAll(async () => {
    works = await setUpSteelWorks()
    for (let round = 1; round <= kills; round += 1)
      for (const code of lots(round)) await openSteelLot(works.bench, code, round)
    await closeConnections()
  })

  it(`has every acknowledged reading once, sound and in the ledger, after each of ${kills} kills`, async () => {
    const random = seededUniform(seed)
    const acknowledged: Acknowledged[] = []
    let rolledBack = 0
    const path = filePath(process.env.DATABASE_URL ?? '')
    for (let round = 1; round <= kills; round += 1) {
      const { address, child } = await start(works)
      const posting = lots(round).map((lot) => post(address, lot, acknowledged))
      const rolling = rollBack(address, round)
      const before = acknowledged.length
      // The first requests wait for the database to be opened; the moment is counted from the fourth answer.
      while (acknowledged.length < before + 4) await pause(5)
      await pause(random() * 2500)
      await killed(child)
      await Promise.all(posting)
      rolledBack += await rolling

      const connection = openSqlite(path)
      try {
        expect(connection.pragma('quick_check', { simple: true })).toBe('ok')
        expect(connection.pragma('foreign_key_check')).toEqual([])
        const count = (table: string, id: string): unknown =>
          connection.prepare(`select count(*) as n from ${table} where clientId = ?`).pluck().get(id)
        const wrong = acknowledged.filter(
          ({ reading, specimen }) => count('Specimen', specimen) !== 1 || count('Reading', reading) !== 1,
        )
        expect(wrong, `round ${round}`).toEqual([])
        expect(
          connection.prepare("select count(*) from Machine where code like 'ROLLED-%'").pluck().get(),
        ).toBe(0)
        // A reading that was not acknowledged may be there, but never half: each has its ledger entry.
        const alone = connection
          .prepare('select count(*) from Specimen where id not in (select specimenId from Reading)')
          .pluck()
          .get()
        expect(alone).toBe(0)
      } finally {
        connection.close()
      }
      expect(
        await verifyLedgerOf({ engine: 'sqlite', databaseUrl: process.env.DATABASE_URL ?? '' } as never, []),
      ).toMatchObject({ sound: true })
    }
    expect(acknowledged.length).toBeGreaterThan(3 * kills)
    expect(rolledBack).toBeGreaterThan(kills)
  })
})
