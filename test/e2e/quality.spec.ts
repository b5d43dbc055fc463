import { expect } from '@playwright/test'
import { serverTest, signIn } from '../support/server'

const test = serverTest('works')

test('quality follows a slur to its lot, holds it, answers the signals, and releases it with a reason', async ({
  page,
}) => {
  await signIn(page, 'orrin')
  await page.getByRole('link', { name: /^Drift/ }).click()
  const slur = page.locator('[data-mark="slur"][data-state="open"]')
  await expect(slur).toHaveCount(1)
  await slur.dispatchEvent('click')
  const signal = page.locator('li:focus')
  await expect(signal).toContainText('9 lots on one side, above the centre line, LC-051 to LC-059')
  await signal.getByRole('link', { name: 'LC-059' }).click()
  await expect(page.getByRole('heading', { level: 1, name: /LC-059/ })).toBeVisible()

  await page.getByRole('link', { name: 'Release: to decide' }).click()
  await page.getByRole('radio', { name: /^Hold/ }).check()
  await page.getByRole('textbox', { name: 'Why' }).fill('The new die draws wide; look at it first.')
  await page.getByRole('button', { name: /^Decide LC-059/ }).click()
  await expect(page.getByRole('heading', { name: 'Decided: on hold' })).toBeVisible()

  // Not released before its signals are answered, and what was typed is still there.
  await page.getByRole('radio', { name: /^Release/ }).check()
  await page.getByRole('textbox', { name: 'Why' }).fill('Inside tolerance on both routes.')
  await page.getByRole('button', { name: /^Decide LC-059/ }).click()
  await expect(
    page
      .getByRole('alert')
      .or(page.getByText(/has to be answered/))
      .first(),
  ).toBeVisible()
  await expect(page.getByRole('textbox', { name: 'Why' })).toHaveValue('Inside tolerance on both routes.')

  await page.goto('/drift?product=LARCH-279')
  await expect(page.getByRole('heading', { name: /^Signals/ })).toBeVisible()
  for (let left = 4; left > 0; left -= 1) {
    await expect(page.locator('.drift-signals > li[data-state="open"]')).toHaveCount(left)
    const open = page.locator('.drift-signals > li[data-state="open"]').first()
    await open.getByText('Answer', { exact: true }).first().click()
    await open.getByLabel('What was found').fill('die 279B draws wide')
    await open.getByLabel('What was done about it').fill('Measured the die, sent it back to be lapped.')
    await open.getByRole('button', { name: 'Answer' }).click()
  }
  await expect(page.locator('.drift-signals > li[data-state="open"]')).toHaveCount(0)
  await expect(page.locator('[data-mark="slur"][data-state="answered"]').first()).toBeAttached()

  await page.goto('/lots/LC-059/release')
  await page.getByRole('radio', { name: /^Release/ }).check()
  const asked = page.getByRole('textbox', { name: /tolerance|specimen|plan|closure/i })
  for (const question of await asked.all()) await question.fill('Looked at: the rest of the lot is inside.')
  await page.getByRole('textbox', { name: 'Why' }).fill('Inside tolerance on both routes; the die is named.')
  await page.getByRole('button', { name: /^Decide LC-059/ }).click()
  await expect(page.getByRole('heading', { name: 'Decided: released' })).toBeVisible()
  const decisions = page.getByRole('list').filter({ hasText: 'The new die draws wide' })
  await expect(decisions).toContainText('Inside tolerance on both routes; the die is named.')
  await expect(decisions).toContainText('M. Orrin')
})

test('limits are proposed from chosen lots and frozen by a person', async ({ page }) => {
  await signIn(page, 'orrin')
  await page.goto('/drift/limits?product=LARCH-279&chart=diameter')
  await page.getByRole('textbox', { name: 'Last lot' }).fill('LC-050')
  await page.getByLabel('Left out').fill('LC-012')
  await page.getByRole('button', { name: 'Propose' }).click()
  await expect(page.getByText('“LC-012” gives no reason.')).toBeVisible()
  await page.getByLabel('Left out').fill('LC-012 spooled over a burr')
  await page.getByRole('button', { name: 'Propose' }).click()
  await expect(page.getByText('50 lots, 1 left out')).toBeVisible()
  await page.getByRole('textbox', { name: 'Why' }).fill('Fifty calm lots on the old die.')
  await page.getByRole('button', { name: /^Freeze set 2/ }).click()
  await page.waitForURL(/\/drift\?product=LARCH-279$/)
  await expect(page.getByText('Diameter, set 2')).toBeVisible()
  await expect(page.getByText(/49 lots \(LC-001 to LC-050, 1 left out\)/)).toBeVisible()
})

test('charts are saved as drawing, picture and data', async ({ page }) => {
  await signIn(page, 'orrin')
  await page.goto('/drift?product=LARCH-279&from=LC-031&to=LC-059')
  const notes = 29 * 4
  await expect(page.locator('.staff-plot .recharts-surface ellipse[data-mark="note"]')).toHaveCount(notes)
  for (const [name, format] of [
    ['drawing (SVG)', 'svg'],
    ['picture (PNG)', 'png'],
    ['data (CSV)', 'csv'],
  ] as const) {
    const download = page.waitForEvent('download')
    await page.getByRole('link', { name }).click()
    expect((await download).suggestedFilename()).toBe(`LARCH-279 LC-031 to LC-059.${format}`)
  }
  const svg = await (await page.request.get('/api/v1/drift/LARCH-279/svg?from=LC-031&to=LC-059')).text()
  expect(svg.match(/data-mark="note"/g)).toHaveLength(notes)
  const slurs = await page.locator('.staff-plot .recharts-surface [data-mark="slur"]').count()
  expect(svg.match(/data-mark="slur"/g) ?? []).toHaveLength(slurs)
  const bars = await page.locator('.staff-plot .recharts-surface [data-mark="bar-line"]').count()
  expect(svg.match(/data-mark="bar-line"/g) ?? []).toHaveLength(bars)
})
