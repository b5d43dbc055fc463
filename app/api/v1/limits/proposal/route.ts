import { changing } from '@/app/api/_route'
import { proposeLimitsSchema } from '@/lib/input/limits'
import { proposeLimits } from '@/lib/services/propose-limits'

// Changes nothing; it is posted because the lots left out, each with a reason, are no part of an address.
export const POST = changing(proposeLimitsSchema, (actor, input) => proposeLimits(actor, input))
