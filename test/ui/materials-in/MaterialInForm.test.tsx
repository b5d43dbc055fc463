import { fireEvent, render, screen } from '@testing-library/react'
import { describe, expect, it } from 'vitest'
import type { FormState } from '@/app/_ui/forms/form-state'
import { MaterialInForm } from '@/app/materials-in/_ui/MaterialInForm'

const works = { numberFormat: 'comma', timeZone: 'Europe/Oslo' } as const
const still = async (state: FormState) => state
const shared = {
  works,
  materials: [{ code: 'MUSIC-WIRE', name: 'Music wire' }],
  coils: [{ code: 'C-1', name: 'Wire 254' }],
}

const row = {
  id: 7,
  code: 'S-3',
  name: 'Wire 254',
  kind: 'spool',
  heat: 'H 77',
  supplier: '',
  sizeMetres: 254e-6,
  lengthMetres: 1200.5,
  massKilograms: undefined,
  receivedAt: Date.UTC(2026, 2, 1, 23, 30),
  note: '',
  active: true,
  version: 4,
  material: undefined,
  parent: { id: 3, code: 'C-0', name: 'Put away since' },
} as const

const shownIn = (name: string | RegExp): string => screen.getByLabelText<HTMLInputElement>(name).value

describe('MaterialInForm', () => {
  it('shows what is known as it would be typed: the works’ comma, its day, mm', () => {
    render(<MaterialInForm action={still} row={row} {...shared} />)
    expect(shownIn(/^Size/)).toBe('0,254')
    expect(shownIn(/^Length/)).toBe('1200,5')
    expect(shownIn(/^Mass/)).toBe('')
    // Half past eleven by UTC is the next day in Oslo.
    expect(shownIn(/^Came in/)).toBe('2026-03-02')
    expect(shownIn(/^Kind/)).toBe('spool')
    expect(screen.queryByLabelText(/^Code/)).toBeNull()
    expect(screen.getByRole('button', { name: 'Save S-3' })).toBeDefined()
  })

  it('keeps a coil to choose that was put away since', () => {
    render(<MaterialInForm action={still} row={row} {...shared} />)
    expect(shownIn(/^Wound from/)).toBe('C-0')
    expect(screen.getByRole('option', { name: 'C-1 · Wire 254' })).toBeDefined()
  })

  it('begins a spool at the coil it is asked for', () => {
    render(<MaterialInForm action={still} kind="spool" parentCode="C-1" {...shared} />)
    expect(shownIn(/^Kind/)).toBe('spool')
    expect(shownIn(/^Wound from/)).toBe('C-1')
    expect(shownIn(/^Code/)).toBe('')
  })

  it('gives back what was typed when it is refused, with the problem at its field', async () => {
    const refuse = async (_: FormState, form: FormData): Promise<FormState> => ({
      status: 'refused',
      problems: [{ code: 'bad-input', message: 'Size is too large.', where: 'size' }],
      values: { size: [String(form.get('size'))], code: [String(form.get('code'))] },
      stamp: 1,
    })
    render(<MaterialInForm action={refuse} {...shared} />)
    fireEvent.change(screen.getByLabelText(/^Code/), { target: { value: 'C-9' } })
    fireEvent.change(screen.getByLabelText(/^Size/), { target: { value: '254' } })
    fireEvent.click(screen.getByRole('button', { name: 'Add it' }))
    await screen.findByRole('alert')
    expect(shownIn(/^Size/)).toBe('254')
    expect(shownIn(/^Code/)).toBe('C-9')
    expect(screen.getByLabelText(/^Size/).getAttribute('aria-invalid')).toBe('true')
  })
})
