import { recordSpecimens } from '@/lib/services/record-specimens'
import { day, fiveAbout, openSteelLot, requestOf, type SteelWorks } from './steel-works'

const calm = [0, 3, -2, 4, -4, 1, -1, 2, -3, 0]

/** Diameters of lots in tenths of a micrometre about 2540: a calm process with a spread between lots. */
export const calmTenths = (count: number): readonly number[] =>
  Array.from({ length: count }, (_, index) => 2540 + (calm[index % calm.length] ?? 0))

/** Opens and measures a lot of five specimens, made on a day and measured two hours later. */
export async function measureLot(
  works: SteelWorks,
  code: string,
  made: number,
  tenths: number,
): Promise<void> {
  await openSteelLot(works.bench, code, made)
  await recordSpecimens(works.bench, requestOf(code, fiveAbout(tenths)), day(made) + 7_200_000)
}

/** Lots L-1, L-2, … on the days 1, 2, … */
export async function measureLots(works: SteelWorks, tenths: readonly number[], first = 1): Promise<void> {
  for (const [index, value] of tenths.entries())
    await measureLot(works, `L-${first + index}`, first + index, value)
}
