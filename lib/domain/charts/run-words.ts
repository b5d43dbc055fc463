import type { ChartSignal } from './staff-chart'

const counts = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
]

const added = { open: '', answered: ', answered', 'no-longer-holds': ', no longer holds' } as const

/** The few words that stand at a slur: "nine above centre", "twelve below centre, answered". */
export function runWords(signal: Pick<ChartSignal, 'members' | 'side' | 'state'>): string {
  const count = counts[signal.members.length] ?? String(signal.members.length)
  return `${count} ${signal.side} centre${added[signal.state]}`
}
