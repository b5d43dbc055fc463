import { expect, type Page } from '@playwright/test'
import axe from 'axe-core'
import { serverTest, signIn } from '../support/server'

const test = serverTest('works')

/** Every page of every room, as R. Falk (administrator and quality) or, at the bench, T. Aldous sees it. */
const pages: readonly (readonly [path: string, username: string])[] = [
  ...[
    '/today',
    '/lots',
    '/lots?search=nothing-like-it',
    '/lots/LC-059',
    '/lots/LC-059/release',
    '/drift',
    '/drift?product=LARCH-279',
    '/drift?product=LARCH-254',
    '/drift/limits?product=LARCH-279',
    '/datasheets',
    '/catalogue',
    '/catalogue/materials',
    '/catalogue/materials/new',
    '/catalogue/materials/MUSIC-WIRE',
    '/catalogue/products/new',
    '/catalogue/products/LARCH-279',
    '/catalogue/products/LARCH-279/1',
    '/catalogue/products/LARCH-279/issue',
    '/equipment',
    '/equipment/rigs/RIG-2',
    '/equipment/rigs/new',
    '/equipment/gauges/M-14',
    '/equipment/gauges/new',
    '/equipment/weights/new',
    '/equipment/machines/new',
    '/equipment/dies/new',
    '/equipment/dies/D-279',
    '/equipment/machines/DM-1',
    '/materials-in',
    '/materials-in?search=nothing-like-it',
    '/materials-in/new',
    '/materials-in/C-9001',
    '/materials-in/S-9001',
    '/lots/LC-060',
    '/lots/import',
    '/settings',
    '/settings/people',
    '/settings/people/new',
    '/settings/password',
    '/nowhere',
  ].map((path) => [path, 'falk'] as const),
  ['/datasheets/new?productCode=LARCH-279', 'pell'],
  ['/bench', 'aldous'],
  ['/bench/LA-001', 'aldous'],
  ['/bench/LC-060', 'aldous'],
]

