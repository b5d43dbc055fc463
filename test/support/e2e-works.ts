/**
 * Run by the end-to-end tests, in a process of its own with DATA_DIR set: fills a migrated, empty database with a
 * small works. Its people and lots come from the demo: Larch 279 whole, with its unanswered signals, a lot to finish
 * (LC-060) and one to begin (LA-001). LC-060 is made of the spool S-9001, wound from the coil C-9001.
 */
import { database } from '@/lib/data/database'
import { materialInSchema } from '@/lib/input/material-in'
import { changeLotMaterials } from '@/lib/services/change-lot-materials'
import { getLot } from '@/lib/services/get-lot'
import { createMaterialIn } from '@/lib/services/keep-material-in'
import { foundDemoWorks } from '@/prisma/demo/found-works'
import { measureLot } from '@/prisma/demo/measure-lots'
import { demoSchedule, WIDE_DIE } from '@/prisma/demo/schedule'
import { decideAsQualityWould } from '@/prisma/demo/tell-story'

const DAY = 86_400_000
const all = demoSchedule()
const lots = all.filter((lot) => lot.micrometres === WIDE_DIE.micrometres)
const untouched = all.find((lot) => lot.code === 'LA-001')
const first = lots[0]
if (!first || !untouched) throw new Error('the demo has other lots')

const actors = await foundDemoWorks(first.madeAt - 7 * DAY)
for (const lot of lots) {
  const unfinished = lot.index === lots.length - 1
  await measureLot(actors[lot.maker], lot, unfinished ? 2 : 5)
  if (!unfinished && lot.index < WIDE_DIE.from + 6) await decideAsQualityWould(actors.orrin, lot)
}
await measureLot(actors[untouched.maker], untouched, 0)

const wire = { name: 'Music wire 279', heat: 'H 4417', supplier: 'Fell Wire', sizeMetres: 279e-6 }
await createMaterialIn(
  actors.orrin,
  'C-9001',
  materialInSchema.parse({ ...wire, kind: 'coil', lengthMetres: 42_000 }),
)
await createMaterialIn(
  actors.orrin,
  'S-9001',
  materialInSchema.parse({ ...wire, kind: 'spool', parentCode: 'C-9001' }),
)
const unfinished = await getLot(actors.orrin, 'LC-060')
await changeLotMaterials(actors.orrin, 'LC-060', {
  lotVersion: unfinished.lot.version,
  materials: [{ role: 'core', code: 'S-9001', fromMetre: 0 }],
  reason: 'Read from the traveller.',
})
await database().close()
