import { expect, test } from '@playwright/test'
import { removeData, startServer } from '../support/server'

test('an empty works asks for the first account and offers an empty works or the demo', async ({
  browser,
}) => {
  const server = await startServer({ template: 'empty' })
  expect(server.output()).toContain(
    `Nobody has an account yet. Make the first one at ${server.address}/set-up`,
  )
  expect(server.output()).not.toContain('code, once')
  const page = await (await browser.newContext({ baseURL: server.address })).newPage()
  await page.goto('/')
  await page.waitForURL(/\/set-up$/)
  await page.getByLabel('Your name').fill('R. Wren')
  await page.getByLabel('Sign-in name').fill('wren')
  await page.getByLabel('Password', { exact: true }).fill('five quiet otters')
  await page.getByLabel('Password again').fill('five quiet otters')
  await page
    .getByRole('button')
    .filter({ hasText: /account/i })
    .click()
  await page.waitForURL(/\/set-up\/works|\/today/)
  await page.waitForURL(/\/set-up\/works$/)
  await expect(page.getByRole('button', { name: 'Begin with an empty works' })).toBeVisible()
  await expect(page.getByRole('button', { name: 'Load the demo works' })).toBeVisible()
  await page.context().close()
  expect(await server.stop()).toBe(0)
  removeData(server)
})

test('a server that others can reach prints a one-time code, and makes no account without it', async ({
  browser,
}) => {
  const server = await startServer({ template: 'empty', env: { TRUST_PROXY: 'yes' } })
  const code = /this code, once: (\S+)/.exec(server.output())?.[1]
  expect(code).toMatch(/^[\w-]{6,}$/)
  const page = await (await browser.newContext({ baseURL: server.address })).newPage()
  await page.goto('/set-up')
  await page.getByLabel('Your name').fill('R. Wren')
  await page.getByLabel('Sign-in name').fill('wren')
  await page.getByLabel('Password', { exact: true }).fill('five quiet otters')
  await page.getByLabel('Password again').fill('five quiet otters')
  await page.getByLabel(/code/i).fill('AAAA-AAAA')
  await page
    .getByRole('button')
    .filter({ hasText: /account/i })
    .click()
  await expect(page.getByText('That is not the code that the last start printed.').first()).toBeVisible()
  await page.getByLabel('Password', { exact: true }).fill('five quiet otters')
  await page.getByLabel('Password again').fill('five quiet otters')
  await page.getByLabel(/code/i).fill(code ?? '')
  await page
    .getByRole('button')
    .filter({ hasText: /account/i })
    .click()
  await page.waitForURL(/\/set-up\/works|\/today|\/sign-in/)
  await page.context().close()
  await server.stop()
  removeData(server)
})
