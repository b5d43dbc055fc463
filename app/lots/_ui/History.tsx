import Link from 'next/link'
import { formatDateTime } from '@/app/_ui/format/dates'
import type { DispositionVerb } from '@/lib/domain/quality/propose-disposition'
import type { HistoryEntry, LotView } from '@/lib/services/get-lot'
import { verbWords } from '../state-words'

const words: Readonly<Record<string, string>> = {
  'open-lot': 'Opened',
  'record-specimens': 'Measured',
  'supersede-reading': 'Corrected',
  'change-materials': 'Made of',
  'import-rows': 'From a file',
  'answer-signal': 'Signal answered',
}

const verbOf = (entry: HistoryEntry): string => {
  const decided = /^decide-(.+)$/.exec(entry.verb)?.[1]
  if (decided) return verbWords[decided as DispositionVerb]?.name ?? decided
  return words[entry.verb] ?? entry.verb.replaceAll('-', ' ')
}

/** Codes of the coils, spools and batches that an entry names, each once. */
const codesOf = (materials: unknown): string =>
  Array.isArray(materials)
    ? [
        ...new Set(
          materials.flatMap((one: unknown): string[] =>
            typeof one === 'object' && one !== null && 'code' in one ? [String(one.code)] : [],
          ),
        ),
      ].join(', ')
    : ''

function textOf({ body, verb }: HistoryEntry): string {
  const text = (key: string): string => (typeof body[key] === 'string' ? (body[key] as string) : '')
  if (verb === 'open-lot')
    return [
      text('productCode'),
      body.revision ? `specification revision ${body.revision}` : '',
      text('machineCode'),
      text('dieCode'),
      codesOf(body.materials),
    ]
      .filter(Boolean)
      .join(', ')
  if (verb === 'change-materials')
    return `${codesOf(body.after) || 'nothing named'}, before that ${codesOf(body.before) || 'nothing'}: “${text('reason')}”`
  if (verb === 'answer-signal') return [text('cause'), text('answer')].filter(Boolean).join(': ')
  if (verb.startsWith('decide-')) return `“${text('reason')}”`
  if (text('reason')) return `“${text('reason')}”`
  const { specimens } = body
  if (Array.isArray(specimens)) {
    const numbers = specimens.flatMap((one: unknown): string[] =>
      typeof one === 'number'
        ? [String(one)]
        : typeof one === 'object' && one !== null && 'number' in one
          ? [String((one as { number: unknown }).number)]
          : [],
    )
    return numbers.length > 0 ? `specimens ${numbers.join(', ')}` : ''
  }
  return ''
}

/** What the ledger says of this lot, oldest first. */
export function History({ view }: { readonly view: LotView }) {
  return (
    <section className="section">
      <h2>What happened</h2>
      <ol className="lots-history">
        {view.history.map((entry) => (
          <li key={entry.sequence}>
            <time dateTime={new Date(entry.at).toISOString()}>
              {formatDateTime(entry.at, view.works.timeZone)}
            </time>
            <b>{verbOf(entry)}</b>
            <span>
              {entry.verb === 'import-rows' ? (
                <Link href={`/lots/import/${entry.subject.replace('import ', '')}`}>{entry.subject}</Link>
              ) : (
                textOf(entry)
              )}
            </span>
            <span className="who">{entry.person ?? ''}</span>
          </li>
        ))}
      </ol>
    </section>
  )
}
