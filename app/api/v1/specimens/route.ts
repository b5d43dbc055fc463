import { changing } from '@/app/api/_route'
import { recordSpecimenSchema } from '@/lib/input/specimen'
import { recordSpecimens } from '@/lib/services/record-specimens'

export const POST = changing(recordSpecimenSchema, (actor, input) => recordSpecimens(actor, input))
