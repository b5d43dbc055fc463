import { describe, expect, it } from 'vitest'
import { warningSign } from '@/lib/domain/charts/warning-sign'
import { numbersIn } from '@/test/support/drawing'

describe('warningSign', () => {
  it('is a named triangle within 22 × 20 px', () => {
    expect(warningSign).toMatchObject({ label: 'Caution', width: 22, height: 20 })
    for (const at of numbersIn(warningSign.shapes)) expect(at >= 0 && at <= 22).toBe(true)
  })
})
