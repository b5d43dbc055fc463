import { reading, receiving } from '@/app/api/_route'
import { listImports } from '@/lib/services/list-imports'
import { receiveImport } from '@/lib/services/receive-import'

export const GET = reading((actor) => listImports(actor))

/** The body is the file itself, `name` in the address what it is called. */
export const POST = receiving((actor, { body, query }) =>
  receiveImport(actor, { fileName: query.name ?? '', body }),
)
