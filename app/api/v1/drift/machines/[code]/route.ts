import { reading } from '@/app/api/_route'
import { getMachineDrift } from '@/lib/services/get-machine-drift'

export const GET = reading((actor, _, { code = '' }) => getMachineDrift(actor, code))
