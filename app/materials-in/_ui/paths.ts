import type { MaterialInKind } from '@/lib/domain/record/material-in'

export const materialInPath = (code: string): string => `/materials-in/${encodeURIComponent(code)}`

/** At the beginning of a sentence or in a table. */
export const kindNames: Readonly<Record<MaterialInKind, string>> = {
  coil: 'Coil',
  spool: 'Spool',
  'resin-batch': 'Resin batch',
}
