import { type CharacteristicId, characteristics } from '@/lib/domain/metrology/characteristics'
import {
  type ClosureVerdict,
  COVERAGE_FACTOR,
  closureVerdict,
  normalisedError,
} from '@/lib/domain/metrology/closure'
import { evaluateSpecimen } from '@/lib/domain/metrology/evaluate-specimen'
import type { SpecimenEvaluation } from '@/lib/domain/metrology/evaluation'
import { judgeLot, type LotJudgement } from '@/lib/domain/quality/judge-lot'
import { judgeSpecimen } from '@/lib/domain/quality/judge-specimen'
import { summariseLot } from '@/lib/domain/quality/lot-summary'
import { guardFactorOf, limitsOf, tolerancedCharacteristics } from '@/lib/domain/quality/tolerances'
import { loadBearingSection } from '@/lib/domain/strings/load-bearing'
import { noteName } from '@/lib/domain/strings/pitch'
import { breakingLoad, tensileStrengthAt } from '@/lib/domain/strings/strength'
import { decimalsForUncertainty, formatNumber, formatQuantity } from '@/lib/domain/units/format'
import { differenceFromSi, fromSi, type UnitId } from '@/lib/domain/units/unit'
import { benchFields, cellKey } from '@/lib/input/bench-cells'
import { fieldRules, sheetOf } from './bench-core'
import type { BenchView } from './bench-view'
import type { DraftValue } from './draft-store'
import type { Delivery } from './use-bench'

type Values = Readonly<Record<string, DraftValue>>

/** Marks of `VerdictMark`. */
export type Mark = 'within' | 'near' | 'beyond' | 'waiting'

export interface ResultRow {
  readonly id: CharacteristicId
  readonly label: string
  readonly unit: string
  readonly values: readonly (string | undefined)[]
  readonly mean?: string
  readonly expanded?: string
  readonly plan: string
  readonly verdict?: { readonly mark: Mark; readonly word: string }
}

export interface LiveLot {
  readonly evaluations: readonly (SpecimenEvaluation | undefined)[]
  readonly rows: readonly ResultRow[]
  readonly headline: { readonly mark: Mark; readonly text: string; readonly tone: string }
  readonly nextAction: { readonly text: string; readonly more?: string }
  readonly missing: readonly { readonly who: string; readonly what: string }[]
  readonly caution: { readonly title: string; readonly text: string }
  readonly finished: boolean
}

const shownRows = [
  'diameter',
  'ovality',
  'massPerMetreWeighed',
  'massPerMetreSounded',
  'closure',
  'effectiveDensity',
  'tension',
  'pitchError',
] as const satisfies readonly CharacteristicId[]

interface Display {
  readonly label: string
  readonly unit: UnitId
  /** Decimals of a specimen's value. */
  readonly decimals: number
}

function displayOf(view: BenchView, id: CharacteristicId): Display {
  const { reference, tension } = view.context.specification
  const { units } = view
  const force = units.force as UnitId
  const massPerLength = units.massPerLength as UnitId
  const small: UnitId = units.diameter === 'in' || units.diameter === 'thou' ? 'thou' : 'µm'
  const name = characteristics[id].name
  switch (id) {
    case 'diameter':
    case 'ovality':
      return { label: name, unit: small, decimals: small === 'thou' ? 3 : 1 }
    case 'massPerMetreWeighed':
    case 'massPerMetreSounded':
      return { label: name, unit: massPerLength, decimals: massPerLength === 'g/m' ? 4 : 1 }
    case 'closure':
      return { label: name, unit: '%', decimals: 2 }
    case 'effectiveDensity':
      return { label: name, unit: 'kg/m³', decimals: 0 }
    case 'tension':
      return {
        label: `Tension, ${noteName(reference.midi)} on ${formatQuantity(reference.length, 'mm', { decimals: 0 })} mm`,
        unit: force,
        decimals: 2,
      }
    default:
      return {
        label: `Pitch error at ${formatQuantity(tension.target, force, { decimals: 1, withUnit: true })}`,
        unit: 'cents',
        decimals: 1,
      }
  }
}

const signed = (id: CharacteristicId): 'always' | 'negative' =>
  id === 'closure' || id === 'pitchError' ? 'always' : 'negative'

