/** Reads a datasheet's table and figures back from the text of its print, and reckons the tensions again. */

export interface PrintedCell {
  readonly note: string
  readonly frequency: number
  readonly length: number
  readonly tension: number
}

export interface PrintedSheet {
  readonly massPerMetre: number
  readonly axialStiffness: number | undefined
  readonly basis: string
  readonly cells: readonly PrintedCell[]
}

const number = (text: string | undefined): number => Number((text ?? '').replace(',', '.'))

export function readPrintedSheet(text: string): PrintedSheet {
  const mass = /([\d.,]+) mg\/m/.exec(text)?.[1]
  const stiffness = /EA = ([\d.,]+) N/.exec(text)?.[1]
  const basis = /Basis: ([^.]+)\./.exec(text.replace(/\s+/g, ' '))?.[1] ?? ''
  const head = /^Note\s+Hz\s+(.+)$/m.exec(text)?.[1] ?? ''
  const lengths = [...head.matchAll(/([\d.,]+) mm/g)].map(([, one]) => number(one) / 1000)
  const rows = [...text.matchAll(/^([A-G]\s?[♯♭]?\s?\d)\s+(\d+[.,]\d\d)\s+(.+)$/gmu)]
  return {
    massPerMetre: number(mass) / 1e6,
    axialStiffness: stiffness === undefined ? undefined : number(stiffness),
    basis,
    cells: rows.flatMap(([, note = '', frequency, rest = '']) => {
      // Tension and share take turns; “over” stands where a tension is not offered.
      const tensions = rest
        .trim()
        .split(/\s+/)
        .filter((_, index) => index % 2 === 0)
      return tensions.flatMap((shown, index): PrintedCell[] => {
        const length = lengths[index]
        return shown === 'over' || length === undefined
          ? []
          : [{ note: note.replace(/\s/g, ''), frequency: number(frequency), length, tension: number(shown) }]
      })
    }),
  }
}

/** T of the plain formula from mass per metre, frequency and length, in newtons. */
export const plainTension = (massPerMetre: number, frequency: number, length: number): number =>
  massPerMetre * (2 * length * frequency) ** 2

/** The same with the stretch solved by repeated substitution, not by the formula of the program. */
export function stretchedTension(unstretched: number, axialStiffness: number): number {
  let tension = unstretched
  for (let round = 0; round < 60; round += 1) tension = unstretched / (1 + tension / axialStiffness)
  return tension
}
