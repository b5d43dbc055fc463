import { TZDate } from '@date-fns/tz'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { parseTime } from '@/lib/input/bench-file/wall-time'

const at = (text: string, zone = 'Europe/London') => {
  const parsed = parseTime(text, zone)
  return parsed.ok ? new Date(parsed.value).toISOString() : parsed.problems[0]?.message
}

describe('parseTime(text, timeZone)', () => {
  it.each([
    ['2026-11-25T14:20', '2026-11-25T14:20:00.000Z'],
    ['2026-07-01 14:20', '2026-07-01T13:20:00.000Z'],
    ['2026-07-01', '2026-06-30T23:00:00.000Z'],
    ['2026-07-01T14:20:05.25Z', '2026-07-01T14:20:05.250Z'],
    ['2026-07-01T14:20+0530', '2026-07-01T08:50:00.000Z'],
    ['2026-03-29T00:59', '2026-03-29T00:59:00.000Z'],
    ['2026-03-29T02:00', '2026-03-29T01:00:00.000Z'],
  ])('%s in London is %s', (text, iso) => {
    expect(at(text)).toBe(iso)
  })

  it('refuses the hour that the clocks skip and the one they go through twice, unless an offset is given', () => {
    expect(at('2026-03-29T01:30')).toBe(
      '“2026-03-29T01:30” never was in Europe/London: the clocks went past it.',
    )
    expect(at('2026-10-25T01:30')).toBe(
      '“2026-10-25T01:30” was twice in Europe/London: the clocks were put back.',
    )
    expect(at('2026-10-25T01:30+01:00')).toBe('2026-10-25T00:30:00.000Z')
    expect(at('2026-10-25T01:30+00:00')).toBe('2026-10-25T01:30:00.000Z')
  })

  it.each([
    '25.11.2026',
    '2026-02-30',
    '2026-13-01',
    '2026-11-25T24:00',
    '2026-11-25T10:61',
    '1899-12-31',
    '',
    'soon',
  ])('refuses %j with a sentence', (text) => {
    expect(at(text)).toMatch(/^“.*” .*\.$/)
  })

  it('agrees with the time-zone library wherever the moment is one', () => {
    const zones = [
      'Europe/London',
      'America/New_York',
      'Asia/Kolkata',
      'Australia/Lord_Howe',
      'UTC',
      'America/St_Johns',
    ]
    const minutes = fc.integer({ min: Date.UTC(1990, 0, 1) / 60_000, max: Date.UTC(2040, 0, 1) / 60_000 })
    fc.assert(
      fc.property(fc.constantFrom(...zones), minutes, (zone, minute) => {
        const local = new Date(minute * 60_000)
        const text = local.toISOString().slice(0, 16)
        const parsed = parseTime(text, zone)
        if (!parsed.ok) return
        const shown = new TZDate(parsed.value, zone)
        expect([
          shown.getFullYear(),
          shown.getMonth(),
          shown.getDate(),
          shown.getHours(),
          shown.getMinutes(),
        ]).toEqual([
          local.getUTCFullYear(),
          local.getUTCMonth(),
          local.getUTCDate(),
          local.getUTCHours(),
          local.getUTCMinutes(),
        ])
      }),
      { numRuns: 2000 },
    )
  })
})
