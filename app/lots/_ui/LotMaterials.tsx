import Link from 'next/link'
import { formatAlong } from '@/app/_ui/format/along'
import { Table } from '@/app/_ui/tables/Table'
import { lotMaterialWords, materialInWords } from '@/lib/domain/record/material-in'
import type { LotView } from '@/lib/services/get-lot'
import type { MaterialInChoice } from '@/lib/services/list-materials-in'
import { LotMaterialsForm } from './LotMaterialsForm'
import './lot-materials.css'

interface Props {
  readonly view: LotView
  /** Whether the reader may look at a coil's own page. */
  readonly maySeeMaterials: boolean
  /** What can be named; undefined for those who may not change it. */
  readonly choices: readonly MaterialInChoice[] | undefined
}

const pathOf = (code: string): string => `/materials-in/${encodeURIComponent(code)}`

/** Coils, spools and batches that a lot is made of, and the form to say it anew. */
export function LotMaterials({ view, maySeeMaterials, choices }: Props) {
  const { lot, materials, works } = view
  const link = (code: string) => (maySeeMaterials ? <Link href={pathOf(code)}>{code}</Link> : code)
  return (
    <section className="section">
      <h2>Made of</h2>
      {materials.length === 0 ? (
        <p className="slate">Nobody said which coil, spool or resin batch this lot is made of.</p>
      ) : (
        <Table
          dense
          caption="What the lot is made of"
          rows={materials}
          keyOf={({ role, place }) => `${role} ${place}`}
          columns={[
            { head: 'Code', cell: ({ code }) => link(code) },
            { head: 'As', cell: ({ role }) => lotMaterialWords[role] },
            { head: 'Name', cell: ({ kind, name }) => `${name} (${materialInWords[kind]})` },
            { head: 'Heat', cell: ({ heat }) => heat || '–' },
            {
              head: 'Wound from',
              cell: ({ parentCode }) => (parentCode === undefined ? '–' : link(parentCode)),
            },
            {
              head: 'Along the lot',
              unit: 'm',
              number: true,
              cell: ({ fromMetre, toMetre }) => formatAlong(fromMetre, toMetre, works.numberFormat),
            },
          ]}
        />
      )}
      {choices ? (
        <details className="lot-materials-change">
          <summary>{materials.length === 0 ? 'Say what it is made of' : 'Change what it is made of'}</summary>
          {choices.length === 0 && materials.length === 0 ? (
            <p>
              No coil, spool or resin batch is in use. They are registered in{' '}
              <Link href="/materials-in">Materials in</Link>.
            </p>
          ) : (
            <LotMaterialsForm
              lotCode={lot.code}
              lotVersion={lot.version}
              decimal={works.numberFormat}
              materials={materials}
              choices={choices}
            />
          )}
        </details>
      ) : null}
    </section>
  )
}
