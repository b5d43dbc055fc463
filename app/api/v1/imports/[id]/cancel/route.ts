import { z } from 'zod'
import { changing } from '@/app/api/_route'
import { importIdOf } from '@/lib/input/import'
import { cancelImport } from '@/lib/services/cancel-import'

export const POST = changing(z.strictObject({}), (actor, _input, params) =>
  cancelImport(actor, importIdOf(params.id)).then(() => ({ asked: true })),
)
