import { expect, type Page } from '@playwright/test'
import { demoProducts } from '@/prisma/demo/products'
import { readLot } from '@/prisma/demo/readings'
import { demoSchedule } from '@/prisma/demo/schedule'
import { serverTest, signIn } from '../support/server'

const test = serverTest('works')

/** What the five specimens of LA-001 read, as somebody types them: no leading zero, one decimal. */
const product = demoProducts.find(({ code }) => code === 'LARCH-254')
const lot = demoSchedule().find(({ code }) => code === 'LA-001')
if (!product || !lot) throw new Error('the demo has other products')
const sheets = readLot(product, lot)
const diameters = sheets.flatMap((sheet) => sheet.diameters.map(({ value }) => value.typed.replace(/^0/, '')))
const masses = sheets.map((sheet) => Number(sheet.cutMass?.typed).toFixed(1))
const frequencies = sheets.map((sheet) => Number(sheet.frequencies[0]?.typed).toFixed(1))

let keys = 0
const enter = async (page: Page, texts: readonly string[]): Promise<void> => {
  for (const text of texts) {
    for (const key of [...text, 'Enter']) {
      await page.keyboard.press(key)
      keys += 1
    }
  }
}

test('the bench logs five specimens by the keypad alone, with the page closed half-way', async ({
  context,
  page,
}) => {
  await signIn(page, 'aldous')
  await page.goto('/bench/LA-001')
  await expect(page.getByRole('textbox', { name: /^Diameter.*specimen 1/ }).first()).toBeFocused()
  await enter(page, diameters.slice(0, 14))
  await expect(page.getByText('Kept on this device')).toBeVisible()
  await page.close()

  const again = await context.newPage()
  await again.goto('/bench/LA-001')
  await expect(again.getByText('Your draft was found on this device.')).toBeVisible()
  // The fifteenth reading is the third of specimen 3: that is where the entry stands.
  await expect(again.getByRole('textbox', { name: /specimen 3/ }).nth(2)).toBeFocused()
  await enter(again, diameters.slice(14))
  await enter(again, masses)
  await enter(again, frequencies)
  await expect(again.getByRole('link', { name: 'Open lot LA-001' })).toBeVisible()
  expect(keys).toBeLessThanOrEqual(240)
  await expect(again.getByRole('columnheader', { name: /stored/ })).toHaveCount(5)

  await again.getByRole('link', { name: 'Open lot LA-001' }).click()
  await expect(again.getByRole('heading', { level: 1, name: /LA-001/ })).toBeVisible()
  await expect(again.getByRole('link', { name: 'Release: to decide' })).toBeVisible()
  const stored = await again.request.get('/api/v1/lots/LA-001')
  const view = await stored.json()
  expect(view.specimens).toHaveLength(5)
  const typed = view.specimens.flatMap((specimen: { sheet: { diameters: { value: { typed: string } }[] } }) =>
    specimen.sheet.diameters.map(({ value }) => value.typed),
  )
  expect(typed).toEqual(diameters)
  // A draft that is stored is gone: the next visit finds none.
  await again.goto('/bench/LA-001')
  await expect(again.getByText('Your draft was found')).toHaveCount(0)
})

test('two digits that changed places are asked about, and answered by a number key', async ({ page }) => {
  await signIn(page, 'imrie')
  await page.goto('/bench/LC-060')
  const entry = page.getByRole('textbox', { name: /specimen 3/ }).first()
  await expect(entry).toBeFocused()
  await page.keyboard.type('.2974')
  await page.keyboard.press('Enter')
  const question = page.getByRole('alertdialog')
  await expect(question).toContainText('0.2794')
  await expect(question.getByRole('button', { name: /^2 I meant 0\.2794/ })).toBeVisible()
  await page.keyboard.press('2')
  await expect(question).toHaveCount(0)
  await expect(entry).toHaveValue(/2794/)
})

test.describe('on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 } })

  test('the entry moves on to the next specimen’s column, and the digits with it', async ({ page }) => {
    await signIn(page, 'aldous')
    await page.goto('/bench/LC-060')
    await expect(page.getByRole('textbox', { name: /specimen 3/ }).first()).toBeFocused()
    for (const typed of ['.2795', '.2791', '.2794', '.2789', '.2792', '.2790', '.2796', '.2793'])
      for (const key of [...typed, 'Enter']) await page.keyboard.press(key)
    const fourth = page.getByRole('textbox', { name: /specimen 4/ })
    await expect(fourth.nth(0)).toHaveValue('0.2796')
    await expect(fourth.nth(1)).toHaveValue('0.2793')
    await expect(fourth.nth(2)).toBeFocused()
  })
})
