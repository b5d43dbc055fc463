import { listFailedImports, listImportsWithOpenRows } from '@/lib/data/today-desks'
import {
  type AskedToday,
  agoOf,
  counted,
  DAY,
  type FoundToday,
  SHOWN,
  totalOf,
  type WaitingItem,
} from './today-item'

/** A failed import is shown this long: by then it was run again, or is not missed. */
const FAILED_WITHIN_DAYS = 14

const hrefOf = (id: number): string => `/lots/import/${id}`

/** Imports that left rows open. @param own only those that the person ran */
export async function importRowsOfToday({ at, personId, tx }: AskedToday, own: boolean): Promise<FoundToday> {
  const { count, imports } = await listImportsWithOpenRows(tx, SHOWN, own ? personId : undefined)
  const kind = own ? 'own-import-rows' : 'import-rows'
  const items = imports.map(
    ({ at: since, differing, fileName, id, refused }): WaitingItem => ({
      kind,
      key: `import ${id}`,
      since,
      mark: 'near',
      title: `${fileName}: ${counted(refused + differing, 'row waits', 'rows wait')} for a decision`,
      text:
        differing === 0
          ? 'They were refused, and nothing of them is stored. Mend the file, or set them aside with a reason.'
          : refused === 0
            ? 'They differ from what is stored. Keep what is stored, or take the file’s with a reason.'
            : `${refused} refused, ${differing} different from what is stored: each is kept, taken or set aside with a reason.`,
      stake: counted(refused + differing, 'row', 'rows'),
      waiting: agoOf(since, at),
      href: hrefOf(id),
      deed: 'Look',
    }),
  )
  return { items, totals: totalOf(kind, count, '/lots/import') }
}

/** Imports that failed lately. */
export async function failedImportsOfToday({ at, tx }: AskedToday): Promise<FoundToday> {
  const { count, imports } = await listFailedImports(tx, at - FAILED_WITHIN_DAYS * DAY, SHOWN)
  const items = imports.map(
    ({ at: since, fileName, id, message }): WaitingItem => ({
      kind: 'import-failed',
      key: `import ${id}`,
      since,
      mark: 'beyond',
      title: `The import of ${fileName} failed`,
      text:
        message === ''
          ? 'It stopped before its last row. Run it again: what is stored is not stored twice.'
          : message,
      stake: 'readings not stored',
      waiting: agoOf(since, at),
      href: hrefOf(id),
      deed: 'Look',
    }),
  )
  return { items, totals: totalOf('import-failed', count, '/lots/import') }
}
