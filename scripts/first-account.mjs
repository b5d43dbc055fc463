/**
 * `node scripts/first-account.mjs ADDRESS`: says where the first account is made, with a fresh one-time code when
 * others than this computer can reach the server. Says nothing once there is an account. Part of `npm start`.
 */
import { data, runCommand } from './lib/database-command.mjs'
import { root } from './lib/schema.mjs'
import { importTypeScript } from './lib/typescript.mjs'

const [address = ''] = process.argv.slice(2)

await runCommand(async () => {
  const accounts = await importTypeScript(root, 'lib/services/create-first-account.ts')
  const { database } = await data('database')
  try {
    if (!(await accounts.isFirstAccountMissing())) return
    const code = await accounts.announceFirstAccount()
    const asked = code === undefined ? '' : `  The page asks for this code, once: ${code}\n`
    process.stdout.write(`Nobody has an account yet. Make the first one at ${address}/set-up\n${asked}`)
  } finally {
    await database().close()
  }
})
