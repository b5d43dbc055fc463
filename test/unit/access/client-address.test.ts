import { describe, expect, test } from 'vitest'
import { askedOnLoopback, clientAddress, isHttps, isLoopback } from '@/lib/access/client-address'

describe('isLoopback', () => {
  test.each([
    'localhost',
    'localhost:3000',
    '127.0.0.1',
    '127.0.0.1:80',
    '127.8.9.10',
    '[::1]',
    '[::1]:3000',
    '::1',
  ])('%s is this computer', (host) => expect(isLoopback(host)).toBe(true))
  test.each([
    '',
    'localhost.example.org',
    '127.0.0.1.example.org',
    '10.0.0.1',
    '128.0.0.1',
    '[::2]:3000',
    '0.0.0.0',
  ])('%j is not', (host) => expect(isLoopback(host)).toBe(false))
})

describe('askedOnLoopback', () => {
  test('goes by the name the browser asked for: a page that resolves its name to 127.0.0.1 does not pass', () => {
    expect(askedOnLoopback(new Headers({ host: 'localhost:3000' }))).toBe(true)
    expect(askedOnLoopback(new Headers({ host: 'rebound.example.org' }))).toBe(false)
    expect(
      askedOnLoopback(new Headers({ host: 'localhost', 'x-forwarded-host': 'strings.example.org' })),
    ).toBe(false)
    expect(askedOnLoopback(new Headers())).toBe(false)
  })
})

describe('clientAddress, isHttps', () => {
  test('take the settled headers', () => {
    const headers = new Headers({ 'x-forwarded-for': '10.0.0.7', 'x-forwarded-proto': 'https' })
    expect(clientAddress(headers)).toBe('10.0.0.7')
    expect(isHttps(headers)).toBe(true)
  })
  test('without them nobody is known and nothing is secure', () => {
    expect(clientAddress(new Headers())).toBe('unknown')
    expect(isHttps(new Headers())).toBe(false)
  })
})
