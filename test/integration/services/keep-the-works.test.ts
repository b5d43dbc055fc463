import { beforeAll, describe, expect, it } from 'vitest'
import type { Actor } from '@/lib/access/actor'
import { database } from '@/lib/data/database'
import { parseSpecification } from '@/lib/input/catalogue'
import { parseDie, parseGauge } from '@/lib/input/equipment'
import { changeOwnPassword } from '@/lib/services/change-own-password'
import { changePerson } from '@/lib/services/change-person'
import { createMaterial } from '@/lib/services/create-material'
import { createPerson } from '@/lib/services/create-person'
import { createProduct } from '@/lib/services/create-product'
import { createWorks } from '@/lib/services/create-works'
import { getLot } from '@/lib/services/get-lot'
import { requirePerson } from '@/lib/services/get-person'
import { getWorks } from '@/lib/services/get-works'
import { issueSpecification } from '@/lib/services/issue-specification'
import { createDie, requireDie, setDieActive, updateDie } from '@/lib/services/keep-die'
import { createGauge, requireGauge, updateGauge } from '@/lib/services/keep-gauge'
import { requireRig, setRigActive, updateRig } from '@/lib/services/keep-rig'
import { updateWeight } from '@/lib/services/keep-weight'
import { listEquipment } from '@/lib/services/list-equipment'
import { requireMaterial } from '@/lib/services/list-materials'
import { listPeople } from '@/lib/services/list-people'
import { listProducts, requireProduct } from '@/lib/services/list-products'
import { openLot } from '@/lib/services/open-lot'
import { setPassword } from '@/lib/services/set-password'
import { setProductActive } from '@/lib/services/set-product-active'
import { updateMaterial } from '@/lib/services/update-material'
import { updateWorks } from '@/lib/services/update-works'
import { demoPassword, foundDemoWorks } from '@/prisma/demo/found-works'
import { refusalOf } from '../../support/refusal-of'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const DAY = 86_400_000
const BEGIN = Date.UTC(2026, 0, 5, 8)

const ledger = async (): Promise<readonly string[]> =>
  (await database().read.ledgerEntry.findMany({ orderBy: { sequence: 'asc' } })).map(
    ({ subject, verb }) => `${verb} ${subject}`,
  )

