import { ConfirmForm } from '@/app/_ui/forms/ConfirmForm'
import { setEquipmentActiveAction } from '../actions'
import type { EquipmentKind } from './kinds'

interface PutAwayProps {
  readonly kind: EquipmentKind | 'rigs'
  readonly code: string
  readonly version: number
  readonly active: boolean
}

/** Takes equipment out of use, or back into it. */
export function PutAway({ kind, code, version, active }: PutAwayProps) {
  return (
    <ConfirmForm
      action={setEquipmentActiveAction.bind(null, kind, code, version, !active)}
      label={active ? 'Put away' : 'Back into use'}
      title={active ? `Put ${code} away?` : `Use ${code} again?`}
      confirm={active ? `Put ${code} away` : `Use ${code} again`}
      tone={active ? 'alarm' : 'primary'}
    >
      <p>
        {active
          ? 'It is offered no more where readings are taken. Everything that names it stays as it is.'
          : 'It is offered again where readings are taken.'}
      </p>
    </ConfirmForm>
  )
}
