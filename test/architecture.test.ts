import { describe, expect, it } from 'vitest'
import { importsOf, objection } from './support/import-table'
import { keptFiles, textOf } from './support/source-files'

const sources = keptFiles().filter((path) => /\.(ts|tsx|mjs)$/.test(path) && !path.startsWith('test/'))

describe('imports', () => {
  it('go where the table of DEVELOPERS.md lets them', () => {
    const objections = sources.flatMap((file) =>
      importsOf(file, textOf(file)).flatMap((one) => {
        const why = objection(file, one)
        return why === undefined ? [] : [`${file} imports ${one.said}: ${why}`]
      }),
    )
    expect(objections).toEqual([])
    expect(sources.length).toBeGreaterThan(400)
  })

  it.each([
    ['lib/domain/units/parse.ts', "import { readFileSync } from 'node:fs'"],
    ['lib/domain/units/parse.ts', "import type { Lot } from '@/lib/data/lots'"],
    ['lib/domain/units/parse.ts', "import { meanOf } from '../control/individuals-chart'"],
    ['lib/domain/charts/svg.ts', "import { useState } from 'react'"],
    ['lib/input/lot.ts', "import { findLot } from '@/lib/data/lots'"],
    ['lib/input/lot.ts', "export { permit } from '../access/permit'"],
    ['lib/data/lots.ts', "import { getLot } from '@/lib/services/get-lot'"],
    ['lib/output/csv.ts', "const lots = await import('@/lib/data/lots')"],
    ['lib/access/permit.ts', "import { getLot } from '@/lib/services/get-lot'"],
    ['lib/services/get-lot.ts', "import { roomPage } from '@/app/_page'"],
    ['lib/services/get-lot.ts', "import { revalidatePath } from 'next/cache'"],
    ['lib/services/get-lot.ts', "import { PrismaClient } from '@prisma/client'"],
    ['app/lots/page.tsx', "import type {\n  Tx,\n} from '@/lib/data/database'"],
    ['app/lots/page.tsx', "import { csvText } from '../../lib/output/csv'"],
    ['app/lots/page.tsx', "import { PrismaClient } from '@/lib/data/generated/sqlite/client'"],
    ['prisma/demo/schedule.ts', "import { useMemo } from 'react'"],
  ])('are refused: in %s, %s', (file, text) => {
    const [found, ...rest] = importsOf(file, text)
    expect(rest).toEqual([])
    expect(found && objection(file, found)).toEqual(expect.any(String))
  })

  it.each([
    ['lib/domain/control/find-signals.ts', "import { sum } from '../statistics/mean'"],
    ['lib/services/get-lot.ts', "import { database } from '@/lib/data/database'"],
    ['app/lots/page.tsx', "import Link from 'next/link'"],
    [
      'lib/domain/units/parse.ts',
      "// import { readFileSync } from 'node:fs'\nimport { ok } from '../result'",
    ],
  ])('are accepted: in %s, %s', (file, text) => {
    const [found, ...rest] = importsOf(file, text)
    expect(rest).toEqual([])
    expect(found && objection(file, found)).toBeUndefined()
  })
})
