import { reading } from '@/app/api/_route'
import { getLot } from '@/lib/services/get-lot'

export const GET = reading((actor, _, { code = '' }) => getLot(actor, code))
