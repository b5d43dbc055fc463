/** A lot as far as its length goes. */
export interface MadeLot {
  /** Epoch milliseconds. */
  readonly madeAt: number
  /** Undefined where nobody said how long it is. */
  readonly lengthMetres: number | undefined
}

export interface MetresMade {
  readonly lots: number
  /** Sum over the lots with a length. */
  readonly metres: number
  /** Lots that the sum knows nothing of. */
  readonly withoutLength: number
  readonly firstMadeAt: number | undefined
  readonly lastMadeAt: number | undefined
}

/** How much was made, and how much of it is not known; scrapped lots wore the die like any other. */
export function metresMade(lots: readonly MadeLot[]): MetresMade {
  const times = lots.map(({ madeAt }) => madeAt)
  return {
    lots: lots.length,
    metres: lots.reduce((sum, { lengthMetres }) => sum + (lengthMetres ?? 0), 0),
    withoutLength: lots.filter(({ lengthMetres }) => lengthMetres === undefined).length,
    firstMadeAt: times.length === 0 ? undefined : times.reduce((a, b) => Math.min(a, b)),
    lastMadeAt: times.length === 0 ? undefined : times.reduce((a, b) => Math.max(a, b)),
  }
}

/** The same for each group of lots, in the order in which the groups first occur. */
export function metresMadeBy<Lot extends MadeLot>(
  lots: readonly Lot[],
  groupOf: (lot: Lot) => string,
): readonly (MetresMade & { readonly group: string })[] {
  const groups = new Map<string, Lot[]>()
  for (const lot of lots) {
    const group = groupOf(lot)
    const own = groups.get(group)
    if (own) own.push(lot)
    else groups.set(group, [lot])
  }
  return [...groups].map(([group, own]) => ({ group, ...metresMade(own) }))
}
