import { TZDate } from '@date-fns/tz'
import type { Metadata } from 'next'
import Link from 'next/link'
import { roomPage } from '@/app/_page'
import { formatDateTime } from '@/app/_ui/format/dates'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { SelectField } from '@/app/_ui/forms/SelectField'
import { Submit } from '@/app/_ui/forms/Submit'
import { NumberField, TextField } from '@/app/_ui/forms/TextField'
import { EmptyState } from '@/app/_ui/shell/EmptyState'
import { PageHead } from '@/app/_ui/shell/PageHead'
import { Table } from '@/app/_ui/tables/Table'
import { listLotsToMeasure } from '@/lib/services/get-bench'
import { getWorks } from '@/lib/services/get-works'
import { listEquipment } from '@/lib/services/list-equipment'
import { listMaterialsInUse } from '@/lib/services/list-materials-in'
import { listProducts } from '@/lib/services/list-products'
import { MadeAtField } from './_ui/MadeAtField'
import { MaterialFields } from './_ui/MaterialFields'
import { ScanLot } from './_ui/ScanLot'
import { openLotAction } from './actions'
import './bench.css'

export const metadata: Metadata = { title: 'Bench' }

/** Wall-clock time of the works for a field of date and time. */
const localTime = (at: number, timeZone: string): string => {
  const now = new TZDate(at, timeZone)
  const two = (part: number): string => String(part).padStart(2, '0')
  return `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}T${two(now.getHours())}:${two(now.getMinutes())}`
}

/** Lots that are being measured, and the way to open the next one. */
export default roomPage(async (actor) => {
  const works = await getWorks(actor)
  const lots = await listLotsToMeasure(actor)
  const products = (await listProducts(actor)).filter((one) => one.active && one.inForce)
  const equipment = await listEquipment(actor)
  const materialsIn = await listMaterialsInUse(actor)
  return (
    <>
      <PageHead
        title="Bench"
        under="All specimens at the micrometer, then at the balance, then at the rig."
        actions={<ScanLot />}
      />
      <div className="columns">
        <section className="section">
          <h2>To measure</h2>
          {lots.length === 0 ? (
            <EmptyState title="No lot is open.">
              Open the lot that comes off the machine; its traveller says product and code.
            </EmptyState>
          ) : (
            <Table
              caption="Lots that are being measured"
              rows={lots}
              keyOf={(lot) => lot.code}
              columns={[
                {
                  head: 'Lot',
                  cell: (lot) => <Link href={`/bench/${encodeURIComponent(lot.code)}`}>{lot.code}</Link>,
                },
                { head: 'Product', cell: (lot) => lot.productName },
                { head: 'Machine', cell: (lot) => lot.machine ?? '–' },
                { head: 'Made', cell: (lot) => formatDateTime(lot.madeAt, works.timeZone) },
                { head: 'Specimens', number: true, cell: (lot) => lot.specimens },
              ]}
            />
          )}
        </section>
        <aside>
          <section className="section">
            <h2>Open a lot</h2>
            {products.length === 0 ? (
              <p>Quality has to issue a specification for a product first, in the Catalogue.</p>
            ) : (
              <ActionForm action={openLotAction} label="Open a lot">
                <div className="fields">
                  <TextField name="code" label="Lot code" maxLength={40} plain />
                  <SelectField
                    name="productCode"
                    label="Product"
                    options={products.map(({ code, name }) => ({ value: code, label: name }))}
                  />
                  <MadeAtField now={localTime(Date.now(), works.timeZone)} />
                  <SelectField
                    name="machineCode"
                    label="Machine"
                    none="not said"
                    options={equipment.machines
                      .filter((one) => one.active)
                      .map(({ code, name }) => ({ value: code, label: name }))}
                  />
                  <SelectField
                    name="dieCode"
                    label="Die"
                    none="not said"
                    options={equipment.dies
                      .filter((one) => one.active)
                      .map(({ code, name }) => ({ value: code, label: `${name} (${code})` }))}
                  />
                  <MaterialFields
                    materials={materialsIn}
                    wound={products.some(({ construction }) => construction !== 'plain')}
                  />
                  <NumberField name="lengthMetres" label="Length of the lot" unit="m" optional />
                </div>
                <div className="actions">
                  <Submit>Open and measure</Submit>
                </div>
              </ActionForm>
            )}
          </section>
        </aside>
      </div>
    </>
  )
})
