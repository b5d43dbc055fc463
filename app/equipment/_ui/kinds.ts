/** The kinds of equipment that have plain pages; rigs have their own. */
export const equipmentKinds = ['gauges', 'weights', 'machines', 'dies'] as const

export type EquipmentKind = (typeof equipmentKinds)[number]

export const kindWords: Readonly<Record<EquipmentKind, { readonly add: string; readonly one: string }>> = {
  gauges: { add: 'Add measuring equipment', one: 'Measuring equipment' },
  weights: { add: 'Add a weight or hanger', one: 'Weight' },
  machines: { add: 'Add a machine', one: 'Machine' },
  dies: { add: 'Add a die', one: 'Die' },
}

export const equipmentKindOf = (text: string | undefined): EquipmentKind | undefined =>
  equipmentKinds.find((kind) => kind === text)

export const equipmentPath = (kind: EquipmentKind | 'rigs', code: string): string =>
  `/equipment/${kind}/${encodeURIComponent(code)}`
