import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { closureGate, type GateInput, type GateSpecimen } from '@/lib/domain/charts/closure-gate'
import { allShapes, marksIn, numbersIn, textsIn } from '@/test/support/drawing'

const gate = (...specimens: GateSpecimen[]): GateInput => ({ unit: 'mg/m', decimals: 1, specimens })

const closed: GateSpecimen = {
  label: '1',
  weighed: { value: 397.5, expanded: 0.4 },
  sounded: { value: 397.9, expanded: 0.5 },
  combined: 0.7,
  verdict: 'closed',
  closureText: '+0.10 %',
}

describe('closureGate', () => {
  it('opens the gate at weighed ± the combined U and stands the note where it was sounded', () => {
    const { shapes } = closureGate(gate(closed))
    const [note] = marksIn(shapes, 'note')
    const ground = allShapes(shapes).find((shape) => shape.kind === 'rect')
    if (note?.kind !== 'ellipse' || ground?.kind !== 'rect') throw new Error('note and gate are drawn')
    const perUnit = ground.w / 1.4
    expect(note.cx).toBeNear(ground.x + ground.w / 2 + 0.4 * perUnit, { absolute: 1e-6 })
    expect(ground).toMatchObject({ fill: 'verdigris', opacity: 0.13 })
    expect(note.cx).toBeLessThan(ground.x + ground.w)
    expect(textsIn(shapes).map(({ text }) => text)).toEqual(
      expect.arrayContaining(['1', 'closed', '+0.10 %', 'mg/m']),
    )
  })

  it('leaves the note of an open specimen outside its gate', () => {
    const { shapes } = closureGate(
      gate({ ...closed, sounded: { value: 399.4, expanded: 0.5 }, verdict: 'open', closureText: '+0.48 %' }),
    )
    const [note] = marksIn(shapes, 'note')
    const ground = allShapes(shapes).find((shape) => shape.kind === 'rect')
    if (note?.kind !== 'ellipse' || ground?.kind !== 'rect') throw new Error('note and gate are drawn')
    expect(note.cx).toBeGreaterThan(ground.x + ground.w)
    expect(ground.fill).toBe('wash')
  })

  it('has one rule for all specimens', () => {
    const { shapes } = closureGate(gate(closed, { ...closed, label: '2' }))
    const [one, two] = marksIn(shapes, 'note')
    expect(one?.kind === 'ellipse' ? one.cx : 0).toBe(two?.kind === 'ellipse' ? two.cx : 1)
  })

  it('points at a slip that lies off the rule and says its value, so that the others keep their room', () => {
    const slip: GateSpecimen = {
      ...closed,
      label: '4',
      sounded: { value: 497.9, expanded: 0.5 },
      verdict: 'open',
    }
    const { shapes } = closureGate(gate(closed, { ...closed, label: '2' }, { ...closed, label: '3' }, slip))
    expect(marksIn(shapes, 'note')).toHaveLength(3)
    expect(textsIn(shapes).map(({ text }) => text)).toContain('sounded 497.9, off the rule')
    const ground = allShapes(shapes).find((shape) => shape.kind === 'rect')
    expect(ground?.kind === 'rect' ? ground.w : 0).toBeGreaterThan(25)
  })

  it('waits where one route or both are missing', () => {
    const { shapes, description } = closureGate(
      gate({ label: '1' }, { label: '2', weighed: { value: 397.5 } }),
    )
    expect(textsIn(shapes).filter(({ text }) => text === 'waits')).toHaveLength(2)
    expect(marksIn(shapes, 'weight')).toHaveLength(1)
    expect(description).toBe(
      'Specimen 1: weighed nothing yet, sounded nothing yet. Specimen 2: weighed 397.5 mg/m, sounded nothing yet.',
    )
  })

  it('says every specimen in words', () => {
    const { label, description } = closureGate(gate(closed))
    expect(label).toBe('Two routes to mass per metre, 1 specimen')
    expect(description).toBe('Specimen 1: weighed 397.5 mg/m, sounded 397.9 mg/m; closed, +0.10 %.')
  })

  it('keeps marks on the rule and numbers finite for any values', () => {
    const route = fc.option(
      fc.record({
        value: fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        expanded: fc.option(fc.double({ min: 0, max: 100, noNaN: true }), { nil: undefined }),
      }),
      { nil: undefined },
    )
    fc.assert(
      fc.property(
        fc.array(
          fc.record({
            label: fc.constant('1'),
            weighed: route,
            sounded: route,
            combined: fc.option(fc.double({ min: 0, max: 100, noNaN: true }), { nil: undefined }),
            verdict: fc.constantFrom(undefined, 'closed' as const, 'doubtful' as const, 'open' as const),
          }),
          { maxLength: 6 },
        ),
        (specimens) => {
          const { shapes, height } = closureGate(gate(...specimens))
          for (const number of [...numbersIn(shapes), height]) expect(Number.isFinite(number)).toBe(true)
          for (const note of marksIn(shapes, 'note'))
            if (note.kind === 'ellipse') expect(note.cx >= 0 && note.cx <= 264).toBe(true)
          for (const shape of allShapes(shapes))
            if (shape.kind === 'rect') expect(shape.w).toBeGreaterThanOrEqual(0)
        },
      ),
      { numRuns: 200, seed: 1 },
    )
  })
})
