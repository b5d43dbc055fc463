import type { Actor } from '@/lib/access/actor'
import { clientIdFrom } from '@/lib/input/client-id'
import { openLot } from '@/lib/services/open-lot'
import { recordSpecimens } from '@/lib/services/record-specimens'
import { demoMachine, demoRig } from './equipment'
import { demoProducts } from './products'
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

/** Opens a lot and records the first `specimens` of its five, as its maker would. */
export async function measureLot(maker: Actor, lot: DemoSchedule, specimens: number): Promise<void> {
  const product = demoProducts.find(({ code }) => code === lot.productCode)
  if (!product) throw new Error(`The demo has no product ${lot.productCode}.`)
  const nextId = idsOf(lot)
  await openLot(
    maker,
    {
      requestId: nextId(),
      code: lot.code,
      productCode: lot.productCode,
      madeAt: lot.madeAt,
      machineCode: demoMachine.code,
      dieCode: lot.dieCode,
      lengthMetres: lot.lengthMetres,
      setting: '',
    },
    lot.madeAt + MINUTE,
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
                hanger: demoRig.hangerCode,
                weights: [...demoRig.weightCodes],
              },
            },
            equipment: {
              rig: demoRig.code,
              micrometer: demoRig.micrometerCode,
              balance: demoRig.balanceCode,
              rule: demoRig.ruleCode,
              counter: demoRig.counterCode,
            },
            measuredAt: lot.measuredAt + index * MINUTE,
          },
        })),
    },
    lot.measuredAt + 10 * MINUTE,
  )
}
