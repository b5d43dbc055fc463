import { changing } from '@/app/api/_route'
import { importIdOf, startImportSchema } from '@/lib/input/import'
import { startImport } from '@/lib/services/start-import'

export const POST = changing(startImportSchema, (actor, input, params) =>
  startImport(actor, importIdOf(params.id), input).then(() => ({ state: 'queued' })),
)
