/**
 * `npm start [-- --demo]`: installs, creates or migrates the database, builds what changed, serves, prints the
 * address. A second start redoes nothing. Settings come from the environment: PORT, HOST, DATA_DIR,
 * DATABASE_URL, TLS_CERT, TLS_KEY, TRUST_PROXY (README).
 */
import { requireNode } from './lib/node-version.mjs'

requireNode()
const { start } = await import('./lib/start.mjs')
await start(process.argv.slice(2))
