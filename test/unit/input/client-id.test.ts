import { describe, expect, it } from 'vitest'
import { clientIdFrom } from '@/lib/input/client-id'

describe('clientIdFrom(time, bytes)', () => {
  it('agrees with the published example of RFC 9562, appendix A.6', () => {
    // Source: RFC 9562 A.6: unix_ts_ms 0x017F22E279B0, rand_a 0xCC3, rand_b 0x18C4DC0C0C07398F.
    const bytes = Uint8Array.from([
      0, 0, 0, 0, 0, 0, 0x0c, 0xc3, 0x18, 0xc4, 0xdc, 0x0c, 0x0c, 0x07, 0x39, 0x8f,
    ])
    expect(clientIdFrom(0x017f22e279b0, bytes)).toBe('017f22e2-79b0-7cc3-98c4-dc0c0c07398f')
  })

  it('sorts by time', () => {
    const bytes = new Uint8Array(16).fill(255)
    const zero = new Uint8Array(16)
    expect(clientIdFrom(1_764_000_000_000, bytes) < clientIdFrom(1_764_000_000_001, zero)).toBe(true)
  })

  it('refuses fewer than 16 bytes', () => {
    expect(() => clientIdFrom(0, new Uint8Array(8))).toThrow(/16 needed/)
  })
})
