import { fireEvent, render, screen, waitFor, within } from '@testing-library/react'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { LotMaterialsForm } from '@/app/lots/_ui/LotMaterialsForm'
import { readMaterialRows, sentRows } from '@/lib/input/lot-materials-form'

const sent = vi.hoisted(() => ({ fields: {} as Record<string, string> }))

vi.mock('@/app/lots/materials-actions', () => ({
  changeLotMaterialsAction: async (_code: string, state: unknown, form: FormData) => {
    sent.fields = Object.fromEntries([...form.entries()].map(([name, value]) => [name, String(value)]))
    return state
  },
}))

const choices = [
  { code: 'C-1', name: 'Wire', kind: 'coil', heat: 'H 77' },
  { code: 'R-1', name: 'Nylon', kind: 'resin-batch', heat: '' },
] as const

const link = (code: string, place: number, fromMetre?: number, toMetre?: number) => ({
  role: 'core' as const,
  place,
  code,
  name: 'Wire',
  kind: 'coil' as const,
  heat: '',
  parentCode: undefined,
  fromMetre,
  toMetre,
})

const form = (materials: readonly ReturnType<typeof link>[]) =>
  render(
    <LotMaterialsForm lotCode="L-1" lotVersion={3} decimal="comma" materials={materials} choices={choices} />,
  )

const rows = () => screen.getAllByRole('group', { name: /^Material \d/ })

describe('LotMaterialsForm', () => {
  beforeEach(() => {
    sent.fields = {}
  })

  it('has a row for each that is named, with the works’ comma, and two more', () => {
    form([link('C-1', 1, 0, 800.5), link('C-0', 2, 800.5)])
    expect(rows()).toHaveLength(4)
    const [first, second] = rows().map((row) => within(row))
    expect(first?.getByLabelText<HTMLInputElement>(/^To/).value).toBe('800,5')
    expect(first?.getByLabelText<HTMLInputElement>(/^From/).value).toBe('0')
    // Put away since, and named all the same.
    expect(second?.getByLabelText<HTMLSelectElement>(/^Coil, spool or batch/).value).toBe('C-0')
  })

  it('never has more rows than a lot may have materials', () => {
    form(Array.from({ length: 19 }, (_, index) => link('C-1', index + 1)))
    expect(rows()).toHaveLength(20)
  })

  it('sends what the action reads: all rows that name something, the version, the reason', async () => {
    form([link('C-1', 1)])
    const last = within(rows().at(-1) ?? document.body)
    fireEvent.change(last.getByLabelText('As'), { target: { value: 'resin' } })
    fireEvent.change(last.getByLabelText(/^Coil, spool or batch/), { target: { value: 'R-1' } })
    fireEvent.change(screen.getByRole('textbox', { name: 'Why' }), { target: { value: 'Seen.' } })
    fireEvent.click(screen.getByRole('button', { name: 'Keep what L-1 is made of' }))
    await waitFor(() => expect(sent.fields.reason).toBe('Seen.'))
    expect(sent.fields.lotVersion).toBe('3')
    expect(readMaterialRows(sent.fields, sentRows(sent.fields))).toMatchObject({
      ok: true,
      value: {
        materials: [
          { role: 'core', code: 'C-1' },
          { role: 'resin', code: 'R-1' },
        ],
      },
    })
  })
})
