import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { type Column, Table } from '@/app/_ui/tables/Table'
import { may } from '@/lib/access/permit'
import { formatQuantity } from '@/lib/domain/units/format'
import { getWorks, type WorksFacts } from '@/lib/services/get-works'
import { listMaterials, type MaterialFacts } from '@/lib/services/list-materials'
import { CatalogueTabs } from '../_ui/CatalogueTabs'
import { shownRange } from '../_ui/shown'

export const metadata: Metadata = { title: 'Materials' }

export default roomPage(async (actor) => {
  const works = await getWorks(actor)
  const materials = await listMaterials(actor)
  return (
    <>
      <PageHead
        title="Catalogue"
        under="A material is a value with a range, never one true number."
        actions={
          may(actor, 'catalogue.keep') ? (
            <Link className="button primary" href="/catalogue/materials/new">
              Add a material
            </Link>
          ) : undefined
        }
      />
      <CatalogueTabs current="/catalogue/materials" />
      <section className="section">
        <Table
          caption="Materials with their ranges and standing"
          rows={materials}
          keyOf={({ code }) => code}
          columns={columns(works.numberFormat)}
        />
        <p className="small">
          In brackets the range met in practice; the standard uncertainty used is its width over √12. Standing
          says how well the values are founded.
        </p>
      </section>
    </>
  )
})

const strengthText = ({ body }: MaterialFacts, decimal: WorksFacts['numberFormat']): string => {
  const rows = body.strengthByDiameter
  const [first, last] = [rows?.[0], rows?.at(-1)]
  const range = first && last ? { low: last.low, high: first.high } : body.tensileStrength
  if (!range) return '–'
  const text = (value: number) => formatQuantity(value, 'MPa', { decimal })
  return `${text(range.low)}–${text(range.high)}${rows ? ', by diameter' : ''}`
}

function columns(decimal: WorksFacts['numberFormat']): readonly Column<MaterialFacts>[] {
  return [
    {
      head: 'Material',
      cell: ({ code, name }) => <Link href={`/catalogue/materials/${encodeURIComponent(code)}`}>{name}</Link>,
    },
    {
      head: 'Density',
      unit: 'kg/m³',
      cell: ({ body }) => shownRange(body.density, 'kg/m³', 0, decimal),
    },
    {
      head: 'Young’s modulus',
      unit: 'GPa',
      cell: ({ body }) => shownRange(body.youngsModulus, 'GPa', body.kind === 'metal' ? 0 : 1, decimal),
    },
    {
      head: 'Expansion',
      unit: 'µm/(m·K)',
      cell: ({ body }) => shownRange(body.thermalExpansion, 'µm/(m·K)', 1, decimal),
    },
    { head: 'Tensile strength', unit: 'MPa', cell: (material) => strengthText(material, decimal) },
    {
      head: 'Standing',
      cell: ({ standing, builtIn }) => (
        <>
          {standing}
          {builtIn ? null : <small> · the works’ own</small>}
        </>
      ),
    },
  ]
}
