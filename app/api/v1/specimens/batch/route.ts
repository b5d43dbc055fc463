import { changing } from '@/app/api/_route'
import { recordSpecimensSchema } from '@/lib/input/specimen'
import { recordSpecimens } from '@/lib/services/record-specimens'

export const POST = changing(recordSpecimensSchema, (actor, input) => recordSpecimens(actor, input))
