import { beforeAll, describe, expect, it, vi } from 'vitest'
import type { Actor } from '@/lib/access/actor'
import { actorFromHeaders, type SessionCookie, signIn, signOut } from '@/lib/access/session'
import { slowingRules } from '@/lib/access/slowing'
import { database } from '@/lib/data/database'
import { changePerson } from '@/lib/services/change-person'
import { createFirstAccount } from '@/lib/services/create-first-account'
import { createPerson } from '@/lib/services/create-person'
import { setPassword } from '@/lib/services/set-password'
import { refusalOf } from '../../support/refusal-of'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const password = 'five winding drums'

const headersOf = (more: Record<string, string> = {}) =>
  new Headers({ host: 'localhost:3000', 'x-forwarded-for': '10.0.0.7', 'x-forwarded-proto': 'http', ...more })

const withCookies = (cookies: readonly SessionCookie[], more: Record<string, string> = {}) =>
  headersOf({
    cookie: cookies.map(({ name, value }) => `${name}=${encodeURIComponent(value)}`).join('; '),
    ...more,
  })

const enter = (username: string, more: Record<string, string> = {}, typed = password) =>
  signIn({ username, password: typed, stay: false }, headersOf(more))

describeOnEachEngine('sign-in', () => {
  useFreshDatabase()
  let administrator: Actor

  beforeAll(async () => {
    administrator = await createFirstAccount(
      { name: 'A. Wren', username: 'wren', password, roles: [], code: '' },
      headersOf(),
    )
    for (const username of ['aldous', 'imrie', 'orrin', 'pell', 'falk', 'guessed', 'swarm']) {
      await createPerson(administrator, { name: username, username, password, roles: ['bench'] })
    }
    await createPerson(
      administrator,
      { name: 'Demo', username: 'demo', password, roles: ['bench'] },
      { demo: true },
    )
  })

  const personOf = async (username: string) => {
    const row = await database().read.person.findUniqueOrThrow({ where: { username } })
    return { id: row.id, version: row.version, name: row.name }
  }

  it('gives a cookie that answers for the person with the roles they hold', async () => {
    const { actor, cookies } = await enter('aldous')
    expect(actor).toMatchObject({ name: 'aldous', roles: ['bench'] })
    expect(await actorFromHeaders(withCookies(cookies))).toEqual(actor)
  })

  it('takes the sign-in name in any case', async () => {
    expect((await enter(' ALDOUS ')).actor.name).toBe('aldous')
  })

  it('keeps its cookie from scripts and other sites, and lets it go with the browser', async () => {
    const { cookies } = await enter('aldous')
    const session = cookies.find(({ name }) => name === 'ledgerline.session_token')
    expect(session?.options).toMatchObject({ httpOnly: true, sameSite: 'lax', path: '/' })
    expect(session?.options.secure).toBeFalsy()
    expect(session?.options.maxAge).toBeUndefined()
  })

  it('keeps the cookie a week when asked to stay', async () => {
    const { cookies } = await signIn({ username: 'aldous', password, stay: true }, headersOf())
    expect(cookies[0]?.options.maxAge).toBe(7 * 24 * 3600)
  })

  it('marks the cookie secure over https, and does not take it over http', async () => {
    const { cookies } = await enter('aldous', { 'x-forwarded-proto': 'https' })
    const session = cookies.find(({ name }) => name.endsWith('session_token'))
    expect(session?.name).toBe('__Secure-ledgerline.session_token')
    expect(session?.options.secure).toBe(true)
    expect(await actorFromHeaders(withCookies(cookies, { 'x-forwarded-proto': 'https' }))).toBeDefined()
    expect(await actorFromHeaders(withCookies(cookies))).toBeUndefined()
  })

  it('knows nobody without a cookie, with a forged one, or with one changed by a letter', async () => {
    expect(await actorFromHeaders(headersOf())).toBeUndefined()
    expect(await actorFromHeaders(headersOf({ cookie: 'ledgerline.session_token=abc.def' }))).toBeUndefined()
    const { cookies } = await enter('aldous')
    const changed = cookies.map((cookie) => ({
      ...cookie,
      value: cookie.value.replace(/^./, (c) => (c === 'a' ? 'b' : 'a')),
    }))
    expect(await actorFromHeaders(withCookies(changed))).toBeUndefined()
  })

  it('answers a wrong password, an unknown name and no name at all alike', async () => {
    const wrong = await refusalOf(enter('imrie', {}, 'five winding drumz'))
    expect(wrong).toMatchObject({
      code: 'not-signed-in',
      message: 'Name and password do not belong together.',
    })
    expect(await refusalOf(enter('nobody'))).toEqual(wrong)
    expect(await refusalOf(enter('no body!'))).toEqual(wrong)
    expect(await refusalOf(enter('x'))).toEqual(wrong)
  })

  it('never keeps a password as it was typed', async () => {
    const accounts = await database().read.account.findMany({ select: { password: true } })
    for (const { password: kept } of accounts) expect(kept).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/)
  })

  it('ends with signing out, in the database and not only in the browser', async () => {
    const { cookies } = await enter('aldous')
    const gone = await signOut(withCookies(cookies))
    expect(gone.find(({ name }) => name.endsWith('session_token'))).toMatchObject({
      value: '',
      options: { maxAge: 0 },
    })
    expect(await actorFromHeaders(withCookies(cookies))).toBeUndefined()
  })

  it('stops counting a role with the next click once it is taken away', async () => {
    const { cookies } = await enter('orrin')
    const { id, version, name } = await personOf('orrin')
    await changePerson(administrator, id, { version, name, roles: ['sales'], active: true })
    expect((await actorFromHeaders(withCookies(cookies)))?.roles).toEqual(['sales'])
    await changePerson(administrator, id, { version: version + 1, name, roles: [], active: true })
    expect((await actorFromHeaders(withCookies(cookies)))?.roles).toEqual([])
  })

  it('knows a deactivated person no more, nor lets them in again', async () => {
    const { cookies } = await enter('pell')
    const { id, version, name } = await personOf('pell')
    await changePerson(administrator, id, { version, name, roles: ['bench'], active: false })
    expect(await actorFromHeaders(withCookies(cookies))).toBeUndefined()
    expect((await refusalOf(enter('pell'))).code).toBe('not-signed-in')
    const user = await database().read.person.findUniqueOrThrow({ where: { id } })
    expect(await database().read.session.count({ where: { userId: user.userId ?? '' } })).toBe(0)
  })

  it('signs everyone out who used the password before it was set anew', async () => {
    const { cookies } = await enter('falk')
    await setPassword(administrator, (await personOf('falk')).id, 'another long password')
    expect(await actorFromHeaders(withCookies(cookies))).toBeUndefined()
    expect((await refusalOf(enter('falk'))).code).toBe('not-signed-in')
    expect((await enter('falk', {}, 'another long password')).actor.name).toBe('falk')
  })

  it('lets a demo account in on this computer only, by name and not by address', async () => {
    const { cookies } = await enter('demo')
    expect(await actorFromHeaders(withCookies(cookies))).toBeDefined()
    expect(await actorFromHeaders(withCookies(cookies, { host: 'strings.example.org' }))).toBeUndefined()
    expect((await refusalOf(enter('demo', { host: '192.168.1.20:3000' }))).code).toBe('not-signed-in')
  })

  describe('slowing', () => {
    it('makes an account wait after wrong tries from one address, even with the right password', async () => {
      for (let n = 0; n < slowingRules.pair.free; n += 1) {
        expect((await refusalOf(enter('guessed', {}, `guess number ${n}`))).code).toBe('not-signed-in')
      }
      const refusal = await refusalOf(enter('guessed'))
      expect(refusal).toMatchObject({ code: 'busy', message: 'Too many tries to sign in.' })
      expect(refusal.mend).toMatch(/^Wait \d+ seconds, then try again\.$/)
    })

    it('does not make the person wait elsewhere', async () => {
      expect((await enter('guessed', { 'x-forwarded-for': '10.0.0.8' })).actor.name).toBe('guessed')
    })

    it('lets them in when the time is over, and forgets the failures then', async () => {
      vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 6_000 })
      try {
        expect((await enter('guessed')).actor.name).toBe('guessed')
        expect((await refusalOf(enter('guessed', {}, 'wrong again here'))).code).toBe('not-signed-in')
        expect((await enter('guessed')).actor.name).toBe('guessed')
      } finally {
        vi.useRealTimers()
      }
    })

    it('counts many at once one by one', async () => {
      const answers = await Promise.all(
        Array.from({ length: 12 }, (_, n) =>
          refusalOf(enter('swarm', { 'x-forwarded-for': '10.0.0.9' }, `guess ${n}`)),
        ),
      )
      const looked = answers.filter(({ code }) => code === 'not-signed-in')
      expect(looked).toHaveLength(slowingRules.pair.free)
    })

    it('slows an address that tries many names', async () => {
      const codes: string[] = []
      for (let n = 0; n < slowingRules.address.free + 2; n += 1) {
        codes.push((await refusalOf(enter(`name${n}`, { 'x-forwarded-for': '10.9.9.9' }))).code)
      }
      expect(codes.filter((code) => code === 'busy').length).toBeGreaterThanOrEqual(1)
      expect(codes.slice(0, slowingRules.address.free).every((code) => code === 'not-signed-in')).toBe(true)
    })

    it('keeps no counter longer than it counts', async () => {
      vi.useFakeTimers({ toFake: ['Date'], now: Date.now() + 3_600_000 })
      try {
        await enter('aldous')
        expect(await database().read.signInAttempt.count()).toBeLessThanOrEqual(3)
      } finally {
        vi.useRealTimers()
      }
    })
  })
})
