import { describe, expect, it } from 'vitest'
import { fitsRole, lotMaterialRoles, materialInKinds, placed } from '@/lib/domain/record/material-in'

describe('fitsRole', () => {
  it('lets coils and spools be wire, resin batches be resin, and nothing else', () => {
    const fitting = materialInKinds.map((kind) => [
      kind,
      lotMaterialRoles.filter((role) => fitsRole(kind, role)),
    ])
    expect(fitting).toEqual([
      ['coil', ['core', 'wrap-1', 'wrap-2']],
      ['spool', ['core', 'wrap-1', 'wrap-2']],
      ['resin-batch', ['resin']],
    ])
  })
})

describe('placed', () => {
  it('counts from 1 within each role, in the order given', () => {
    const links = (['core', 'wrap-1', 'core', 'core', 'wrap-1'] as const).map((role) => ({ role }))
    expect(placed(links).map(({ role, place }) => `${role} ${place}`)).toEqual([
      'core 1',
      'wrap-1 1',
      'core 2',
      'core 3',
      'wrap-1 2',
    ])
  })
})
