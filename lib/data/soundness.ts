/** Whether a database of the embedded engine is whole: its pages, and that each reference leads somewhere. */
import { type Ask, inspectSqlite } from './connections'
import { removeLogFiles } from './file-copies'

/** What is wrong, as a sentence; undefined when nothing is. */
export const soundnessOf = async (ask: Ask): Promise<string | undefined> => {
  const pages = await ask('PRAGMA quick_check')
  if (pages !== 'ok') return `the check of the file says: ${String(pages)}.`
  const orphan = await ask('PRAGMA foreign_key_check')
  if (orphan !== undefined) return `an entry of ${String(orphan)} refers to something that is not there.`
  return undefined
}

/** The same for a file that no process has open; the file stays as it is. */
export const soundnessOfFile = async (path: string): Promise<string | undefined> => {
  try {
    const connection = inspectSqlite(path)
    try {
      return await soundnessOf(async (sql) => {
        const row = connection.prepare<[], Record<string, unknown>>(sql).get()
        return row === undefined ? undefined : Object.values(row)[0]
      })
    } finally {
      connection.close()
    }
  } catch (error) {
    if (String((error as { code?: unknown }).code).startsWith('SQLITE_'))
      return `it can’t be read (${(error as Error).message}).`
    throw error
  } finally {
    removeLogFiles(path)
  }
}
