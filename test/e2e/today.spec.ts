import { expect, type Page } from '@playwright/test'
import { serverTest, signIn } from '../support/server'

const test = serverTest('works')

const kindsOn = (page: Page): Promise<string[]> =>
  page
    .locator('.today-item')
    .evaluateAll((items) => items.map((item) => item.getAttribute('data-kind') ?? ''))

test('the bench sees what is to be measured, half-measured lots first, and goes on where it stopped', async ({
  page,
}) => {
  await signIn(page, 'aldous')
  await page.goto('/today')
  await expect(page.getByRole('heading', { level: 1 })).toContainText('One lot is half measured')
  const kinds = await kindsOn(page)
  expect(kinds.indexOf('lot-half-measured')).toBeLessThan(kinds.indexOf('lot-to-measure'))
  for (const notTheirs of ['signal', 'lot-to-decide', 'product-without-datasheet', 'backup-old'])
    expect(kinds).not.toContain(notTheirs)
  await page.getByRole('link', { name: /^Measure ?: Finish measuring LC-060/ }).click()
  await expect(page).toHaveURL(/\/bench\/LC-060$/)
  await expect(page.getByRole('heading', { level: 1 })).toContainText('LC-060')
})

test('quality sees one line for an event, and its link opens the signal', async ({ page }) => {
  await signIn(page, 'orrin')
  await page.goto('/today')
  const bands = page.locator('.today-band')
  await expect(bands.first().getByRole('heading', { level: 2 })).toHaveText(
    'Before anything more is drawn or sent',
  )
  const event = page.locator('.today-item[data-kind="signal"]')
  await expect(event).toHaveCount(1)
  await expect(event).toContainText('Larch 279')
  await expect(event).toContainText('3 more signals of the same lots.')
  expect(await kindsOn(page)).not.toContain('lot-to-measure')
  const href = (await event.getByRole('link').getAttribute('href')) ?? ''
  await event.getByRole('link').click()
  await expect(page).toHaveURL(/\/drift\?product=LARCH-279&lot=LC-\d+#signal-\d+$/)
  await expect(page.locator(href.slice(href.indexOf('#')))).toHaveAttribute('data-state', 'open')
})

test('sales sees the product that has released lots and no datasheet, and begins one', async ({ page }) => {
  await signIn(page, 'pell')
  await page.goto('/today')
  expect(await kindsOn(page)).toEqual(['product-without-datasheet'])
  await page.getByRole('link', { name: /^Build ?: Larch 279 has no datasheet/ }).click()
  await expect(page).toHaveURL(/\/datasheets\/new\?productCode=LARCH-279$/)
})

test('somebody with two roles sees what waits at both desks, each thing once', async ({ page }) => {
  await signIn(page, 'falk')
  await page.goto('/today')
  const kinds = await kindsOn(page)
  expect(kinds).toEqual(expect.arrayContaining(['signal', 'backup-old']))
  const titles = await page.locator('.today-item h3').allTextContents()
  expect(new Set(titles).size).toBe(titles.length)
})

test('on a phone nothing is cut off, and every link is as high as a thumb needs', async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 844 })
  await signIn(page, 'orrin')
  await page.goto('/today')
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390)
  for (const link of await page.locator('.today-item .button').all())
    expect((await link.boundingBox())?.height).toBeGreaterThanOrEqual(44)
})
