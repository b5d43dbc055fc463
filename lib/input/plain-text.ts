import { z } from 'zod'

/** Control characters (but line breaks and tabs in longer texts), and surrogates that stand alone. */
const forbidden = /[\p{Cc}\p{Surrogate}]/u
const forbiddenInParagraphs = /(?![\n\t])[\p{Cc}\p{Surrogate}]/u

const bounds = (name: string, min: number, max: number, pattern: RegExp) =>
  z
    .string({ error: `${name}: a text is needed.` })
    .refine((text) => !pattern.test(text), {
      error: `${name} holds characters that can’t be shown or stored.`,
      abort: true,
    })
    .trim()
    .min(min, { error: min === 1 ? `${name} is empty.` : `${name} needs at least ${min} characters.` })
    .max(max, { error: `${name} is longer than ${max} characters.` })

/** One line of text from a person. */
export const plainText = (name: string, { min = 1, max = 200 }: { min?: number; max?: number } = {}) =>
  bounds(name, min, max, forbidden)

/** A text that may have several lines: a reason, a note, an answer. */
export const paragraphs = (name: string, { min = 1, max = 2000 }: { min?: number; max?: number } = {}) =>
  bounds(name, min, max, forbiddenInParagraphs)

/** A code as works write them on labels: letters, digits and a few signs between, no gaps. */
export const codeText = (name: string, max = 40) =>
  plainText(name, { max }).refine((text) => /^[\p{L}\p{N}](?:[\p{L}\p{N}._/-]*[\p{L}\p{N}])?$/u.test(text), {
    error: `${name} may hold letters, digits and - . _ / between them.`,
  })
