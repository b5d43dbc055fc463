'use server'

import { currentActor } from '@/app/_session'
import { submitted } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { ok } from '@/lib/domain/result'
import { collect } from '@/lib/input/collect'
import { versionField } from '@/lib/input/form-fields'
import { parseMaterialIn, parseMaterialInCode } from '@/lib/input/material-in'
import { startOfDay } from '@/lib/services/calendar-day'
import { getWorks } from '@/lib/services/get-works'
import { createMaterialIn, setMaterialInActive, updateMaterialIn } from '@/lib/services/keep-material-in'
import { materialInPath } from './_ui/paths'

/** Days begin by the works' clock. */
const worksDays = async (): Promise<(day: string) => number> => {
  const { timeZone } = await getWorks(await currentActor())
  return (day) => startOfDay(day, timeZone)
}

export async function createMaterialInAction(_: FormState, form: FormData): Promise<FormState> {
  const startOf = await worksDays()
  return submitted(form, {
    parse: (fields) =>
      collect({ code: parseMaterialInCode(fields), input: parseMaterialIn(fields, startOf) }),
    serve: (actor, { code, input }) => createMaterialIn(actor, code, input),
    goTo: ({ code }) => materialInPath(code),
  })
}

export async function updateMaterialInAction(code: string, _: FormState, form: FormData): Promise<FormState> {
  const startOf = await worksDays()
  return submitted(form, {
    parse: (fields) => collect({ version: versionField(fields), input: parseMaterialIn(fields, startOf) }),
    serve: (actor, { version, input }) => updateMaterialIn(actor, code, version, input),
    goTo: () => materialInPath(code),
  })
}

export async function setMaterialInActiveAction(
  code: string,
  version: number,
  active: boolean,
  _: FormState,
  form: FormData,
): Promise<FormState> {
  return submitted(form, {
    parse: () => ok(active),
    serve: (actor, wanted) => setMaterialInActive(actor, code, version, wanted),
    goTo: () => materialInPath(code),
  })
}
