import { z } from 'zod'

/** A revision as it stands in an address. */
export const revisionNumberSchema = z.coerce
  .number({ error: 'A revision is named by its number.' })
  .int({ error: 'A revision is named by its number.' })
  .min(1, { error: 'Revisions are numbered from 1.' })
  .max(1_000_000, { error: 'There is no such revision.' })
