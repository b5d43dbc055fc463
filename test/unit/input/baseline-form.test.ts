import { describe, expect, it } from 'vitest'
import { parseBaseline, parseBaselineForm, parseLeftOut } from '@/lib/input/baseline-form'

describe('parseLeftOut', () => {
  it('reads one lot a line, the code first, then the reason', () => {
    expect(parseLeftOut('LA-336 load 10 g short\r\n\n  LA-340: die changed - too late \n')).toEqual({
      ok: true,
      value: [
        { lotCode: 'LA-336', reason: 'load 10 g short' },
        { lotCode: 'LA-340', reason: 'die changed - too late' },
      ],
    })
  })

  it('leaves out nothing for an empty text', () => {
    expect(parseLeftOut(' \n ')).toEqual({ ok: true, value: [] })
  })

  it('refuses a lot without a reason and a lot named twice, naming both', () => {
    const refused = parseLeftOut('LA-1\nLA-2 short load\nLA-2 short load again')
    expect(refused).toMatchObject({
      ok: false,
      problems: [
        { where: 'leftOut', message: expect.stringContaining('“LA-1” gives no reason') },
        { where: 'leftOut', message: expect.stringContaining('LA-2 stands there twice') },
      ],
    })
  })
})

describe('parseBaseline', () => {
  const fields = { product: 'L254', chart: 'spread-of-massPerMetreWeighed' }

  it('leaves the ends open where no lot is named', () => {
    const parsed = parseBaseline({ ...fields, first: ' ', last: '' })
    expect(parsed).toMatchObject({
      ok: true,
      value: {
        productCode: 'L254',
        statistic: 'within-lot-sd',
        characteristic: 'massPerMetreWeighed',
        leftOut: [],
      },
    })
    expect(parsed.ok && parsed.value.firstLotCode).toBeUndefined()
  })

  it('refuses a chart that is none', () => {
    expect(parseBaseline({ ...fields, chart: 'weight' })).toMatchObject({
      ok: false,
      problems: [{ where: 'chart' }],
    })
  })
})

describe('parseBaseline: lots that are alike', () => {
  it.each([
    ['yes', true],
    ['no', false],
    ['', undefined],
    [undefined, undefined],
  ])('%s is %s', (alike, read) => {
    const parsed = parseBaseline({ product: 'L254', chart: 'diameter', alike })
    expect(parsed.ok && parsed.value.alike).toBe(read)
  })
})

describe('parseBaselineForm', () => {
  const fields = { product: 'L254', chart: 'diameter', supersedes: '0', reason: 'First sixty lots.' }

  it('takes an instant from which the set holds', () => {
    expect(parseBaselineForm({ ...fields, effectiveFrom: '2026-10-01T00:00:00Z' })).toMatchObject({
      ok: true,
      value: { effectiveFrom: Date.UTC(2026, 9, 1), supersedes: 0, reason: 'First sixty lots.' },
    })
  })

  it('refuses a form that does not say which set it replaces', () => {
    expect(parseBaselineForm({ ...fields, supersedes: 'none' })).toMatchObject({
      ok: false,
      problems: [{ where: 'supersedes' }],
    })
  })
})
