'use server'

import { submitted } from '@/app/_submit'
import type { FormState } from '@/app/_ui/forms/form-state'
import type { Actor } from '@/lib/access/actor'
import { ok, type Result } from '@/lib/domain/result'
import { collect } from '@/lib/input/collect'
import {
  parseDie,
  parseEquipmentCode,
  parseGauge,
  parseMachine,
  parseRig,
  parseWeight,
} from '@/lib/input/equipment'
import { type FormFields, versionField } from '@/lib/input/form-fields'
import { createDie, setDieActive, updateDie } from '@/lib/services/keep-die'
import { createGauge, setGaugeActive, updateGauge } from '@/lib/services/keep-gauge'
import { createMachine, setMachineActive, updateMachine } from '@/lib/services/keep-machine'
import { createRig, setRigActive, updateRig } from '@/lib/services/keep-rig'
import { createWeight, setWeightActive, updateWeight } from '@/lib/services/keep-weight'
import { type EquipmentKind, equipmentPath } from './_ui/kinds'

type Kind = EquipmentKind | 'rigs'
type Who = Actor | undefined

/** Parsing and services of one kind, so that the actions below are the same for all. */
interface Keeping<Input> {
  readonly parse: (fields: FormFields) => Result<Input>
  readonly create: (actor: Who, code: string, input: Input) => Promise<unknown>
  readonly update: (actor: Who, code: string, version: number, input: Input) => Promise<void>
}

const created = <Input>(kind: Kind, { parse, create }: Keeping<Input>, form: FormData) =>
  submitted(form, {
    parse: (fields) => collect({ code: parseEquipmentCode(fields), input: parse(fields) }),
    serve: async (actor, { code, input }) => {
      await create(actor, code, input as Input)
      return code
    },
    goTo: (code) => (kind === 'rigs' ? equipmentPath(kind, code) : '/equipment'),
  })

const changed = <Input>(kind: Kind, { parse, update }: Keeping<Input>, code: string, form: FormData) =>
  submitted(form, {
    parse: (fields) => collect({ version: versionField(fields), input: parse(fields) }),
    serve: (actor, { version, input }) => update(actor, code, version, input as Input),
    goTo: () => (kind === 'rigs' ? equipmentPath(kind, code) : '/equipment'),
  })

const gauge = { parse: parseGauge, create: createGauge, update: updateGauge }
const weight = { parse: parseWeight, create: createWeight, update: updateWeight }
const machine = { parse: parseMachine, create: createMachine, update: updateMachine }
const die = { parse: parseDie, create: createDie, update: updateDie }
const rig = { parse: parseRig, create: createRig, update: updateRig }

const setActive = {
  gauges: setGaugeActive,
  weights: setWeightActive,
  machines: setMachineActive,
  dies: setDieActive,
  rigs: setRigActive,
}

export async function createEquipmentAction(kind: Kind, _: FormState, form: FormData): Promise<FormState> {
  switch (kind) {
    case 'gauges':
      return created(kind, gauge, form)
    case 'weights':
      return created(kind, weight, form)
    case 'machines':
      return created(kind, machine, form)
    case 'dies':
      return created(kind, die, form)
    case 'rigs':
      return created(kind, rig, form)
  }
}

export async function updateEquipmentAction(
  kind: Kind,
  code: string,
  _: FormState,
  form: FormData,
): Promise<FormState> {
  switch (kind) {
    case 'gauges':
      return changed(kind, gauge, code, form)
    case 'weights':
      return changed(kind, weight, code, form)
    case 'machines':
      return changed(kind, machine, code, form)
    case 'dies':
      return changed(kind, die, code, form)
    case 'rigs':
      return changed(kind, rig, code, form)
  }
}

export async function setEquipmentActiveAction(
  kind: Kind,
  code: string,
  version: number,
  active: boolean,
  _: FormState,
  form: FormData,
): Promise<FormState> {
  return submitted(form, {
    parse: () => ok(active),
    serve: (actor, wanted) => setActive[kind](actor, code, version, wanted),
    goTo: () => '/equipment',
  })
}
