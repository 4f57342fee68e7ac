import type { Page } from '@playwright/test'
import { benchPage } from './bench-page'
import { expect, test } from './support/test'

async function openClearances(page: Page, preset: string) {
  const bench = benchPage(page)
  await bench.open(`?preset=${preset}`)
  await page.getByRole('tab', { name: 'Clearances' }).click()
  const leaf = page.getByRole('article', { name: 'Clearances' })
  await expect(leaf).toBeVisible()
  return { bench, leaf }
}

test('the 45° V-twin clears its banks with a 199 mm rod, fails with 191, and a press mends it in one step', async ({
  page,
}) => {
  const { bench, leaf } = await openClearances(page, 'v2-45-1600')
  await expect(leaf).toContainText('Piston 1 to piston 2: 3.9 mm at 180.0°.')
  await bench.type('Rod, centres', '191')
  await expect(leaf.getByRole('status')).toContainText(
    'Piston 1 and piston 2 overlap by 1.8 mm near the crank at 180.0°.',
  )
  await leaf.getByRole('button', { name: 'Lengthen the rod to 196.0 mm' }).press('Enter')
  await expect(bench.field('Rod, centres')).toHaveValue('196.0')
  await expect(leaf).toContainText('pairs keep their limits.')
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(bench.field('Rod, centres')).toHaveValue('191.0')
  await expect(leaf.getByRole('status')).toContainText('overlap')
})

test('going to a clearance turns to the drawing at that instant and says it', async ({ page }) => {
  const { bench, leaf } = await openClearances(page, 'v2-45-1600')
  await leaf.getByRole('button', { name: 'Go to Piston 1 and Piston 2' }).press('Enter')
  await expect(page.getByRole('tab', { name: 'Drawing' })).toHaveAttribute('aria-selected', 'true')
  await bench.expectAngle('180.0')
  await expect(page.locator('.slips')).toContainText('Piston 1 to piston 2: 3.9 mm at 180.0°.')
})

test('another pair is chosen in the table, and a deck height makes the deck known', async ({ page }) => {
  const { leaf } = await openClearances(page, 'i4x-1000')
  await expect(leaf.getByRole('region', { name: 'Not known' })).toContainText('The deck height is not given.')
  const deck = leaf.getByRole('textbox', { name: 'Deck height' })
  await deck.fill('140')
  await deck.press('Enter')
  await expect(leaf.getByRole('region', { name: 'Not known' })).toContainText('Nothing')
  await expect(leaf.getByRole('status').first()).toContainText('above the deck at top dead centre')
  await leaf.getByRole('button', { name: 'Rod to bore edge' }).first().click()
  await expect(leaf.getByRole('region', { name: /^Rod to bore edge/ })).toContainText('as they are drawn')
  await deck.fill('-5')
  await deck.blur()
  await expect(deck).toHaveValue('-5')
  await expect(leaf.locator('.errnote').last()).toBeVisible()
})

test('the leaf has no barriers', async ({ page }) => {
  const { bench } = await openClearances(page, 'v2-45-1600')
  await bench.type('Rod, centres', '191')
  await benchPage(page).expectNoBarriers('.leaf-area')
})
