import { randomUUID } from 'node:crypto'
import { expect, type Page } from '@playwright/test'
import { demoRig } from '@/prisma/demo/equipment'
import { demoProducts } from '@/prisma/demo/products'
import { readLot } from '@/prisma/demo/readings'
import { demoSchedule } from '@/prisma/demo/schedule'
import { serverTest, signedIn } from '../support/server'

const test = serverTest('works')

const product = demoProducts.find(({ code }) => code === 'LARCH-254')
const lot = demoSchedule().find(({ code }) => code === 'LA-002')
if (!product || !lot) throw new Error('the demo has other products')
const sheets = readLot(product, lot)

const equipment = {
  rig: demoRig.code,
  micrometer: demoRig.micrometerCode,
  balance: demoRig.balanceCode,
  rule: demoRig.ruleCode,
  counter: demoRig.counterCode,
}

/** What the bench would send for one specimen. */
const specimenOf = (lotCode: string, number: number) => ({
  requestId: randomUUID(),
  lotCode,
  specimen: { clientId: randomUUID(), number },
  reading: { clientId: randomUUID(), sheet: sheets[(number - 1) % sheets.length], equipment },
})

const post = (page: Page, address: string, path: string, data: unknown) =>
  page.request.post(path, { headers: { origin: address, 'content-type': 'application/json' }, data })

const openLot = (page: Page, address: string, code: string) =>
  post(page, address, '/api/v1/lots', {
    requestId: randomUUID(),
    code,
    productCode: 'LARCH-254',
    madeAt: '2026-11-30T08:00:00Z',
    dieCode: 'D-08',
  })

test('two routes of the built server write at once, others are refused in between: nothing acknowledged is lost', async ({
  browser,
  server,
}) => {
  const bench = await signedIn(browser, server, 'aldous')
  expect((await openLot(bench, server.address, 'W-0')).status()).toBeLessThan(300)
  const rounds = Array.from({ length: 12 }, (_, index) => index + 1)
  const replies = await Promise.all(
    rounds.flatMap((round) => [
      openLot(bench, server.address, `W-${round}`),
      post(bench, server.address, '/api/v1/specimens', specimenOf('W-0', round)),
      // These begin a transaction and roll it back.
      openLot(bench, server.address, 'W-0'),
      post(bench, server.address, '/api/v1/specimens', specimenOf('W-NOWHERE', round)),
    ]),
  )
  const statuses = replies.map((reply) => reply.status())
  for (const [index, status] of statuses.entries()) {
    if (index % 4 < 2) expect(status, `reply ${index}`).toBeLessThan(300)
    else expect(status, `reply ${index}`).toBeGreaterThanOrEqual(400)
  }
  const view = await (await bench.request.get('/api/v1/lots/W-0')).json()
  expect(view.specimens.map((one: { number: number }) => one.number)).toEqual(rounds)
  for (const round of rounds)
    expect((await bench.request.get(`/api/v1/lots/W-${round}`)).status(), `W-${round}`).toBe(200)
  await bench.context().close()
})

test('a specimen sent again is stored once, and the same id for other values is refused with a sentence', async ({
  browser,
  server,
}) => {
  const bench = await signedIn(browser, server, 'imrie')
  await openLot(bench, server.address, 'AGAIN-1')
  const request = specimenOf('AGAIN-1', 1)
  const replies = await Promise.all(
    [1, 2, 3, 4].map(() => post(bench, server.address, '/api/v1/specimens', request)),
  )
  const bodies = await Promise.all(replies.map((reply) => reply.text()))
  expect(replies.map((reply) => reply.status())).toEqual(Array(4).fill(replies[0]?.status()))
  expect(new Set(bodies).size).toBe(1)
  const other = await post(bench, server.address, '/api/v1/specimens', {
    ...request,
    reading: { ...request.reading, sheet: sheets[1] },
  })
  expect(other.status()).toBe(409)
  expect(await other.json()).toMatchObject({ code: 'conflict', message: expect.stringMatching(/\.$/) })
  const view = await (await bench.request.get('/api/v1/lots/AGAIN-1')).json()
  expect(view.specimens).toHaveLength(1)
  await bench.context().close()
})
