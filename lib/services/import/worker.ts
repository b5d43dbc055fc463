/**
 * The thread that works through imports: its own connections, its own memory, so that pages answer meanwhile. Bundled
 * to build/workers/import.mjs. With a task in its `workerData` it does that and ends: a spreadsheet is turned into text.
 */
import { parentPort, workerData } from 'node:worker_threads'
import { openBulk } from '@/lib/data/bulk/open-bulk'
import { database } from '@/lib/data/database'
import { requireEnvironment } from '@/lib/data/env'
import { sheetToCsv } from './sheet-to-csv'
import { giveUpRunning, workThrough } from './work-through'

interface SheetTask {
  readonly task: 'sheet'
  readonly from: string
  readonly to: string
}

/** How long to wait before looking again when nobody has nudged. */
const IDLE = 2_000

/** A thread that died so often without a batch in between gives up the import it was at. */
const MOST_DEATHS = 3

async function workForEver(deaths: number): Promise<void> {
  const environment = requireEnvironment()
  const state = { stopping: false, wake: () => {} }
  parentPort?.on('message', (message: unknown) => {
    if (message === 'stop') state.stopping = true
    state.wake()
  })
  const connection = await openBulk(environment)
  if (deaths >= MOST_DEATHS) await giveUpRunning({ connection, read: database().read })
  while (!state.stopping) {
    const worked = await workThrough({
      connection,
      read: database().read,
      dataDir: environment.dataDir,
      stopAsked: () => state.stopping,
      progress: (progress) => parentPort?.postMessage(progress),
    })
    if (worked || state.stopping) continue
    await new Promise<void>((resolve) => {
      const timer = setTimeout(resolve, IDLE)
      state.wake = () => {
        clearTimeout(timer)
        resolve()
      }
    })
  }
  await connection.close()
  await database().close()
  parentPort?.close()
}

const task = workerData as SheetTask | { readonly task: 'imports'; readonly deaths: number } | null

/** Most memory outside the heap that unpacking may take, bytes. */
const MOST_UNPACKED = 900_000_000

/** What a file unpacks to is what it says only if it is honest: a thread that grows beyond it is ended. */
async function convert({ from, to }: SheetTask): Promise<void> {
  const guard = setInterval(() => {
    if (process.memoryUsage().arrayBuffers > MOST_UNPACKED) process.exit(1)
  }, 50)
  const outcome = await sheetToCsv(from, to)
  clearInterval(guard)
  parentPort?.postMessage(outcome)
}

if (task?.task === 'sheet') await convert(task)
else if (task?.task === 'imports') await workForEver(task.deaths)
