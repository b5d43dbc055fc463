/** Puts a back-up in the database's place; what was there is kept beside it. */
import { existsSync, readFileSync, renameSync } from 'node:fs'
import { basename, dirname } from 'node:path'
import { z } from 'zod'
import { LedgerlineError, problem } from '@/lib/domain/errors'
import { noteOf } from './backup'
import { openSqlite } from './connections'
import { isBusy } from './db-errors'
import { copyExactly, flushToDisk, hashOfFile, removeDatabaseFiles, removeLogFiles } from './file-copies'
import type { LedgerHead } from './ledger'
import { contentOfFile } from './ledger-anchor'
import { soundnessOfFile } from './soundness'

const noteSchema = z.object({
  sha256: z.string(),
  ledger: z.object({ count: z.number(), hash: z.string() }),
})

export interface Restored {
  readonly ledger: LedgerHead
  /** Where the database that was there is now; undefined when there was none. */
  readonly kept: string | undefined
}

/**
 * Checks a back-up and puts a copy of it in place of `path`. Nobody may have the database open; the caller holds
 * its lock and migrates afterwards.
 * @param known names of all migrations that this program has
 * @throws LedgerlineError when the back-up is missing, damaged, changed, of another program or of a newer version, or when the
 * database is in use; nothing is changed then
 */
export const restore = async (
  backup: string,
  path: string,
  known: readonly string[],
  at: Date,
): Promise<Restored> => {
  const { ledger } = await requireGoodBackup(backup, known)
  const incoming = `${path}.incoming`
  removeDatabaseFiles(incoming)
  copyExactly(backup, incoming)
  let kept: string | undefined
  try {
    kept = existsSync(path) ? setAside(path, at) : undefined
    renameSync(incoming, path)
    flushToDisk(dirname(path))
  } catch (error) {
    if (kept !== undefined) renameSync(kept, path)
    removeDatabaseFiles(incoming)
    throw error
  }
  return { ledger, kept }
}

const requireGoodBackup = async (backup: string, known: readonly string[]) => {
  if (!existsSync(backup)) throw problem('not-found', `There is no file ${backup}.`)
  const name = basename(backup)
  const refuse = (what: string, mend: string): LedgerlineError =>
    problem('bad-input', `${name} was not restored: ${what}`, { mend })
  const another = 'Take another back-up. The database is as it was.'

  const note = noteBeside(backup)
  if (note !== undefined && hashOfFile(backup) !== note.sha256)
    throw refuse('it is not the file that its note was written for.', another)
  const faults = await soundnessOfFile(backup)
  if (faults !== undefined) throw refuse(faults, another)
  const content = contentOfFile(backup)
  const newer = content.migrations.filter((migration) => !known.includes(migration))
  if (newer.length > 0)
    throw refuse(
      `it was made by a newer version of Ledgerline (${newer.join(', ')}).`,
      'Restore it with that version. The database is as it was.',
    )
  if (
    note !== undefined &&
    (note.ledger.count !== content.ledger.count || note.ledger.hash !== content.ledger.hash)
  )
    throw refuse('its ledger is not the one that its note tells of.', another)
  return content
}

const noteBeside = (backup: string): z.infer<typeof noteSchema> | undefined => {
  const path = noteOf(backup)
  if (!existsSync(path)) return undefined
  try {
    return noteSchema.parse(JSON.parse(readFileSync(path, 'utf8')))
  } catch (error) {
    throw new LedgerlineError(
      { code: 'bad-input', message: `${basename(path)} can’t be read.`, mend: 'Take another back-up.' },
      { cause: error },
    )
  }
}

/** Moves the database to a name of its own, its log written into it first. */
const setAside = (path: string, at: Date): string => {
  const kept = `${path}.replaced-${at.toISOString().replace(/[-:]/g, '').slice(0, 15)}`
  if (existsSync(kept)) throw problem('conflict', `${basename(kept)} exists already.`)
  try {
    const connection = openSqlite(path)
    try {
      connection.pragma('locking_mode = EXCLUSIVE')
      connection.exec('BEGIN EXCLUSIVE; COMMIT')
      connection.pragma('wal_checkpoint(TRUNCATE)')
    } finally {
      connection.close()
    }
  } catch (error) {
    if (isBusy(error))
      throw problem('busy', 'The database is in use.', { mend: 'Stop the server, then restore again.' })
    // Damaged beyond opening: kept as it is, with its log.
    for (const ending of ['-wal', '-shm'])
      if (existsSync(`${path}${ending}`)) renameSync(`${path}${ending}`, `${kept}${ending}`)
  }
  renameSync(path, kept)
  removeLogFiles(path)
  return kept
}
