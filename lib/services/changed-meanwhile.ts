import { type LedgerlineError, problem } from '@/lib/domain/errors'

/** Someone saved another version while this one was being edited. Nothing was stored. */
export const changedMeanwhile = (what: string): LedgerlineError =>
  problem('conflict', `${what} was changed by someone else in the meantime; nothing of yours was saved.`, {
    mend: 'Load the page again to see what is there now, then make your change once more.',
  })