describeOnEachEngine('keeping the works', () => {
  useFreshDatabase()
  let actors: Awaited<ReturnType<typeof foundDemoWorks>>
  let quality: Actor
  let administrator: Actor
  beforeAll(async () => {
    actors = await foundDemoWorks(BEGIN)
    quality = actors.orrin
    administrator = actors.falk
  })

  describe('settings', () => {
    it('change with a version, for administrators only, and are in the ledger', async () => {
      const { version } = await getWorks(administrator)
      const values = {
        name: 'Tarnbeck String Works',
        place: 'Tarnbeck',
        timeZone: 'Europe/London',
        latitudeDegrees: 54.4,
        heightMetres: 85,
        version,
        gravityTyped: 9.8145,
        airTemperatureCelsius: 21,
        airPressurePascals: 100_000,
        airHumidity: 0.4,
        lengthUnit: 'in',
        diameterUnit: 'thou',
        forceUnit: 'lbf',
        massUnit: 'g',
        numberFormat: 'comma',
        a4: 442,
        secondPersonPublishes: false,
      }
      await updateWorks(administrator, values)
      expect(await getWorks(quality)).toMatchObject({
        gravity: { value: 9.8145, typed: true },
        numberFormat: 'comma',
        a4: 442,
        version: version + 1,
      })
      expect(await refusalOf(updateWorks(administrator, values))).toMatchObject({ code: 'conflict' })
      expect(await refusalOf(updateWorks(quality, { ...values, version: version + 1 }))).toMatchObject({
        code: 'not-permitted',
      })
      expect((await ledger()).at(-1)).toMatch(/works/)
    })

    it('are founded once', async () => {
      expect(
        await refusalOf(
          createWorks(administrator, {
            name: 'Another',
            place: '',
            timeZone: 'Europe/Oslo',
            latitudeDegrees: 60,
            heightMetres: 0,
          } as never),
        ),
      ).toMatchObject({ code: 'conflict' })
    })
  })

  describe('people', () => {
    it('are added with a role, change roles, and their sign-in names are their own', async () => {
      const made = await createPerson(administrator, {
        name: 'N. Carr',
        username: 'carr',
        password: 'seven slow herons',
        roles: ['bench'],
      })
      await changePerson(administrator, made.id, {
        version: made.version,
        name: 'N. Carr',
        roles: ['bench', 'quality'],
        active: true,
      })
      expect(await requirePerson(administrator, made.id)).toMatchObject({ roles: ['bench', 'quality'] })
      expect(
        await refusalOf(
          createPerson(administrator, {
            name: 'Other Carr',
            username: 'carr',
            password: 'seven slow herons',
            roles: [],
          }),
        ),
      ).toMatchObject({ code: 'conflict', where: 'username' })
      expect(
        await refusalOf(
          createPerson(quality, { name: 'X', username: 'xx', password: 'seven slow herons', roles: [] }),
        ),
      ).toMatchObject({ code: 'not-permitted' })
    })

    it('leave at least one administrator', async () => {
      const falk = (await listPeople(administrator)).find(({ name }) => name === 'R. Falk')
      if (!falk) throw new Error('no administrator')
      const change = { version: falk.version, name: falk.name, active: true }
      expect(
        await refusalOf(changePerson(administrator, falk.id, { ...change, roles: ['quality'] })),
      ).toMatchObject({ message: expect.stringMatching(/administrator/i) })
    })

    it('get a password from an administrator and change their own with the old one', async () => {
      await setPassword(administrator, actors.imrie.personId, 'nine green kettles')
      expect(
        await refusalOf(
          changeOwnPassword(actors.imrie, { current: demoPassword('imrie'), password: 'six red kettles ok' }),
        ),
      ).toMatchObject({ where: 'current' })
      await changeOwnPassword(actors.imrie, { current: 'nine green kettles', password: 'six red kettles ok' })
      expect(await refusalOf(setPassword(quality, actors.imrie.personId, 'x'.repeat(12)))).toMatchObject({
        code: 'not-permitted',
      })
    })
  })

  describe('the catalogue', () => {
    it('has the handbook materials with range and standing, and takes a measured one beside them', async () => {
      const steel = await requireMaterial(quality, 'MUSIC-WIRE')
      expect(steel.body.density).toEqual({ value: 7850, low: 7830, high: 7870 })
      expect(steel.standing).toBe('public page')
      const input = {
        name: 'Wire of coil 118',
        kind: 'metal',
        standing: 'measured here',
        source: '',
        body: steel.body,
      }
      await createMaterial(quality, 'COIL-118', input as never)
      expect(await requireMaterial(quality, 'COIL-118')).toMatchObject({ standing: 'measured here' })
      expect(await refusalOf(createMaterial(quality, 'COIL-118', input as never))).toMatchObject({
        code: 'conflict',
      })
      expect(await refusalOf(createMaterial(actors.pell, 'COIL-119', input as never))).toMatchObject({
        code: 'not-permitted',
      })
      const { version } = await requireMaterial(quality, 'COIL-118')
      await updateMaterial(quality, 'COIL-118', version, {
        ...input,
        name: 'Wire of coil 118, again',
      } as never)
      expect(await refusalOf(updateMaterial(quality, 'COIL-118', version, input as never))).toMatchObject({
        code: 'conflict',
      })
    })

    it('issues dated revisions: a lot keeps the one in force when it was made', async () => {
      const open = (code: string, madeAt: number) =>
        openLot(
          actors.aldous,
          { requestId: crypto.randomUUID(), code, productCode: 'LARCH-254', madeAt, setting: '' } as never,
          madeAt + 60_000,
        )
      await open('OLD-1', BEGIN + 3 * DAY)
      const product = await requireProduct(quality, 'LARCH-254')
      const revision = product.revisions[0]
      if (!revision) throw new Error('no revision')
      const draft = parseSpecification(
        {
          materialCode: 'MUSIC-WIRE',
          effectiveDay: '2026-01-15',
          note: 'Half a micrometre thicker.',
          diameter: '0.2545',
          diameterTolerance: '3',
          massPerMetre: '',
          massTolerance: '2',
          ovalityMax: '3',
          densityTolerance: '1.5',
          referenceNote: 'E4',
          a4: '440',
          length: '648',
          basis: 'unloaded-mass',
          guardDiameter: '0',
          guardMass: '1',
          heads: '3',
          tails: '2',
          positions: '3',
          directions: '2',
          weighedState: 'slack',
          cutLength: '500',
          acceptanceConstant: '1.5',
          rigCode: 'RIG-2',
        },
        'mm',
      )
      if (!draft.ok) throw new Error(JSON.stringify(draft.problems))
      const issue = (actor: Actor) =>
        issueSpecification(
          actor,
          {
            productCode: 'LARCH-254',
            materialCode: 'MUSIC-WIRE',
            effectiveFrom: BEGIN + 10 * DAY,
            note: draft.value.note,
            specification: { draft: draft.value.draft },
          },
          BEGIN + 4 * DAY,
        )
      expect(await refusalOf(issue(actors.aldous))).toMatchObject({ code: 'not-permitted' })
      expect(await issue(quality)).toMatchObject({ number: 2 })
      await open('OLD-2', BEGIN + 9 * DAY)
      await open('NEW-1', BEGIN + 11 * DAY)
      const numbers = await Promise.all(
        ['OLD-1', 'OLD-2', 'NEW-1'].map(async (code) => (await getLot(quality, code)).specification.number),
      )
      expect(numbers).toEqual([1, 1, 2])
      expect(
        (await requireProduct(quality, 'LARCH-254')).revisions.map(({ number }) => number).sort(),
      ).toEqual([1, 2])
    })

    it('takes products in, and out of the range without losing them', async () => {
      await createProduct(quality, { code: 'ASH-300', name: 'Ash 300', family: 'Ash', construction: 'plain' })
      await setProductActive(quality, 'ASH-300', false)
      const all = await listProducts(quality)
      expect(all.find(({ code }) => code === 'ASH-300')?.active ?? false).toBe(false)
      expect(await requireProduct(quality, 'ASH-300')).toMatchObject({ name: 'Ash 300' })
      expect(
        await refusalOf(
          createProduct(quality, { code: 'ASH-300', name: 'Ash', family: '', construction: 'plain' }),
        ),
      ).toMatchObject({ code: 'conflict' })
    })
  })

  describe('equipment', () => {
    it('is registered with resolution and uncertainty, changed with its version, never deleted', async () => {
      const gauge = parseGauge({
        name: 'Micrometer 15',
        kind: 'micrometer',
        resolution: '1',
        uAbsolute: '0.8',
        uRelative: '',
        error: '0.2',
        mode: 'direct',
        calibrationDue: '2026-12-31',
        note: '',
      })
      if (!gauge.ok) throw new Error(JSON.stringify(gauge.problems))
      await createGauge(quality, 'M-15', gauge.value)
      const stored = await requireGauge(quality, 'M-15')
      expect(stored.resolution).toBeCloseTo(1e-6, 18)
      expect(stored.uAbsolute).toBeCloseTo(8e-7, 18)
      await updateGauge(quality, 'M-15', stored.version, { ...gauge.value, uAbsolute: 6e-7 })
      expect(await refusalOf(updateGauge(quality, 'M-15', stored.version, gauge.value))).toMatchObject({
        code: 'conflict',
      })
      expect(await refusalOf(createGauge(actors.aldous, 'M-16', gauge.value))).toMatchObject({
        code: 'not-permitted',
      })

      const die = parseDie({ name: 'Die 9', size: '0.254', sizeMetres: '0.254', bore: '0.254' })
      if (!die.ok) throw new Error(JSON.stringify(die.problems))
      await createDie(quality, 'D-09', die.value)
      await setDieActive(quality, 'D-09', 1, false)
      expect(await requireDie(quality, 'D-09')).toMatchObject({ active: false })
      const { version } = await requireDie(quality, 'D-09')
      await updateDie(quality, 'D-09', version, { ...die.value, name: 'Die 9, lapped' })
      expect((await listEquipment(quality)).dies.find(({ code }) => code === 'D-09')).toMatchObject({
        name: 'Die 9, lapped',
      })
    })

    it('names only what is registered: a rig refuses a weight that nobody has', async () => {
      const rig = await requireRig(quality, 'RIG-2')
      const { code: _, version, active: __, id: ___, ...values } = rig as typeof rig & { id?: number }
      expect(
        await refusalOf(updateRig(quality, 'RIG-2', version, { ...values, weightCodes: ['W-99'] } as never)),
      ).toMatchObject({ code: 'not-found', message: expect.stringContaining('W-99') })
      expect(
        await refusalOf(
          updateWeight(quality, 'W-99', 1, { kind: 'slot', conventionalMass: 1, uMass: 1e-5, note: '' }),
        ),
      ).toMatchObject({ code: 'not-found' })
      await setRigActive(quality, 'RIG-2', version, false)
      expect((await listEquipment(quality)).rigs.find(({ code }) => code === 'RIG-2')).toMatchObject({
        active: false,
      })
      await setRigActive(quality, 'RIG-2', version + 1, true)
    })
  })
})
