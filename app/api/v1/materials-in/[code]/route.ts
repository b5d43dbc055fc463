import { reading } from '@/app/api/_route'
import { getMaterialIn } from '@/lib/services/get-material-in'

export const GET = reading((actor, _, { code = '' }) => getMaterialIn(actor, code))
