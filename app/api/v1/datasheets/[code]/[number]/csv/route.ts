import { replyFile } from '@/app/api/_reply'
import { parsedOrThrow, reading } from '@/app/api/_route'
import { revisionNumberSchema } from '@/lib/input/revision-number'
import { saveDatasheet } from '@/lib/services/save-datasheet'

export const GET = reading(async (actor, _, { code = '', number }) =>
  replyFile(await saveDatasheet(actor, code, parsedOrThrow(revisionNumberSchema, number), 'csv')),
)
