/** The server's side of the import thread, which `scripts/lib/import-worker.mjs` starts and keeps alive. */
import { problem } from '@/lib/domain/errors'
import type { SheetOutcome } from './sheet-to-csv'
import type { ImportProgress } from './work-through'

interface ImportWorker {
  readonly nudge: () => void
  readonly progress: ReadonlyMap<number, ImportProgress>
  /** In a thread of its own: the bundler of pages must not see where it lies. */
  readonly convert: (from: string, to: string) => Promise<SheetOutcome>
}

const key = Symbol.for('ledgerline.import-worker')

const link = (): ImportWorker | undefined =>
  (globalThis as typeof globalThis & { readonly [key]?: ImportWorker })[key]

/** Tells the thread that something waits. Without one nothing happens: whoever starts next will find it. */
export const nudgeImportWorker = (): void => link()?.nudge()

/** How far and how fast a run is at this moment, where a thread is at it. */
export const importProgress = (importId: number): ImportProgress | undefined => link()?.progress.get(importId)

/**
 * Turns a spreadsheet into text in a thread of its own with bounded memory.
 * @throws LedgerlineError bad-input; not-ready where no thread can be had
 */
export async function convertSheet(from: string, to: string): Promise<void> {
  const convert = link()?.convert
  if (!convert)
    throw problem('not-ready', 'Spreadsheets are opened by the server’s import thread, and there is none.', {
      where: 'file',
      mend: 'Save it as CSV.',
    })
  const outcome = await convert(from, to)
  if (!outcome.ok) throw problem('bad-input', outcome.message, { where: 'file', mend: outcome.mend })
}
