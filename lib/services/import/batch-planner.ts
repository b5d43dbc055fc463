import { randomBytes } from 'node:crypto'
import type { BulkConnection, BulkRow } from '@/lib/data/bulk/bulk-connection'
import { bulkLedgerHead } from '@/lib/data/bulk/bulk-ledger'
import type { PlannedLot } from '@/lib/data/bulk/store-batch'
import type { Tx } from '@/lib/data/database'
import { findCurrentDisposition, unmarkedRevisionsOf } from '@/lib/data/dispositions'
import type { KnownEquipment } from '@/lib/data/evaluation-facts'
import { sha256 } from '@/lib/data/hash'
import { findLotByCode, type LotRow, lotWriteStateOf } from '@/lib/data/lots'
import { loadSpecimens, specimenStateOf } from '@/lib/data/specimens'
import type { Problem } from '@/lib/domain/errors'
import { admitEntry } from '@/lib/domain/record/admit-entry'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import type { ChartHistory } from '@/lib/domain/record/chart-history'
import { isFinal } from '@/lib/domain/record/lot-state'
import { planSpecimenWrite } from '@/lib/domain/record/plan-specimen-write'
import type { RaisedSignal } from '@/lib/domain/record/reconcile-signals'
import type { LotWriteState, SpecimenEntry } from '@/lib/domain/record/write-state'
import type { BenchRow } from '@/lib/input/bench-file/bench-row'
import { clientIdFrom } from '@/lib/input/client-id'
import { entryFromRow } from './entry-from-row'
import { KnownWorks } from './known-works'
import { contradictions, openFromRow } from './open-from-row'

/** A row of the file that was understood, with its place. */
export interface ReadRow {
  readonly row: number
  readonly line: number
  readonly cells: readonly string[]
  readonly bench: BenchRow
}

/** What becomes of a row that is not simply stored. */
export interface SetAside {
  readonly row: number
  readonly line: number
  readonly cells: readonly string[]
  readonly kind: 'refused' | 'differs'
  readonly lotCode: string
  readonly specimen: number | undefined
  readonly problems: readonly Problem[]
  /** Canonical JSON of the entry that differs. */
  readonly entry: string
}

export interface PlannedBatch {
  readonly lots: readonly PlannedLot[]
  readonly setAside: readonly SetAside[]
  readonly stored: number
  readonly alreadyThere: number
  readonly lotsOpened: number
  /** What the plans name by code, as it stood when they were made. */
  readonly equipment: KnownEquipment
  /** Entries of the ledger that the plan rests on: when there are more, somebody wrote, and it is planned anew. */
  readonly ledgerCount: number
}

export interface Importer {
  readonly personId: number
  /** May add to lots that are decided. */
  readonly mayAddToDecided: boolean
}

/**
 * Plans batches of rows on what is stored, and remembers what it has read as long as nobody else writes. The plan is
 * made outside the write transaction, because evaluating takes most of the time.
 */
export class BatchPlanner {
  private known: KnownWorks | undefined

  constructor(
    private readonly read: Tx,
    private readonly connection: BulkConnection,
    private readonly importer: Importer,
  ) {}

  /** The batch was stored: what was planned is what stands there now. */
  stored(ledgerCount: number): void {
    if (this.known) this.known.ledgerCount = ledgerCount
  }

  /** The batch was not stored: nothing that was planned holds. */
  forget(): void {
    this.known = undefined
  }

  async plan(rows: readonly ReadRow[], at: number): Promise<PlannedBatch> {
    const known = await this.fresh()
    const groups = new Map<string, ReadRow[]>()
    for (const row of rows) groups.set(row.bench.lot, [...(groups.get(row.bench.lot) ?? []), row])
    const lotIds = await this.connection.reserveIds('Lot', groups.size)
    const lots: PlannedLot[] = []
    const setAside: SetAside[] = []
    let [stored, alreadyThere, lotsOpened] = [0, 0, 0]
    for (const [code, group] of groups) {
      const found = await this.findOrOpen(known, code, group, lotIds[lots.length] ?? Number.NaN, at, setAside)
      if (!found) continue
      const entries = this.entriesOf(known, found, group, at, setAside)
      const fresh = entries.filter((one) => one.admission !== 'already-there')
      alreadyThere += entries.length - fresh.length
      if (fresh.length === 0) continue
      lots.push(
        await this.planLot(
          known,
          found,
          fresh.map((one) => one.entry),
          at,
        ),
      )
      stored += fresh.length
      if (found.opens) lotsOpened += 1
    }
    const { ledgerCount, lookups } = known
    return { lots, setAside, stored, alreadyThere, lotsOpened, equipment: lookups.equipment, ledgerCount }
  }

  /** What is remembered, or everything read anew when somebody has written since. */
  private async fresh(): Promise<KnownWorks> {
    const { count } = await bulkLedgerHead(this.connection)
    if (this.known?.ledgerCount !== count) this.known = await KnownWorks.at(this.read, count)
    return this.known
  }

