/** The server: the built app (or the one under development) behind plain or TLS sockets, until told to stop. */
import { readFileSync } from 'node:fs'
import { createServer as createPlain } from 'node:http'
import { createServer as createTls } from 'node:https'
import { CommandFailed } from './child.mjs'
import { settleAddress } from './client-address.mjs'
import { startImportWorker } from './import-worker.mjs'
import { listenSentence } from './prepare.mjs'

/** How long requests under way may take to end once the server is told to stop. */
const grace_ms = 10_000

const isLoopback = (host) => host === 'localhost' || host === '::1' || /^127\./.test(host)

const makeServer = (tls, handler) => {
  if (tls === undefined) return createPlain(handler)
  try {
    return createTls({ cert: readFileSync(tls.certPath), key: readFileSync(tls.keyPath) }, handler)
  } catch (error) {
    throw new CommandFailed(`TLS_CERT, TLS_KEY: the two do not make a server certificate (${error.message}).`)
  }
}

/** The address to type into a browser on this computer. */
export const shownAddress = ({ host, tls }, port) => {
  const anywhere = host === '0.0.0.0' || host === '::'
  const name = anywhere ? 'localhost' : host.includes(':') ? `[${host}]` : host
  return `${tls === undefined ? 'http' : 'https'}://${name}:${port}`
}

/**
 * Serves until SIGINT or SIGTERM: then takes no new connection, lets requests under way end, and ends the process.
 * @param {string} root
 * @param {import('../../lib/data/env').Environment} settings
 * @param {{ dev?: boolean }} [options]
 * @returns {Promise<string>} the address
 */
export const serve = async (root, settings, { dev = false } = {}) => {
  process.env.NODE_ENV = dev ? 'development' : 'production'
  process.env.NEXT_TELEMETRY_DISABLED = '1'
  process.env.CHECKPOINT_DISABLE = '1'
  process.env.DATA_DIR = settings.dataDir
  process.env.DATABASE_URL = settings.databaseUrl
  const https = settings.tls !== undefined
  // Listens first: with PORT=0 the framework has to know which port it became, as it asks itself for pages.
  let open
  const opened = new Promise((resolve) => {
    open = resolve
  })
  const server = makeServer(settings.tls, async (request, response) => {
    settleAddress(request, { trustProxy: settings.trustProxy, https })
    const handle = await opened
    handle(request, response)
  })
  await new Promise((resolve, reject) => {
    server.once('error', (error) => reject(new CommandFailed(listenSentence(error, settings))))
    server.listen({ host: settings.host, port: settings.port }, resolve)
  })
  const { default: next } = await import('next')
  const { port } = server.address()
  const app = next({ dev, dir: root, httpServer: server, hostname: settings.host, port })
  await app.prepare()
  open(app.getRequestHandler())

  stopOnSignal(server, app, startImportWorker(root))
  return shownAddress(settings, port)
}

const stopOnSignal = (server, app, imports) => {
  let stopping = false
  const stop = (signal) => {
    if (stopping) process.exit(signal === 'SIGINT' ? 130 : 143)
    stopping = true
    const deadline = setTimeout(() => server.closeAllConnections(), grace_ms)
    server.close(async () => {
      clearTimeout(deadline)
      await imports.stop()
      await globalThis[Symbol.for('ledgerline.close')]?.()
      await app.close()
      process.exit(0)
    })
    server.closeIdleConnections()
  }
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => stop(signal))
}

/** Whether only this computer can reach the server. */
export const onLoopback = (settings) => isLoopback(settings.host)
