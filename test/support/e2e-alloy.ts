/**
 * Run by the end-to-end tests, in a process of its own with DATA_DIR set: fills a migrated, empty database with the
 * lots of Rowan 1060 from the demo that its first limits come from, and two lots of the light spool that nobody has
 * looked into.
 */
import { database } from '@/lib/data/database'
import { foundDemoWorks } from '@/prisma/demo/found-works'
import { measureLot } from '@/prisma/demo/measure-lots'
import { productOf } from '@/prisma/demo/products'
import { receiveMaterials } from '@/prisma/demo/receive-materials'
import { demoSchedule } from '@/prisma/demo/schedule'
import { WRONG_ALLOY } from '@/prisma/demo/story-facts'
import { decideAsQualityWould } from '@/prisma/demo/tell-story'

const DAY = 86_400_000
const { from, productCode } = WRONG_ALLOY
const { baseline } = productOf(productCode)
const lots = demoSchedule().filter(
  (lot) =>
    lot.productCode === productCode && (lot.index < baseline || (lot.index >= from && lot.index < from + 2)),
)
const [first] = lots
if (!first) throw new Error('The demo has other lots.')

const actors = await foundDemoWorks(first.madeAt - 7 * DAY)
const received = new Set<string>()
for (const lot of lots) {
  await receiveMaterials(actors.orrin, lot, received)
  await measureLot(actors[lot.maker], lot, 5, true)
  if (lot.index < baseline) await decideAsQualityWould(actors.orrin, lot)
}
await database().close()
