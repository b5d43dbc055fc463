import { sigmasText, valueText } from './readout'
import type { ChartNote, StaffChart, StaveModel } from './staff-chart'

/** More than these of one kind would be a litany; the table and the files have them all. */
const MOST_TOLD = 12

/** The newest of many, and how many more there are. */
function told(texts: readonly string[], between: string, rest: (more: number) => string): string {
  const more = texts.length - MOST_TOLD
  return [...(more > 0 ? [rest(more)] : []), ...texts.slice(-MOST_TOLD)].join(between)
}

const count = (many: number, one: string): string => `${many} ${one}${many === 1 ? '' : 's'}`

function staveSentences(stave: StaveModel, chart: StaffChart): string[] {
  const text = (value: number): string => valueText(value, stave, chart)
  const newest = stave.segments.at(-1)
  const last = stave.notes.at(-1)
  const beyond = stave.notes.filter((note) => note.beyond)
  const limits =
    newest?.upper === undefined
      ? (stave.withoutLimits ?? 'no limits')
      : newest.lower === undefined
        ? `limit set ${newest.number}, at most ${text(newest.upper)}`
        : `limit set ${newest.number}, ${text(newest.lower)} to ${text(newest.upper)}`
  const where = (note: ChartNote): string => `${note.code} ${text(note.value)}`
  return [
    `${stave.label}, ${stave.unitLabel}: ${limits}${newest?.provisional ? ', provisional' : ''}.`,
    ...(last
      ? [`Last lot ${where(last)}${last.sigmas === undefined ? '' : `, ${sigmasText(last.sigmas, chart)}`}.`]
      : ['No values.']),
    ...(beyond.length > 0
      ? [`Beyond the limits: ${told(beyond.map(where), ', ', (more) => `${count(more, 'earlier lot')}`)}.`]
      : []),
    ...(stave.slurs.length === 0
      ? []
      : [
          told(
            stave.slurs.map(({ sentence, state }) =>
              state === 'open'
                ? sentence
                : `${sentence} (${state === 'answered' ? 'answered' : 'no longer holds'})`,
            ),
            ' ',
            (more) => `${count(more, 'earlier run')}.`,
          ),
        ]),
  ]
}

/** The chart in words, for those who do not see it and for the picture's description. */
export function describeStaffChart(chart: StaffChart): string {
  const { from, to } = chart.window
  const [first, last] = [chart.lots[from], chart.lots[to]]
  if (!first || !last) return `${chart.title}: no lots yet.`
  const range =
    first === last
      ? `One lot, ${first.code}`
      : `${count(to - from + 1, 'lot')}, ${first.code} to ${last.code}`
  const bars = chart.barLines.map(
    ({ atIndex, reason }) => `${reason} before ${chart.lots[atIndex]?.code ?? ''}`,
  )
  return [
    `${range}; ${count(chart.staves.length, 'characteristic')}.`,
    ...chart.staves.flatMap((stave) => staveSentences(stave, chart)),
    ...(bars.length > 0 ? [`Changes: ${told(bars, '; ', (more) => count(more, 'earlier change'))}.`] : []),
  ].join(' ')
}
