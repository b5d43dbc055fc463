import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database, type Tx } from '@/lib/data/database'
import { dies } from '@/lib/data/dies'
import { appendLedger } from '@/lib/data/ledger'
import { lockRow } from '@/lib/data/locks'
import { insertLotMaterials } from '@/lib/data/lot-materials'
import { findLotByCode, insertLot } from '@/lib/data/lots'
import { machines } from '@/lib/data/machines'
import { findProductByCode, type ProductRow } from '@/lib/data/products'
import { findSpecification, findSpecificationInForce, type SpecificationRow } from '@/lib/data/specifications'
import { problem } from '@/lib/domain/errors'
import type { OpenLotInput } from '@/lib/input/lot'
import { lotMaterialLinks } from './lot-material-links'
import { once } from './once'

export interface OpenedLot {
  readonly code: string
  readonly productCode: string
  /** Number of the specification revision the lot is judged by, from now on. */
  readonly revision: number
}

/**
 * Opens a lot for measuring. Its specification revision is fixed: the one on the traveller, else the one in
 * force when it was made.
 * @throws LedgerlineError not-permitted, not-found (product, machine, die, revision, coil, spool, batch),
 *   not-ready (no specification in force), conflict (the code is taken), bad-input (a material that does not fit
 *   its role, or is put away)
 */
export async function openLot(
  actor: Actor | undefined,
  input: OpenLotInput,
  at: number = Date.now(),
): Promise<OpenedLot> {
  permit(actor, 'lots.open')
  return database().write(async (tx) => {
    const product = await findProductByCode(tx, input.productCode)
    if (!product)
      throw problem('not-found', `There is no product ${input.productCode}.`, { where: 'productCode' })
    await lockRow(tx, 'Product', product.id)
    const open = () => openOnce(tx, product, input, actor, at)
    const { requestId } = input
    const { reply, repeated } =
      requestId === undefined
        ? { reply: await open(), repeated: false }
        : await once(tx, { requestId, personId: actor.personId, input, at }, open)
    if (!repeated)
      await appendLedger(tx, {
        at,
        personId: actor.personId,
        verb: 'open-lot',
        subject: `lot ${reply.code}`,
        body: { ...input, revision: reply.revision },
      })
    return reply
  })
}

async function openOnce(
  tx: Tx,
  product: ProductRow,
  input: OpenLotInput,
  actor: Actor,
  at: number,
): Promise<OpenedLot> {
  const taken = await findLotByCode(tx, input.code)
  if (taken)
    throw problem('conflict', `Lot ${input.code} is there already, of ${taken.product.name}.`, {
      where: 'code',
      mend: 'Open it in the list of lots, or give this one another code.',
    })
  if (input.madeAt > at + 24 * 3_600_000)
    throw problem('bad-input', 'A lot can’t be made in the future.', {
      where: 'madeAt',
      mend: 'Check the date.',
    })
  const revision = await revisionOf(tx, product, input)
  const machine = input.machineCode === undefined ? undefined : await machines.get(tx, input.machineCode)
  if (input.machineCode !== undefined && !machine)
    throw problem('not-found', `There is no machine ${input.machineCode}.`, { where: 'machineCode' })
  const die = input.dieCode === undefined ? undefined : await dies.get(tx, input.dieCode)
  if (input.dieCode !== undefined && !die)
    throw problem('not-found', `There is no die ${input.dieCode}.`, { where: 'dieCode' })
  const links = await lotMaterialLinks(tx, input.materials ?? [], { lengthMetres: input.lengthMetres })
  const lot = await insertLot(tx, {
    code: input.code,
    product,
    specificationRevisionId: revision.id,
    machineId: machine?.id,
    dieId: die?.id,
    makerId: actor.personId,
    madeAt: input.madeAt,
    lengthMetres: input.lengthMetres,
    setting: input.setting,
    at,
    personId: actor.personId,
  })
  await insertLotMaterials(tx, lot.id, links)
  return { code: input.code, productCode: product.code, revision: revision.number }
}

async function revisionOf(tx: Tx, product: ProductRow, input: OpenLotInput): Promise<SpecificationRow> {
  if (input.revision !== undefined) {
    const named = await findSpecification(tx, product.id, input.revision)
    if (!named)
      throw problem('not-found', `${product.name} has no specification revision ${input.revision}.`, {
        where: 'revision',
      })
    return named
  }
  const inForce = await findSpecificationInForce(tx, product.id, input.madeAt)
  if (!inForce)
    throw problem('not-ready', `${product.name} had no specification in force when this lot was made.`, {
      where: 'madeAt',
      mend: 'Issue a specification revision in the Catalogue, effective from that day.',
    })
  return inForce
}
