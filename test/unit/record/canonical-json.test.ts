import { describe, expect, it } from 'vitest'
import { canonicalJson } from '@/lib/domain/record/canonical-json'

const fromBits = (bits: string): number => {
  const view = new DataView(new ArrayBuffer(8))
  view.setBigUint64(0, BigInt(`0x${bits}`))
  return view.getFloat64(0)
}

describe('canonicalJson', () => {
  it('writes the example of RFC 8785, section 3.2.2', () => {
    const input: unknown = JSON.parse(String.raw`{
      "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
      "string": "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/",
      "literals": [null, true, false]
    }`)
    expect(canonicalJson(input)).toBe(
      String.raw`{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\u000f\nA'B\"\\\\\"/"}`,
    )
  })

  it('sorts keys by UTF-16 code units as in RFC 8785, section 3.2.3', () => {
    const input: unknown = JSON.parse(String.raw`{
      "\u20ac": "Euro Sign",
      "\r": "Carriage Return",
      "\ufb33": "Hebrew Letter Dalet With Dagesh",
      "1": "One",
      "\ud83d\ude00": "Emoji: Grinning Face",
      "\u0080": "Control",
      "\u00f6": "Latin Small Letter O With Diaeresis"
    }`)
    const values = Object.values(JSON.parse(canonicalJson(input)) as Record<string, string>)
    // JSON.parse puts integer-like keys first, so the order is read from the text instead.
    const order = values.sort((a, b) => canonicalJson(input).indexOf(a) - canonicalJson(input).indexOf(b))
    expect(order).toEqual([
      'Carriage Return',
      'One',
      'Control',
      'Latin Small Letter O With Diaeresis',
      'Euro Sign',
      'Emoji: Grinning Face',
      'Hebrew Letter Dalet With Dagesh',
    ])
  })

  it.each([
    // Source: RFC 8785, appendix B.
    ['0000000000000000', '0'],
    ['8000000000000000', '0'],
    ['0000000000000001', '5e-324'],
    ['8000000000000001', '-5e-324'],
    ['7fefffffffffffff', '1.7976931348623157e+308'],
    ['ffefffffffffffff', '-1.7976931348623157e+308'],
    ['4340000000000000', '9007199254740992'],
    ['c340000000000000', '-9007199254740992'],
    ['4430000000000000', '295147905179352830000'],
    ['44b52d02c7e14af5', '9.999999999999997e+22'],
    ['44b52d02c7e14af6', '1e+23'],
    ['44b52d02c7e14af7', '1.0000000000000001e+23'],
    ['444b1ae4d6e2ef4e', '999999999999999700000'],
    ['444b1ae4d6e2ef4f', '999999999999999900000'],
    ['444b1ae4d6e2ef50', '1e+21'],
    ['3eb0c6f7a0b5ed8c', '9.999999999999997e-7'],
    ['3eb0c6f7a0b5ed8d', '0.000001'],
    ['41b3de4355555553', '333333333.3333332'],
    ['41b3de4355555554', '333333333.33333325'],
    ['41b3de4355555555', '333333333.3333333'],
    ['41b3de4355555556', '333333333.3333334'],
    ['41b3de4355555557', '333333333.33333343'],
    ['becbf647612f3696', '-0.0000033333333333333333'],
    ['43143ff3c1cb0959', '1424953923781206.2'],
  ])('writes the double of bits %s as %s', (bits, text) => {
    expect(canonicalJson(fromBits(bits))).toBe(text)
  })

  it.each(['7fffffffffffffff', '7ff0000000000000', 'fff0000000000000'])(
    'refuses the double of bits %s, which is no number',
    (bits) => {
      expect(() => canonicalJson({ span: fromBits(bits) })).toThrow(TypeError)
    },
  )

  it('leaves undefined properties out and keeps null ones', () => {
    expect(canonicalJson({ b: undefined, a: null })).toBe('{"a":null}')
  })

  it('gives one text for one content, whatever the order of keys', () => {
    expect(canonicalJson({ a: { y: 1, x: 2 }, b: [] })).toBe(canonicalJson({ b: [], a: { x: 2, y: 1 } }))
  })

  it.each([
    ['undefined at the top', undefined],
    ['undefined in an array', [undefined]],
    ['a function', { f: () => 1 }],
    ['a date', { at: new Date(0) }],
    ['a big integer', { n: 1n }],
    ['a lone surrogate', { text: '\ud800' }],
    ['a lone surrogate in a key', { '\udc00': 1 }],
  ])('refuses %s', (_, value) => {
    expect(() => canonicalJson(value)).toThrow(TypeError)
  })

  it('names the place of what it refuses', () => {
    expect(() => canonicalJson({ rig: { spans: [1, Number.NaN] } })).toThrow('$.rig.spans[1]')
  })

  it('is read back by JSON.parse to the same content', () => {
    const content = { name: 'Larch 254', d: [2.54e-4, 0.1 + 0.2], nested: { ok: true, none: null } }
    expect(JSON.parse(canonicalJson(content))).toEqual(content)
  })
})
