import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { getWorks, insertWorks } from '@/lib/data/works'
import { problem } from '@/lib/domain/errors'
import type { NewWorksInput } from '@/lib/input/works'
import { installMaterials } from './install-materials'

/** Millimetres, milligrams, newtons and a decimal point, until Settings says otherwise. */
export const usualUnits = {
  lengthUnit: 'mm',
  diameterUnit: 'mm',
  forceUnit: 'N',
  massUnit: 'mg',
  numberFormat: 'point',
} as const

/** 20 °C, standard pressure, half humidity. */
const usualAir = { airTemperatureCelsius: 20, airPressurePascals: 101325, airHumidity: 0.5 } as const

/**
 * Gives the works its name and place and installs the handbook's materials.
 * @throws LedgerlineError not-permitted; conflict when there is a works already
 */
export async function createWorks(
  actor: Actor | undefined,
  input: NewWorksInput,
  { demo = false, at = Date.now() }: { readonly demo?: boolean; readonly at?: number } = {},
): Promise<void> {
  permit(actor, 'settings.keep')
  await database().write(async (tx) => {
    if (await getWorks(tx))
      throw problem('conflict', 'This works is set up already.', { mend: 'Change it in Settings.' })
    await insertWorks(
      tx,
      {
        gravityTyped: undefined,
        a4: 440,
        secondPersonPublishes: false,
        ...usualAir,
        ...usualUnits,
        ...input,
      },
      { demo, at },
    )
    const materials = await installMaterials(tx, at)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'create',
      subject: 'works',
      body: { ...input, demo, materials },
    })
  })
}
