import { parsedOrThrow, reading } from '@/app/api/_route'
import { revisionNumberSchema } from '@/lib/input/revision-number'
import { getDatasheet } from '@/lib/services/get-datasheet'

export const GET = reading((actor, _, { code = '', number }) =>
  getDatasheet(actor, code, parsedOrThrow(revisionNumberSchema, number)),
)
