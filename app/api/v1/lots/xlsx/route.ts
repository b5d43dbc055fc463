import { lotsFile } from '../_lots-file'

export const GET = lotsFile('xlsx')
