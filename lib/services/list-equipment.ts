import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { type DieRow, dies } from '@/lib/data/dies'
import { type GaugeRow, gauges } from '@/lib/data/gauges'
import { type MachineRow, machines } from '@/lib/data/machines'
import { type RigRow, rigs } from '@/lib/data/rigs'
import { type WeightRow, weights } from '@/lib/data/weights'

export interface EquipmentList {
  readonly gauges: readonly GaugeRow[]
  readonly weights: readonly WeightRow[]
  readonly rigs: readonly RigRow[]
  readonly machines: readonly MachineRow[]
  readonly dies: readonly DieRow[]
}

/** All equipment of the works by kind and code; what is no longer in use stands last. */
export async function listEquipment(actor: Actor | undefined): Promise<EquipmentList> {
  permit(actor, 'equipment.read')
  const { read } = database()
  const [gaugeRows, weightRows, rigRows, machineRows, dieRows] = await Promise.all([
    gauges.list(read),
    weights.list(read),
    rigs.list(read),
    machines.list(read),
    dies.list(read),
  ])
  return { gauges: gaugeRows, weights: weightRows, rigs: rigRows, machines: machineRows, dies: dieRows }
}