/** The tolerance in words: target ± when it is even, else from – to. */
function planText(view: BenchView, id: CharacteristicId, display: Display): string {
  const limits = limitsOf(view.context.specification, id)
  const show = (si: number, decimals = display.decimals): string =>
    formatQuantity(si, display.unit, { decimals, decimal: view.decimal })
  if (!limits) return id === 'closure' ? 'within U' : ''
  const { lower, upper } = limits
  if (lower === undefined) return upper === undefined ? '' : `at most ${show(upper)}`
  if (upper === undefined) return `at least ${show(lower)}`
  const target = (lower + upper) / 2
  return `${show(target)} ± ${formatNumber(differenceFromSi(upper - target, display.unit), { decimals: display.decimals, decimal: view.decimal })}`
}

const conformityMark: Readonly<Record<LotJudgement['verdict'], Mark>> = {
  inside: 'within',
  'not proven': 'near',
  outside: 'beyond',
}

const closureMark: Readonly<Record<ClosureVerdict, Mark>> = {
  closed: 'within',
  doubtful: 'near',
  open: 'beyond',
}

export function liveLot(
  view: BenchView,
  values: Values,
  setUp: Values,
  delivery: Readonly<Record<number, Delivery>>,
): LiveLot {
  const { specification } = view.context
  const numbers = Array.from({ length: view.plan.specimens }, (_, index) => index + 1)
  const hasAny = (specimen: number): boolean =>
    benchFields(view.plan).some((field) => !field.setUp && values[cellKey(specimen, field.id)] !== undefined)
  const evaluations = numbers.map((specimen) =>
    hasAny(specimen) ? evaluateSpecimen(sheetOf(view, values, setUp, specimen), view.context) : undefined,
  )
  const judgements: LotJudgement[] = []
  let closure: ClosureVerdict | undefined
  const rows = shownRows.map((id): ResultRow => {
    const display = displayOf(view, id)
    const estimates = evaluations.flatMap((one) => one?.results[id] ?? [])
    const summary = summariseLot(estimates)
    const limits = limitsOf(specification, id)
    const k = view.plan.acceptanceConstant
    let verdict: ResultRow['verdict']
    if (summary && id === 'closure') {
      closure = closureVerdict(summary.mean, summary.uMean)
      verdict = { mark: closureMark[closure], word: closure }
    } else if (summary && limits) {
      // While specimens are missing the spread is not judged: the mean alone says how it stands so far.
      const judgement = judgeLot(id, summary, limits, guardFactorOf(specification, id), k)
      const soFar =
        summary.n < view.plan.specimens
          ? judgeSpecimen({ value: summary.mean, u: summary.uMean }, limits, judgement.guardFactor)
          : judgement.verdict
      judgements.push({ ...judgement, verdict: soFar })
      verdict = { mark: conformityMark[soFar], word: soFar }
    }
    const expandedSi = summary && COVERAGE_FACTOR * summary.uMean
    const shownU = expandedSi === undefined ? undefined : differenceFromSi(expandedSi, display.unit)
    const needed = shownU === undefined ? undefined : decimalsForUncertainty(shownU)
    const lotDecimals = Math.max(0, Math.min(needed ?? display.decimals, display.decimals))
    return {
      id,
      label: display.label,
      unit: display.unit,
      values: evaluations.map((one) => {
        const estimate = one?.results[id]
        if (!one) return undefined
        return estimate
          ? formatQuantity(estimate.value, display.unit, {
              decimals: display.decimals,
              decimal: view.decimal,
              sign: signed(id),
            })
          : undefined
      }),
      ...(summary
        ? {
            mean: formatQuantity(summary.mean, display.unit, {
              decimals: lotDecimals,
              decimal: view.decimal,
              sign: signed(id),
            }),
            // An uncertainty below the last digit shown is left out rather than printed as zero.
            ...(shownU !== undefined && Number(shownU.toFixed(lotDecimals)) > 0
              ? { expanded: formatNumber(shownU, { decimals: lotDecimals, decimal: view.decimal }) }
              : {}),
          }
        : {}),
      plan: planText(view, id, display),
      ...(verdict ? { verdict } : {}),
    }
  })
  const missing = missingOf(view, values, delivery)
  const finished = numbers.every((specimen) => delivery[specimen]?.state === 'stored')
  return {
    evaluations,
    rows,
    missing,
    finished,
    headline: headlineOf(judgements, closure, numbers.length, evaluations),
    nextAction: nextActionOf(view, values, judgements, closure, evaluations, finished),
    caution: cautionOf(view, evaluations),
  }
}

