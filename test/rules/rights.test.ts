import { describe, expect, it } from 'vitest'
import { askings, unasked } from '../support/asks-first'
import { keptFiles, textOf } from '../support/source-files'

const services = keptFiles().filter((path) => /^lib\/services\/[^/]+\.ts$/.test(path))
const texts = services.map(textOf)

/** Functions of the services that a page or route calls by name. */
const servicesOf = (text: string): readonly string[] =>
  [...text.matchAll(/import (?!type )\{([^}]*)\} from '@\/lib\/services\//g)].flatMap(([, names = '']) =>
    names
      .split(',')
      .map((name) => name.trim())
      .filter((name) => name !== '' && !name.startsWith('type ')),
  )

describe('services', () => {
  it('ask for the right before anything is looked up', () => {
    expect(texts.flatMap(askings).filter(({ exported }) => exported).length).toBeGreaterThan(50)
    expect(unasked(texts)).toEqual([])
  })

  it('are called by pages with the actor, but for what comes before anybody has an account', () => {
    const pages = keptFiles().filter((path) => /^app\/.*\.tsx?$/.test(path))
    const taking = new Set(texts.flatMap(askings).map(({ name }) => name))
    const without = pages.flatMap((path) => servicesOf(textOf(path))).filter((name) => !taking.has(name))
    expect([...new Set(without)].sort()).toEqual([
      'createFirstAccount',
      'demoProgress',
      'isCodeNeeded',
      'isFirstAccountMissing',
      'isWorksMissing',
      'startOfDay',
    ])
    expect(servicesOf("import { findIt, type It } from '@/lib/services/find-it'")).toEqual(['findIt'])
  })

  it.each([
    ['no question', 'export async function readLot(actor: Actor, code: string) { return findLot(code) }'],
    [
      'a question that comes after reading',
      "export const readLot = async (actor: Actor) => { const lot = await findLot(); permit(actor, 'lots.read'); return lot }",
    ],
    [
      'a value awaited while the actor is handed on',
      "const keep = (actor: Actor, x: X) => permit(actor, 'x')\nexport const readLot = async (actor: Actor) => keep(actor, await valuesOf())",
    ],
    [
      'the actor handed to somebody who does not ask',
      'export const readLot = async (actor: Actor) => appendLedger(actor)',
    ],
  ])('are found out: %s', (_, text) => {
    expect(unasked([text])).toEqual(['readLot'])
  })

  it('may ask through another service', () => {
    const lot = "export function getLot(actor: Actor) { permit(actor, 'lots.read'); return 1 }"
    const chart = 'export const saveChart = async (actor: Actor) => draw(await getLot(actor))'
    expect(unasked([chart, lot])).toEqual([])
    expect(unasked([chart])).toEqual(['saveChart'])
  })
})
