import { findUnit, type UnitId } from '@/lib/domain/units/unit'

/** Columns that hold a word or a code. */
export const wordColumns = [
  'lot',
  'product',
  'made_at',
  'machine',
  'die',
  'coil',
  'spool',
  'maker',
  'specification',
  'specimen',
  'taken_at',
  'measured_at',
  'measurer',
  'rig',
  'micrometer',
  'balance',
  'rule',
  'counter',
  'weights',
  'weighed_state',
  'note',
] as const

export type WordColumn = (typeof wordColumns)[number]

/** Columns that hold a value with a unit in their name. */
const bases = {
  lot_length: ['length'],
  cut_length: ['length'],
  cut_mass: ['mass'],
  load: ['mass', 'force'],
  span: ['length'],
  frequency: ['frequency'],
  temperature: ['temperature'],
  pressure: ['pressure'],
  humidity: ['fraction'],
} as const

export type ValueBase = keyof typeof bases

/** Readings that the format knows and nothing computes from yet: they are kept as notes, word for word. */
const keptAsNotes =
  /^(?:span2|pulse_length)_(?:mm|um|in|thou|m)$|^frequency2_hz$|^pulse_trips$|^pulse_time_(?:s|ms)$/

export type BenchColumn =
  | { readonly kind: 'word'; readonly id: WordColumn }
  | { readonly kind: 'value'; readonly base: ValueBase; readonly unit: UnitId }
  | {
      readonly kind: 'diameter'
      readonly position: number
      readonly direction: 'a' | 'b'
      readonly unit: UnitId
    }
  | { readonly kind: 'note' }
  | { readonly kind: 'left-out' }

/** How the file writes units that need more than plain letters. */
const spelled: Readonly<Record<string, string>> = {
  um: 'um',
  c: '°C',
  f: '°F',
  k: 'K',
  hz: 'Hz',
  n: 'N',
  hpa: 'hPa',
  pa: 'Pa',
  percent: '%',
}

const unitOf = (dimensions: readonly string[], suffix: string): UnitId | undefined => {
  for (const dimension of [
    'length',
    'mass',
    'force',
    'frequency',
    'temperature',
    'pressure',
    'fraction',
  ] as const) {
    if (!dimensions.includes(dimension)) continue
    const known = Object.hasOwn(spelled, suffix)
    const unit = findUnit(dimension, known ? (spelled[suffix] ?? suffix) : suffix)
    if (unit !== undefined && (known || plainSuffixes.has(suffix))) return unit
  }
  return undefined
}

const plainSuffixes = new Set(['mm', 'm', 'in', 'thou', 'g', 'mg', 'kg', 'kgf', 'lbf'])

const isWord = (name: string): name is WordColumn => (wordColumns as readonly string[]).includes(name)

/**
 * The column that a name of the bench file stands for; undefined for a name the format does not know. Fixed names
 * come first, then a base name with a unit of its dimension: `cut_mass_g`, `d2b_thou`, `load_lbf`. `as-note` and
 * `leave-out` are what a person chooses for columns that mean nothing here.
 */
export function benchColumn(name: string): BenchColumn | undefined {
  if (isWord(name)) return { kind: 'word', id: name }
  if (name === 'as-note') return { kind: 'note' }
  if (name === 'leave-out' || name === 'refused_because') return { kind: 'left-out' }
  if (keptAsNotes.test(name)) return { kind: 'note' }
  const diameter = /^d([1-9]\d?)([ab])_([a-z]+)$/.exec(name)
  if (diameter) {
    const unit = unitOf(['length'], diameter[3] ?? '')
    return (
      unit && {
        kind: 'diameter',
        position: Number(diameter[1]),
        direction: diameter[2] === 'b' ? 'b' : 'a',
        unit,
      }
    )
  }
  const value = /^([a-z_]+)_([a-z]+)$/.exec(name)
  const base = value?.[1]
  if (base === undefined || !isBase(base)) return undefined
  const unit = unitOf(bases[base], value?.[2] ?? '')
  return unit && { kind: 'value', base, unit }
}

const isBase = (text: string): text is ValueBase => Object.hasOwn(bases, text)

/** Names to offer when a foreign column is mapped: every word column, every value with its usual units. */
export function offeredNames(positions: number): readonly string[] {
  const diameters = Array.from({ length: positions }, (_, index) => index + 1).flatMap((position) =>
    ['a', 'b'].flatMap((direction) =>
      ['mm', 'um', 'in', 'thou'].map((unit) => `d${position}${direction}_${unit}`),
    ),
  )
  return [
    ...wordColumns,
    ...diameters,
    ...['mm', 'm', 'in'].map((unit) => `cut_length_${unit}`),
    ...['mg', 'g'].map((unit) => `cut_mass_${unit}`),
    ...['kg', 'g', 'n', 'kgf', 'lbf'].map((unit) => `load_${unit}`),
    ...['mm', 'm', 'in'].map((unit) => `span_${unit}`),
    'frequency_hz',
    'lot_length_m',
    ...['c', 'f', 'k'].map((unit) => `temperature_${unit}`),
    ...['hpa', 'pa'].map((unit) => `pressure_${unit}`),
    'humidity_percent',
  ]
}

/** What a foreign header probably means, by its letters alone: `D1A [mm]` is `d1a_mm`. Undefined when nothing fits. */
export function likelyName(header: string): string | undefined {
  const plain = header
    .trim()
    .toLowerCase()
    .replaceAll('µ', 'u')
    .replaceAll('μ', 'u')
    .replaceAll('°', '')
    .replaceAll('%', 'percent')
    .replace(/[\s()[\]./:-]+/g, '_')
    .replace(/^_+|_+$/g, '')
  return benchColumn(plain) ? plain : undefined
}
