import { changing } from '@/app/api/_route'
import { decideLotSchema } from '@/lib/input/decision'
import { decideLot } from '@/lib/services/decide-lot'

export const POST = changing(
  decideLotSchema,
  (actor, input, { code = '' }) => decideLot(actor, code, input),
  201,
)
