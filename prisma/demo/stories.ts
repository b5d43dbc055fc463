import type { CharacteristicId } from '@/lib/domain/metrology/characteristics'
import type { DemoMachine } from './equipment'
import { demoProducts } from './products'
import { type DemoSchedule, demoSchedule } from './schedule'
import {
  CHANGED_DIE,
  HARD_TWIN,
  inCoarseDays,
  inHardTwin,
  inZeroWeek,
  LATE_LOT,
  MISSING_SLOT,
  MOVED_TARGET,
  NYLON_SEASON,
  OCTAVE,
  SWAPPED_DIGITS,
  UNCOUNTED_HOOK,
  UNEVEN_WINDER,
  WIDE_DIE,
  WORN_DIE,
  WRONG_ALLOY,
  ZERO_WEEK,
} from './story-facts'
import { isUneven } from './uneven-lots'

/** Something that is buried in the demo: a fault to be found, or what looks like one and must not be named so. */
export interface DemoStory {
  readonly key: string
  readonly kind: 'fault' | 'decoy'
  readonly sentence: string
  /** Codes of the products that it touches. */
  readonly products: readonly string[]
  readonly machine: DemoMachine
  readonly rig?: string
  /** Codes of the lots that it touches, in chart order: the first is the lot in which it begins. */
  readonly lots: readonly string[]
  readonly firstLot: string
  readonly lastLot: string
  /** Working days from 0. */
  readonly firstDay: number
  readonly lastDay: number
  /** Size with its unit: metres, kilograms, or a share of the characteristic. */
  readonly amount: number
  readonly unit: 'm' | 'm a lot' | 'kg' | 'share' | 'times'
  /** Where it shows first. */
  readonly characteristic: CharacteristicId
  readonly statistic: 'mean' | 'within-lot-sd'
  /** All that it moves, or might be thought to: of a decoy none of them is to raise a signal. */
  readonly touches: readonly CharacteristicId[]
  /** To which side a fault moves it. */
  readonly side?: 'above' | 'below'
  /**
   * Within how many of its own lots it should have been found (the first is 1); undefined for decoys, of which
   * nothing is to be found.
   */
  readonly foundWithin?: number
  /** By the default charts, or already by a specimen whose two routes do not close. */
  readonly foundBy?: 'charts' | 'closure'
}

interface Told
  extends Omit<
    DemoStory,
    | 'products'
    | 'machine'
    | 'lots'
    | 'firstLot'
    | 'lastLot'
    | 'firstDay'
    | 'lastDay'
    | 'statistic'
    | 'touches'
  > {
  readonly statistic?: DemoStory['statistic']
  readonly touches?: DemoStory['touches']
  readonly has: (lot: DemoSchedule) => boolean
}

const inRun =
  (story: { readonly productCode: string; readonly from: number; readonly lots: number }) =>
  (lot: DemoSchedule): boolean =>
    lot.productCode === story.productCode && lot.index >= story.from && lot.index < story.from + story.lots

const isOne =
  (story: { readonly productCode: string; readonly index: number }) =>
  (lot: DemoSchedule): boolean =>
    lot.productCode === story.productCode && lot.index === story.index

