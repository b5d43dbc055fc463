import { expect } from '@playwright/test'
import { serverTest, signedIn, signIn } from '../support/server'

const test = serverTest('works')

test('quality adds a coil and a spool wound from it, the bench opens a lot of it, quality names the splice', async ({
  browser,
  page,
  server,
}) => {
  await signIn(page, 'orrin')
  await page.getByRole('link', { name: 'Materials in' }).click()
  await page.getByRole('link', { name: 'Add a coil, spool or batch' }).click()
  await page.getByLabel('Code').fill('C-77')
  await page.getByLabel('Name').fill('Music wire 254')
  await page.getByLabel('Heat').fill('H 5120')
  await page.getByLabel('Size').fill('254')
  await page.getByRole('button', { name: 'Add it' }).click()
  // 254 mm is no wire: what was typed is still there.
  await expect(page.getByRole('main').getByRole('alert')).toContainText('Size')
  await expect(page.getByLabel('Heat')).toHaveValue('H 5120')
  await page.getByLabel('Size').fill('254 µm')
  await page.getByRole('button', { name: 'Add it' }).click()
  await expect(page.getByRole('heading', { level: 1, name: /C-77/ })).toBeVisible()
  await expect(page.getByText('No lot names it.')).toBeVisible()

  await page.getByRole('link', { name: 'Add a spool wound from it' }).click()
  await page.getByLabel('Code').fill('S-77')
  await page.getByLabel('Name').fill('Music wire 254')
  await expect(page.getByLabel('Wound from')).toHaveValue('C-77')
  await page.getByRole('button', { name: 'Add it' }).click()
  await expect(page.getByRole('heading', { level: 1, name: /S-77/ })).toBeVisible()

  const bench = await signedIn(browser, server, 'aldous')
  await bench.goto('/bench')
  await bench.getByLabel('Lot code').fill('LA-900')
  await bench.getByLabel('Product').selectOption({ label: 'Larch 254' })
  await bench.getByLabel('Coil or spool of the wire').selectOption('S-77')
  await bench.getByLabel('Length of the lot').fill('1200')
  await bench.getByRole('button', { name: 'Open and measure' }).click()
  await bench.waitForURL(/\/bench\/LA-900/)
  await bench.context().close()

  await page.goto('/lots/LA-900')
  await expect(page.getByRole('row', { name: /S-77/ })).toContainText('C-77')
  await page.getByText('Change what it is made of').click()
  const rows = page.getByRole('group', { name: /^Material \d/ })
  await rows.nth(0).getByLabel('To').fill('800')
  await rows.nth(1).getByLabel('Coil, spool or batch').selectOption('C-77')
  await rows.nth(1).getByLabel('From').fill('1300')
  await page.getByRole('textbox', { name: 'Why' }).fill('Spliced when the spool ran out.')
  await page.getByRole('button', { name: 'Keep what LA-900 is made of' }).click()
  await expect(page.getByRole('main').getByRole('alert')).toContainText(
    'C-77 goes to 1300 m, but the lot is 1200 m long.',
  )
  await rows.nth(1).getByLabel('From').fill('800')
  await page.getByRole('button', { name: 'Keep what LA-900 is made of' }).click()
  await expect(page.getByText('C-77').first()).toBeVisible()
  await expect(page.getByText(/S-77, C-77, before that S-77: “Spliced/)).toBeVisible()

  await page.goto('/materials-in/C-77')
  const made = page.getByRole('table', { name: 'Lots made of it, newest first' })
  await expect(made.getByRole('row')).toHaveCount(3)
  await page.getByRole('button', { name: 'Put away' }).click()
  await page.getByRole('button', { name: 'Put C-77 away' }).click()
  await expect(page.getByText('Coil, put away')).toBeVisible()
  await page.goto('/materials-in?inUse=yes&search=C-77')
  await expect(page.getByRole('link', { name: 'S-77' })).toHaveCount(0)
  await expect(page.getByText('Nothing fits.')).toBeVisible()
})

test('a die shows the metres drawn through it, a machine the way to its chart', async ({ page }) => {
  await signIn(page, 'aldous')
  await page.goto('/equipment/dies/D-279')
  await expect(page.getByText(/^[\d\s ]+ m in \d+ lots since/)).toBeVisible()
  await expect(page.getByRole('table', { name: 'Metres drawn by month, newest first' })).toBeVisible()
  await page.goto('/equipment/machines/DM-1')
  await expect(page.getByRole('link', { name: 'Its staff chart over all products' })).toHaveAttribute(
    'href',
    '/drift?machine=DM-1',
  )
})

test('programs list and register what came in; the bench may not, and sales may not look', async ({
  browser,
  server,
}) => {
  const send = async (username: string, data: unknown) => {
    const page = await signedIn(browser, server, username)
    const reply = await page.request.post('/api/v1/materials-in', {
      headers: { origin: server.address, 'content-type': 'application/json' },
      data,
    })
    const list = await page.request.get('/api/v1/materials-in?search=C-88')
    const answer = { posted: reply.status(), listed: list.status(), list: await list.json() }
    await page.context().close()
    return answer
  }
  const coil = { code: 'C-88', kind: 'coil', name: 'Bronze 120', lengthMetres: 9000 }
  expect(await send('aldous', coil)).toMatchObject({ posted: 403, listed: 200, list: { count: 0 } })
  expect(await send('orrin', { ...coil, lengthMetres: -1 })).toMatchObject({ posted: 400 })
  expect(await send('orrin', coil)).toMatchObject({
    posted: 201,
    list: { materials: [{ code: 'C-88', lengthMetres: 9000, lots: 0, active: true }] },
  })
  expect(await send('orrin', coil)).toMatchObject({ posted: 409 })
  expect(await send('pell', coil)).toMatchObject({ posted: 403, listed: 403 })
})