const toleranced = new Set<CharacteristicId>(tolerancedCharacteristics)

function headlineOf(
  judgements: readonly LotJudgement[],
  closure: ClosureVerdict | undefined,
  planned: number,
  evaluations: readonly (SpecimenEvaluation | undefined)[],
): LiveLot['headline'] {
  const judged = judgements.filter((one) => toleranced.has(one.id))
  if (judged.length === 0) return { mark: 'waiting', text: 'Nothing measured yet', tone: 'slate' }
  const names = (list: readonly LotJudgement[]): string =>
    list.map((one) => characteristics[one.id].name.toLowerCase()).join(', ')
  const outside = judged.filter((one) => one.verdict === 'outside')
  if (outside.length > 0)
    return { mark: 'beyond', text: `Outside tolerance: ${names(outside)}`, tone: 'vermilion' }
  if (closure === 'open')
    return { mark: 'beyond', text: 'The two routes disagree: closure open', tone: 'vermilion' }
  const unproven = judged.filter((one) => one.verdict === 'not proven')
  if (unproven.length > 0)
    return { mark: 'near', text: `Not proven inside: ${names(unproven)}`, tone: 'brass' }
  const done = evaluations.filter((one) => one?.results.closure).length
  return {
    mark: 'within',
    text: done < planned ? 'Inside tolerance so far' : 'Inside tolerance',
    tone: 'verdigris',
  }
}

const stationWords: Readonly<Record<string, string>> = {
  micrometer: 'Go to the micrometer',
  balance: 'Go to the balance',
  rig: 'Go to the rig',
}

function nextActionOf(
  view: BenchView,
  values: Values,
  judgements: readonly LotJudgement[],
  closure: ClosureVerdict | undefined,
  evaluations: readonly (SpecimenEvaluation | undefined)[],
  finished: boolean,
): LiveLot['nextAction'] {
  const open = evaluations.findIndex((one) => {
    const estimate = one?.results.closure
    return estimate !== undefined && closureVerdict(estimate.value, estimate.u) === 'open'
  })
  if (open >= 0) {
    const estimate = evaluations[open]?.results.closure
    const error = estimate ? normalisedError(estimate.value, estimate.u) : 0
    return {
      text: `Sound specimen ${open + 1} again, then weigh it again.`,
      more: `Weighing and sounding disagree by ${formatNumber(Math.abs(error), { decimals: 1 })} times what their uncertainty allows. Check load, span and the octave first.`,
    }
  }
  const order = benchFields(view.plan).filter((field) => !field.setUp)
  for (const station of ['micrometer', 'balance', 'rig'] as const)
    for (let specimen = 1; specimen <= view.plan.specimens; specimen += 1) {
      const field = order.find(
        (one) => one.station === station && values[cellKey(specimen, one.id)] === undefined,
      )
      if (!field) continue
      const end = view.plan.takenAt[specimen - 1]
      return {
        text: `${stationWords[station] ?? ''}: specimen ${specimen}, ${field.label.toLowerCase()}.`,
        ...(end ? { more: `Specimen ${specimen} is cut from the ${end} of the lot.` } : {}),
      }
    }
  if (!finished) return { text: 'All is typed. Sending.' }
  if (judgements.some((one) => one.verdict === 'outside'))
    return {
      text: 'Stop and call quality: the lot is outside tolerance.',
      more: 'Keep the machine as it is until somebody has looked.',
    }
  if (closure === 'doubtful')
    return {
      text: 'The routes agree only just. Sound one specimen again.',
      more: 'Quality decides on the lot.',
    }
  return { text: 'Done. The lot waits for quality.', more: 'The machine may go on.' }
}

function missingOf(
  view: BenchView,
  values: Values,
  delivery: Readonly<Record<number, Delivery>>,
): LiveLot['missing'] {
  const words: Readonly<Record<string, string>> = {
    micrometer: 'diameter',
    balance: 'weighing',
    rig: 'sounding',
  }
  const parts = Array.from({ length: view.plan.specimens }, (_, index) => index + 1).flatMap((specimen) => {
    if (delivery[specimen]?.state === 'stored') return []
    const stations = new Set(
      benchFields(view.plan)
        .filter((field) => !field.setUp && values[cellKey(specimen, field.id)] === undefined)
        .map((field) => words[field.station] ?? ''),
    )
    return stations.size > 0 ? [{ specimen, what: [...stations].join(', ') }] : []
  })
  const groups = new Map<string, number[]>()
  for (const { specimen, what } of parts) groups.set(what, [...(groups.get(what) ?? []), specimen])
  return [...groups].map(([what, specimens]) => ({
    what,
    who: `${specimens.length === 1 ? 'Specimen' : 'Specimens'} ${specimens.join(', ')}`,
  }))
}

