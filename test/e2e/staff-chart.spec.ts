import { expect, type Page, test } from '@playwright/test'
import axe from 'axe-core'
import { chartPage } from '../support/chart-bundle'
import type { SampleOptions } from '../support/staff-chart-sample'

declare global {
  interface Window {
    layers: { readonly transform: string; readonly lots: readonly string[] }[]
  }
}

interface Mark {
  readonly key: string
  readonly x: number
  readonly y: number
  readonly w: number
  readonly h: number
}

let html = ''

test.beforeAll(async () => {
  html = await chartPage()
})

test.beforeEach(async ({ page }) => {
  await page.setContent(html)
})

/** Shows the sample in the page's own chart, and beside it the file that the same data give. */
async function drawBoth(page: Page, options: SampleOptions, width: number): Promise<void> {
  await page.evaluate(
    ({ options, width }) => {
      const file = document.getElementById('file')
      if (file) file.innerHTML = window.drawSample(options, width)
    },
    { options, width },
  )
  await page.locator('.staff-plot .recharts-surface').waitFor()
}

/** All marks of one kind under an element: boxes in px from its upper left corner, in the order of their names. */
async function marksOf(page: Page, root: string, kind: string): Promise<Mark[]> {
  return page.evaluate(
    ({ root, kind }) => {
      const svg = document.querySelector(root)
      const origin = svg?.getBoundingClientRect()
      const found = [...(svg?.querySelectorAll(`[data-mark="${kind}"]`) ?? [])].map((element) => {
        const box = element.getBoundingClientRect()
        const { lot, stave, signal, state } = (element as SVGElement).dataset
        return {
          key: [kind, stave, lot, signal, state].join(' '),
          x: box.x + box.width / 2 - (origin?.x ?? 0),
          y: box.y + box.height / 2 - (origin?.y ?? 0),
          w: box.width,
          h: box.height,
        }
      })
      return found.sort((a, b) => a.key.localeCompare(b.key) || a.x - b.x || a.y - b.y)
    },
    { root, kind },
  )
}

const kinds = [
  'note',
  'ledger-line',
  'slur',
  'bar-line',
  'limit-line',
  'centre-line',
  'tolerance-line',
] as const

const samples: readonly (readonly [string, SampleOptions, number, Partial<Record<string, number>>])[] = [
  // Sixty lots, one value missing, and what buildStaffChart is expected to find of them in the window of 52.
  ['60 lots', {}, 964, { note: 207, 'bar-line': 4, slur: 3 }],
  ['60 lots on a phone', { window: { from: 36, to: 59 } }, 358, { note: 96, 'bar-line': 1, slur: 2 }],
  ['160 lots in one window', { lots: 160, window: { from: 0, to: 159 } }, 964, { 'bar-line': 4 }],
  ['12 lots, no limits yet', { lots: 12 }, 964, { note: 48, slur: 0, 'limit-line': 0 }],
  ['two lots', { lots: 2 }, 964, { note: 8, 'limit-line': 0 }],
  ['one lot', { lots: 1 }, 964, { note: 4, slur: 0 }],
  ['no lots', { lots: 0 }, 964, { note: 0, 'bar-line': 0 }],
  ['equal values', { lots: 30, equal: true }, 964, { note: 120, 'ledger-line': 0 }],
]

for (const [name, options, width, expected] of samples)
  test(`page and file show the same marks within half a pixel: ${name}`, async ({ page }) => {
    await drawBoth(page, options, width)
    for (const kind of kinds) {
      const inPage = await marksOf(page, '.staff-plot .recharts-surface', kind)
      const inFile = await marksOf(page, '#file svg', kind)
      expect(inPage.map(({ key }) => key)).toEqual(inFile.map(({ key }) => key))
      if (expected[kind] !== undefined) expect(inPage, kind).toHaveLength(expected[kind])
      inPage.forEach((mark, index) => {
        const other = inFile[index]
        for (const part of ['x', 'y', 'w', 'h'] as const)
          expect(Math.abs(mark[part] - (other?.[part] ?? Number.NaN)), `${mark.key} ${part}`).toBeLessThan(
            0.5,
          )
      })
    }
  })

