import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Table } from '@/app/_ui/tables/Table'
import { may } from '@/lib/access/permit'
import { formatQuantity } from '@/lib/domain/units/format'
import { getWorks, type WorksFacts } from '@/lib/services/get-works'
import { type MaterialFacts, requireMaterial } from '@/lib/services/list-materials'
import { MaterialForm } from '../../_ui/MaterialForm'
import { shownRange } from '../../_ui/shown'
import { updateMaterialAction } from '../../actions'

export const metadata: Metadata = { title: 'Material' }

export default roomPage(async (actor, { params }) => {
  const works = await getWorks(actor)
  const material = await requireMaterial(actor, params.code ?? '')
  const strengths = material.body.strengthByDiameter ?? []
  return (
    <>
      <PageHead
        over={<Link href="/catalogue/materials">Materials</Link>}
        title={
          <>
            {material.name} <span>{material.code}</span>
          </>
        }
        under={[material.standing, material.source].filter(Boolean).join(' · ')}
      />
      <div className="columns">
        {may(actor, 'catalogue.keep') ? (
          <MaterialForm
            action={updateMaterialAction.bind(null, material.code)}
            decimal={works.numberFormat}
            material={material}
          />
        ) : (
          <MaterialReadOnly material={material} decimal={works.numberFormat} />
        )}
        <aside>
          {strengths.length > 0 ? (
            <section className="section">
              <h2>Tensile strength by diameter</h2>
              <Table
                dense
                caption="Least and greatest tensile strength by diameter"
                rows={strengths}
                keyOf={({ diameter }) => diameter}
                columns={[
                  {
                    head: 'Diameter',
                    unit: works.units.diameter,
                    cell: ({ diameter }) =>
                      formatQuantity(diameter, works.units.diameter, {
                        decimals: works.units.diameter === 'µm' ? 0 : 3,
                        decimal: works.numberFormat,
                      }),
                  },
                  {
                    head: 'Least',
                    unit: 'MPa',
                    number: true,
                    cell: ({ low }) => formatQuantity(low, 'MPa', { decimal: works.numberFormat }),
                  },
                  {
                    head: 'Greatest',
                    unit: 'MPa',
                    number: true,
                    cell: ({ high }) => formatQuantity(high, 'MPa', { decimal: works.numberFormat }),
                  },
                ]}
              />
              <p className="small">Between the rows it is interpolated; outside of them it is not known.</p>
            </section>
          ) : null}
        </aside>
      </div>
    </>
  )
})

function MaterialReadOnly({
  material: { body },
  decimal,
}: {
  readonly material: MaterialFacts
  readonly decimal: WorksFacts['numberFormat']
}) {
  return (
    <section className="section">
      <dl className="facts">
        <dt>Kind</dt>
        <dd>{body.kind}</dd>
        <dt>Density, kg/m³</dt>
        <dd>{shownRange(body.density, 'kg/m³', 0, decimal)}</dd>
        <dt>Young’s modulus, GPa</dt>
        <dd>{shownRange(body.youngsModulus, 'GPa', 1, decimal)}</dd>
        <dt>Expansion, µm/(m·K)</dt>
        <dd>{shownRange(body.thermalExpansion, 'µm/(m·K)', 1, decimal)}</dd>
      </dl>
    </section>
  )
}
