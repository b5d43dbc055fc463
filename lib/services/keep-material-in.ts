import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database, type Tx } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'
import { findMaterialByCode } from '@/lib/data/materials'
import {
  isMaterialInNamed,
  type MaterialInRow,
  type MaterialInValues,
  materialsIn,
} from '@/lib/data/materials-in'
import { problem } from '@/lib/domain/errors'
import { materialInWords } from '@/lib/domain/record/material-in'
import type { MaterialInInput } from '@/lib/input/material-in'
import { changedMeanwhile } from './changed-meanwhile'

/**
 * Registers a coil, spool or resin batch.
 * @throws LedgerlineError not-permitted; conflict when the code is taken; not-found (material of the catalogue,
 *   coil it was wound from); bad-input when something other than a spool is wound, or from something other than a coil
 */
export async function createMaterialIn(
  actor: Actor | undefined,
  code: string,
  input: MaterialInInput,
  at: number = Date.now(),
): Promise<MaterialInRow> {
  permit(actor, 'materials-in.keep')
  return database().write(async (tx) => {
    const taken = await materialsIn.get(tx, code)
    if (taken)
      throw problem('conflict', `The code ${code} is taken by another ${materialInWords[taken.kind]}.`, {
        where: 'code',
        mend: 'Choose another one.',
      })
    const row = await materialsIn.insert(tx, code, await valuesOf(tx, code, input), at)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'create',
      subject: `material-in ${code}`,
      body: { ...input },
    })
    return row
  })
}

/**
 * Changes what is known of it. Its kind may change as long as no lot and no spool names it.
 * @throws LedgerlineError as `createMaterialIn`; not-found; conflict when someone changed it in the meantime
 */
export async function updateMaterialIn(
  actor: Actor | undefined,
  code: string,
  version: number,
  input: MaterialInInput,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'materials-in.keep')
  await database().write(async (tx) => {
    const row = await found(tx, code)
    if (input.kind !== row.kind && (await isMaterialInNamed(tx, row.id)))
      throw problem('bad-input', `${code} stays a ${materialInWords[row.kind]}: lots or spools name it.`, {
        where: 'kind',
        mend: 'Register the other one under a code of its own.',
      })
    if (!(await materialsIn.update(tx, code, version, await valuesOf(tx, code, input))))
      throw changedMeanwhile(code)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'change',
      subject: `material-in ${code}`,
      body: { ...input },
    })
  })
}

/** Puts it away, or back into use. @throws LedgerlineError not-permitted, not-found, conflict */
export async function setMaterialInActive(
  actor: Actor | undefined,
  code: string,
  version: number,
  active: boolean,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'materials-in.keep')
  await database().write(async (tx) => {
    await found(tx, code)
    if (!(await materialsIn.setActive(tx, code, version, active))) throw changedMeanwhile(code)
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: active ? 'activate' : 'deactivate',
      subject: `material-in ${code}`,
      body: {},
    })
  })
}

/** @throws LedgerlineError not-permitted, not-found */
export async function requireMaterialIn(actor: Actor | undefined, code: string): Promise<MaterialInRow> {
  permit(actor, 'materials-in.read')
  return found(database().read, code)
}

async function found(tx: Tx, code: string): Promise<MaterialInRow> {
  const row = await materialsIn.get(tx, code)
  if (!row) throw problem('not-found', `There is no coil, spool or resin batch ${code}.`)
  return row
}

async function valuesOf(tx: Tx, code: string, input: MaterialInInput): Promise<MaterialInValues> {
  const { materialCode, parentCode } = input
  const material = materialCode === undefined ? undefined : await findMaterialByCode(tx, materialCode)
  if (materialCode !== undefined && !material)
    throw problem('not-found', `The catalogue has no material ${materialCode}.`, {
      where: 'materialCode',
      mend: 'Add it to the Catalogue, or leave the material open.',
    })
  return {
    name: input.name,
    kind: input.kind,
    heat: input.heat,
    supplier: input.supplier,
    sizeMetres: input.sizeMetres,
    lengthMetres: input.lengthMetres,
    massKilograms: input.massKilograms,
    receivedAt: input.receivedAt,
    note: input.note,
    materialId: material?.id,
    parentId: parentCode === undefined ? undefined : await parentOf(tx, code, input.kind, parentCode),
  }
}

/** Only a spool is wound, and only from a coil: so no chain of them can close on itself. */
async function parentOf(
  tx: Tx,
  code: string,
  kind: MaterialInInput['kind'],
  parentCode: string,
): Promise<number> {
  const at = { where: 'parentCode' }
  if (kind !== 'spool')
    throw problem('bad-input', `${code} is a ${materialInWords[kind]}; only a spool is wound from a coil.`, {
      ...at,
      mend: 'Leave “wound from” empty.',
    })
  const parent = await materialsIn.get(tx, parentCode)
  if (!parent) throw problem('not-found', `There is no coil ${parentCode}.`, at)
  if (parent.kind !== 'coil')
    throw problem('bad-input', `${parentCode} is a ${materialInWords[parent.kind]}, not a coil.`, {
      ...at,
      mend: 'Choose the coil that the spool was wound from.',
    })
  return parent.id
}
