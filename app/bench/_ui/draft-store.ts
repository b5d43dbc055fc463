/**
 * What is typed and not yet stored lives in this browser's IndexedDB, under the person who typed it, so
 * that a closed tab or a dead battery loses nothing.
 */
export const DRAFT_FORMAT = 1

export interface DraftValue {
  readonly typed: string
  readonly unit: string
  readonly si: number
  /** Reason given for keeping a questioned value. */
  readonly kept?: { readonly question: string; readonly reason: string }
}

export interface BenchDraft {
  readonly format: typeof DRAFT_FORMAT
  readonly personId: number
  readonly lotCode: string
  readonly values: Readonly<Record<string, DraftValue>>
  /** Set-up values by field, and ids that make sending safe to repeat, by specimen. */
  readonly setUp: Readonly<Record<string, DraftValue>>
  readonly requestIds: Readonly<Record<string, string>>
  readonly savedAt: number
}

const DATABASE = 'ledgerline-bench'
const STORE = 'drafts'

const key = (personId: number, lotCode: string): string => `${personId}:${lotCode}`

function open(): Promise<IDBDatabase> {
  return new Promise((resolve, reject) => {
    const request = indexedDB.open(DATABASE, 1)
    request.onupgradeneeded = () => request.result.createObjectStore(STORE)
    request.onsuccess = () => resolve(request.result)
    request.onerror = () => reject(request.error ?? new Error('the draft store could not be opened'))
  })
}

async function inStore<T>(
  mode: IDBTransactionMode,
  work: (store: IDBObjectStore) => IDBRequest<T>,
): Promise<T> {
  const db = await open()
  try {
    return await new Promise<T>((resolve, reject) => {
      const transaction = db.transaction(STORE, mode)
      const request = work(transaction.objectStore(STORE))
      // Resolved when the transaction is complete: only then is the draft on the disk.
      transaction.oncomplete = () => resolve(request.result)
      transaction.onerror = () => reject(transaction.error ?? new Error('the draft was not kept'))
      transaction.onabort = () => reject(transaction.error ?? new Error('the draft was not kept'))
    })
  } finally {
    db.close()
  }
}

export async function readDraft(personId: number, lotCode: string): Promise<BenchDraft | undefined> {
  const found: unknown = await inStore('readonly', (store) => store.get(key(personId, lotCode)))
  if (typeof found !== 'object' || found === null) return undefined
  const draft = found as BenchDraft
  return draft.format === DRAFT_FORMAT ? draft : undefined
}

export async function keepDraft(draft: BenchDraft): Promise<void> {
  await inStore('readwrite', (store) => store.put(draft, key(draft.personId, draft.lotCode)))
}

export async function dropDraft(personId: number, lotCode: string): Promise<void> {
  await inStore('readwrite', (store) => store.delete(key(personId, lotCode)))
}
