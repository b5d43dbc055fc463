import { chmodSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, test } from 'vitest'
import {
  isFirstAccountCode,
  issueFirstAccountCode,
  spendFirstAccountCode,
} from '@/lib/access/first-account-code'
import { sessionSecret } from '@/lib/access/session-secret'

let folder: string
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'ledgerline-secret-'))
})
afterEach(() => rmSync(folder, { recursive: true }))

const modeOf = (name: string) => statSync(join(folder, name)).mode & 0o777

describe('sessionSecret', () => {
  test('is made once, long, readable by its owner only', () => {
    const secret = sessionSecret(folder)
    expect(Buffer.from(secret, 'base64url')).toHaveLength(32)
    expect(modeOf('session-secret')).toBe(0o600)
    expect(sessionSecret(folder)).toBe(secret)
  })

  test('differs from works to works', () => {
    expect(sessionSecret(join(folder, 'a'))).not.toBe(sessionSecret(join(folder, 'b')))
  })

  test('closes a file that others could read', () => {
    sessionSecret(folder)
    chmodSync(join(folder, 'session-secret'), 0o644)
    sessionSecret(folder)
    expect(modeOf('session-secret')).toBe(0o600)
  })

  test('refuses a file that holds no such key', () => {
    writeFileSync(join(folder, 'session-secret'), 'short\n')
    expect(() => sessionSecret(folder)).toThrow(/holds no session secret/)
  })
})

describe('first account code', () => {
  test('is known again however it is typed', () => {
    const code = issueFirstAccountCode(folder)
    expect(code).toMatch(/^[2-9A-Z]{4}-[2-9A-Z]{4}-[2-9A-Z]{4}$/)
    expect(isFirstAccountCode(folder, code)).toBe(true)
    expect(isFirstAccountCode(folder, ` ${code.toLowerCase().replaceAll('-', ' ')} `)).toBe(true)
  })

  test('lies in the folder as a hash, for its owner only', () => {
    const code = issueFirstAccountCode(folder)
    const kept = readFileSync(join(folder, 'first-account-code'), 'utf8')
    expect(kept).toMatch(/^[0-9a-f]{64}$/)
    expect(kept.toUpperCase()).not.toContain(code.replaceAll('-', ''))
    expect(modeOf('first-account-code')).toBe(0o600)
  })

  test('counts no more once another was made, or it has served', () => {
    const first = issueFirstAccountCode(folder)
    const second = issueFirstAccountCode(folder)
    expect(isFirstAccountCode(folder, first)).toBe(false)
    spendFirstAccountCode(folder)
    expect(isFirstAccountCode(folder, second)).toBe(false)
  })

  test('nothing typed, or nothing made, is never right', () => {
    expect(isFirstAccountCode(folder, '')).toBe(false)
    issueFirstAccountCode(folder)
    expect(isFirstAccountCode(folder, '')).toBe(false)
  })
})
