/**
 * Canonical JSON of a value: one text for one content, whatever the order its keys were written in, so that
 * a hash of the text is a hash of the content. Numbers and texts are written as ECMAScript does; keys are
 * sorted by UTF-16 code units; no white space; a minus zero is written 0. Properties that are undefined are
 * left out, as in JSON.
 *
 * Not for data with integers beyond 2^53: they have no exact number here.
 *
 * Source: RFC 8785, JSON Canonicalization Scheme (2020).
 * Throws a TypeError that names the place for what JSON cannot say: numbers that are not finite, lone
 * surrogates, functions, symbols, big integers, undefined inside an array or at the top, class instances.
 */
export function canonicalJson(value: unknown): string {
  return write(value, '$')
}

/** With the u flag a surrogate in a pair is not seen as one. */
const loneSurrogate = /\p{Surrogate}/u

function write(value: unknown, place: string): string {
  if (value === null || typeof value === 'boolean') return String(value)
  if (typeof value === 'number') return writeNumber(value, place)
  if (typeof value === 'string') return writeText(value, place)
  if (Array.isArray(value)) {
    return `[${value.map((item, index) => write(item, `${place}[${index}]`)).join(',')}]`
  }
  if (typeof value === 'object' && isPlain(value)) return writeObject(value, place)
  throw new TypeError(`${place}: ${nameOf(value)} has no canonical JSON`)
}

function writeNumber(value: number, place: string): string {
  if (!Number.isFinite(value)) throw new TypeError(`${place}: ${value} is not a finite number`)
  return JSON.stringify(value)
}

function writeText(value: string, place: string): string {
  if (loneSurrogate.test(value)) throw new TypeError(`${place}: the text holds a lone surrogate`)
  return JSON.stringify(value)
}

function writeObject(value: Readonly<Record<string, unknown>>, place: string): string {
  const pairs = Object.keys(value)
    .filter((key) => value[key] !== undefined)
    .sort(byCodeUnits)
    .map((key) => `${writeText(key, place)}:${write(value[key], `${place}.${key}`)}`)
  return `{${pairs.join(',')}}`
}

const byCodeUnits = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0)

function isPlain(value: object): value is Readonly<Record<string, unknown>> {
  const prototype: unknown = Object.getPrototypeOf(value)
  return prototype === Object.prototype || prototype === null
}

function nameOf(value: unknown): string {
  if (typeof value === 'object' && value !== null)
    return `an object of class ${value.constructor?.name ?? '?'}`
  return typeof value
}
