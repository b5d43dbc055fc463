import type { Actor } from '@/lib/access/actor'
import { createDemoAdministrator } from '@/lib/services/create-demo-administrator'
import { createPerson } from '@/lib/services/create-person'
import { createProduct } from '@/lib/services/create-product'
import { createWorks } from '@/lib/services/create-works'
import { issueSpecification } from '@/lib/services/issue-specification'
import { createDie } from '@/lib/services/keep-die'
import { createGauge } from '@/lib/services/keep-gauge'
import { createMachine } from '@/lib/services/keep-machine'
import { createRig } from '@/lib/services/keep-rig'
import { createWeight } from '@/lib/services/keep-weight'
import { demoGauges, demoMachine, demoPeople, demoRig, demoWeights, demoWorks } from './equipment'
import { demoProducts } from './products'
import { demoSchedule, dieOf } from './schedule'

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
  for (const { code, due, ...gauge } of demoGauges)
    await createGauge(founding, code, { uRelative: 0, error: 0, note: '', calibrationDue: due, ...gauge }, at)
  for (const { code, ...weight } of demoWeights)
    await createWeight(founding, code, { ...weight, note: '' }, at)
  const { code: rigCode, ...rig } = demoRig
  await createRig(founding, rigCode, { ...rig, weightCodes: [...rig.weightCodes], note: '' }, at)
  const { code: machineCode, ...machine } = demoMachine
  await createMachine(founding, machineCode, machine, at)
  const dies = new Map(demoSchedule().map((lot) => [dieOf(lot.micrometres, lot.index), lot.micrometres]))
  for (const [code, micrometres] of dies)
    await createDie(founding, code, { name: `Die ${code.slice(2)}`, sizeMetres: micrometres / 1e6 }, at)
  for (const { code, family, name, specification } of demoProducts) {
    await createProduct(founding, { code, name, family, construction: 'plain' }, at)
    await issueSpecification(
      founding,
      {
        productCode: code,
        materialCode: 'MUSIC-WIRE',
        effectiveFrom: at,
        note: '',
        specification: { body: specification },
      },
      at,
    )
  }
  return actors as DemoActors
}
