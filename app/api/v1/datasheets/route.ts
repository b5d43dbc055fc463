import { changing, reading } from '@/app/api/_route'
import { publishDatasheetSchema } from '@/lib/input/datasheet'
import { listDatasheets } from '@/lib/services/list-datasheets'
import { publishDatasheet } from '@/lib/services/publish-datasheet'

export const GET = reading((actor) => listDatasheets(actor))

export const POST = changing(publishDatasheetSchema, (actor, input) => publishDatasheet(actor, input), 201)
