import type { KnownEquipment } from '@/lib/data/evaluation-facts'
import { problem } from '@/lib/domain/errors'
import { hangingCodes } from '@/lib/domain/record/evaluation-facts'
import type { SpecimenEntry } from '@/lib/domain/record/write-state'

const kinds = ['micrometer', 'balance', 'rule', 'counter'] as const

/**
 * Everything that entries name has to be registered, and each gauge has to be what it is used as.
 * @throws LedgerlineError bad-input with the code that is not known
 */
export function checkEquipment(equipment: KnownEquipment, entries: readonly SpecimenEntry[]): void {
  for (const { reading } of entries) {
    const { rig } = reading.equipment
    if (rig !== undefined && !equipment.rigs.some((one) => one.code === rig)) throw unknown('rig', rig)
    for (const kind of kinds) {
      const code = reading.equipment[kind]
      if (code === undefined) continue
      const gauge = equipment.gauges.find((one) => one.code === code)
      if (!gauge) throw unknown(kind, code)
      if (gauge.kind !== kind)
        throw problem('bad-input', `${code} is registered as a ${gauge.kind}, not as a ${kind}.`, {
          where: kind,
          mend: `Choose a ${kind}.`,
        })
    }
    for (const code of hangingCodes(reading.values))
      if (!equipment.weights.some((one) => one.code === code)) throw unknown('weight', code)
  }
}

const unknown = (kind: string, code: string) =>
  problem('bad-input', `There is no ${kind} ${code}.`, {
    where: kind,
    mend: `Register it in Equipment, or choose another ${kind}.`,
  })
