import { readFileSync } from 'node:fs'
import { expect, type Page } from '@playwright/test'
import readXlsxFile from 'read-excel-file/node'
import { serverTest, signedIn, signIn } from '../support/server'

const test = serverTest('works')

const filters = (page: Page) => page.getByRole('search')
const heads = (page: Page) => page.getByRole('columnheader').allInnerTexts()

/** Texts of the first lot of the page by the name of their column, units left out. */
async function firstLot(page: Page): Promise<Readonly<Record<string, string>>> {
  const row = page.getByRole('table').getByRole('row').nth(1)
  const names = await row
    .getByRole('cell')
    .evaluateAll((cells) => cells.map((cell) => (cell.getAttribute('data-head') ?? '').split(',')[0] ?? ''))
  const texts = await row.getByRole('cell').allInnerTexts()
  const code = await row.getByRole('rowheader').textContent()
  return { Lot: code ?? '', ...Object.fromEntries(names.map((name, index) => [name, texts[index] ?? ''])) }
}

/** The file behind a link: its name and its bytes. */
async function taken(page: Page, link: string): Promise<{ name: string; content: Buffer }> {
  const waiting = page.waitForEvent('download')
  await page.getByRole('link', { name: link, exact: true }).click()
  const download = await waiting
  return { name: download.suggestedFilename(), content: readFileSync(await download.path()) }
}

const total = async (page: Page): Promise<number> =>
  Number.parseInt((await page.getByRole('list', { name: 'The whole selection' }).textContent()) ?? '', 10)

test('quality narrows the list, sorts it, chooses columns, comes back to it, and takes along what it shows', async ({
  page,
}) => {
  await signIn(page, 'orrin')
  await page.getByRole('link', { name: /^Lots/ }).first().click()
  await expect(page.getByRole('heading', { name: 'Lots' })).toBeVisible()
  const everything = await total(page)

  await page.getByLabel('Search').fill('LARCH lc-')
  await filters(page).getByLabel('State').selectOption({ label: 'released' })
  await page.getByRole('button', { name: 'Show', exact: true }).click()
  await page.waitForURL(/state=released/)
  const released = await total(page)
  expect(released).toBeGreaterThan(10)
  expect(released).toBeLessThan(everything)

  await page.getByRole('columnheader', { name: 'Length' }).getByRole('link').click()
  await page.waitForURL(/sort=length-down/)
  await expect(page.getByRole('columnheader', { name: 'Length' })).toHaveAttribute('aria-sort', 'descending')
  const longest = Number((await firstLot(page)).Length)
  await page.getByRole('columnheader', { name: 'Length' }).getByRole('link').click()
  await page.waitForURL(/sort=length-up/)
  expect(Number((await firstLot(page)).Length)).toBeLessThan(longest)

  await page.getByText('Columns', { exact: true }).click()
  const columns = page.getByRole('group', { name: 'Columns of the list' })
  await columns.getByLabel('Machine').uncheck()
  await columns.getByLabel('Spread of diameter').check()
  await page.getByRole('button', { name: 'Show these columns' }).click()
  await page.waitForURL(/columns=/)
  await expect(page.getByRole('columnheader', { name: 'Spread of diameter' })).toBeVisible()
  const chosen = await heads(page)
  expect(chosen.join(' ')).not.toContain('Machine')
  expect(page.url()).toContain('sort=length-up')
  const shown = await firstLot(page)

  await page.reload()
  expect([await heads(page), await firstLot(page)]).toEqual([chosen, shown])

  const csv = await taken(page, 'CSV')
  expect(csv.name).toBe('lots.csv')
  const lines = csv.content.toString('utf8').trim().split('\r\n')
  expect(lines).toHaveLength(released + 1)
  const names = lines[0]?.replace('\uFEFF', '').split(',') ?? []
  const cells = lines[1]?.split(',') ?? []
  const plain = (text: string | undefined) => text?.replace('−', '-').replace('+', '')
  expect(cells[0]).toBe(shown.Lot)
  expect(Number(cells[names.indexOf('Diameter (µm)')]).toFixed(2)).toBe(shown.Diameter)
  expect(Number(cells[names.indexOf('Closure (%)')]).toFixed(2).replace('-0.00', '0.00')).toBe(
    plain(shown.Closure),
  )

  const excel = await taken(page, 'Excel')
  expect(excel.name).toBe('lots.xlsx')
  const [sheet] = await readXlsxFile(excel.content)
  const rows = sheet?.data ?? []
  expect(rows).toHaveLength(released + 1)
  expect(rows[0]).toEqual(names)
  const [row = []] = rows.slice(1)
  const spread = row[names.indexOf('Spread of diameter (µm)')]
  expect([row[0], typeof spread]).toEqual([shown.Lot, 'number'])
  expect(Number(spread).toFixed(3)).toBe(shown['Spread of diameter'])
  expect(row[names.findIndex((name) => name.startsWith('Made'))]).toBeInstanceOf(Date)

  // Another list, whose address names no columns: this browser remembers them.
  await page.goto('/lots')
  expect(await heads(page)).toContain(chosen.find((head) => head.startsWith('Spread of diameter')))
  await page.getByText('Columns', { exact: true }).click()
  await page.getByRole('button', { name: 'The usual columns' }).click()
  await expect(page.getByRole('columnheader', { name: 'Machine' })).toBeVisible()
  expect((await heads(page)).join(' ')).not.toContain('Spread')
})

test('pages, filters and columns work without script', async ({ browser, server }) => {
  const page = await signedIn(browser, server, 'orrin', { javaScriptEnabled: false })
  await page.goto('/lots')
  await expect(page.getByText('Lots 1 to 50 of 61')).toBeVisible()
  await page.getByRole('link', { name: 'Next' }).click()
  await expect(page.getByText('Lots 51 to 61 of 61')).toBeVisible()
  await page.getByText('More filters').click()
  await page.getByLabel('with an open signal').check()
  await page.getByRole('button', { name: 'Show', exact: true }).click()
  await expect(page.getByLabel('with an open signal')).toBeChecked()
  expect(await total(page)).toBeLessThan(30)
  expect((await firstLot(page))['To answer']).toMatch(/signal/)
  await page.getByText('Columns', { exact: true }).click()
  await page.getByLabel('Maker').check()
  await page.getByRole('button', { name: 'Show these columns' }).click()
  await expect(page.getByRole('columnheader', { name: 'Maker' })).toBeVisible()
  expect(page.url()).toMatch(/signals=open.*columns=.*maker/)
  await page.context().close()
})

test('an address that can’t be understood is answered with a sentence and the rest of it', async ({
  page,
}) => {
  await signIn(page, 'orrin')
  await page.goto('/lots?search=lc-0&from=2026-02-30&sort=colour')
  await expect(page.getByText('Made from: that is no day of the calendar')).toBeVisible()
  await expect(page.getByLabel('Search')).toHaveValue('lc-0')
  expect(await total(page)).toBeGreaterThan(10)
})

test('sales lists and takes along released lots only', async ({ page }) => {
  await signIn(page, 'pell')
  await page.goto('/lots?columns=state')
  await expect(filters(page).getByLabel('State')).toHaveCount(0)
  const lines = (await taken(page, 'CSV')).content.toString('utf8').trim().split('\r\n').slice(1)
  expect(lines).toHaveLength(await total(page))
  expect(lines.every((line) => line.endsWith(',released'))).toBe(true)
})
