'use server'

import { submitted } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { ok } from '@/lib/domain/result'
import { changeLotMaterialsSchema } from '@/lib/input/lot'
import { atRows, readMaterialRows, refusedAtRows, sentRows } from '@/lib/input/lot-materials-form'
import { parseInput } from '@/lib/input/parse-input'
import { changeLotMaterials } from '@/lib/services/change-lot-materials'

export async function changeLotMaterialsAction(
  lotCode: string,
  _: FormState,
  form: FormData,
): Promise<FormState> {
  return submitted(form, {
    parse: (fields) => {
      const rows = readMaterialRows(fields, sentRows(fields))
      if (!rows.ok) return rows
      const { materials, at } = rows.value
      const input = atRows(
        parseInput(changeLotMaterialsSchema, {
          lotVersion: Number(fields.lotVersion),
          materials,
          reason: fields.reason ?? '',
        }),
        at,
      )
      return input.ok ? ok({ input: input.value, at }) : input
    },
    serve: (actor, { input, at }) => refusedAtRows(() => changeLotMaterials(actor, lotCode, input), at),
    goTo: () => `/lots/${encodeURIComponent(lotCode)}`,
  })
}