const told: readonly Told[] = [
  {
    key: 'worn-die',
    kind: 'fault',
    sentence: 'Die D-07 wears by 0.05 µm a lot for 70 lots of Larch 254; the next die is 3.5 µm narrower.',
    has: inRun(WORN_DIE),
    amount: WORN_DIE.perLot,
    unit: 'm a lot',
    characteristic: 'diameter',
    side: 'above',
    foundWithin: 24,
    foundBy: 'charts',
  },
  {
    key: 'wide-die',
    kind: 'fault',
    sentence: 'The new die D-279B of Larch 279 draws 1.2 µm wide from its first lot on.',
    has: (lot) => lot.dieCode === WIDE_DIE.code,
    amount: WIDE_DIE.wider,
    unit: 'm',
    characteristic: 'massPerMetreWeighed',
    side: 'above',
    foundWithin: 9,
    foundBy: 'charts',
  },
  {
    key: 'micrometer-zero',
    kind: 'fault',
    sentence: 'The zero of M-14 stands 1.5 µm high for six working days, on every product measured with it.',
    has: (lot) => lot.micrometer === ZERO_WEEK.micrometer && inZeroWeek(lot.day),
    amount: ZERO_WEEK.error,
    unit: 'm',
    characteristic: 'effectiveDensity',
    side: 'below',
    foundWithin: 6,
    foundBy: 'charts',
  },
  {
    key: 'wrong-alloy',
    kind: 'fault',
    sentence: 'Six lots of Rowan 1060 are wound from a spool of brass sold as bronze: −1.81 % in mass.',
    has: inRun(WRONG_ALLOY),
    amount: WRONG_ALLOY.share,
    unit: 'share',
    characteristic: 'massPerMetreWeighed',
    side: 'below',
    foundWithin: 3,
    foundBy: 'charts',
  },
  {
    key: 'hard-twin',
    kind: 'fault',
    sentence: 'A heat drawn too hard feeds 24 lots on the bronze winder: −0.57 % in mass.',
    has: (lot) => inHardTwin(lot.machine, lot.day),
    amount: HARD_TWIN.share,
    unit: 'share',
    characteristic: 'massPerMetreWeighed',
    side: 'below',
    foundWithin: 24,
    foundBy: 'charts',
  },
  {
    key: 'octave',
    kind: 'fault',
    sentence:
      'On one specimen the octave was taken for the fundamental, and kept when the entry check asked.',
    has: isOne(OCTAVE),
    amount: OCTAVE.times,
    unit: 'times',
    characteristic: 'closure',
    foundWithin: 1,
    foundBy: 'closure',
  },
  {
    key: 'swapped-digits',
    kind: 'fault',
    sentence: 'Two digits of a frequency changed places, and were kept when the entry check asked.',
    has: isOne(SWAPPED_DIGITS),
    amount: -0.007,
    unit: 'share',
    characteristic: 'closure',
    foundWithin: 1,
    foundBy: 'closure',
  },
  {
    key: 'missing-slot',
    kind: 'fault',
    sentence: 'For one shift on rig 4 a slot of 0.1 kg is named that does not hang.',
    rig: MISSING_SLOT.rig,
    has: (lot) => lot.rig === MISSING_SLOT.rig && lot.day === MISSING_SLOT.day,
    amount: MISSING_SLOT.mass,
    unit: 'kg',
    characteristic: 'closure',
    foundWithin: 1,
    foundBy: 'closure',
  },
  {
    key: 'uncounted-hook',
    kind: 'fault',
    sentence: 'A hook of 20 g hangs on rig 3 that nobody counts: the closure moves with 1/load.',
    rig: UNCOUNTED_HOOK.rig,
    has: (lot) => lot.rig === UNCOUNTED_HOOK.rig && lot.day >= UNCOUNTED_HOOK.from,
    amount: UNCOUNTED_HOOK.mass,
    unit: 'kg',
    characteristic: 'closure',
    foundWithin: 12,
    foundBy: 'charts',
  },
  {
    key: 'uneven-winder',
    kind: 'fault',
    sentence: 'Specimens of a lot differ half as much again on twelve lots of the bronze winder.',
    has: isUneven,
    amount: UNEVEN_WINDER.times,
    unit: 'times',
    characteristic: 'massPerMetreWeighed',
    side: 'above',
    statistic: 'within-lot-sd',
    foundWithin: 12,
    foundBy: 'charts',
  },
  {
    key: 'nylon-season',
    kind: 'decoy',
    sentence: 'Nylon takes up water with the season, ±0.5 % in mass, and neighbouring lots are alike.',
    has: (lot) => lot.machine === 'EX-1',
    amount: NYLON_SEASON.share,
    unit: 'share',
    characteristic: 'massPerMetreWeighed',
    touches: ['massPerMetreWeighed', 'diameter', 'effectiveDensity'],
  },
  {
    key: 'moved-target',
    kind: 'decoy',
    sentence: 'A specification revision moves diameter and mass of Rowan 810, and its lots follow.',
    has: (lot) => lot.productCode === MOVED_TARGET.productCode && lot.index >= MOVED_TARGET.from,
    amount: MOVED_TARGET.diameter,
    unit: 'm',
    characteristic: 'diameter',
    touches: ['diameter', 'massPerMetreWeighed', 'effectiveDensity'],
  },
  {
    key: 'changed-die',
    kind: 'decoy',
    sentence: 'A die of Larch 330 is changed for one as good.',
    has: (lot) => lot.dieCode === CHANGED_DIE.code,
    amount: 0,
    unit: 'm',
    characteristic: 'diameter',
    touches: ['diameter', 'massPerMetreWeighed'],
  },
  {
    key: 'late-lot',
    kind: 'decoy',
    sentence: 'A lot is entered eight working days late, when later ones are on the charts already.',
    has: isOne(LATE_LOT),
    amount: 0,
    unit: 'share',
    characteristic: 'massPerMetreWeighed',
    touches: ['diameter', 'massPerMetreWeighed', 'closure', 'effectiveDensity'],
  },
  {
    key: 'coarse-micrometer',
    kind: 'decoy',
    sentence:
      'For seven working days a micrometer with steps of 1 µm measures what the drawing machine makes.',
    has: (lot) => inCoarseDays(lot.machine, lot.day),
    amount: 0,
    unit: 'm',
    characteristic: 'diameter',
    touches: ['diameter', 'effectiveDensity'],
  },
]

/** All that is buried, with the lots that it touches. */
export const demoStories: readonly DemoStory[] = told.map(
  ({ has, statistic = 'mean', touches, ...story }) => {
    const lots = demoSchedule().filter(has)
    const [first, last] = [lots[0], lots.at(-1)]
    if (!first || !last) throw new Error(`No lot of the demo has the story ${story.key}.`)
    const codes = new Set(lots.map((lot) => lot.productCode))
    return {
      ...story,
      statistic,
      touches: touches ?? [story.characteristic],
      products: demoProducts.flatMap(({ code }) => (codes.has(code) ? [code] : [])),
      machine: first.machine,
      lots: lots.map((lot) => lot.code),
      firstLot: first.code,
      lastLot: last.code,
      firstDay: first.day,
      lastDay: last.day,
    }
  },
)
