import { reading } from '@/app/api/_route'
import { getDrift } from '@/lib/services/get-drift'

export const GET = reading((actor, _, { product = '' }) => getDrift(actor, product))
