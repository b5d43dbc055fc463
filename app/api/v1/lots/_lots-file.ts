import { replyFile } from '@/app/api/_reply'
import { parsedOrThrow, reading } from '@/app/api/_route'
import { listLotsSchema } from '@/lib/input/lot-list'
import { type LotsFormat, saveLots } from '@/lib/services/save-lots'

/** A route that gives the list of lots as a file. */
export const lotsFile = (format: LotsFormat) =>
  reading(async (actor, query) =>
    replyFile(await saveLots(actor, format, parsedOrThrow(listLotsSchema, query))),
  )
