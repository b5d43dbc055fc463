import { reading } from '@/app/api/_route'
import { listDriftProducts } from '@/lib/services/list-drift-products'

export const GET = reading((actor) => listDriftProducts(actor))
