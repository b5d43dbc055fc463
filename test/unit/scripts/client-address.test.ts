import type { IncomingMessage } from 'node:http'
import { describe, expect, it } from 'vitest'
import { settleAddress } from '@/scripts/lib/client-address.mjs'

const settled = (
  headers: Record<string, string>,
  {
    remoteAddress = '198.51.100.7',
    ...server
  }: { remoteAddress?: string; trustProxy: boolean; https?: boolean },
) => {
  const request = { headers: { host: 'ledger.example', ...headers }, socket: { remoteAddress } }
  settleAddress(request as unknown as IncomingMessage, { https: false, ...server })
  return request.headers as Record<string, string | undefined>
}

const forged = {
  forwarded: 'for=203.0.113.1',
  'x-forwarded-for': '203.0.113.1',
  'x-forwarded-host': 'localhost',
  'x-forwarded-port': '1',
  'x-forwarded-proto': 'https',
  'x-real-ip': '203.0.113.1',
}

describe('settleAddress(request, server)', () => {
  it('believes no forwarded header unless the proxy is trusted', () => {
    expect(settled(forged, { trustProxy: false })).toEqual({
      host: 'ledger.example',
      'x-forwarded-for': '198.51.100.7',
      'x-forwarded-proto': 'http',
      'x-forwarded-host': 'ledger.example',
    })
  })

  it('takes from a trusted proxy what that proxy added last', () => {
    const headers = {
      ...forged,
      'x-forwarded-for': '203.0.113.1, 192.0.2.9',
      'x-forwarded-host': 'works.example',
    }
    expect(settled(headers, { trustProxy: true })).toMatchObject({
      'x-forwarded-for': '192.0.2.9',
      'x-forwarded-proto': 'https',
      'x-forwarded-host': 'works.example',
    })
  })

  it('falls back to the socket when a trusted proxy says nothing, or no address', () => {
    expect(settled({}, { trustProxy: true })['x-forwarded-for']).toBe('198.51.100.7')
    expect(settled({ 'x-forwarded-for': 'unknown' }, { trustProxy: true })['x-forwarded-for']).toBe(
      '198.51.100.7',
    )
    expect(settled({ 'x-forwarded-proto': 'gopher' }, { trustProxy: true })['x-forwarded-proto']).toBe('http')
  })

  it('writes an IPv4 address the short way, and says https of its own sockets', () => {
    const headers = settled({}, { trustProxy: false, https: true, remoteAddress: '::ffff:127.0.0.1' })
    expect(headers).toMatchObject({ 'x-forwarded-for': '127.0.0.1', 'x-forwarded-proto': 'https' })
  })
})
