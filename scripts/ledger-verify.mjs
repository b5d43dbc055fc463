/**
 * `node scripts/ledger-verify.mjs [NOTE …]`: walks the ledger from its first entry and compares it with its head
 * and with every anchor: those of published datasheets, those in the notes of back-ups in the data folder, and
 * those in the notes that are named. Ends with 1 when a link is broken, and says which.
 */
import { existsSync, readdirSync, readFileSync } from 'node:fs'
import { basename, join } from 'node:path'
import { CommandFailed } from './lib/child.mjs'
import { data, readDatabaseSettings, runCommand } from './lib/database-command.mjs'

const notesIn = (folder) =>
  existsSync(folder)
    ? readdirSync(folder)
        .filter((name) => name.endsWith('.db.json'))
        .map((name) => join(folder, name))
    : []

const anchorOf = (path) => {
  try {
    const { ledger } = JSON.parse(readFileSync(path, 'utf8'))
    if (!Number.isInteger(ledger.count) || !/^[0-9a-f]{64}$/.test(ledger.hash))
      throw new TypeError('no ledger')
    return { count: ledger.count, hash: ledger.hash, where: `the back-up ${basename(path, '.json')}` }
  } catch {
    throw new CommandFailed(`${path} is not the note of a back-up.`)
  }
}

await runCommand(async () => {
  const settings = await readDatabaseSettings()
  const anchors = [...notesIn(join(settings.dataDir, 'backups')), ...process.argv.slice(2)].map(anchorOf)
  const { verifyLedgerOf } = await data('verify-ledger')
  const verdict = await verifyLedgerOf(settings, anchors)
  if (!verdict.sound) throw new CommandFailed(`The ledger is broken. ${verdict.message}`)
  process.stdout.write(
    `The ledger holds: ${verdict.count} entries, ${verdict.anchors} anchors.\nHead: ${verdict.hash}\n`,
  )
})