test('one pointer reads all staves: mouse, arrow keys, Home, End; Enter opens the lot', async ({ page }) => {
  await drawBoth(page, {}, 964)
  const pointer = page.getByRole('slider', { name: 'Lot read on all staves' })
  await pointer.focus()
  await page.keyboard.press('End')
  await expect(pointer).toHaveAttribute(
    'aria-valuetext',
    /^LA-360, .*Diameter .*σ; Mass per metre, weighed .*Closure /,
  )
  await page.keyboard.press('ArrowLeft')
  await expect(pointer).toHaveAttribute('aria-valuenow', '59')
  await expect(page.locator('.staff-over ellipse[data-mark="pointer"]')).toHaveCount(4)
  await page.keyboard.press('Home')
  await expect(pointer).toHaveAttribute('aria-valuetext', /^LA-309/)
  // Past the window's edge the window follows.
  await page.keyboard.press('ArrowLeft')
  await expect(pointer).toHaveAttribute('aria-valuetext', /^LA-308/)
  await page.keyboard.press('Enter')
  expect(await page.evaluate(() => window.opened)).toEqual(['LA-308'])
  const note = page.locator('.staff-plot .recharts-surface ellipse[data-lot="LA-340"][data-stave="mass"]')
  await note.hover()
  await expect(pointer).toHaveAttribute('aria-valuetext', /^LA-340/)
  await expect(note.locator('xpath=..')).toHaveAttribute('href', '/lots/LA-340')
})

test('the overview moves and resizes the window by mouse and by keys', async ({ page }) => {
  await drawBoth(page, {}, 964)
  const first = page.getByRole('slider', { name: 'First lot shown' })
  const both = page.getByRole('slider', { name: 'Lots shown', exact: true })
  const notes = page.locator('.staff-plot .recharts-surface ellipse[data-mark="note"][data-stave="mass"]')
  await expect(notes).toHaveCount(52)
  const box = await first.boundingBox()
  if (!box) throw new Error('the overview has no handle')
  await page.mouse.move(box.x + 12, box.y + 20)
  await page.mouse.down()
  await page.mouse.move(box.x + 12 + 250, box.y + 20, { steps: 5 })
  await page.mouse.up()
  await expect(first).toHaveAttribute('aria-valuenow', '29')
  await expect(notes).toHaveCount(32)
  await both.focus()
  await page.keyboard.press('PageUp')
  await expect(both).toHaveAttribute('aria-valuetext', 'LA-319 to LA-350')
  await expect(notes).toHaveCount(32)
  await first.focus()
  await page.keyboard.press('End')
  // A window is never narrower than eight lots.
  await expect(notes).toHaveCount(8)
})

/** The lots shown, as the overview says them. */
const shownLots = (page: Page) => page.getByRole('slider', { name: 'Lots shown', exact: true })

test('dragging the plot moves a drawn layer, and the chart is drawn anew where it is let go', async ({
  page,
}) => {
  await drawBoth(page, { lots: 200 }, 964)
  await expect(shownLots(page)).toHaveAttribute('aria-valuetext', 'LA-449 to LA-500')
  const plot = await page.locator('.staff-plot').boundingBox()
  if (!plot) throw new Error('no plot')
  const [x, y] = [plot.x + 400, plot.y + 150]
  // The layer is gone once the hand rests, which a slow machine may take a movement for: it is watched from inside.
  await page.evaluate(() => {
    window.layers = []
    new MutationObserver(() => {
      const moved = document.querySelector('.staff-layer g[transform]')
      if (moved)
        window.layers.push({
          transform: moved.getAttribute('transform') ?? '',
          lots: [...moved.querySelectorAll('ellipse[data-stave="mass"]')].map(
            (head) => head.getAttribute('data-lot') ?? '',
          ),
        })
    }).observe(document.body, { subtree: true, childList: true, attributes: true })
  })
  await page.mouse.move(x, y)
  await page.mouse.down()
  await page.mouse.move(x + 142, y, { steps: 4 })
  await expect.poll(() => page.evaluate(() => window.layers.length)).toBeGreaterThan(0)
  await page.mouse.up()
  const layers = await page.evaluate(() => window.layers)
  for (const { transform } of layers) expect(transform).toMatch(/^translate\(\d+(\.\d+)? 0\)$/)
  // Older lots came in drawn already: half a window of them.
  expect(layers[0]?.lots).toContain('LA-439')
  expect(layers[0]?.lots).toContain('LA-426')
  await expect(page.locator('.staff-layer')).toHaveCount(0)
  await expect(shownLots(page)).toHaveAttribute('aria-valuetext', 'LA-439 to LA-490')
  // A drag is no click: nothing was opened.
  expect(await page.evaluate(() => window.opened)).toEqual([])
})

