import { reading } from '@/app/api/_route'
import { getBench } from '@/lib/services/get-bench'

export const GET = reading((actor, _, { code = '' }) => getBench(actor, code))
