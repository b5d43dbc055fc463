import { readFileSync } from 'node:fs'
import { expect, type Page } from '@playwright/test'
import { csvOf, type FileCells } from '../support/bench-file'
import { serverTest, signIn } from '../support/server'

const test = serverTest('works')

const rowOf = (lot: string, number: number, change: FileCells = {}): FileCells => ({
  Los: lot,
  product: 'Larch 254',
  made_at: '2026-11-23T07:10',
  Maschine: 'DM-1',
  specimen: String(number),
  taken_at: 'head',
  measured_at: `2026-11-23T08:${String(number % 60).padStart(2, '0')}`,
  d1a_mm: '0.2540',
  d1b_mm: '0.2541',
  d2a_mm: '0.2540',
  d2b_mm: '0.2542',
  d3a_mm: '0.2541',
  d3b_mm: '0.2541',
  cut_length_mm: '500.0',
  cut_mass_mg: '198.92',
  weights: 'H-01 W-05 W-02',
  span_mm: '648.0',
  frequency_hz: '330.54',
  note: '',
  ...change,
})

/** The same under the names of the bench file. */
const ownRow = (lot: string, number: number, change: FileCells = {}): FileCells => {
  const { Los: _, Maschine: __, ...row } = rowOf(lot, number, change)
  return { lot, machine: 'DM-1', ...row }
}

async function send(page: Page, name: string, text: string): Promise<void> {
  await page.goto('/lots/import')
  await page
    .getByLabel('Bench file, CSV or XLSX')
    .setInputFiles({ name, mimeType: 'text/csv', buffer: Buffer.from(text) })
  await page.waitForURL(/\/lots\/import\/\d+$/)
  await expect(page.getByRole('heading', { level: 1, name: `${name} not begun` })).toBeVisible()
}

const figure = (page: Page, name: string) =>
  page
    .locator('.import-figures > div')
    .filter({ has: page.getByText(name, { exact: true }) })
    .locator('dd')

const state = (page: Page, words: string) =>
  expect(page.getByRole('heading', { level: 1, name: new RegExp(`${words}$`) })).toBeVisible({
    timeout: 60_000,
  })

test('the bench sends a file with foreign headers and a fault, maps it, mends the refused row, and has it whole', async ({
  page,
}) => {
  await signIn(page, 'aldous')
  await page.goto('/lots')
  await page.getByRole('link', { name: 'Import', exact: true }).click()
  await expect(page.getByText('None yet.')).toBeVisible()
  const rows = [1, 2, 3, 4, 5].map((number) => rowOf('E-100', number, number === 3 ? { d1a_mm: 'thin' } : {}))
  await send(page, 'old bench.csv', csvOf(rows))

  await expect(page.getByText('No column is read as lot: it is missing from the file.')).toBeVisible()
  await page.getByRole('button', { name: 'Begin the import' }).click()
  await expect(page.getByRole('main').getByRole('alert').first()).toContainText('No column is read as lot')
  await page.getByLabel('Los', { exact: true }).selectOption('lot')
  await page.getByLabel('Maschine', { exact: true }).selectOption('machine')
  await page.getByRole('button', { name: 'Look again' }).click()
  await expect(page.getByText('No column is read as lot')).toHaveCount(0)
  const preview = page.getByRole('region', { name: 'First rows of the file' })
  await expect(preview).toContainText('“thin” has no digits')
  await expect(preview.getByRole('row')).toHaveCount(7)

  await page.getByLabel('Keep these columns under a name').fill('old bench')
  await page.getByRole('button', { name: 'Begin the import' }).click()
  await state(page, 'done')
  await expect(figure(page, 'specimens stored')).toHaveText('4')
  await expect(figure(page, 'lots opened')).toHaveText('1')
  const refused = page.getByRole('table', { name: 'Refused rows with their reasons' })
  await expect(refused.getByRole('row', { name: /d1a_mm/ })).toContainText('thin')

  const waiting = page.waitForEvent('download')
  await page.getByRole('link', { name: 'Take the refused rows along' }).click()
  const saved = readFileSync(await (await waiting).path(), 'utf8')
  expect(saved.trim().split('\r\n')).toHaveLength(2)
  await send(page, 'mended.csv', saved.replace('thin', '0.2540'))
  // The columns are read as kept: nothing is asked, nothing is wrong.
  await expect(page.getByLabel('Los', { exact: true })).toHaveValue('lot')
  await expect(page.getByText('No column is read as')).toHaveCount(0)
  await page.getByRole('button', { name: 'Begin the import' }).click()
  await state(page, 'done')
  await expect(figure(page, 'specimens stored')).toHaveText('1')

  await send(page, 'old bench.csv', csvOf(rows).replace('thin', '0.2540'))
  await page.getByRole('button', { name: 'Begin the import' }).click()
  await state(page, 'done')
  await expect(figure(page, 'already there')).toHaveText('5')
  await expect(figure(page, 'refused')).toHaveText('0')
  await page.goto('/lots/E-100')
  await expect(page.getByRole('heading', { level: 1, name: /E-100/ })).toBeVisible()
})

