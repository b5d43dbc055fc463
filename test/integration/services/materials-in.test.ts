import { beforeAll, describe, expect, it } from 'vitest'
import { database } from '@/lib/data/database'
import { listLotMaterials } from '@/lib/data/lot-materials'
import { findLotId } from '@/lib/data/lots'
import { changeLotMaterialsSchema, openLotSchema } from '@/lib/input/lot'
import { listMaterialsInSchema, type MaterialInInput, materialInSchema } from '@/lib/input/material-in'
import { changeLotMaterials } from '@/lib/services/change-lot-materials'
import { getLot } from '@/lib/services/get-lot'
import { getMaterialIn } from '@/lib/services/get-material-in'
import {
  createMaterialIn,
  requireMaterialIn,
  setMaterialInActive,
  updateMaterialIn,
} from '@/lib/services/keep-material-in'
import { listMaterialsIn, listMaterialsInUse } from '@/lib/services/list-materials-in'
import { openLot } from '@/lib/services/open-lot'
import { refusalOf } from '../../support/refusal-of'
import { day, type SteelWorks, setUpSteelWorks } from '../../support/steel-works'
import { describeOnEachEngine, useFreshDatabase } from '../../support/template-database'

const input = (given: Partial<MaterialInInput> & Pick<MaterialInInput, 'kind'>): MaterialInInput => ({
  ...materialInSchema.parse({ name: 'Music wire 254', kind: given.kind }),
  ...given,
})

const ledgerOf = async (subject: string) =>
  (await database().read.ledgerEntry.findMany({ where: { subject }, orderBy: { sequence: 'asc' } })).map(
    ({ verb, body }) => ({ verb, body: JSON.parse(body) as unknown }),
  )

