import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database, type Tx } from '@/lib/data/database'
import {
  type DatasheetRevisionRow,
  findDatasheetOfProduct,
  listReleasedLots,
  listRevisions,
} from '@/lib/data/datasheets'
import { findMaterialByCode, materialBodyOf } from '@/lib/data/materials'
import { findProductByCode } from '@/lib/data/products'
import { findSpecificationInForce, specificationBodyOf } from '@/lib/data/specifications'
import { getWorks } from '@/lib/data/works'
import { buildDatasheet as buildBody, type ReleasedLot } from '@/lib/domain/datasheets/build-datasheet'
import { compareRevisions } from '@/lib/domain/datasheets/compare-revisions'
import type { DatasheetBody } from '@/lib/domain/datasheets/datasheet'
import { LedgerlineError, problem } from '@/lib/domain/errors'
import { MODEL_VERSION } from '@/lib/domain/metrology/model-version'
import { tensionTableCautions } from '@/lib/domain/strings/cautions'
import type { BuildDatasheetInput } from '@/lib/input/datasheet'

export interface DatasheetPreview {
  readonly body: DatasheetBody
  readonly productId: number
  readonly lotIds: readonly number[]
  readonly datasheet: { readonly id: number; readonly code: string } | undefined
  readonly newest: DatasheetRevisionRow | undefined
  /** Against the newest revision, in short phrases. */
  readonly changes: readonly string[]
}

/** The tension table as it would be published now, from the lots that are released now. */
export async function buildDatasheet(
  actor: Actor | undefined,
  input: BuildDatasheetInput,
): Promise<DatasheetPreview> {
  permit(actor, 'datasheets.build')
  return previewDatasheet(database().read, input, Date.now())
}

/** The same inside a transaction: what is published is built from what is true when it is published. */
export async function previewDatasheet(
  tx: Tx,
  input: BuildDatasheetInput,
  at: number,
): Promise<DatasheetPreview> {
  const product = await findProductByCode(tx, input.productCode)
  if (!product) throw problem('not-found', `There is no product ${input.productCode}.`)
  const specification = await findSpecificationInForce(tx, product.id, at)
  const material = specification && (await findMaterialByCode(tx, specification.materialCode))
  if (!specification || !material)
    throw problem('not-ready', `${product.name} has no specification in force.`, {
      mend: 'Issue a specification revision in the Catalogue.',
    })
  const works = await getWorks(tx)
  const rows = await listReleasedLots(tx, product.id, MODEL_VERSION)
  const usable = rows.flatMap(({ id, code, madeAt, summaries }) => {
    const of = (characteristic: string) => summaries.find((one) => one.characteristic === characteristic)
    const massPerMetre = of('massPerMetreWeighed')
    const lot: ReleasedLot | undefined = massPerMetre && {
      code,
      madeAt,
      massPerMetre,
      diameter: of('diameter'),
      effectiveDensity: of('effectiveDensity'),
    }
    return lot ? [{ id, lot }] : []
  })
  const built = buildBody(
    {
      works: works?.name ?? '',
      product: { code: product.code, name: product.name, construction: product.construction },
      material: materialBodyOf(material),
      materialName: material.name,
      specification: specificationBodyOf(specification),
      specificationNumber: specification.number,
      lots: usable.map((one) => one.lot),
      cautions: tensionTableCautions,
    },
    input,
  )
  if (!built.ok) {
    const [first] = built.problems
    throw first ? new LedgerlineError(first) : problem('not-ready', 'The datasheet cannot be built.')
  }
  const datasheet = (await findDatasheetOfProduct(tx, product.id)) ?? undefined
  const [newest] = datasheet ? await listRevisions(tx, datasheet.id) : []
  const before = newest ? (JSON.parse(newest.body) as DatasheetBody) : undefined
  return {
    body: built.value,
    productId: product.id,
    lotIds: usable.map((one) => one.id),
    datasheet,
    newest,
    changes: compareRevisions(before, built.value),
  }
}
