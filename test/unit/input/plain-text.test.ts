import { describe, expect, it } from 'vitest'
import { codeText, paragraphs, plainText } from '@/lib/input/plain-text'

const accepts = (schema: ReturnType<typeof plainText>, text: unknown): boolean =>
  schema.safeParse(text).success

describe('plainText', () => {
  it.each(['Die 7 worn', 'Öl 41 °C', '👩‍🔧 was here'])('takes %s', (text) => {
    expect(accepts(plainText('Cause'), text)).toBe(true)
  })

  it.each([
    ['a bell', 'die\u0007'],
    ['a null', 'die\u0000'],
    ['a line break', 'die\nworn'],
    ['a lone surrogate', 'die \ud83d'],
    ['nothing but blanks', '   '],
    ['a number', 7],
    ['more than the bound', 'x'.repeat(201)],
  ])('refuses %s', (_, text) => {
    expect(accepts(plainText('Cause'), text)).toBe(false)
  })
})

describe('paragraphs', () => {
  it('takes line breaks and tabs', () => {
    expect(accepts(paragraphs('Why'), 'Weighed again.\n\tStill heavy.')).toBe(true)
  })

  it('refuses other control characters', () => {
    expect(accepts(paragraphs('Why'), 'Weighed\u001b[2J again')).toBe(false)
  })
})

describe('codeText', () => {
  it.each(['LA-354', 'Larch254', 'B-03/2', '7', 'Ö-1'])('takes %s', (text) => {
    expect(codeText('Lot').safeParse(text).success).toBe(true)
  })

  it.each(['LA 354', '-354', 'LA-', '../etc', 'LA<354>', ''])('refuses “%s”', (text) => {
    expect(codeText('Lot').safeParse(text).success).toBe(false)
  })
})
