import { replyFile } from '@/app/api/_reply'
import { reading } from '@/app/api/_route'
import { importIdOf } from '@/lib/input/import'
import { saveRefusedRows } from '@/lib/services/save-refused-rows'

export const GET = reading(async (actor, _query, params) =>
  replyFile(await saveRefusedRows(actor, importIdOf(params.id))),
)
