import { beforeAll, describe, expect, it } from 'vitest'
import { POST as postDecision } from '@/app/api/v1/lots/[code]/decisions/route'
import { GET as getLotRoute } from '@/app/api/v1/lots/[code]/route'
import { GET as getLots, POST as postLot } from '@/app/api/v1/lots/route'
import { POST as postAnswer } from '@/app/api/v1/signals/[id]/answer/route'
import { POST as postSpecimen } from '@/app/api/v1/specimens/route'
import type { Role } from '@/lib/access/actor'
import { signIn } from '@/lib/access/session'
import { database } from '@/lib/data/database'
import { createFirstAccount } from '@/lib/services/create-first-account'
import { createPerson } from '@/lib/services/create-person'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { typedMass } from '../../support/sheets'
import { day, openSteelLot, requestOf, type SteelWorks, setUpSteelWorks } from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const HOST = 'ledgerline.test:3000'
const password = 'five winding drums'

type Route = (
  request: Request,
  context: { readonly params: Promise<Readonly<Record<string, string>>> },
) => Promise<Response>

const proxied = { host: HOST, 'x-forwarded-for': '10.0.0.7', 'x-forwarded-proto': 'http' }

describeOnEachEngine('routes', () => {
  useFreshDatabase()
  let works: SteelWorks
  const cookies: Partial<Record<Role, string>> = {}

  beforeAll(async () => {
    // Signing in is the first account's; the works of the tests has people without passwords.
    const administrator = await createFirstAccount(
      { name: 'W. First', username: 'first', password, roles: [], code: '' },
      new Headers({ ...proxied, host: 'localhost:3000' }),
    )
    for (const role of ['bench', 'quality', 'sales'] as const) {
      const username = `${role}er`
      await createPerson(administrator, { name: username, username, password, roles: [role] })
      const session = await signIn({ username, password, stay: false }, new Headers(proxied))
      cookies[role] = session.cookies
        .map(({ name, value }) => `${name}=${encodeURIComponent(value)}`)
        .join('; ')
    }
    works = await setUpSteelWorks()
    await openSteelLot(works.bench, 'R-x', 1)
  })

  const send = async (
    route: Route,
    role: Role | undefined,
    body: unknown,
    { params = {}, headers = {} }: { params?: Record<string, string>; headers?: Record<string, string> } = {},
  ) => {
    const request = new Request(`http://${HOST}/api/v1/somewhere`, {
      method: 'POST',
      headers: {
        ...proxied,
        origin: `http://${HOST}`,
        'content-type': 'application/json',
        ...(role ? { cookie: cookies[role] ?? '' } : {}),
        ...headers,
      },
      body: typeof body === 'string' ? body : JSON.stringify(body),
    })
    const response = await route(request, { params: Promise.resolve(params) })
    return { status: response.status, reply: await response.json() }
  }

  const ask = async (
    route: Route,
    role: Role | undefined,
    query = '',
    params: Record<string, string> = {},
  ) => {
    const request = new Request(`http://${HOST}/api/v1/somewhere${query}`, {
      headers: { ...proxied, ...(role ? { cookie: cookies[role] ?? '' } : {}) },
    })
    const response = await route(request, { params: Promise.resolve(params) })
    return { status: response.status, reply: await response.json() }
  }

  /** What the bench posts: one specimen, as JSON that went through a wire. */
  const posted = (lotCode: string, change: Parameters<typeof requestOf>[1][number] = {}) => {
    const { requestId, entries } = requestOf(lotCode, [change])
    return JSON.parse(JSON.stringify({ requestId, lotCode, ...entries[0] }))
  }

  describe('that change something', () => {
    it('take what our own pages send', async () => {
      await openSteelLot(works.bench, 'R-1', 1)
      const { status, reply } = await send(postSpecimen, 'bench', posted('R-1'))
      expect([status, reply]).toMatchObject([200, { lotCode: 'R-1', specimens: [{ outcome: 'stored' }] }])
    })

    it('give the same reply to the same request', async () => {
      await openSteelLot(works.bench, 'R-2', 1)
      const body = posted('R-2')
      const first = await send(postSpecimen, 'bench', body)
      expect(await send(postSpecimen, 'bench', body)).toEqual(first)
      expect(await database().read.reading.count({ where: { specimen: { lot: { code: 'R-2' } } } })).toBe(1)
    })

    it.each([
      ['from no page', { origin: '' }],
      ['from another page', { origin: 'http://elsewhere.test' }],
      ['from another port', { origin: 'http://ledgerline.test:4000' }],
      ['from a page by https where this is http', { origin: `https://${HOST}` }],
      ['from a page without an origin of its own', { origin: 'null' }],
    ])('refuse what comes %s, though the cookie is right', async (_, headers) => {
      const { status, reply } = await send(postSpecimen, 'bench', posted('R-x'), { headers })
      expect([status, reply]).toMatchObject([403, { code: 'not-permitted' }])
      expect(await database().read.reading.count({ where: { specimen: { lot: { code: 'R-x' } } } })).toBe(0)
    })

    it.each(['text/plain', 'application/x-www-form-urlencoded', 'application/jsonp', ''])(
      'refuse the content type “%s”, which a form elsewhere could send',
      async (type) => {
        const { status, reply } = await send(postSpecimen, 'bench', posted('R-1'), {
          headers: { 'content-type': type },
        })
        expect([status, reply]).toMatchObject([400, { code: 'bad-input' }])
      },
    )

    it('ask who it is before they look at what was sent', async () => {
      expect(await send(postSpecimen, undefined, '{broken')).toMatchObject({
        status: 401,
        reply: { code: 'not-signed-in', mend: 'Sign in and try again.' },
      })
    })

    it('refuse what is no JSON, and what is too large, with a sentence', async () => {
      expect(await send(postSpecimen, 'bench', '{broken')).toMatchObject({ status: 400 })
      expect(await send(postSpecimen, 'bench', JSON.stringify({ pad: 'x'.repeat(2_100_000) }))).toMatchObject(
        {
          status: 400,
          reply: { message: expect.stringContaining('larger than 2 MB') },
        },
      )
    })

    it('name every field that is wrong', async () => {
      const body = posted('R-1')
      body.reading.sheet.cutMass.typed = 'heavy'
      body.reading.sheet.span.typed = '6480'
      const { status, reply } = await send(postSpecimen, 'bench', body)
      expect(status).toBe(400)
      expect(reply.problems.map((one: { where: string }) => one.where)).toEqual([
        'reading.sheet.cutMass',
        'reading.sheet.span',
      ])
    })

    it('say not permitted with 403, conflict with 409 and both values, not found with 404', async () => {
      expect(await send(postSpecimen, 'sales', posted('R-1'))).toMatchObject({
        status: 403,
        reply: { code: 'not-permitted' },
      })
      const clash = await send(postSpecimen, 'bench', posted('R-1', { cutMass: typedMass('210.1') }))
      expect(clash).toMatchObject({
        status: 409,
        reply: { details: { 'cutMass.stored': '199.1 mg', 'cutMass.entered': '210.1 mg' } },
      })
      expect(await send(postSpecimen, 'bench', posted('R-999'))).toMatchObject({ status: 404 })
      const answer = { cause: 'Die worn', answer: 'Changed.', version: 1 }
      expect(await send(postAnswer, 'quality', answer, { params: { id: '77' } })).toMatchObject({
        status: 404,
      })
      expect(await send(postAnswer, 'quality', answer, { params: { id: 'x' } })).toMatchObject({
        status: 400,
      })
    })
  })

  describe('of a lot', () => {
    it('open, show and decide it', async () => {
      const lot = { code: 'R-3', productCode: 'L254', madeAt: new Date(day(3)).toISOString() }
      expect(await send(postLot, 'bench', lot)).toMatchObject({
        status: 201,
        reply: { code: 'R-3', revision: 1 },
      })
      await recordSpecimens(works.bench, requestOf('R-3', [{}, {}, {}, {}, {}]))
      const shown = await ask(getLotRoute, 'quality', '', { code: 'R-3' })
      expect(shown).toMatchObject({
        status: 200,
        reply: { lot: { code: 'R-3', state: 'to-decide', version: 2 }, product: { name: 'Larch 254' } },
      })
      expect(shown.reply.specimens[0].evaluation.verified).toBe(true)
      const decision = { verb: 'release', reason: 'Conforms on both routes.', lotVersion: 2 }
      const params = { code: 'R-3' }
      expect(await send(postDecision, 'bench', decision, { params })).toMatchObject({ status: 403 })
      expect(await send(postDecision, 'quality', decision, { params })).toMatchObject({ status: 201 })
      expect(await send(postDecision, 'quality', decision, { params })).toMatchObject({
        status: 409,
        reply: { code: 'already-decided' },
      })
    })

    it('show sales only what is released', async () => {
      await openSteelLot(works.bench, 'R-4', 4)
      expect(await ask(getLotRoute, 'sales', '', { code: 'R-4' })).toMatchObject({ status: 403 })
      expect(await ask(getLotRoute, 'sales', '', { code: 'R-3' })).toMatchObject({ status: 200 })
      const { reply } = await ask(getLots, 'sales')
      expect(reply.lots.map((one: { code: string }) => one.code)).toEqual(['R-3'])
      expect((await ask(getLots, 'sales', '?state=measuring')).reply.lots).toEqual([])
    })

    it('find it by a part of its code, whatever the case', async () => {
      const { reply } = await ask(getLots, 'bench', '?search=r-3')
      expect(reply).toMatchObject({ count: 1, page: 1, pages: 1, lots: [{ code: 'R-3' }] })
      expect((await ask(getLots, 'bench', '?state=nowhere')).status).toBe(400)
      expect((await ask(getLots, 'bench', '?page=0')).status).toBe(400)
      expect((await ask(getLots, undefined)).status).toBe(401)
    })
  })
})
