import { changing, parsedOrThrow, reading } from '@/app/api/_route'
import { createMaterialInSchema, listMaterialsInSchema } from '@/lib/input/material-in'
import { createMaterialIn } from '@/lib/services/keep-material-in'
import { listMaterialsIn } from '@/lib/services/list-materials-in'

export const GET = reading((actor, query) =>
  listMaterialsIn(actor, parsedOrThrow(listMaterialsInSchema, query)),
)

export const POST = changing(
  createMaterialInSchema,
  (actor, { code, ...input }) => createMaterialIn(actor, code, input),
  201,
)
