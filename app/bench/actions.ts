'use server'

import { TZDate } from '@date-fns/tz'
import { redirect } from 'next/navigation'
import { currentActor } from '@/app/_session'
import { submitted } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { lotMaterialRoles } from '@/lib/domain/record/material-in'
import { ok } from '@/lib/domain/result'
import { openLotSchema } from '@/lib/input/lot'
import { atRows, readMaterialRows, refusedAtRows, roleRow } from '@/lib/input/lot-materials-form'
import { parseInput } from '@/lib/input/parse-input'
import { getWorks } from '@/lib/services/get-works'
import { openLot } from '@/lib/services/open-lot'

/** Goes to the sheet of the lot that was scanned; an unknown one gets its sentence there. */
export async function goToLotAction(form: FormData): Promise<void> {
  const code = String(form.get('code') ?? '').trim()
  redirect(code === '' ? '/bench' : `/bench/${encodeURIComponent(code)}`)
}

const filled = (value: string | undefined): string | undefined => (value?.trim() ? value.trim() : undefined)

/** A wall-clock time of a form field in a time zone, as an instant with its offset. */
const instantOf = (local: string | undefined, timeZone: string): string | undefined => {
  const [, year, month, day, hour, minute] = /^(\d{4})-(\d\d)-(\d\d)T(\d\d):(\d\d)/.exec(local ?? '') ?? []
  return minute === undefined
    ? local
    : new TZDate(
        Number(year),
        Number(month) - 1,
        Number(day),
        Number(hour),
        Number(minute),
        0,
        0,
        timeZone,
      ).toISOString()
}

export async function openLotAction(_: FormState, form: FormData): Promise<FormState> {
  const { timeZone } = await getWorks(await currentActor())
  return submitted(form, {
    parse: (fields) => {
      const length = filled(fields.lengthMetres)
      const rows = readMaterialRows(fields, lotMaterialRoles.map(roleRow))
      if (!rows.ok) return rows
      const { materials, at } = rows.value
      const parsed = parseInput(openLotSchema, {
        code: (fields.code ?? '').trim(),
        productCode: fields.productCode,
        madeAt: instantOf(fields.madeAt, timeZone),
        machineCode: filled(fields.machineCode),
        dieCode: filled(fields.dieCode),
        ...(length === undefined ? {} : { lengthMetres: Number(length.replace(',', '.')) }),
        setting: fields.setting ?? '',
        materials,
      })
      const input = atRows(parsed, at)
      return input.ok ? ok({ input: input.value, at }) : input
    },
    serve: (actor, { input, at }) => refusedAtRows(() => openLot(actor, input), at),
    goTo: (reply) => `/bench/${encodeURIComponent(reply.code)}`,
  })
}
