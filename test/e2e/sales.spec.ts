import { readFileSync } from 'node:fs'
import { expect } from '@playwright/test'
import { pdfText } from '../support/pdf-text'
import { plainTension, readPrintedSheet, stretchedTension } from '../support/printed-table'
import { serverTest, signIn } from '../support/server'

const test = serverTest('works')

test('sales publishes a tension table and takes it along: its numbers obey the law printed in it', async ({
  page,
}) => {
  await signIn(page, 'pell')
  await page.getByRole('link', { name: 'Datasheets' }).click()
  await page.getByRole('link', { name: 'Build a datasheet' }).first().click()
  await page.getByLabel('Product').selectOption({ label: 'Larch 279' })
  await page.getByLabel('Notes').fill('G3–C4')
  await page.getByLabel('Lengths').fill('610 648 25.5 in')
  await page.getByRole('button', { name: 'Show the table' }).click()
  const table = page.getByRole('region', { name: 'Tension table' })
  await expect(table.getByRole('row')).toHaveCount(7)
  await expect(page.getByText('not published')).toBeVisible()

  await page.getByRole('button', { name: 'Publish revision 1' }).click()
  await page.waitForURL(/\/datasheets\/DS-0001\/1$/)
  await expect(page.getByRole('heading', { name: 'DS-0001, revision 1' })).toBeVisible()
  const shown = await table.getByRole('row').nth(1).textContent()

  const pdf = page.waitForEvent('download')
  await page.getByRole('link', { name: 'PDF' }).click()
  const pdfFile = await (await pdf).path()
  expect((await pdf).suggestedFilename()).toBe('DS-0001 revision 1.pdf')
  const text = await pdfText(readFileSync(pdfFile))
  const sheet = readPrintedSheet(text)
  expect(sheet.basis).toBe('unloaded mass, stretch solved')
  expect(sheet.cells).toHaveLength(18)
  for (const { frequency, length, tension } of sheet.cells) {
    const plain = plainTension(sheet.massPerMetre, frequency, length)
    const reckoned = stretchedTension(plain, sheet.axialStiffness ?? Number.NaN)
    expect(Math.abs(tension - reckoned)).toBeLessThan(0.05 + reckoned * 4e-4)
  }
  expect(text.replace(/\s+/g, ' ')).toContain('A string under tension can hurt.')
  expect(shown).toContain(sheet.cells[0]?.tension.toFixed(1))

  const csv = page.waitForEvent('download')
  await page.getByRole('link', { name: 'CSV' }).click()
  const lines = readFileSync(await (await csv).path(), 'utf8')
    .trim()
    .split('\r\n')
  expect(lines).toHaveLength(19)
  const head = lines[0]?.replace('\uFEFF', '').split(',') ?? []
  for (const line of lines.slice(1)) {
    const row = line.split(/,(?=(?:[^"]*"[^"]*")*[^"]*$)/)
    const value = (column: string): number => Number(row[head.indexOf(column)])
    const plain = plainTension(value('mass_per_metre_kg_per_m'), value('frequency_hz'), value('length_m'))
    expect(value('tension_n') / stretchedTension(plain, value('axial_stiffness_n'))).toBeCloseTo(1, 9)
  }

  // A second revision leaves the first one as it was.
  await page.getByRole('link', { name: 'Build the next revision' }).click()
  await page.getByLabel('Basis').selectOption({ label: 'plain formula, for comparison' })
  await page.getByRole('button', { name: 'Show the table' }).click()
  await page.getByRole('button', { name: 'Publish revision 2' }).click()
  await page.waitForURL(/\/DS-0001\/2$/)
  await page.getByRole('link', { name: 'Revision 1' }).click()
  await expect(page.getByText('Superseded by')).toBeVisible()
  expect(await table.getByRole('row').nth(1).textContent()).toBe(shown)
})
