import { readdir } from 'node:fs/promises'
import { join } from 'node:path'

const pattern = /^ledgerline-(\d{4})(\d\d)(\d\d)-(\d\d)(\d\d)(\d\d)\.db$/

/** When a back-up was made, by the name that `backupName` gave it; undefined for any other name. */
export const timeOfBackup = (name: string): number | undefined => {
  const [year, month, day, hour, minute, second] = (pattern.exec(name) ?? []).slice(1).map(Number)
  if (year === undefined || month === undefined) return undefined
  return Date.UTC(year, month - 1, day, hour, minute, second)
}

/** When the newest back-up in the data folder was made, epoch milliseconds; undefined when there is none. */
export async function newestBackup(dataDir: string): Promise<number | undefined> {
  const names = await readdir(join(dataDir, 'backups')).catch(() => [])
  const times = names.flatMap((name) => timeOfBackup(name) ?? [])
  return times.length === 0 ? undefined : Math.max(...times)
}
