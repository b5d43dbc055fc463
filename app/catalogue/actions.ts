'use server'

import { currentActor } from '@/app/_session'
import { submitted } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import { ok } from '@/lib/domain/result'
import {
  parseMaterial,
  parseMaterialVersion,
  parseNewMaterialCode,
  parseProduct,
  parseSpecification,
} from '@/lib/input/catalogue'
import { collect } from '@/lib/input/collect'
import { startOfDay } from '@/lib/services/calendar-day'
import { createMaterial } from '@/lib/services/create-material'
import { createProduct } from '@/lib/services/create-product'
import { getWorks } from '@/lib/services/get-works'
import { issueSpecification } from '@/lib/services/issue-specification'
import { requireMaterial } from '@/lib/services/list-materials'
import { setProductActive } from '@/lib/services/set-product-active'
import { updateMaterial } from '@/lib/services/update-material'

const productPath = (code: string) => `/catalogue/products/${encodeURIComponent(code)}`

export async function createProductAction(_: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: parseProduct,
    serve: (actor, input) => createProduct(actor, input),
    goTo: ({ code }) => productPath(code),
  })
}

export async function setProductActiveAction(
  code: string,
  active: boolean,
  _: FormState,
  form: FormData,
): Promise<FormState> {
  return submitted(form, {
    parse: () => ok(active),
    serve: (actor, wanted) => setProductActive(actor, code, wanted),
    goTo: () => productPath(code),
  })
}

export async function issueSpecificationAction(
  productCode: string,
  _: FormState,
  form: FormData,
): Promise<FormState> {
  const { units, timeZone } = await getWorks(await currentActor())
  return submitted(form, {
    parse: (fields) => parseSpecification(fields, units.diameter),
    serve: (actor, { materialCode, effectiveDay, note, draft }) =>
      issueSpecification(actor, {
        productCode,
        materialCode,
        effectiveFrom: startOfDay(effectiveDay, timeZone),
        note,
        specification: { draft },
      }),
    goTo: () => productPath(productCode),
  })
}

export async function createMaterialAction(_: FormState, form: FormData): Promise<FormState> {
  return submitted(form, {
    parse: (fields) => collect({ code: parseNewMaterialCode(fields), input: parseMaterial(fields) }),
    serve: (actor, { code, input }) => createMaterial(actor, code, input),
    goTo: () => '/catalogue/materials',
  })
}

export async function updateMaterialAction(code: string, _: FormState, form: FormData): Promise<FormState> {
  const { body } = await requireMaterial(await currentActor(), code)
  return submitted(form, {
    parse: (fields) => collect({ version: parseMaterialVersion(fields), input: parseMaterial(fields, body) }),
    serve: (actor, { version, input }) => updateMaterial(actor, code, version, input),
    goTo: () => '/catalogue/materials',
  })
}
