import { unit } from '@/lib/domain/units/unit'

/** Choices of a unit: "mm, millimetre". */
export const unitOptions = (ids: readonly string[]) =>
  ids.map((id) => ({ value: id, label: `${id}, ${unit(id).name}` }))

export const numberFormatOptions = [
  { value: 'point', label: 'Point: 0.254' },
  { value: 'comma', label: 'Comma: 0,254' },
]
