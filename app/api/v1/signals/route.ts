import { reading } from '@/app/api/_route'
import { listSignals } from '@/lib/services/list-signals'

export const GET = reading((actor) => listSignals(actor))
