import type { Actor } from '@/lib/access/actor'
import { createDemoAdministrator } from '@/lib/services/create-demo-administrator'
import { createMaterial } from '@/lib/services/create-material'
import { createPerson } from '@/lib/services/create-person'
import { createProduct } from '@/lib/services/create-product'
import { createWorks } from '@/lib/services/create-works'
import { issueSpecification } from '@/lib/services/issue-specification'
import { createDie } from '@/lib/services/keep-die'
import { createGauge } from '@/lib/services/keep-gauge'
import { createMachine } from '@/lib/services/keep-machine'
import { createRig } from '@/lib/services/keep-rig'
import { createWeight } from '@/lib/services/keep-weight'
import { alderNylon } from './alder'
import { demoGauges, demoMachines, demoPeople, demoRigs, demoWeights, demoWorks } from './equipment'
import { demoProducts, productOf } from './products'
import { type DemoSchedule, demoSchedule } from './schedule'
import { workingDay } from './working-days'

export type DemoUsername = (typeof demoPeople)[number]['username']

/** Known to everyone who reads this: demo accounts can sign in on this computer only. */
export const demoPassword = (username: string): string => `tarnbeck-${username}`

export type DemoActors = Readonly<Record<DemoUsername, Actor>>

const inputOf = (person: (typeof demoPeople)[number]) => ({
  name: person.name,
  username: person.username,
  password: demoPassword(person.username),
  roles: [...person.roles],
})

/** Place, people, equipment, products: everything that has to be there before the first lot. */
export async function foundDemoWorks(at: number): Promise<DemoActors> {
  const [administrator] = demoPeople.filter(({ roles }) => roles.some((role) => role === 'administrator'))
  if (!administrator) throw new Error('The demo has no administrator.')
  const founder = await createDemoAdministrator(inputOf(administrator), at)
  // The founder's rights in the demo: what follows is equipment and catalogue, which quality keeps.
  const founding: Actor = { ...founder, roles: ['administrator', 'quality'] }
  await createWorks(founding, { ...demoWorks }, { demo: true, at })
  const actors: Partial<Record<DemoUsername, Actor>> = {}
  for (const person of demoPeople) {
    if (person === administrator && founder.name === person.name) {
      actors[person.username] = founder
      continue
    }
    const made = await createPerson(founding, inputOf(person), { demo: true, at })
    actors[person.username] = { personId: made.id, name: made.name, roles: [...person.roles] }
  }
  await keepEquipment(founding, at)
  await keepCatalogue(founding, at)
  return actors as DemoActors
}

async function keepEquipment(founding: Actor, at: number): Promise<void> {
  for (const { code, due, note = '', uRelative = 0, ...gauge } of demoGauges)
    await createGauge(founding, code, { error: 0, note, uRelative, calibrationDue: due, ...gauge }, at)
  for (const { code, ...weight } of demoWeights)
    await createWeight(founding, code, { ...weight, note: '' }, at)
  for (const { code, ...rig } of demoRigs)
    await createRig(founding, code, { ...rig, weightCodes: [...rig.weightCodes], note: '' }, at)
  for (const { code, ...machine } of demoMachines) await createMachine(founding, code, machine, at)
  const dies = new Map(
    demoSchedule().flatMap(({ dieCode, micrometres }) => (dieCode ? [[dieCode, micrometres] as const] : [])),
  )
  for (const [code, micrometres] of dies)
    await createDie(founding, code, { name: `Die ${code.slice(2)}`, sizeMetres: micrometres / 1e6 }, at)
}

async function keepCatalogue(founding: Actor, at: number): Promise<void> {
  const { body, code: nylon, name: nylonName } = alderNylon
  await createMaterial(
    founding,
    nylon,
    {
      name: nylonName,
      standing: 'measured here',
      source: 'Strings of three sizes, each sounded at five loads.',
      body,
    },
    at,
  )
  for (const { code, construction, family, materialCode, name, specification } of demoProducts) {
    await createProduct(founding, { code, name, family, construction }, at)
    await issueSpecification(
      founding,
      {
        productCode: code,
        materialCode,
        effectiveFrom: at,
        note: '',
        specification: { body: specification },
      },
      at,
    )
  }
}

/** Before the first lot that is made to a later revision, quality issues it: in force from that day on. */
export async function reviseBefore(quality: Actor, lot: DemoSchedule): Promise<void> {
  const { code, materialCode, revised } = productOf(lot.productCode)
  if (revised?.from !== lot.index) return
  const { note, specification } = revised
  await issueSpecification(
    quality,
    {
      productCode: code,
      materialCode,
      effectiveFrom: workingDay(lot.day),
      note,
      specification: { body: specification },
    },
    lot.openedAt - 2 * 3_600_000,
  )
}
