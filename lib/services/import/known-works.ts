import { loadChartHistories, loadMachineCharts } from '@/lib/data/chart-histories'
import type { Tx } from '@/lib/data/database'
import type { ChartHistory } from '@/lib/domain/record/chart-history'
import { chartsAfter, machineSignalsAfter, type SignalId } from '@/lib/domain/record/charts-after'
import type { SpecimenWritePlan } from '@/lib/domain/record/write-plan'
import type { LotWriteState, MachineSignals } from '@/lib/domain/record/write-state'
import { type LoadedFacts, loadFacts } from '../evaluation-facts'
import { type ImportLookups, loadLookups } from './lookups'

/** Products of a machine whose charts are remembered, and the signals of the machine's own. */
interface KnownMachine {
  readonly products: Set<number>
  signals: readonly MachineSignals[]
}

/**
 * What an import has read of the works and of its charts, followed up with what its own batches store. It is true as
 * long as nobody else writes, which the count of the ledger's entries tells.
 */
export class KnownWorks {
  private readonly facts = new Map<number, LoadedFacts>()
  private readonly charts = new Map<number, readonly ChartHistory[]>()
  private readonly machines = new Map<number, KnownMachine>()

  private constructor(
    private readonly read: Tx,
    public ledgerCount: number,
    readonly lookups: ImportLookups,
  ) {}

  /** The works as it stands with so many entries in its ledger. */
  static async at(read: Tx, ledgerCount: number): Promise<KnownWorks> {
    return new KnownWorks(read, ledgerCount, await loadLookups(read))
  }

  async factsOf(revisionId: number): Promise<LoadedFacts> {
    const facts =
      this.facts.get(revisionId) ?? (await loadFacts(this.read, revisionId, this.lookups.equipment))
    this.facts.set(revisionId, facts)
    return facts
  }

  async chartsOf(productId: number): Promise<readonly ChartHistory[]> {
    const charts = this.charts.get(productId) ?? (await loadChartHistories(this.read, productId))
    this.charts.set(productId, charts)
    return charts
  }

  /** Charts of everything else that a machine makes, lots of this import among them. */
  async machineOf(machineId: number, butProductId: number): Promise<NonNullable<LotWriteState['machine']>> {
    const machine = this.machines.get(machineId) ?? (await this.loadMachine(machineId))
    machine.products.add(butProductId)
    return {
      id: machineId,
      products: [...machine.products]
        .filter((productId) => productId !== butProductId)
        .sort((a, b) => a - b)
        .map((productId) => ({ productId, charts: this.charts.get(productId) ?? [] })),
      signals: machine.signals,
    }
  }

  /** Charts and signals become what the plan makes of them; `signalId` gives the ids that it will store. */
  settle(state: LotWriteState, plan: SpecimenWritePlan, signalId: SignalId): void {
    this.charts.set(state.lot.productId, chartsAfter(state, plan, signalId))
    const machine = state.machine && this.machines.get(state.machine.id)
    if (machine && state.machine) machine.signals = machineSignalsAfter(state.machine, plan, signalId)
  }

  private async loadMachine(machineId: number): Promise<KnownMachine> {
    const { products, signals } = await loadMachineCharts(this.read, machineId)
    for (const { charts, productId } of products)
      if (!this.charts.has(productId)) this.charts.set(productId, charts)
    const machine = { products: new Set(products.map((one) => one.productId)), signals }
    this.machines.set(machineId, machine)
    return machine
  }
}