test('a long import shows how far it is, and ended by hand keeps what is in', async ({ page }) => {
  await signIn(page, 'aldous')
  const rows = Array.from({ length: 6000 }, (_, index) =>
    ownRow(`E-2${String(Math.floor(index / 5)).padStart(4, '0')}`, (index % 5) + 1),
  )
  await send(page, 'ten years.csv', csvOf(rows))
  await page.getByRole('button', { name: 'Begin the import' }).click()
  await state(page, 'under way')
  await expect(page.getByRole('status').filter({ hasText: /^[1-9]\d* of 6000 rows/ })).toBeVisible({
    timeout: 60_000,
  })
  await page.getByRole('button', { name: 'End it' }).click()
  await page.getByRole('dialog').getByRole('button', { name: 'End it' }).click()
  await state(page, 'ended by hand')
  const stored = Number(await figure(page, 'specimens stored').textContent())
  expect(stored).toBeGreaterThan(0)
  expect(stored).toBeLessThan(6000)
  await page.goto('/lots/import')
  await expect(page.getByRole('row', { name: /ten years\.csv/ })).toContainText(String(stored))
})

test('quality chooses between a stored value and the file’s, with a reason', async ({ page }) => {
  await signIn(page, 'orrin')
  await send(page, 'first.csv', csvOf([1, 2].map((number) => ownRow('E-300', number))))
  await page.getByRole('button', { name: 'Begin the import' }).click()
  await state(page, 'done')
  const other = [
    ownRow('E-300', 1, { cut_mass_mg: '201.40', d1a_mm: '0.2552' }),
    ownRow('E-300', 2, { cut_mass_mg: '202.40' }),
  ]
  await send(page, 'second.csv', csvOf(other))
  await page.getByRole('button', { name: 'Begin the import' }).click()
  await state(page, 'done')
  await expect(page.getByText('2 to choose')).toBeVisible()
  await expect(page.getByText('cut mass: 198.92 mg stored, 201.40 mg in the file')).toBeVisible()
  await page.getByLabel(/specimen 1 of E-300/).check()
  await page.getByLabel(/The file’s takes its place/).check()
  await page.getByRole('button', { name: 'Answer the chosen rows' }).click()
  await expect(page.getByRole('main').getByRole('alert').first()).toContainText('Reason')
  await page.getByLabel('Why').fill('Read again from the bench book.')
  await page.getByRole('button', { name: 'Answer the chosen rows' }).click()
  await expect(page.getByText('1 to choose')).toBeVisible()
  const answered = page.getByRole('table', { name: 'Rows that were answered' })
  await expect(answered.getByRole('row', { name: /E-300/ })).toContainText('the file’s value')
  await page.getByLabel(/specimen 2 of E-300/).check()
  await page.getByLabel(/The stored one stays/).check()
  await page.getByLabel('Why').fill('The page was smudged.')
  await page.getByRole('button', { name: 'Answer the chosen rows' }).click()
  await expect(page.getByText('0 to choose')).toBeVisible()
  const lot = await (await page.request.get('/api/v1/lots/E-300')).json()
  expect(JSON.stringify(lot)).toContain('201.40')
  expect(JSON.stringify(lot)).not.toContain('202.40')
})

test('sales is shown no way in and is let in by none', async ({ page }) => {
  await signIn(page, 'pell')
  await page.goto('/lots')
  await expect(page.getByRole('link', { name: 'Import', exact: true })).toHaveCount(0)
  expect((await page.request.get('/api/v1/imports')).status()).toBe(403)
})