const violationsOn = async (page: Page): Promise<string[]> => {
  await page.evaluate(axe.source)
  return page.evaluate(async () => {
    const { axe } = window as unknown as { axe: typeof import('axe-core') }
    const { violations } = await axe.run(document, { resultTypes: ['violations'] })
    return violations.map(
      ({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 160)).join(' | ')}`,
    )
  })
}

/** Elements that stick out of the page at the right; those inside a frame that scrolls by itself may. */
const stickingOut = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const width = document.documentElement.clientWidth
    const scrolls = (element: Element | null): boolean =>
      element !== null &&
      (/auto|scroll|hidden|clip/.test(getComputedStyle(element).overflowX) || scrolls(element.parentElement))
    const out = [...document.body.querySelectorAll('*')].filter((element) => {
      const box = element.getBoundingClientRect()
      return box.width > 0 && box.right > width + 1 && !scrolls(element.parentElement)
    })
    return [
      ...(document.documentElement.scrollWidth > width
        ? [`the page is ${document.documentElement.scrollWidth} px wide`]
        : []),
      ...out.map((element) => `${element.tagName} ${element.className}`.slice(0, 80)),
    ]
  })

/** Sends files: one that waits to be begun, one whose rows are refused or differ. @returns their pages */
async function sendImports(page: Page, address: string): Promise<readonly string[]> {
  const head = 'lot,product,made_at,specimen,d1a_mm,cut_length_mm,cut_mass_mg,frequency_hz,Farbe'
  const row = (number: number, thick: string) =>
    `I-1,Larch 254,2026-11-23T07:10,${number},${thick},500.0,198.92,330.5,red`
  const send = async (name: string, ...rows: readonly string[]) => {
    const reply = await page.request.post(`/api/v1/imports?name=${name}`, {
      headers: { origin: address, 'content-type': 'application/octet-stream' },
      data: Buffer.from([head, ...rows].join('\n')),
    })
    const { id } = (await reply.json()) as { readonly id: number }
    return id
  }
  const run = async (id: number) => {
    const path = `/api/v1/imports/${id}`
    const { preview, version } = await (await page.request.get(path)).json()
    await page.request.post(`${path}/start`, {
      headers: { origin: address, 'content-type': 'application/json' },
      data: { options: preview.options, version },
    })
    await expect
      .poll(async () => (await (await page.request.get(path)).json()).state, { timeout: 30_000 })
      .toBe('done')
  }
  await run(await send('first.csv', row(1, '0.2540')))
  const done = await send('done.csv', row(1, '0.2560'), row(2, 'thin'), row(3, '-1'))
  await run(done)
  const draft = await send('draft.csv', row(4, 'thin'), row(5, '0.2540'))
  return [`/lots/import/${draft}`, `/lots/import/${done}`]
}

for (const colorScheme of ['light', 'dark'] as const)
  test(`axe finds nothing on any page, and nothing sticks out at 390 px: ${colorScheme}`, async ({
    browser,
    server,
  }) => {
    test.setTimeout(400_000)
    const found: string[] = []
    for (const username of ['falk', 'pell', 'aldous']) {
      const context = await browser.newContext({ baseURL: server.address, colorScheme })
      const page = await context.newPage()
      const said: string[] = []
      page.on('console', (message) => {
        if (['error', 'warning'].includes(message.type())) said.push(message.text())
      })
      page.on('pageerror', (error) => said.push(error.message))
      await signIn(page, username)
      const imports = username === 'falk' ? await sendImports(page, server.address) : []
      const own = pages.flatMap(([path, who]) => (who === username ? [path] : []))
      for (const path of [...own, ...imports]) {
        await page.setViewportSize({ width: 1440, height: 900 })
        said.length = 0
        const response = await page.goto(path)
        await page.locator('main h1, main .bench-next').first().waitFor()
        if (path.startsWith('/drift?product=LARCH-279')) await page.locator('.staff-plot').waitFor()
        expect(response?.headers()['content-security-policy'], path).toMatch(/script-src[^;]*'nonce-/)
        expect(response?.headers()['cache-control'], path).toMatch(/no-store/)
        const at = (list: readonly string[]) => list.map((one) => `${path}: ${one}`)
        found.push(...at(await violationsOn(page)))
        if (!/ · Ledgerline$/.test(await page.title())) found.push(`${path}: titled ${await page.title()}`)
        await page.setViewportSize({ width: 390, height: 844 })
        found.push(...at(await stickingOut(page)))
        found.push(...at(said.filter((text) => path !== '/nowhere' || !/404/.test(text))))
      }
      await context.close()
    }
    expect(found).toEqual([])
  })

test('the sign-in page passes axe, light and dark', async ({ browser, server }) => {
  for (const colorScheme of ['light', 'dark'] as const) {
    const context = await browser.newContext({ baseURL: server.address, colorScheme })
    const page = await context.newPage()
    await page.goto('/sign-in')
    expect(await violationsOn(page), colorScheme).toEqual([])
    await context.close()
  }
})

test('the bench loads at most 70 kB of script more than the framework does', async ({ browser, server }) => {
  const loaded = async (path: string): Promise<number> => {
    const context = await browser.newContext({ baseURL: server.address })
    const page = await context.newPage()
    await signIn(page, 'aldous')
    const sizes = new Map<string, number>()
    const client = await context.newCDPSession(page)
    await client.send('Network.enable')
    await client.send('Network.setCacheDisabled', { cacheDisabled: true })
    const names = new Map<string, string>()
    client.on('Network.responseReceived', ({ requestId, response, type }) => {
      if (type === 'Script') names.set(requestId, response.url)
    })
    client.on('Network.loadingFinished', ({ encodedDataLength, requestId }) => {
      const name = names.get(requestId)
      if (name) sizes.set(name, encodedDataLength)
    })
    await page.goto(path, { waitUntil: 'networkidle' })
    await context.close()
    expect(sizes.size).toBeGreaterThan(2)
    return [...sizes.values()].reduce((sum, size) => sum + size, 0)
  }
  const base = await loaded('/nowhere')
  const bench = await loaded('/bench/LA-001')
  test.info().annotations.push({ type: 'script', description: `framework ${base} B, bench ${bench} B` })
  console.log(
    `script over the wire: framework ${(base / 1000).toFixed(0)} kB, bench ${(bench / 1000).toFixed(0)} kB`,
  )
  expect(bench - base).toBeLessThanOrEqual(70_000)
})
