import { randomUUID } from 'node:crypto'
import type { Actor, Role } from '@/lib/access/actor'
import { database } from '@/lib/data/database'
import { dies } from '@/lib/data/dies'
import { gauges } from '@/lib/data/gauges'
import { sha256 } from '@/lib/data/hash'
import { machines } from '@/lib/data/machines'
import { insertMaterial } from '@/lib/data/materials'
import { insertPerson } from '@/lib/data/people'
import { insertProduct } from '@/lib/data/products'
import { rigs } from '@/lib/data/rigs'
import { insertSpecification } from '@/lib/data/specifications'
import { weights } from '@/lib/data/weights'
import { insertWorks } from '@/lib/data/works'
import type { EvaluationContext, GaugeFacts } from '@/lib/domain/metrology/evaluation'
import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import { canonicalJson } from '@/lib/domain/record/canonical-json'
import type { RecordSpecimensInput } from '@/lib/input/specimen'
import { openLot } from '@/lib/services/open-lot'
import { diameterAt, steelEquipment, steelSheet } from './sheets'
import { steelContext } from './steel-context'

/** A works with one product, its equipment and one person a role: what a bench needs to begin. */
export interface SteelWorks {
  readonly bench: Actor
  readonly otherBench: Actor
  readonly quality: Actor
  readonly sales: Actor
  readonly administrator: Actor
}

const DAY = 86_400_000

/** When the works was set up; lots are made on the days after. */
export const BEGIN = Date.UTC(2026, 0, 5, 8)

export const day = (count: number): number => BEGIN + count * DAY

/** What this works knows: gravity is typed, which has its own uncertainty (`works-gravity.ts`). */
export const worksContext = (): EvaluationContext =>
  steelContext({ gravity: { value: steelContext().gravity.value, u: 2e-5 } })

/** Stores it in the database under test. */
export async function setUpSteelWorks(): Promise<SteelWorks> {
  const context = steelContext()
  return database().write(async (tx) => {
    await insertWorks(
      tx,
      {
        name: 'Tarn Strings',
        place: 'Tarn',
        timeZone: 'Europe/Oslo',
        latitudeDegrees: 59.9,
        heightMetres: 20,
        gravityTyped: context.gravity.value,
        airTemperatureCelsius: context.air.celsius,
        airPressurePascals: context.air.pascals,
        airHumidity: context.air.humidity,
        lengthUnit: 'mm',
        diameterUnit: 'mm',
        forceUnit: 'N',
        massUnit: 'mg',
        numberFormat: 'point',
        a4: 440,
        secondPersonPublishes: false,
      },
      { demo: false, at: BEGIN },
    )
    const person = async (name: string, ...roles: Role[]): Promise<Actor> => {
      const row = await insertPerson(tx, {
        name,
        username: name.toLowerCase().replace(/\W/g, ''),
        searchKey: name.toLowerCase(),
        roles,
        userId: randomUUID(),
        at: BEGIN,
      })
      return { personId: row.id, name, roles }
    }
    const material = await insertMaterial(
      tx,
      'STEEL',
      {
        name: 'Plain steel',
        body: canonicalJson(context.material),
        kind: 'metal',
        standing: 'M',
        source: 'invented',
      },
      { builtIn: false, at: BEGIN },
    )
    const product = await insertProduct(
      tx,
      'L254',
      { name: 'Larch 254', family: 'Larch', construction: 'plain' },
      BEGIN,
    )
    const quality = await person('M. Orrin', 'quality')
    const body = canonicalJson(context.specification)
    await insertSpecification(tx, {
      productId: product.id,
      number: 1,
      effectiveFrom: BEGIN - DAY,
      materialId: material.id,
      body,
      hash: sha256(body),
      note: '',
      issuedAt: BEGIN,
      issuedById: quality.personId,
    })
    await storeEquipment(tx)
    return {
      bench: await person('T. Aldous', 'bench'),
      otherBench: await person('R. Falk', 'bench'),
      quality,
      sales: await person('J. Pell', 'sales'),
      administrator: await person('A. Wren', 'administrator'),
    }
  })
}

async function storeEquipment(tx: Parameters<Parameters<ReturnType<typeof database>['write']>[0]>[0]) {
  const context = steelContext()
  const gauge = (facts: GaugeFacts | undefined, kind: string) =>
    facts &&
    gauges.insert(
      tx,
      facts.code,
      { ...facts, name: `${kind} ${facts.code}`, kind, calibrationDueAt: day(2000), note: '' },
      BEGIN,
    )
  await gauge(context.micrometer, 'micrometer')
  await gauge(context.balance, 'balance')
  await gauge(context.rule, 'rule')
  await gauge(context.counter, 'counter')
  for (const { code, kind, mass } of context.weights)
    await weights.insert(tx, code, { kind, conventionalMass: mass.value, uMass: mass.u, note: '' }, BEGIN)
  const { rig } = context
  if (rig)
    await rigs.insert(
      tx,
      rig.code,
      {
        name: 'Rig 2',
        arrangement: rig.arrangement,
        spanMetres: rig.span.value,
        uSpanMetres: rig.span.u,
        endCondition: rig.endCondition,
        uEndRelative: rig.uEndRelative,
        frictionHalfWidth: rig.frictionHalfWidth,
        hangingLengthMetres: rig.hangingLength,
        hangerCode: rig.hangerCode,
        weightCodes: rig.weightCodes,
        micrometerCode: steelEquipment.micrometer,
        balanceCode: steelEquipment.balance,
        ruleCode: steelEquipment.rule,
        counterCode: steelEquipment.counter,
        note: '',
      },
      BEGIN,
    )
  await machines.insert(tx, 'DM-1', { name: 'Drawing machine 1', kind: 'drawing machine' }, BEGIN)
  await dies.insert(tx, 'D-7', { name: 'Die 7', sizeMetres: 254e-6 }, BEGIN)
  await dies.insert(tx, 'D-8', { name: 'Die 8', sizeMetres: 254e-6 }, BEGIN)
}

/** Opens a lot of the product, made on a day. */
export const openSteelLot = (actor: Actor, code: string, made: number, dieCode = 'D-7') =>
  openLot(
    actor,
    { code, productCode: 'L254', madeAt: day(made), machineCode: 'DM-1', dieCode, setting: '' },
    day(made) + 3_600_000,
  )

/** A request that records specimens 1, 2, … of a lot with these sheets. */
export const requestOf = (
  lotCode: string,
  sheets: readonly Partial<SpecimenSheet>[],
  first = 1,
): RecordSpecimensInput => ({
  requestId: randomUUID(),
  lotCode,
  entries: sheets.map((sheet, index) => ({
    specimen: { clientId: randomUUID(), number: first + index },
    reading: { clientId: randomUUID(), kind: 'sheet', sheet: steelSheet(sheet), equipment: steelEquipment },
  })),
})

/** Six equal diameters. */
export const thick = (typed: string): Partial<SpecimenSheet> => ({
  diameters: [1, 2, 3].flatMap((position) => [
    diameterAt(position, 'a', typed),
    diameterAt(position, 'b', typed),
  ]),
})

/** Five specimens whose diameters lie about a value, given in tenths of a micrometre. */
export const fiveAbout = (tenths: number): readonly Partial<SpecimenSheet>[] =>
  [-2, -1, 0, 1, 2].map((step) => thick(((tenths + step) / 10_000).toFixed(4)))
