/** Keeps the import's thread alive beside the server, and hands on what it tells. */
import { join } from 'node:path'
import { Worker } from 'node:worker_threads'

/** A run needs little memory; one that needs more is ended rather than the server. */
const limits = { maxOldGenerationSizeMb: 192, maxYoungGenerationSizeMb: 12 }

/** A spreadsheet unpacks in memory: as much as one may need, and no more. */
const sheetLimits = { maxOldGenerationSizeMb: 1024 }

const key = Symbol.for('ledgerline.import-worker')

/** Milliseconds before a thread that died is started again; each death in a row doubles them. */
const firstPause = 1_000
const longestPause = 60_000

/**
 * Turns a spreadsheet into text in a thread of its own.
 * @returns {Promise<{ ok: true } | { ok: false, message: string, mend: string }>}
 */
export const convertSheet = (root, from, to) =>
  new Promise((resolve) => {
    const refuse = (message) => resolve({ ok: false, message, mend: 'Save it as CSV.' })
    const thread = new Worker(join(root, 'build/workers/import.mjs'), {
      workerData: { task: 'sheet', from, to },
      resourceLimits: sheetLimits,
    })
    thread.once('message', resolve)
    thread.once('error', () => refuse('This spreadsheet is too large to be opened.'))
    thread.once('exit', () => refuse('This spreadsheet can’t be read.'))
  })

/**
 * Starts the thread. `globalThis[Symbol.for('ledgerline.import-worker')]` gets what services use: `nudge`,
 * `progress` and `convert`.
 * @returns {{ stop(): Promise<void> }}
 */
export const startImportWorker = (root) => {
  const progress = new Map()
  let worker
  let stopping = false
  let pause = firstPause
  let deaths = 0
  const launch = () => {
    worker = new Worker(join(root, 'build/workers/import.mjs'), {
      // A file that ends the thread again and again is given up, so that the next one gets its turn.
      workerData: { task: 'imports', deaths },
      resourceLimits: limits,
      env: process.env,
    })
    worker.on('message', (message) => {
      pause = firstPause
      deaths = 0
      progress.set(message.importId, message)
    })
    worker.on('error', (error) => console.error('The import thread ended:', error.message))
    worker.on('exit', () => {
      if (stopping) return
      deaths += 1
      setTimeout(launch, pause).unref()
      pause = Math.min(longestPause, 2 * pause)
    })
  }
  launch()
  globalThis[key] = {
    nudge: () => worker.postMessage('look'),
    progress,
    convert: (from, to) => convertSheet(root, from, to),
  }
  return {
    stop: () =>
      new Promise((resolve) => {
        stopping = true
        globalThis[key] = undefined
        // What runs ends after its batch; one that hangs is ended.
        const giveUp = setTimeout(() => worker.terminate().then(resolve), 5_000)
        worker.once('exit', () => {
          clearTimeout(giveUp)
          resolve()
        })
        worker.postMessage('stop')
      }),
  }
}
