import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { findGaugesByCodes } from '@/lib/data/gauges'
import { type RigRow, type RigValues, rigs } from '@/lib/data/rigs'
import { findWeightsByCodes } from '@/lib/data/weights'
import { problem } from '@/lib/domain/errors'
import type { RigInput } from '@/lib/input/equipment'
import { createEquipment, type Kind, missing, setEquipmentActive, updateEquipment } from './keep-equipment'

const kind: Kind<RigRow, RigValues> = { word: 'rig', store: rigs }

const gaugeFields = [
  ['micrometerCode', 'micrometer'],
  ['balanceCode', 'balance'],
  ['ruleCode', 'rule'],
  ['counterCode', 'counter'],
] as const

/** Whatever a rig names has to exist, and to be of that kind. */
const checkNames = async (input: RigInput): Promise<void> => {
  const { read } = database()
  const hanging = [input.hangerCode, ...input.weightCodes].filter((code) => code !== '')
  const known = new Set((await findWeightsByCodes(read, hanging)).map(({ code }) => code))
  const lost = hanging.find((code) => !known.has(code))
  if (lost !== undefined) {
    throw problem('not-found', `There is no weight or hanger ${lost}.`, {
      where: lost === input.hangerCode ? 'hangerCode' : 'weightCodes',
      mend: 'Register it under Weights first.',
    })
  }
  const gauges = await findGaugesByCodes(
    read,
    gaugeFields.map(([field]) => input[field]).filter((code) => code !== ''),
  )
  for (const [field, word] of gaugeFields) {
    const code = input[field]
    if (code !== '' && !gauges.some((gauge) => gauge.code === code && gauge.kind === word)) {
      throw problem('not-found', `There is no ${word} ${code}.`, {
        where: field,
        mend: 'Add it under Measuring equipment first.',
      })
    }
  }
}

/** Adds a rig. @throws LedgerlineError not-permitted; conflict when the code is taken; not-found for a name */
export const createRig = async (
  actor: Actor | undefined,
  code: string,
  input: RigInput,
  at: number = Date.now(),
): Promise<RigRow> => {
  permit(actor, 'equipment.keep')
  await checkNames(input)
  return createEquipment(kind, actor, code, input, at)
}

/** Results already computed keep what they rest on. @throws LedgerlineError not-permitted, not-found, conflict */
export const updateRig = async (
  actor: Actor | undefined,
  code: string,
  version: number,
  input: RigInput,
  at: number = Date.now(),
): Promise<void> => {
  permit(actor, 'equipment.keep')
  await checkNames(input)
  await updateEquipment(kind, actor, code, version, input, at)
}

/** Puts a rig away, or back into use. @throws LedgerlineError not-permitted, not-found, conflict */
export const setRigActive = (
  actor: Actor | undefined,
  code: string,
  version: number,
  active: boolean,
  at: number = Date.now(),
): Promise<void> => setEquipmentActive(kind, actor, code, version, active, at)

/** @throws LedgerlineError not-permitted, not-found */
export async function requireRig(actor: Actor | undefined, code: string): Promise<RigRow> {
  permit(actor, 'equipment.read')
  const row = await rigs.get(database().read, code)
  if (!row) throw missing('rig', code)
  return row
}