  private async findOrOpen(
    known: KnownWorks,
    code: string,
    group: readonly ReadRow[],
    id: number,
    at: number,
    setAside: SetAside[],
  ): Promise<FoundLot | undefined> {
    const there = await findLotByCode(this.read, code)
    if (there) {
      const { facts } = await known.factsOf(there.specificationRevisionId)
      const specimens = await loadSpecimens(this.read, there.id, known.lookups.equipment)
      const disposition = await findCurrentDisposition(this.read, there.id)
      return {
        lot: there,
        opens: undefined,
        materials: [],
        specimenIds: new Map(specimens.map((one) => [one.clientId, one.id])),
        base: {
          facts,
          specimens: specimens.map(specimenStateOf),
          ...(disposition ? { disposition } : {}),
          datasheetRevisions: await unmarkedRevisionsOf(this.read, there.id),
        },
      }
    }
    // The first row that can opens the lot; rows before it that can't are refused.
    for (const one of group) {
      const opened = await openFromRow(one.bench, known.lookups, { id, personId: this.importer.personId, at })
      if (!opened.ok) {
        setAside.push(refusedRow(one, opened.problems))
        continue
      }
      const { lot, materials, row } = opened.value
      const { facts } = await known.factsOf(lot.specificationRevisionId)
      return {
        lot,
        opens: row,
        materials,
        from: one.row,
        specimenIds: new Map(),
        base: { facts, specimens: [], datasheetRevisions: [] },
      }
    }
    return undefined
  }

  /** Entries of the rows that can be stored or are there already; the others are set aside. */
  private entriesOf(
    known: KnownWorks,
    { base, from, lot }: FoundLot,
    group: readonly ReadRow[],
    at: number,
    setAside: SetAside[],
  ): readonly { readonly entry: SpecimenEntry; readonly admission: string }[] {
    const state = stateOf(lot, base, [], undefined)
    return group.flatMap((one) => {
      if (from !== undefined && one.row < from) return []
      const wrong = contradictions(one.bench, lot, known.lookups)
      const entry = entryFromRow(one.bench, lot, base.facts.specification.plan, known.lookups, newIds(at), at)
      const problems = [...wrong, ...(entry.ok ? [] : entry.problems)]
      if (problems.length > 0 || !entry.ok) {
        setAside.push(refusedRow(one, problems))
        return []
      }
      const admission = admitEntry(state, entry.value)
      if (!admission.ok) {
        setAside.push({
          ...refusedRow(one, admission.problems),
          kind: 'differs',
          entry: canonicalJson(entry.value),
        })
        return []
      }
      if (admission.value.kind !== 'already-there' && isFinal(lot.state) && !this.importer.mayAddToDecided) {
        setAside.push(refusedRow(one, [decidedProblem(lot)]))
        return []
      }
      return [{ entry: entry.value, admission: admission.value.kind }]
    })
  }

  private async planLot(
    known: KnownWorks,
    { base, lot, materials, opens, specimenIds }: FoundLot,
    entries: readonly SpecimenEntry[],
    at: number,
  ): Promise<PlannedLot> {
    const charts = await known.chartsOf(lot.product.id)
    const machine =
      lot.machine && charts.length > 0 ? await known.machineOf(lot.machine.id, lot.product.id) : undefined
    const state = stateOf(lot, base, charts, machine)
    const planned = planSpecimenWrite(state, entries, { personId: this.importer.personId }, at, sha256)
    if (!planned.ok) throw new Error(planned.problems.map((one) => one.message).join(' '))
    const plan = planned.value
    const raised = plan.signals.flatMap((rows) => rows.raised)
    const ids = await this.connection.reserveIds('Signal', raised.length)
    const signalIds = new Map(
      raised.map((one, index): [RaisedSignal, number] => [one, ids[index] ?? Number.NaN]),
    )
    known.settle(state, plan, (one) => signalIds.get(one) ?? Number.NaN)
    return { opens, materials, plan, specimenIds, signalIds }
  }
}

interface FoundLot {
  readonly lot: LotRow
  readonly opens: BulkRow | undefined
  readonly materials: readonly BulkRow[]
  /** The row that opens it: the ones before it are refused. */
  readonly from?: number
  readonly specimenIds: ReadonlyMap<string, number>
  readonly base: Pick<LotWriteState, 'facts' | 'specimens' | 'disposition' | 'datasheetRevisions'>
}

const stateOf = (
  lot: LotRow,
  base: FoundLot['base'],
  charts: readonly ChartHistory[],
  machine: LotWriteState['machine'],
): LotWriteState => ({
  ...base,
  lot: lotWriteStateOf(lot),
  charts,
  ...(machine ? { machine } : {}),
})

const newIds = (at: number) => ({
  specimen: clientIdFrom(at, randomBytes(16)),
  reading: clientIdFrom(at, randomBytes(16)),
})

const refusedRow = ({ bench, cells, line, row }: ReadRow, problems: readonly Problem[]): SetAside => ({
  row,
  line,
  cells,
  kind: 'refused',
  lotCode: bench.lot,
  specimen: bench.specimen,
  problems,
  entry: '',
})

const decidedProblem = (lot: LotRow): Problem => ({
  code: 'not-permitted',
  message: `Lot ${lot.code} is decided: only quality adds readings to it.`,
  where: 'lot',
  mend: 'Ask quality to import this row.',
})
