import type { Actor } from '@/lib/access/actor'
import { permit } from '@/lib/access/permit'
import { database } from '@/lib/data/database'
import { listMappings } from '@/lib/data/import-mappings'
import { changeImport, findImport } from '@/lib/data/imports'
import { appendLedger } from '@/lib/data/ledger'
import { problem } from '@/lib/domain/errors'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import { nameOf } from '@/lib/input/bench-file/layout'
import type { KeepImportOptionsInput } from '@/lib/input/import'
import { changedMeanwhile } from './changed-meanwhile'

/**
 * Keeps how a file is to be read, so that the preview shows it; a mapping kept under a name takes the place of the
 * columns it knows. Nothing is imported.
 * @throws LedgerlineError not-permitted, not-found; conflict when the import has begun or was changed meanwhile
 */
export async function keepImportOptions(
  actor: Actor | undefined,
  id: number,
  { mapping, options, version }: KeepImportOptionsInput,
  at: number = Date.now(),
): Promise<void> {
  permit(actor, 'imports.run')
  await database().write(async (tx) => {
    if (!(await findImport(tx, id))) throw problem('not-found', `There is no import ${id}.`)
    const kept = (await listMappings(tx)).find((one) => one.name === mapping)
    if (mapping !== '' && !kept)
      throw problem('not-found', `No mapping is kept under the name ${mapping}.`, { where: 'mapping' })
    const columns = Object.fromEntries(
      Object.entries(options.columns).map(([header, name]) => [
        header,
        (kept && nameOf(kept.columns, header)) ?? name,
      ]),
    )
    const changed = await changeImport(
      tx,
      { id, states: ['draft'], version },
      { options: canonicalJson({ ...options, columns }) },
    )
    if (!changed) throw changedMeanwhile('This import')
    await appendLedger(tx, {
      at,
      personId: actor.personId,
      verb: 'keep-import-options',
      subject: `import ${id}`,
      body: { mapping, delimiter: options.delimiter, decimal: options.decimal },
    })
  })
}
