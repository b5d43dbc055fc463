import type { Actor } from '@/lib/access/actor'
import { clientIdFrom } from '@/lib/input/client-id'
import { openLot } from '@/lib/services/open-lot'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { rigOf } from './equipment'
import { productOf } from './products'
import { seededRandom } from './random'
import { readLot } from './readings'
import type { DemoSchedule } from './schedule'

const MINUTE = 60_000

/** Ids that are the same at every loading. */
function idsOf(lot: DemoSchedule): () => string {
  const random = seededRandom(lot.micrometres * 7919 + lot.index)
  let count = 0
  return () => {
    count += 1
    const bytes = Uint8Array.from({ length: 16 }, () => Math.floor(random.uniform() * 256))
    return clientIdFrom(lot.madeAt + count, bytes)
  }
}

/**
 * Opens a lot and records the first `specimens` of its five, as its maker would. What it is made of is named
 * when coils, spools and batches have been received (`receiveMaterials`).
 */
export async function measureLot(
  maker: Actor,
  lot: DemoSchedule,
  specimens: number,
  received = false,
): Promise<void> {
  const product = productOf(lot.productCode)
  const rig = rigOf(lot.rig)
  const nextId = idsOf(lot)
  await openLot(
    maker,
    {
      requestId: nextId(),
      code: lot.code,
      productCode: lot.productCode,
      madeAt: lot.madeAt,
      machineCode: lot.machine,
      dieCode: lot.dieCode,
      lengthMetres: lot.lengthMetres,
      setting: '',
      materials: received ? [...lot.materials] : [],
    },
    lot.openedAt + MINUTE,
  )
  if (specimens === 0) return
  await recordSpecimens(
    maker,
    {
      requestId: nextId(),
      lotCode: lot.code,
      entries: readLot(product, lot)
        .slice(0, specimens)
        .map((sheet, index) => ({
          specimen: { clientId: nextId(), number: index + 1 },
          reading: {
            clientId: nextId(),
            kind: 'sheet' as const,
            sheet: {
              ...sheet,
              diameters: [...sheet.diameters],
              frequencies: [...sheet.frequencies],
              keptDoubts: [...sheet.keptDoubts],
              load: {
                kind: 'weights' as const,
                hanger: product.load[0] ?? '',
                weights: product.load.slice(1),
              },
            },
            equipment: {
              rig: rig.code,
              micrometer: lot.micrometer,
              balance: rig.balanceCode,
              rule: rig.ruleCode,
              counter: rig.counterCode,
            },
            measuredAt: lot.measuredAt + index * MINUTE,
          },
        })),
    },
    lot.measuredAt + 10 * MINUTE,
  )
}
