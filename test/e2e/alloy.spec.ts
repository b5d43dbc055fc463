import { expect } from '@playwright/test'
import { serverTest, signIn } from '../support/server'

const test = serverTest('alloy')

/** The spool of brass sold as bronze, and the lots that were wound from it. */
const SPOOL = 'S-RC-08'
const LOTS = ['RC-045', 'RC-046']

test('quality follows a light spool by links alone: from Today to the chart, a lot, the spool and its lots', async ({
  page,
}) => {
  await signIn(page, 'orrin')
  await page.getByRole('navigation').getByRole('link', { name: 'Today' }).click()
  const event = page.locator('.today-item[data-kind="signal"]').filter({ hasText: 'mass per metre, weighed' })
  await expect(event).toHaveCount(1)
  await expect(event).toContainText('Rowan 1060')
  await expect(event).toContainText('RC-045 is beyond the lower limit')
  await event.getByRole('link').click()

  // The chart: the bar line before the first lot that is light says what changed there.
  await expect(page).toHaveURL(/\/drift\?product=ROWAN-1060.*#signal-\d+$/)
  await expect(page.getByRole('heading', { level: 1 })).toContainText('Rowan 1060')
  await expect(page.locator('main svg text').filter({ hasText: SPOOL }).first()).toContainText(`${SPOOL} in`)
  await page.getByText('As a table').click()
  await expect(page.getByRole('row', { name: /RC-045/ })).toContainText(SPOOL)

  await page.getByRole('link', { name: 'RC-045', exact: true }).first().click()
  await expect(page).toHaveURL(/\/lots\/RC-045$/)
  const madeOf = page.getByRole('table', { name: 'What the lot is made of' })
  await expect(madeOf.getByRole('row', { name: new RegExp(SPOOL) })).toContainText('wrap')
  await madeOf.getByRole('link', { name: SPOOL }).click()

  await expect(page).toHaveURL(new RegExp(`/materials-in/${SPOOL}$`))
  await expect(page.getByRole('heading', { level: 1 })).toContainText(SPOOL)
  const itsLots = page.getByRole('table').filter({ hasText: 'Along the lot' }).getByRole('rowheader')
  await expect(itsLots).toHaveText([...LOTS].reverse())

  // And from its lots to each of them, and back to the chart.
  await page.getByRole('link', { name: 'RC-046', exact: true }).click()
  await expect(page.getByRole('heading', { level: 1 })).toContainText('RC-046')
  await page.goBack()
  await page.getByRole('link', { name: /Rowan 1060.*staff chart/ }).click()
  await expect(page).toHaveURL(/\/drift\?product=ROWAN-1060/)
})
