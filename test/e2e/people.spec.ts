import { expect } from '@playwright/test'
import { serverTest, signedIn } from '../support/server'

const test = serverTest('works')

test('two browsers decide one lot at once: one wins, the other is told and loses nothing it typed', async ({
  browser,
  server,
}) => {
  const pages = [await signedIn(browser, server, 'orrin'), await signedIn(browser, server, 'falk')]
  for (const [index, page] of pages.entries()) {
    await page.goto('/lots/LC-058/release')
    await page.getByRole('radio', { name: /^Hold/ }).check()
    await page
      .getByRole('textbox', { name: 'Why' })
      .fill(`Held by browser ${index + 1}, the die is looked at.`)
  }
  await Promise.all(pages.map((page) => page.getByRole('button', { name: /^Decide LC-058/ }).click()))
  const won = pages.map((page) => page.getByRole('heading', { name: 'Decided: on hold' }))
  const told = pages.map((page) => page.getByRole('alert'))
  await expect
    .poll(async () => {
      const wins = await Promise.all(won.map((one) => one.count()))
      const tells = await Promise.all(told.map((one) => one.filter({ hasText: /LC-058|lot/i }).count()))
      return [wins.filter((count) => count > 0).length, tells.filter((count) => count > 0).length]
    })
    .toEqual([1, 1])
  for (const page of pages) {
    if ((await page.getByRole('heading', { name: 'Decided: on hold' }).count()) > 0) continue
    await expect(page.getByRole('textbox', { name: 'Why' })).toHaveValue(/Held by browser/)
  }
  const lot = await (await pages[0]?.request.get('/api/v1/lots/LC-058'))?.json()
  expect(lot.dispositions).toHaveLength(1)
  for (const page of pages) await page.context().close()
})

test('a role taken away stops the next click', async ({ browser, server }) => {
  const quality = await signedIn(browser, server, 'orrin')
  await quality.goto('/lots/LC-057/release')
  await quality.getByRole('radio', { name: /^Hold/ }).check()
  await quality.getByRole('textbox', { name: 'Why' }).fill('Looked at the die.')

  const administrator = await signedIn(browser, server, 'falk')
  await administrator.goto('/settings/people')
  await administrator.getByRole('link', { name: 'M. Orrin' }).click()
  await administrator.getByRole('checkbox', { name: /^Quality/ }).uncheck()
  await administrator.getByRole('checkbox', { name: /^Bench/ }).check()
  await administrator
    .getByRole('button', { name: /Keep|Save|roles/i })
    .first()
    .click()
  await expect(administrator.getByText(/bench/i).first()).toBeVisible()

  await quality.getByRole('button', { name: /^Decide LC-057/ }).click()
  await expect(
    quality.getByText('Deciding a lot is for quality; M. Orrin is signed in for bench.'),
  ).toBeVisible()
  const refused = await quality.request.post('/api/v1/lots/LC-057/decisions', {
    headers: { origin: server.address, 'content-type': 'application/json' },
    data: { verb: 'hold', reason: 'Looked at the die.', lotVersion: 2, answers: [] },
  })
  expect(refused.status()).toBe(403)
  const lot = await (await administrator.request.get('/api/v1/lots/LC-057')).json()
  expect(lot.dispositions).toHaveLength(0)
  for (const page of [quality, administrator]) await page.context().close()
})

test('nothing is read or written without signing in, and nothing from another site', async ({
  page,
  server,
  browser,
}) => {
  for (const path of ['/today', '/lots/LC-001', '/drift?product=LARCH-279', '/settings', '/datasheets']) {
    await page.goto(path)
    expect(new URL(page.url()).pathname).toBe('/sign-in')
  }
  for (const path of [
    '/api/v1/lots',
    '/api/v1/lots/LC-001',
    '/api/v1/drift/LARCH-279/csv',
    '/api/v1/datasheets',
  ])
    expect((await page.request.get(path)).status(), path).toBe(401)
  const bench = await signedIn(browser, server, 'aldous')
  const foreign = await bench.request.post('/api/v1/specimens', {
    headers: { origin: 'https://elsewhere.example', 'content-type': 'application/json' },
    data: {},
  })
  expect(foreign.status()).toBe(403)
  await bench.context().close()
})
