import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { requireEnvironment } from '@/lib/data/env'
import { keepMapping } from '@/lib/data/import-mappings'
import { changeImport, findImport } from '@/lib/data/imports'
import { appendLedger } from '@/lib/data/ledger'
import { problem } from '@/lib/domain/errors'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { layoutOf, nameOf } from '@/lib/input/bench-file/layout'
import type { StartImportInput } from '@/lib/input/import'
import { changedMeanwhile } from './changed-meanwhile'
import { headersOf } from './import/file-rows'
import { importPath } from './import/work-through'
import { nudgeImportWorker } from './import/worker-link'
import { refusal } from './refusal'

/**
 * Begins an import with the columns that a person confirmed; they may be kept under a name.
 * @throws LedgerlineError not-permitted, not-found; bad-input (a column that is unknown, missing or twice); conflict
 *   when it was started already
 */
export async function startImport(
  actor: Actor | undefined,
  id: number,
  { keepAs, options, version }: StartImportInput,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'imports.run')
  const facts = await findImport(database().read, id)
  if (!facts) throw problem('not-found', `There is no import ${id}.`)
  const headers = await headersOf(importPath(requireEnvironment().dataDir, facts.sha256), options.delimiter)
  const layout = layoutOf(headers, options.columns)
  if (!layout.ok) throw refusal(layout.problems)
  const kept = {
    ...options,
    columns: Object.fromEntries(
      headers.map((header) => [header, nameOf(options.columns, header) ?? 'as-note']),
    ),
  }
  await database().write(async (tx) => {
    const changed = await changeImport(
      tx,
      { id, states: ['draft'], version },
      { state: 'queued', options: canonicalJson(kept) },
    )
    if (!changed) throw changedMeanwhile('This import')
    if (keepAs !== '') await keepMapping(tx, keepAs, kept.columns, { at, personId: actor.personId })
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'start-import',
      subject: `import ${id}`,
      body: { ...kept, ...(keepAs === '' ? {} : { keptAs: keepAs }) },
    })
  })
  nudgeImportWorker()
}