/** The load on the rig against the least that breaks the string, with the usual cautions. */
function cautionOf(
  view: BenchView,
  evaluations: readonly (SpecimenEvaluation | undefined)[],
): LiveLot['caution'] {
  const { material, rig, specification, weights, gravity } = view.context
  const bearing = loadBearingSection(specification.core, specification.diameter.target)
  const strength = tensileStrengthAt(material, bearing.size)
  const breaking = strength && breakingLoad(strength.low, bearing.area)
  const hung = weights
    .filter((one) => one.code === rig?.hangerCode || rig?.weightCodes.includes(one.code))
    .reduce((sum, one) => sum + one.mass.value, 0)
  const force = evaluations.find((one) => one?.steps.force !== undefined)?.steps.force ?? hung * gravity.value
  const care =
    'Eye protection on, hands and feet clear of the weights, guard closed before sounding. Release the load before cutting. Local rules and qualified people come first.'
  if (!breaking || !(force > 0)) return { title: 'A loaded string can whip', text: care }
  const fraction = force / breaking
  const shown = (newtons: number): string =>
    formatQuantity(newtons, view.units.force as UnitId, { decimals: 1, withUnit: true })
  return {
    title: `Loaded to ${formatNumber(fraction, { decimals: 2 })} of the least breaking load`,
    text:
      fraction > 0.85
        ? `Do not hang it: ${shown(force)} is more than 0.85 of the ${shown(breaking)} at which this string may break. ${care}`
        : `${shown(force)} on a string that may break at ${shown(breaking)}. ${fraction > 0.75 ? 'This is high: stand aside. ' : ''}${care}`,
  }
}

export interface SoFar {
  /** Where the readings lie in what the plan allows: 0 at its lower end, 1 at its upper, beyond on either side. */
  readonly shares: readonly number[]
}

/** The readings of one row so far, against what the plan leads one to expect. */
export function soFarOf(view: BenchView, values: Values, fieldId: string): SoFar | undefined {
  const { diameter, massPerMetre } = view.context.specification
  const range =
    fieldId === 'cutMass'
      ? { lower: massPerMetre.lower * view.plan.cutLength, upper: massPerMetre.upper * view.plan.cutLength }
      : fieldId.startsWith('d')
        ? diameter
        : undefined
  if (!range) return undefined
  const shares = Array.from({ length: view.plan.specimens }, (_, index) => {
    const value = values[cellKey(index + 1, fieldId)]
    return value ? [(value.si - range.lower) / (range.upper - range.lower)] : []
  }).flat()
  return shares.length === 0 ? undefined : { shares }
}

/** What the plan column says beside each reading. */
export function planTextsOf(view: BenchView): Readonly<Record<string, string>> {
  const { diameter, massPerMetre } = view.context.specification
  const texts: Record<string, string> = {}
  for (const field of benchFields(view.plan)) {
    const rules = fieldRules(view, field.id)
    const show = (si: number): string =>
      formatQuantity(si, rules.unit, { decimals: rules.decimals, decimal: view.decimal })
    if (field.station === 'micrometer') texts[field.id] = `${show(diameter.lower)} – ${show(diameter.upper)}`
    if (field.id === 'cutMass') texts[field.id] = `about ${show(massPerMetre.target * view.plan.cutLength)}`
    if (field.id === 'cutLength') texts[field.id] = 'by the plan'
    if (field.id === 'span' && view.context.rig) texts[field.id] = `rig ${view.context.rig.code}`
    if (field.id === 'temperature') texts[field.id] = 'of the room'
  }
  return texts
}

export function setUpFieldsOf(view: BenchView, setUp: Values) {
  return benchFields(view.plan)
    .filter((field) => field.setUp)
    .map((field) => {
      const { decimals, unit } = fieldRules(view, field.id)
      const value = setUp[field.id]
      return {
        id: field.id,
        label: field.label,
        unit,
        shown: value ? formatNumber(fromSi(value.si, unit), { decimals, decimal: view.decimal }) : '',
      }
    })
}
