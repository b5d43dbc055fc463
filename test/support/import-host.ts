/**
 * A process like the server's own with nothing but the import thread and one page's reading: `GET /` lists lots. Prints
 * its port, then, four times a second, its memory and the longest delay of its main thread. May be killed at any moment.
 * DATA_DIR and ACTOR come from outside.
 */
import { createServer } from 'node:http'
import { monitorEventLoopDelay } from 'node:perf_hooks'
import type { Actor } from '@/lib/access/actor'
import { listLots } from '@/lib/services/list-lots'
import { startImportWorker } from '@/scripts/lib/import-worker.mjs'

export interface HostFigures {
  readonly rssMb: number
  /** Of the main thread since the last figures, milliseconds. */
  readonly delayMs: number
}

const actor = JSON.parse(process.env.ACTOR ?? '{}') as Actor

const server = createServer(async (_, response) => {
  try {
    const { count } = await listLots(actor, { search: '', page: 1 })
    response.end(String(count))
  } catch (error) {
    response.statusCode = 500
    response.end(String(error))
  }
})
const delay = monitorEventLoopDelay({ resolution: 10 })
delay.enable()
server.listen(0, '127.0.0.1', () => {
  const address = server.address()
  if (typeof address === 'object' && address) process.stdout.write(`${address.port}\n`)
  startImportWorker(process.cwd())
  setInterval(() => {
    const figures: HostFigures = {
      rssMb: process.memoryUsage.rss() / 1e6,
      delayMs: delay.max / 1e6,
    }
    delay.reset()
    process.stdout.write(`${JSON.stringify(figures)}\n`)
  }, 250)
})
