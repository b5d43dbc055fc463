import { describe, expect, it } from 'vitest'
import { signalHref } from '@/lib/domain/record/signal-href'

describe('signalHref(signal)', () => {
  it('leads to the product’s chart, or to the machine’s for a run over products', () => {
    expect(signalHref({ id: 7, productCode: 'LARCH-254' })).toBe('/drift?product=LARCH-254#signal-7')
    expect(signalHref({ id: 7, productCode: 'A&B', machineCode: 'BW-1', lotCode: 'RC-045' })).toBe(
      '/drift?machine=BW-1&lot=RC-045#signal-7',
    )
    expect(signalHref({ id: 7, productCode: 'A&B' })).toBe('/drift?product=A%26B#signal-7')
  })
})