test('the wheel with ctrl zooms about the mouse, sideways it moves; keys and buttons do the same', async ({
  page,
}) => {
  await drawBoth(page, { lots: 200, window: { from: 60, to: 119 } }, 964)
  const lots = async (): Promise<readonly number[]> =>
    ((await shownLots(page).getAttribute('aria-valuetext')) ?? '')
      .split(' to ')
      .map((code) => Number(code.slice(3)) - 301)
  const note = page.locator('.staff-plot .recharts-surface ellipse[data-lot="LA-391"][data-stave="mass"]')
  const before = await note.boundingBox()
  if (!before) throw new Error('no note')
  await page.mouse.move(before.x + 5, before.y + 4)
  await page.keyboard.down('Control')
  await page.mouse.wheel(0, -120)
  await page.keyboard.up('Control')
  await expect.poll(async () => (await lots())[0]).toBeGreaterThan(65)
  const [from = 0, to = 0] = await lots()
  expect(to - from).toBeLessThan(45)
  // The lot under the mouse stays there, within half a step.
  await expect.poll(async () => Math.abs(((await note.boundingBox())?.x ?? 0) - before.x)).toBeLessThan(15)
  await page.mouse.wheel(-300, 0)
  await expect.poll(async () => (await lots())[0]).toBeLessThan(from)
  const pointer = page.getByRole('slider', { name: 'Lot read on all staves' })
  await pointer.focus()
  await page.keyboard.press('0')
  await expect.poll(lots).toEqual([0, 199])
  await expect(page.getByRole('button', { name: 'Show all lots' })).toHaveAttribute('aria-disabled', 'true')
  await page.keyboard.press('+')
  await expect.poll(async () => ((await lots())[1] ?? 0) - ((await lots())[0] ?? 0)).toBe(133)
  await page.keyboard.press('-')
  await expect.poll(lots).toEqual([0, 199])
  await page.getByRole('button', { name: 'Show the newest lots' }).click()
  await expect.poll(lots).toEqual([148, 199])
  await page.getByRole('button', { name: 'Show fewer lots, larger' }).click()
  await expect.poll(async () => ((await lots())[1] ?? 0) - ((await lots())[0] ?? 0)).toBe(34)
  await pointer.focus()
  for (let press = 0; press < 8; press += 1) await page.keyboard.press('+')
  await expect.poll(async () => ((await lots())[1] ?? 0) - ((await lots())[0] ?? 0)).toBe(7)
})

test('a window of 10,000 lots is drawn in bounded marks and can be moved', async ({ page }) => {
  await drawBoth(page, { lots: 10_000, window: { from: 0, to: 9999 } }, 964)
  const marks = await page.locator('.staff-plot .recharts-surface [data-mark]').count()
  expect(marks).toBeLessThan(4 * 5 * 764)
  await expect(page.getByText(/^\d+ signals not drawn: /).first()).toBeVisible()
  await page.getByRole('button', { name: 'Show the newest lots' }).click()
  await expect(shownLots(page)).toHaveAttribute('aria-valuetext', 'LA-10249 to LA-10300')
})

test.describe('with a finger', () => {
  test.use({ hasTouch: true })

  test('the first tap on a note reads it, the second one follows it', async ({ page }) => {
    await drawBoth(page, {}, 964)
    const left: string[] = []
    await page.exposeFunction('leaving', (href: string) => left.push(href))
    await page.evaluate(() =>
      document.addEventListener('click', (event) => {
        const link = (event.target as Element).closest('a')
        if (link && !event.defaultPrevented) {
          event.preventDefault()
          ;(window as unknown as { leaving: (href: string) => void }).leaving(link.getAttribute('href') ?? '')
        }
      }),
    )
    const note = page.locator(
      '.staff-plot .recharts-surface ellipse[data-lot="LA-340"][data-stave="closure"]',
    )
    await note.tap()
    await expect(page.getByRole('slider', { name: 'Lot read on all staves' })).toHaveAttribute(
      'aria-valuetext',
      /^LA-340/,
    )
    expect(left).toEqual([])
    await note.tap()
    await expect.poll(() => left).toEqual(['/lots/LA-340'])
  })

  test('two fingers apart show fewer lots, about the place between them', async ({ page }) => {
    await drawBoth(page, { lots: 200, window: { from: 60, to: 119 } }, 964)
    const plot = await page.locator('.staff-plot').boundingBox()
    if (!plot) throw new Error('no plot')
    const client = await page.context().newCDPSession(page)
    const touch = (type: 'touchStart' | 'touchMove' | 'touchEnd', xs: readonly number[]) =>
      client.send('Input.dispatchTouchEvent', {
        type,
        touchPoints: xs.map((x, id) => ({ x: plot.x + x, y: plot.y + 150, id })),
      })
    await touch('touchStart', [470])
    await touch('touchStart', [470, 570])
    for (const more of [10, 30, 50]) await touch('touchMove', [470 - more, 570 + more])
    await touch('touchEnd', [])
    await expect(shownLots(page)).toHaveAttribute('aria-valuetext', /^LA-37\d to LA-40\d$/)
  })
})

for (const theme of ['light', 'dark'] as const)
  test(`axe finds nothing on the chart, ${theme}`, async ({ page }) => {
    await page.evaluate((name) => document.documentElement.setAttribute('data-theme', name), theme)
    await drawBoth(page, {}, 964)
    await page.getByText('As a table').click()
    await page.evaluate(axe.source)
    const violations = await page.evaluate(async () => {
      const { axe } = window as unknown as { axe: typeof import('axe-core') }
      return (await axe.run('#chart')).violations.map(
        ({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`,
      )
    })
    expect(violations).toEqual([])
  })
