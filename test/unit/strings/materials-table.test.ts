import { describe, expect, it } from 'vitest'
import { handbookMaterials } from '@/lib/domain/strings/materials-table'
import { tensileStrengthAt } from '@/lib/domain/strings/strength'
import { metres } from '@/lib/domain/units/quantity'

describe('handbookMaterials', () => {
  it('keeps every value inside its range, under a code of its own, with a source', () => {
    expect(new Set(handbookMaterials.map(({ code }) => code)).size).toBe(handbookMaterials.length)
    for (const { body, code, source } of handbookMaterials) {
      for (const range of [body.density, body.youngsModulus, body.thermalExpansion]) {
        if (!range) continue
        expect(range.low, code).toBeLessThanOrEqual(range.value)
        expect(range.value, code).toBeLessThanOrEqual(range.high)
      }
      expect(source.length, code).toBeGreaterThan(10)
    }
  })

  it('gives music wire of 0.010 in 2668 to 2951 MPa, and rises as the wire gets thinner', () => {
    // Source: ASTM A228 as a public page reproduces it: 387 to 428 ksi; × 6.894757.
    const wire = handbookMaterials.find(({ code }) => code === 'MUSIC-WIRE')
    const at = wire && tensileStrengthAt(wire.body, metres(0.01 * 0.0254))
    expect(at?.low).toBeCloseTo(2668.27e6, -5)
    expect(at?.high).toBeCloseTo(2950.96e6, -5)
    const rows = wire?.body.strengthByDiameter ?? []
    expect(rows).toHaveLength(13)
    for (const [index, row] of rows.entries()) {
      const before = rows[index - 1]
      if (!before) continue
      expect(row.diameter).toBeGreaterThan(before.diameter)
      expect(row.low).toBeLessThan(before.low)
    }
  })
})
