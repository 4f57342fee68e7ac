import type { Page } from '@playwright/test'
import { benchPage } from './bench-page'
import { expect, test } from './support/test'

async function openFiring(page: Page, preset: string) {
  const bench = benchPage(page)
  await bench.open(`?preset=${preset}`)
  await page.getByRole('tab', { name: 'Firing' }).click()
  const leaf = page.getByRole('article', { name: 'Firing' })
  await expect(leaf).toBeVisible()
  return { bench, leaf, orders: leaf.getByRole('region', { name: 'Orders the crank allows' }) }
}

test('the eight even orders of a cross-plane V8 are ranked, one is taken by key, and undo brings the old one back', async ({
  page,
}) => {
  const { bench, orders } = await openFiring(page, 'v8x-5000')
  await expect(orders).toContainText('8 even orders.')
  const other = orders.getByRole('button', { name: '1-8-7-2-6-5-4-3', exact: true })
  await other.focus()
  await page.keyboard.press('Enter')
  await expect(orders.getByRole('row', { name: 'Same throw 3 3' })).toBeVisible()
  await orders.getByRole('button', { name: 'Take 1-8-7-2-6-5-4-3' }).press('Enter')
  await expect(bench.field('Firing order')).toHaveValue('1-8-7-2-6-5-4-3')
  await expect(orders).toContainText('This is the present order.')
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(bench.field('Firing order')).toHaveValue('1-8-4-3-6-5-7-2')
})

test('an engine that cannot fire evenly shows all its orders, and says why there is no even one', async ({
  page,
}) => {
  const { leaf, orders } = await openFiring(page, 'v2-45-1600')
  await expect(orders).toContainText('405-315')
  await expect(leaf.getByRole('alert')).toHaveCount(0)
  await orders.getByRole('button', { name: '1-2', exact: true }).click()
  await orders.getByRole('button', { name: '45-675', exact: true }).click()
  await expect(orders.getByRole('row', { name: 'Intervals 45-675 405-315' })).toBeVisible()
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(orders.getByRole('row', { name: 'Intervals 405-315 405-315' })).toBeVisible()
  await orders.getByRole('radio', { name: 'Even' }).click()
  await expect(orders).toContainText('No even order.')
  await expect(orders).toContainText('allow no even order')
})

test('a grouping of collectors is looked at, taken, and its pulses are said', async ({ page }) => {
  const { leaf } = await openFiring(page, 'v8x-5000')
  const collectors = leaf.getByRole('region', { name: /^Collectors/ })
  const pulses = leaf.getByRole('region', { name: /^Exhaust pulses/ })
  await pulses.getByLabel('Blow-down lasts').fill('120')
  await expect(pulses).toContainText('4 of 8 pulses overlap another of their collector')
  await collectors.getByRole('button', { name: '8-3-5-2 + 1-4-6-7', exact: true }).click()
  await expect(pulses).toContainText('No two pulses of one collector overlap.')
  await expect(pulses).toContainText('all alike, 180° after the last pulse')
  await collectors.getByRole('button', { name: 'Take 8-3-5-2 + 1-4-6-7' }).click()
  await expect(collectors).toContainText('now 8-3-5-2 + 1-4-6-7')
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(collectors).toContainText('now 2-4-6-8 + 1-3-5-7')
})

test('throws are set from a wanted order in one step; a cylinder named twice is refused beside the field', async ({
  page,
}) => {
  const { bench, leaf } = await openFiring(page, 'i3-1000')
  const phasing = leaf.getByRole('region', { name: 'Throws for a wanted order' })
  const order = phasing.getByLabel('Wanted order')
  await order.fill('1-3-3')
  await expect(phasing.getByRole('alert')).toContainText('cylinder 3 appears more than once and 2 is missing')
  await expect(order).toHaveValue('1-3-3')
  await expect(order).toHaveAttribute('aria-invalid', 'true')
  await order.fill('1-2-3')
  await expect(phasing.getByRole('alert')).toHaveCount(0)
  await phasing.getByRole('button', { name: 'Set the throws so' }).click()
  await expect(bench.field('Throws')).toHaveValue('0/120/240')
  await expect(bench.field('Firing order')).toHaveValue('1-2-3')
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(bench.field('Throws')).toHaveValue('0/240/120')
  await expect(bench.field('Firing order')).toHaveValue('1-3-2')
})

test('the rhythm is off until it is asked for, its marks follow the crank, and a speed that is none is refused', async ({
  page,
}) => {
  const { bench, leaf } = await openFiring(page, 'single-125-2t')
  const rhythm = leaf.getByRole('region', { name: 'Rhythm' })
  await expect(rhythm).toContainText('no engine sound')
  await expect(rhythm.locator('.now')).toHaveCount(0)
  await bench.still('120')
  await rhythm.getByRole('switch').click()
  await expect(rhythm.locator('li.now')).toHaveText(/1/)
  await rhythm.getByRole('radio', { name: 'Own speed' }).click()
  await rhythm.getByRole('textbox', { name: 'Speed of the rhythm' }).fill('60000')
  await expect(rhythm.getByRole('alert')).toContainText('Give 1 to 3,000 rpm')
  await rhythm.getByRole('slider', { name: 'Volume' }).press('ArrowRight')
  await expect(rhythm).toContainText('Volume 45 %')
  await page.getByRole('tab', { name: 'Drawing' }).click()
  await page.getByRole('tab', { name: 'Firing' }).click()
  await expect(page.getByRole('switch', { name: 'Rhythm off' })).toBeVisible()
})

test('the firing leaf has no barriers and does not scroll sideways', async ({ page }) => {
  const { bench, orders } = await openFiring(page, 'm6-2t-520')
  await expect(orders).toContainText('One even order.')
  await benchPage(page).expectNoBarriers('.leaf')
  await page.setViewportSize({ width: 360, height: 780 })
  await bench.expectNoSidewaysScroll()
})
