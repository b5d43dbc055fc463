import { describe, expect, test } from 'vitest'
import type { Actor, Role } from '@/lib/access/actor'
import { roles } from '@/lib/access/actor'
import { may, permit } from '@/lib/access/permit'
import { rights, type Verb, verbs } from '@/lib/access/rights'
import { LedgerlineError } from '@/lib/domain/errors'

const actor = (...held: Role[]): Actor => ({ personId: 7, name: 'T. Aldous', roles: held })

const refusal = (who: Actor | undefined, verb: Verb) => {
  try {
    permit(who, verb)
  } catch (error) {
    if (error instanceof LedgerlineError) return error.problem
    throw error
  }
  return undefined
}

/** Written out again from the works' rules, so that a slip in the table shows. */
const expected: Record<Verb, string> = {
  'lots.read': 'bench quality administrator',
  'lots.read-released': 'bench quality sales administrator',
  'drift.read': 'bench quality administrator',
  'equipment.read': 'bench quality administrator',
  'materials-in.read': 'bench quality administrator',
  'imports.read': 'bench quality administrator',
  'catalogue.read': 'bench quality sales administrator',
  'datasheets.read': 'bench quality sales administrator',
  'settings.read': 'bench quality sales administrator',
  'people.read': 'bench quality sales administrator',
  'ledger.read': 'quality administrator',
  'lots.open': 'bench quality',
  'imports.run': 'bench quality',
  'readings.record': 'bench quality',
  'readings.supersede-own': 'bench quality',
  'readings.supersede-any': 'quality',
  'lots.decide': 'quality',
  'limits.freeze': 'quality',
  'signals.answer': 'quality',
  'equipment.keep': 'quality',
  'materials-in.keep': 'quality',
  'catalogue.keep': 'quality',
  'datasheets.build': 'sales',
  'datasheets.check': 'quality',
  'datasheets.publish': 'sales',
  'people.keep': 'administrator',
  'settings.keep': 'administrator',
  'backup.make': 'administrator',
}

describe('permit', () => {
  test.each(verbs)('%s is for exactly the roles of the works’ rules', (verb) => {
    const passed = roles.filter((role) => refusal(actor(role), verb) === undefined)
    expect(passed.join(' ')).toBe(expected[verb])
  })

  test.each(verbs)('%s is refused without an actor as not signed in', (verb) => {
    expect(refusal(undefined, verb)?.code).toBe('not-signed-in')
  })

  test.each(verbs)('%s is refused to a person without roles', (verb) => {
    expect(refusal(actor(), verb)?.code).toBe('not-permitted')
  })

  test('passes a person who holds the role among several', () => {
    expect(refusal(actor('bench', 'sales'), 'datasheets.publish')).toBeUndefined()
  })

  test('does not add roles up: administrator with sales still decides nothing', () => {
    expect(refusal(actor('administrator', 'sales'), 'lots.decide')?.code).toBe('not-permitted')
  })

  test('says who may, and who is asking', () => {
    expect(refusal(actor('bench', 'sales'), 'lots.decide')).toEqual({
      code: 'not-permitted',
      message: 'Deciding a lot is for quality; T. Aldous is signed in for bench and sales.',
      mend: 'Ask someone with that role, or an administrator for the role.',
    })
    expect(refusal(actor(), 'ledger.read')?.message).toBe(
      'Reading the ledger is for quality and administrator; T. Aldous has no role yet.',
    )
  })
})

describe('may', () => {
  test('answers as permit does, without throwing', () => {
    for (const verb of verbs) {
      expect(may(undefined, verb)).toBe(false)
      for (const role of roles) expect(may(actor(role), verb)).toBe(rights[verb].roles.includes(role))
    }
  })
})
