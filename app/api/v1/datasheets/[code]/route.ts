import { reading } from '@/app/api/_route'
import { getDatasheet } from '@/lib/services/get-datasheet'

/** The newest revision. */
export const GET = reading((actor, _, { code = '' }) => getDatasheet(actor, code))
