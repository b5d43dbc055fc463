import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  buildDatasheet,
  type DatasheetFacts,
  type DatasheetRequest,
} from '@/lib/domain/datasheets/build-datasheet'
import { compareRevisions } from '@/lib/domain/datasheets/compare-revisions'
import type { DatasheetBody } from '@/lib/domain/datasheets/datasheet'
import { lotSpread } from '@/lib/domain/datasheets/lot-spread'
import { tensionByBasis } from '@/lib/domain/datasheets/tension-by-basis'
import { workingState } from '@/lib/domain/datasheets/working-state'
import type { LotSummaryBody } from '@/lib/domain/quality/lot-summary'
import { hertz, kilogramsPerMetre, metres, newtons } from '@/lib/domain/units/quantity'
import { steelContext } from '@/test/support/steel-context'

const summary = (mean: number, s: number, n = 5): LotSummaryBody => ({
  n,
  mean,
  m2: s * s * (n - 1),
  min: mean - s,
  max: mean + s,
  uCommon: mean * 2e-4,
  uMean: mean * 3e-4,
})

const facts: DatasheetFacts = {
  works: 'A works',
  product: { code: 'LARCH-254', name: 'Larch 254', construction: 'plain' },
  materialName: 'Music wire',
  material: steelContext().material,
  specificationNumber: 1,
  specification: steelContext().specification,
  lots: [397.5, 398.2, 397.9].map((mass, index) => ({
    code: `LA-${index}`,
    madeAt: index,
    massPerMetre: summary(mass * 1e-6, 0.2e-6),
    diameter: summary(254e-6, 0.4e-6),
  })),
  cautions: ['A loaded string can hurt.'],
}

const request: DatasheetRequest = {
  notes: [59, 64, 69, 76],
  lengths: [metres(0.61), metres(0.648)],
  a4: hertz(440),
  basis: 'unloaded-mass',
  forceUnit: 'N',
}

const built = (change: Partial<DatasheetRequest> = {}): DatasheetBody => {
  const result = buildDatasheet(facts, { ...request, ...change })
  if (!result.ok) throw new Error(result.problems[0]?.message)
  return result.value
}

describe('tensionByBasis(basis, masses, f, L)', () => {
  const masses = {
    unloaded: kilogramsPerMetre(0.000385336),
    loaded: kilogramsPerMetre(0.0003826801403809705),
    axialStiffness: newtons(10062.91396852981),
  }

  it('gives 69.838 N with the stretch solved, 70.323 N by the plain formula, for 0.25 mm steel at E4 on 648 mm', () => {
    // Source: physics.json, tension-with-stretch, computed independently with 40 digits.
    const f = hertz(329.6275569128699)
    expect(tensionByBasis('unloaded-mass', masses, f, metres(0.648))).toBeCloseTo(69.83818609499869, 10)
    expect(tensionByBasis('plain-formula', masses, f, metres(0.648))).toBeCloseTo(70.32287395502541, 10)
    expect(tensionByBasis('loaded-mass', masses, f, metres(0.648))).toBeCloseTo(69.83818609499869, 10)
  })
})

describe('a tension table of a wound string', () => {
  it('stretches and breaks by the core alone', () => {
    const core = { shape: 'hex', size: metres(0.2e-3) } as const
    const result = buildDatasheet({ ...facts, specification: { ...facts.specification, core } }, request)
    if (!result.ok) throw new Error(result.problems[0]?.message)
    const area = (Math.sqrt(3) / 2) * 0.2e-3 ** 2
    expect(result.value.axialStiffness).toBeCloseTo(206e9 * area, 8)
    expect(result.value.breakingLoad?.value).toBeCloseTo(2668e6 * area, 8)
  })
})

describe('workingState(fraction)', () => {
  it.each([
    [0.24, 'slack'],
    [0.25, 'working'],
    [0.6, 'working'],
    [0.61, 'upper'],
    [0.76, 'over'],
    [undefined, 'working'],
  ])('%s is %s', (fraction, state) => expect(workingState(fraction)).toBe(state))
})

