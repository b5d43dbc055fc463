/** `npm run dev [-- --demo]`: as `npm start`, but serves the sources themselves and follows each change. */
import { requireNode } from './lib/node-version.mjs'

requireNode()
const { start } = await import('./lib/start.mjs')
await start(process.argv.slice(2), { dev: true })
