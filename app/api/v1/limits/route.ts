import { changing } from '@/app/api/_route'
import { freezeLimitsSchema } from '@/lib/input/limits'
import { freezeLimits } from '@/lib/services/freeze-limits'

export const POST = changing(freezeLimitsSchema, (actor, input) => freezeLimits(actor, input), 201)
