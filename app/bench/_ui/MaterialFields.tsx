import { SelectField } from '@/app/_ui/forms/SelectField'
import { fitsRole, type LotMaterialRole, lotMaterialRoles } from '@/lib/domain/record/material-in'
import { roleRow } from '@/lib/input/lot-materials-form'
import type { MaterialInChoice } from '@/lib/services/list-materials-in'

const labels: Readonly<Record<LotMaterialRole, string>> = {
  core: 'Coil or spool of the wire',
  'wrap-1': 'Spool of the wrap',
  'wrap-2': 'Spool of the second wrap',
  resin: 'Resin batch',
}

interface Props {
  /** What is in use. */
  readonly materials: readonly MaterialInChoice[]
  /** Whether the works makes strings with a wrap. */
  readonly wound: boolean
}

const isWrap = (role: LotMaterialRole): boolean => role === 'wrap-1' || role === 'wrap-2'

/** One choice for each role that something in use fits; splices are named on the lot's page later. */
export function MaterialFields({ materials, wound }: Props) {
  return lotMaterialRoles.map((role) => {
    const fitting = wound || !isWrap(role) ? materials.filter(({ kind }) => fitsRole(kind, role)) : []
    return fitting.length === 0 ? null : (
      <SelectField
        key={role}
        name={`${roleRow(role).row}.code`}
        label={labels[role]}
        optional
        none="not said"
        options={fitting.map(({ code, name }) => ({ value: code, label: `${code} · ${name}` }))}
      />
    )
  })
}