describeOnEachEngine('materials in', () => {
  useFreshDatabase()
  let works: SteelWorks
  beforeAll(async () => {
    works = await setUpSteelWorks()
    await createMaterialIn(works.quality, 'C-1', input({ kind: 'coil', heat: 'H 77', materialCode: 'STEEL' }))
    await createMaterialIn(works.quality, 'C-2', input({ kind: 'coil' }))
    await createMaterialIn(works.quality, 'S-1', input({ kind: 'spool', parentCode: 'C-1' }))
    await createMaterialIn(works.quality, 'R-1', input({ kind: 'resin-batch', name: 'Nylon 6-12' }))
  })

  const linksOf = async (code: string) => {
    const { read } = database()
    const id = (await findLotId(read, code)) ?? -1
    return (await listLotMaterials(read, [id])).get(id) ?? []
  }
  const open = (code: string, materials: readonly unknown[], more: object = {}) =>
    openLot(
      works.bench,
      openLotSchema.parse({
        code,
        productCode: 'L254',
        madeAt: new Date(day(5)).toISOString(),
        materials,
        ...more,
      }),
    )

  describe('createMaterialIn', () => {
    it('keeps what is known of it, with the coil and the material of the catalogue', async () => {
      const given = input({
        kind: 'spool',
        name: 'Wound on Monday',
        heat: 'H 77',
        supplier: 'Northern Wire',
        parentCode: 'C-1',
        materialCode: 'STEEL',
        sizeMetres: 254e-6,
        lengthMetres: 1200,
        massKilograms: 0.48,
        receivedAt: day(2),
        note: 'Dented flange.',
      })
      await createMaterialIn(works.quality, 'S-9', given, day(3))
      const { materialCode, parentCode, ...facts } = given
      expect(await requireMaterialIn(works.bench, 'S-9')).toMatchObject({
        ...facts,
        code: 'S-9',
        active: true,
        version: 1,
        material: { code: materialCode },
        parent: { code: parentCode },
      })
      expect(await ledgerOf('material-in S-9')).toEqual([{ verb: 'create', body: given }])
    })

    it('refuses a code twice, unknown coils and materials, and a winding that can’t be', async () => {
      const refused = (given: MaterialInInput, code = 'X-1') =>
        refusalOf(createMaterialIn(works.quality, code, given))
      expect(await refused(input({ kind: 'coil' }), 'C-1')).toMatchObject({ code: 'conflict', where: 'code' })
      expect(await refused(input({ kind: 'coil', materialCode: 'TIN' }))).toMatchObject({
        code: 'not-found',
        where: 'materialCode',
      })
      expect(await refused(input({ kind: 'spool', parentCode: 'C-9' }))).toMatchObject({
        code: 'not-found',
        where: 'parentCode',
      })
      expect(await refused(input({ kind: 'spool', parentCode: 'R-1' }))).toMatchObject({
        message: 'R-1 is a resin batch, not a coil.',
      })
      expect(await refused(input({ kind: 'coil', parentCode: 'C-1' }))).toMatchObject({ where: 'parentCode' })
    })

    it('is for quality; the bench reads, sales does not', async () => {
      expect(await refusalOf(createMaterialIn(works.bench, 'X-2', input({ kind: 'coil' })))).toMatchObject({
        code: 'not-permitted',
      })
      expect(await refusalOf(requireMaterialIn(works.sales, 'C-1'))).toMatchObject({ code: 'not-permitted' })
      expect(await refusalOf(requireMaterialIn(works.bench, 'C-77'))).toMatchObject({ code: 'not-found' })
    })
  })

  describe('updateMaterialIn', () => {
    it('changes one version once', async () => {
      await createMaterialIn(works.quality, 'C-3', input({ kind: 'coil', heat: 'H 1', lengthMetres: 100 }))
      await updateMaterialIn(works.quality, 'C-3', 1, input({ kind: 'coil', heat: 'H 2' }))
      expect(await requireMaterialIn(works.bench, 'C-3')).toMatchObject({ heat: 'H 2', version: 2 })
      expect((await requireMaterialIn(works.bench, 'C-3')).lengthMetres).toBeUndefined()
      expect(
        await refusalOf(updateMaterialIn(works.quality, 'C-3', 1, input({ kind: 'coil' }))),
      ).toMatchObject({ code: 'conflict' })
      expect((await ledgerOf('material-in C-3')).map(({ verb }) => verb)).toEqual(['create', 'change'])
    })

    it('changes the kind as long as nothing names it', async () => {
      await createMaterialIn(works.quality, 'C-4', input({ kind: 'coil' }))
      await updateMaterialIn(works.quality, 'C-4', 1, input({ kind: 'spool' }))
      expect(await requireMaterialIn(works.bench, 'C-4')).toMatchObject({ kind: 'spool' })
      expect(
        await refusalOf(updateMaterialIn(works.quality, 'C-1', 1, input({ kind: 'spool' }))),
      ).toMatchObject({ code: 'bad-input', where: 'kind' })
    })
  })

  describe('openLot', () => {
    it('stores what the lot is made of, places counted within each role', async () => {
      await open(
        'M-1',
        [
          { role: 'core', code: 'C-1', fromMetre: 0, toMetre: 800 },
          { role: 'resin', code: 'R-1' },
          { role: 'core', code: 'S-1', fromMetre: 800 },
        ],
        { lengthMetres: 1200 },
      )
      expect(await linksOf('M-1')).toMatchObject([
        { role: 'core', place: 1, code: 'C-1', kind: 'coil', heat: 'H 77', fromMetre: 0, toMetre: 800 },
        { role: 'core', place: 2, code: 'S-1', kind: 'spool', parentCode: 'C-1', fromMetre: 800 },
        { role: 'resin', place: 1, code: 'R-1', kind: 'resin-batch', fromMetre: undefined },
      ])
    })

    it('opens nothing when one of them can’t be', async () => {
      const refused = (materials: readonly unknown[]) =>
        refusalOf(open('M-2', materials, { lengthMetres: 1000 }))
      expect(
        await refused([
          { role: 'core', code: 'C-1' },
          { role: 'core', code: 'C-99' },
        ]),
      ).toMatchObject({
        code: 'not-found',
        where: 'materials.1.code',
      })
      expect(await refused([{ role: 'core', code: 'R-1' }])).toMatchObject({
        message: 'R-1 is a resin batch and can’t be the wire or core of a lot.',
      })
      expect(await refused([{ role: 'resin', code: 'C-1' }])).toMatchObject({ mend: 'Choose a resin batch.' })
      expect(await refused([{ role: 'core', code: 'C-1', toMetre: 1001 }])).toMatchObject({
        where: 'materials.0.toMetre',
      })
      await setMaterialInActive(works.quality, 'C-2', 1, false)
      expect(await refused([{ role: 'core', code: 'C-2' }])).toMatchObject({
        code: 'bad-input',
        message: 'The coil C-2 is put away.',
      })
      expect(await findLotId(database().read, 'M-2')).toBeUndefined()
    })
  })

  describe('listMaterialsIn', () => {
    const list = (given: object) => listMaterialsIn(works.bench, listMaterialsInSchema.parse(given))

    it('finds by code, name, heat and supplier, whatever the case', async () => {
      await createMaterialIn(
        works.quality,
        'Q-1',
        input({ kind: 'coil', name: 'Bronze 120', heat: 'Zeta 9', supplier: 'Ærø Wire' }),
      )
      for (const search of ['q-1', 'BRONZE', 'zeta', 'ærø'])
        expect((await list({ search })).materials.map(({ code }) => code)).toEqual(['Q-1'])
      expect(await list({ search: 'q-2' })).toEqual({ materials: [], count: 0, page: 1, pages: 1 })
    })

    it('keeps to a kind and to what is in use', async () => {
      await createMaterialIn(works.quality, 'R-2', input({ kind: 'resin-batch' }))
      await setMaterialInActive(works.quality, 'R-2', 1, false)
      const codes = async (given: object) => (await list(given)).materials.map(({ code }) => code)
      expect(await codes({ kind: 'resin-batch' })).toEqual(['R-1', 'R-2'])
      expect(await codes({ kind: 'resin-batch', inUse: 'yes' })).toEqual(['R-1'])
      expect(await codes({ kind: 'resin-batch', inUse: 'no' })).toEqual(['R-2'])
      expect((await listMaterialsInUse(works.bench)).map(({ code }) => code)).not.toContain('R-2')
    })

    it('counts the lots and stays on the last page there is', async () => {
      await open('M-20', [{ role: 'resin', code: 'R-1' }])
      const found = await list({ search: 'R-1', page: 9 })
      expect(found).toMatchObject({ page: 1, pages: 1 })
      expect(found.materials[0]?.lots).toBe(
        await database().read.lotMaterial.count({ where: { materialIn: { code: 'R-1' } } }),
      )
    })

    it('is not for sales', async () => {
      expect(await refusalOf(listMaterialsIn(works.sales, { search: '', page: 1 }))).toMatchObject({
        code: 'not-permitted',
      })
      expect(await refusalOf(listMaterialsInUse(works.sales))).toMatchObject({ code: 'not-permitted' })
    })
  })

  describe('getMaterialIn', () => {
    it('shows the spools wound from a coil, and lots made of it or through them, newest first', async () => {
      await createMaterialIn(works.quality, 'G-1', input({ kind: 'coil' }))
      await createMaterialIn(works.quality, 'G-2', input({ kind: 'spool', parentCode: 'G-1' }))
      await open('M-30', [{ role: 'core', code: 'G-1', fromMetre: 0, toMetre: 700 }])
      await open('M-31', [{ role: 'core', code: 'G-2', fromMetre: 10 }], {
        madeAt: new Date(day(6)).toISOString(),
      })
      const view = await getMaterialIn(works.bench, 'G-1')
      expect(view).toMatchObject({ row: { code: 'G-1' }, spools: [{ code: 'G-2' }], links: 2 })
      expect(view.madeOf).toMatchObject([
        { lotCode: 'M-31', code: 'G-2', fromMetre: 10, toMetre: undefined, state: 'measuring' },
        { lotCode: 'M-30', code: 'G-1', toMetre: 700, productName: 'Larch 254' },
      ])
      expect((await getMaterialIn(works.bench, 'G-2')).madeOf.map(({ lotCode }) => lotCode)).toEqual(['M-31'])
      expect(await refusalOf(getMaterialIn(works.sales, 'G-1'))).toMatchObject({ code: 'not-permitted' })
    })

    it('is on the page of the lot', async () => {
      await open('M-32', [{ role: 'core', code: 'S-1', toMetre: 12 }])
      expect((await getLot(works.bench, 'M-32')).materials).toEqual([
        {
          role: 'core',
          place: 1,
          code: 'S-1',
          name: 'Music wire 254',
          kind: 'spool',
          heat: '',
          parentCode: 'C-1',
          fromMetre: undefined,
          toMetre: 12,
        },
      ])
    })
  })

  describe('changeLotMaterials', () => {
    const change = (lotVersion: number, materials: readonly unknown[]) =>
      changeLotMaterialsSchema.parse({ lotVersion, materials, reason: 'Read from the traveller.' })

    it('says anew what a lot is made of, and keeps what was said before in the ledger', async () => {
      await open('M-3', [{ role: 'core', code: 'C-1' }])
      await changeLotMaterials(works.bench, 'M-3', change(1, [{ role: 'core', code: 'S-1', fromMetre: 5 }]))
      expect(await linksOf('M-3')).toMatchObject([{ code: 'S-1', place: 1, fromMetre: 5 }])
      expect((await ledgerOf('lot M-3')).at(-1)).toEqual({
        verb: 'change-materials',
        body: {
          reason: 'Read from the traveller.',
          before: [{ role: 'core', code: 'C-1' }],
          after: [{ role: 'core', code: 'S-1', fromMetre: 5 }],
        },
      })
      await changeLotMaterials(works.bench, 'M-3', change(2, []))
      expect(await linksOf('M-3')).toEqual([])
    })

    it('refuses what was looked at before somebody else changed the lot', async () => {
      await open('M-4', [])
      await changeLotMaterials(works.bench, 'M-4', change(1, [{ role: 'core', code: 'C-1' }]))
      expect(await refusalOf(changeLotMaterials(works.bench, 'M-4', change(1, [])))).toMatchObject({
        code: 'conflict',
      })
      expect(await linksOf('M-4')).toHaveLength(1)
    })

    it('lets one of two changes of the same moment win', async () => {
      await open('M-5', [])
      const outcomes = await Promise.allSettled([
        changeLotMaterials(works.bench, 'M-5', change(1, [{ role: 'core', code: 'C-1' }])),
        changeLotMaterials(works.otherBench, 'M-5', change(1, [{ role: 'core', code: 'S-1' }])),
      ])
      expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected'])
      expect(await linksOf('M-5')).toHaveLength(1)
    })

    it('keeps what was put away since, but takes nothing new that is', async () => {
      await createMaterialIn(works.quality, 'C-5', input({ kind: 'coil' }))
      await open('M-6', [{ role: 'core', code: 'C-5' }])
      await setMaterialInActive(works.quality, 'C-5', 1, false)
      await changeLotMaterials(works.bench, 'M-6', change(1, [{ role: 'core', code: 'C-5', toMetre: 9 }]))
      expect(await linksOf('M-6')).toMatchObject([{ code: 'C-5', toMetre: 9 }])
      await open('M-7', [])
      expect(
        await refusalOf(changeLotMaterials(works.bench, 'M-7', change(1, [{ role: 'core', code: 'C-5' }]))),
      ).toMatchObject({ where: 'materials.0.code' })
    })

    it('asks quality once the lot is decided', async () => {
      await open('M-8', [])
      await database().write((tx) => tx.lot.update({ where: { code: 'M-8' }, data: { state: 'released' } }))
      const asked = change(1, [{ role: 'core', code: 'C-1' }])
      expect(await refusalOf(changeLotMaterials(works.bench, 'M-8', asked))).toMatchObject({
        code: 'not-permitted',
      })
      await changeLotMaterials(works.quality, 'M-8', asked)
      expect(await linksOf('M-8')).toHaveLength(1)
      expect(await refusalOf(changeLotMaterials(works.sales, 'M-8', asked))).toMatchObject({
        code: 'not-permitted',
      })
    })
  })
})
