import { changing } from '@/app/api/_route'
import { supersedeReadingSchema } from '@/lib/input/specimen'
import { supersedeReading } from '@/lib/services/supersede-reading'

export const POST = changing(supersedeReadingSchema, (actor, input) => supersedeReading(actor, input))
