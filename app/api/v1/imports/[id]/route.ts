import { reading } from '@/app/api/_route'
import { importIdOf } from '@/lib/input/import'
import { getImport } from '@/lib/services/get-import'

export const GET = reading((actor, _query, params) => getImport(actor, importIdOf(params.id)))
