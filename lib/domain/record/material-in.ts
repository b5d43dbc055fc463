/** What comes into the works to be made into strings. A spool may be wound from a coil; a resin batch is extruded. */
export const materialInKinds = ['coil', 'spool', 'resin-batch'] as const

export type MaterialInKind = (typeof materialInKinds)[number]

/** As what a material goes into a lot, from the inside out. */
export const lotMaterialRoles = ['core', 'wrap-1', 'wrap-2', 'resin'] as const

export type LotMaterialRole = (typeof lotMaterialRoles)[number]

/** In the middle of a sentence: "a resin batch". */
export const materialInWords: Readonly<Record<MaterialInKind, string>> = {
  coil: 'coil',
  spool: 'spool',
  'resin-batch': 'resin batch',
}

export const lotMaterialWords: Readonly<Record<LotMaterialRole, string>> = {
  core: 'wire or core',
  'wrap-1': 'wrap',
  'wrap-2': 'second wrap',
  resin: 'resin',
}

/** Wire comes from a coil or a spool, resin from a batch. */
export const fitsRole = (kind: MaterialInKind, role: LotMaterialRole): boolean =>
  (role === 'resin') === (kind === 'resin-batch')

/** Links with their places: from 1 within each role, in the order in which they are given. */
export function placed<Link extends { readonly role: LotMaterialRole }>(
  links: readonly Link[],
): readonly (Link & { readonly place: number })[] {
  const counts = new Map<LotMaterialRole, number>()
  return links.map((link) => {
    const place = (counts.get(link.role) ?? 0) + 1
    counts.set(link.role, place)
    return { ...link, place }
  })
}
