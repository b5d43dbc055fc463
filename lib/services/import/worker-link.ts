/** The server's side of the import thread, which `scripts/lib/import-worker.mjs` starts and keeps alive. */
import { join } from 'node:path'
import { Worker } from 'node:worker_threads'
import { problem } from '@/lib/domain/errors'
import type { SheetOutcome } from './sheet-to-csv'
import type { ImportProgress } from './work-through'

interface ImportWorker {
  readonly nudge: () => void
  readonly progress: ReadonlyMap<number, ImportProgress>
}

const key = Symbol.for('ledgerline.import-worker')

const link = (): ImportWorker | undefined =>
  (globalThis as typeof globalThis & { readonly [key]?: ImportWorker })[key]

/** Tells the thread that something waits. Without one nothing happens: whoever starts next will find it. */
export const nudgeImportWorker = (): void => link()?.nudge()

/** How far and how fast a run is at this moment, where a thread is at it. */
export const importProgress = (importId: number): ImportProgress | undefined => link()?.progress.get(importId)

const script = (): string => join(process.cwd(), 'build', 'workers', 'import.mjs')

/** Turns a spreadsheet into text in a thread of its own with bounded memory. @throws LedgerlineError bad-input */
export async function convertSheet(from: string, to: string): Promise<void> {
  const outcome = await new Promise<SheetOutcome>((resolve) => {
    const worker = new Worker(script(), {
      workerData: { task: 'sheet', from, to },
      resourceLimits: { maxOldGenerationSizeMb: 1024 },
    })
    worker.once('message', resolve)
    worker.once('error', () =>
      resolve({ ok: false, message: 'This spreadsheet is too large to be opened.', mend: 'Save it as CSV.' }),
    )
    worker.once('exit', () =>
      resolve({ ok: false, message: 'This spreadsheet can’t be read.', mend: 'Save it as CSV.' }),
    )
  })
  if (!outcome.ok) throw problem('bad-input', outcome.message, { where: 'file', mend: outcome.mend })
}
