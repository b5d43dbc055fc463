import { massOfWeights } from './equipment'
import { type DemoProduct, specificationFor } from './product'
import { type Random, seededRandom } from './random'
import type { DemoSchedule } from './schedule'
import {
  HARD_TWIN,
  inHardTwin,
  inZeroWeek,
  MISSING_SLOT,
  UNCOUNTED_HOOK,
  UNEVEN_WINDER,
  WIDE_DIE,
  WORN_DIE,
  WRONG_ALLOY,
  ZERO_WEEK,
} from './story-facts'
import { isUneven } from './uneven-lots'

/** What is true of a lot; nobody at the works can see it. SI. */
export interface TrueLot {
  readonly diameter: number
  readonly massPerMetre: number
  /** Tail − head, metres. */
  readonly taper: number
  readonly ovality: number
  readonly celsius: number
  /** Share by which the load pulls less or more than reckoned while this lot is sounded. */
  readonly pull: number
  /** What the zero of the micrometer stands off, metres. */
  readonly zero: number
  /** How much wider than usual its specimens differ. */
  readonly spread: number
  /** What hangs, kilograms: not always what is written down. */
  readonly hangingMass: number
}

const YEAR = 365.25 * 86_400_000

/** Nylon is heaviest in a humid August. */
const dampness = (madeAt: number): number => Math.sin((2 * Math.PI * (madeAt - Date.UTC(2026, 4, 15))) / YEAR)

/** Share by which what is wound or extruded is heavier or lighter than its diameter says. */
function massStory({ season }: DemoProduct, lot: DemoSchedule): number {
  const brass =
    lot.productCode === WRONG_ALLOY.productCode &&
    lot.index >= WRONG_ALLOY.from &&
    lot.index < WRONG_ALLOY.from + WRONG_ALLOY.lots
  return (
    (brass ? WRONG_ALLOY.share : 0) +
    (inHardTwin(lot.machine, lot.day) ? HARD_TWIN.share : 0) +
    (season ? season.share * dampness(lot.madeAt) : 0)
  )
}

/** Metres by which a die, or water, makes the string thicker than drawn at random. */
function diameterStory({ season, specification }: DemoProduct, lot: DemoSchedule): number {
  const worn = lot.dieCode === WORN_DIE.code ? (lot.index - WORN_DIE.from + 1) * WORN_DIE.perLot : 0
  const wide = lot.dieCode === WIDE_DIE.code ? WIDE_DIE.wider : 0
  const swollen = season
    ? season.swells * season.share * dampness(lot.madeAt) * specification.diameter.target
    : 0
  return worn + wide + swollen
}

/** Departures that follow each other: x_i = r x_(i−1) + √(1 − r²) z, from the first lot on. */
function followed(product: DemoProduct, index: number, seed: number): number {
  const { follows } = product.variation
  const random = seededRandom(product.micrometres * 31 + 17 + luckOf(product, seed))
  let value = random.normal(2.5)
  for (let lot = 0; lot < index; lot += 1)
    value = follows * value + Math.sqrt(1 - follows * follows) * random.normal(2.5)
  return value
}

/** Seeds of one lot stay apart from those of the others, whatever the seed of the whole. */
const SEED_STEP = 15_485_863
const STREAM_STEP = 32_452_843

const luckOf = ({ stream = 0 }: DemoProduct, seed: number): number => seed * SEED_STEP + stream * STREAM_STEP

export const randomOf = (product: DemoProduct, lot: DemoSchedule, seed: number): Random =>
  seededRandom(lot.micrometres * 1000 + lot.index + luckOf(product, seed))

function hangingMass(product: DemoProduct, lot: DemoSchedule): number {
  const missing = lot.rig === MISSING_SLOT.rig && lot.day === MISSING_SLOT.day ? MISSING_SLOT.mass : 0
  const hook = lot.rig === UNCOUNTED_HOOK.rig && lot.day >= UNCOUNTED_HOOK.from ? UNCOUNTED_HOOK.mass : 0
  return massOfWeights(product.load) + missing + hook
}

/** The draws of a lot in a fixed order, with what is buried in it on top. */
export function trueLot(product: DemoProduct, lot: DemoSchedule, random: Random, seed: number): TrueLot {
  const { variation } = product
  const target = specificationFor(product, lot.index)
  const drawn = random.normal(2.5)
  const byChance = variation.follows === 0 ? drawn : followed(product, lot.index, seed)
  const moved = variation.diameter * byChance
  const diameter = target.diameter.target + moved + diameterStory(product, lot)
  const [thin, thick] = variation.taper
  const taper = thin + (thick - thin) * random.uniform()
  const mass = variation.mass * random.normal(2)
  const [least, most] = variation.ovality
  // Swelling makes the string thicker and heavier by its own laws; a die makes it heavier as it makes it thicker.
  const swollen = product.season ? diameterStory(product, lot) : 0
  const grown = (diameter - swollen) / target.diameter.target
  return {
    diameter,
    massPerMetre:
      target.massPerMetre.target *
      grown ** (2 * variation.massFollows) *
      (1 + mass) *
      (1 + massStory(product, lot)),
    taper,
    ovality: least + (most - least) * random.uniform(),
    celsius: 20 + random.normal(2) * 0.5,
    pull: variation.pull * random.normal(variation.pullCut),
    zero:
      variation.zero * random.normal(2) +
      (lot.micrometer === ZERO_WEEK.micrometer && inZeroWeek(lot.day) ? ZERO_WEEK.error : 0),
    spread: isUneven(lot) ? UNEVEN_WINDER.times : 1,
    hangingMass: hangingMass(product, lot),
  }
}
