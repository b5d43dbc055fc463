import type { SpecimenSheet } from '@/lib/domain/metrology/sheet'
import type { BenchView } from './bench-view'
import type { Delivery } from './use-bench'

export type SendOutcome = Delivery

interface Outgoing {
  readonly requestId: string
  readonly specimenId: string
  readonly readingId: string
  readonly number: number
  readonly sheet: SpecimenSheet
}

interface ProblemReply {
  readonly message?: string
  readonly mend?: string
}

const sentence = (reply: ProblemReply): string =>
  [reply.message ?? 'The server refused it without saying why.', reply.mend].filter(Boolean).join(' ')

/**
 * Posts one specimen. The same request id always gives the same stored reply, so this may be repeated
 * after any silence. A refusal is final; silence, overload and an ended session leave it waiting.
 */
export async function sendSpecimen(view: BenchView, outgoing: Outgoing): Promise<SendOutcome> {
  const { equipment, lot } = view
  let response: Response
  try {
    response = await fetch('/api/v1/specimens', {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify({
        requestId: outgoing.requestId,
        lotCode: lot.code,
        specimen: { clientId: outgoing.specimenId, number: outgoing.number },
        reading: { clientId: outgoing.readingId, sheet: outgoing.sheet, equipment },
      }),
    })
  } catch {
    return {
      state: 'waits',
      message: 'The server was not reached. It is kept on this device and tried again.',
    }
  }
  const reply: unknown = await response.json().catch(() => ({}))
  const text = sentence(typeof reply === 'object' && reply !== null ? (reply as ProblemReply) : {})
  if (response.ok) return { state: 'stored', at: new Date().toISOString() }
  if (response.status === 401)
    return { state: 'waits', message: 'Your session has ended. Sign in again; it is kept on this device.' }
  if (response.status === 503 || response.status === 429) return { state: 'waits', message: text }
  return { state: 'refused', message: text }
}
