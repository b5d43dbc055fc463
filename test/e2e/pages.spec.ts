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
      for (const [path] of pages.filter(([, who]) => who === username)) {
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
