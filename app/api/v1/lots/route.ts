import { changing, parsedOrThrow, reading } from '@/app/api/_route'
import { openLotSchema } from '@/lib/input/lot'
import { listLotsSchema } from '@/lib/input/lot-list'
import { listLots } from '@/lib/services/list-lots'
import { openLot } from '@/lib/services/open-lot'

export const GET = reading((actor, query) => listLots(actor, parsedOrThrow(listLotsSchema, query)))

export const POST = changing(openLotSchema, (actor, input) => openLot(actor, input), 201)
