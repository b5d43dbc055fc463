/**
 * A server of the services that can be killed at any moment: `POST /record` stores specimens and answers when they
 * are committed, `POST /roll-back` writes and rolls back. Prints its port. DATA_DIR and ACTOR come from outside.
 */
import { createServer } from 'node:http'
import { text } from 'node:stream/consumers'
import type { Actor } from '@/lib/access/actor'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import type { RecordSpecimensInput } from '@/lib/input/specimen'
import { recordSpecimens } from '@/lib/services/record-specimens'

const actor = JSON.parse(process.env.ACTOR ?? '{}') as Actor

const rollBack = (code: string): Promise<never> =>
  database().write(async (tx) => {
    const now = new Date()
    await tx.machine.create({
      data: { code, name: code, searchKey: code.toLowerCase(), kind: 'drawing machine', createdAt: now },
    })
    await new Promise((resolve) => setTimeout(resolve, 3))
    await appendLedger(tx, { at: 1, personId: 1, verb: 'note', subject: code, body: {} })
    throw new Error('rolled back on purpose')
  })

const server = createServer(async (request, response) => {
  const body = await text(request)
  try {
    if (request.url === '/roll-back') await rollBack(body)
    else await recordSpecimens(actor, JSON.parse(body) as RecordSpecimensInput)
    response.end('stored')
  } catch (error) {
    response.statusCode = 500
    response.end(String(error))
  }
})
server.listen(0, '127.0.0.1', () => {
  const address = server.address()
  if (typeof address === 'object' && address) process.stdout.write(`${address.port}\n`)
})
