import { changing } from '@/app/api/_route'
import { decideImportRowsSchema, importIdOf } from '@/lib/input/import'
import { decideImportRows } from '@/lib/services/decide-import-rows'

export const POST = changing(decideImportRowsSchema, (actor, input, params) =>
  decideImportRows(actor, importIdOf(params.id), input),
)