describe('lotSpread(summaries, show)', () => {
  it('finds the components of a balanced set and prints n lots, m specimens', () => {
    const spread = lotSpread([summary(10, 1), summary(14, 1), summary(12, 1)], String)
    // By hand: MS_W = 1, MS_B = 5·4 = 20, between = √((20 − 1)/5).
    expect(spread?.withinLots).toBeCloseTo(1, 12)
    expect(spread?.betweenLots).toBeCloseTo(Math.sqrt(19 / 5), 12)
    expect(spread?.statement).toMatch(/^3 lots, 15 specimens: lot means from 10 to 14/)
  })

  it('says zero for a negative component, and nothing without lots', () => {
    expect(lotSpread([summary(10, 5), summary(10.1, 5)], String)?.betweenLots).toBe(0)
    expect(lotSpread([], String)).toBeUndefined()
    expect(lotSpread([summary(10, 0, 1)], String)).toMatchObject({
      lots: 1,
      specimens: 1,
      betweenLots: 0,
      withinLots: 0,
    })
  })
})

describe('buildDatasheet(facts, request)', () => {
  it('obeys the law of the basis that it states, in every cell', () => {
    const lawful: Record<string, (body: DatasheetBody, plain: number, T: number) => void> = {
      'plain-formula': (_, plain, T) => expect(Math.abs(T / plain - 1)).toBeLessThan(1e-12),
      'unloaded-mass': (body, plain, T) =>
        expect(Math.abs((T + (T * T) / body.axialStiffness) / plain - 1)).toBeLessThan(1e-12),
      'loaded-mass': (body, plain, T) =>
        expect(Math.abs(T / ((plain * body.loadedMassPerMetre) / body.massPerMetre.value) - 1)).toBeLessThan(
          1e-12,
        ),
    }
    for (const [basis, check] of Object.entries(lawful)) {
      const body = built({ basis: basis as DatasheetRequest['basis'] })
      for (const row of body.rows)
        row.cells.forEach((cell, index) => {
          const speed = 2 * (body.lengths[index] ?? 0) * row.frequency
          check(body, body.massPerMetre.value * speed * speed, cell.tension)
        })
      expect(body.rows).toHaveLength(4)
    }
  })

  it('rises with note and length', () => {
    const { rows } = built()
    for (const [index, row] of rows.entries()) {
      expect(row.cells[1]?.tension).toBeGreaterThan(row.cells[0]?.tension ?? 0)
      const below = rows[index - 1]
      if (below) expect(row.cells[0]?.tension).toBeGreaterThan(below.cells[0]?.tension ?? 0)
    }
  })

  it('refuses without released lots, notes or lengths, in a sentence', () => {
    expect(buildDatasheet({ ...facts, lots: [] }, request)).toMatchObject({
      ok: false,
      problems: [{ message: 'No lot of Larch 254 is released yet, so there is nothing to publish from.' }],
    })
    expect(buildDatasheet(facts, { ...request, notes: [] }).ok).toBe(false)
  })

  it('does not print digits that the uncertainty does not carry', () => {
    const rough = {
      ...facts,
      lots: facts.lots.map((lot) => ({
        ...lot,
        massPerMetre: { ...lot.massPerMetre, uCommon: lot.massPerMetre.mean * 0.05 },
      })),
    }
    const result = buildDatasheet(rough, request)
    expect(result.ok && result.value.decimals).toBe(0)
    expect(built().decimals).toBe(1)
  })

  it('survives JSON unchanged', () => {
    fc.assert(
      fc.property(fc.constantFrom('N', 'kgf', 'lbf'), fc.integer({ min: 40, max: 80 }), (forceUnit, midi) => {
        const body = built({ forceUnit, notes: [midi] })
        expect(JSON.parse(JSON.stringify(body))).toEqual(body)
      }),
    )
  })
})

describe('compareRevisions(before, after)', () => {
  it('names what changed', () => {
    expect(compareRevisions(undefined, built())).toEqual(['first revision'])
    expect(compareRevisions(built(), built())).toEqual(['nothing but the date'])
    expect(compareRevisions(built(), built({ basis: 'plain-formula', a4: hertz(442) }))).toEqual([
      'basis unloaded mass, stretch solved to plain formula',
      'A4 440 to 442 Hz',
    ])
  })
})
