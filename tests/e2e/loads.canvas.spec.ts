import type { Page } from '@playwright/test'
import { benchPage } from './bench-page'
import { expect, test } from './support/test'

async function openLoads(page: Page, preset = 'i4-2000') {
  const bench = benchPage(page)
  await bench.open(`?preset=${preset}`)
  await page.getByRole('tablist', { name: 'Leaves' }).getByRole('tab', { name: 'Loads' }).click()
  const leaf = page.getByRole('article', { name: 'Loads' })
  await expect(leaf.getByRole('heading', { name: 'Bearings' })).toBeVisible()
  return { bench, leaf }
}

test('the load of a pin is read by key and by pointer, in newtons and on its area, and agrees with the table', async ({
  page,
}) => {
  const { leaf } = await openLoads(page)
  const polar = leaf.getByRole('slider', { name: 'Load of pin 1, rod 1' })
  await polar.focus()
  await page.keyboard.press('Home')
  await expect(polar).toHaveAttribute(
    'aria-valuetext',
    /^Crank angle 0°: gas .* kN towards .*MPa on its area$/,
  )
  // the peak of the table, 24.2 kN at 29°, one key press at a time from 0°
  for (let step = 0; step < 29; step++) await page.keyboard.press('ArrowRight')
  await expect(polar).toHaveAttribute('aria-valuetext', /^Crank angle 29°: .*total 24\.2 kN/)
  const row = leaf.getByRole('row', { name: /^pin 1, rod 1/ })
  await expect(row).toContainText('24.2')
  await expect(row).toContainText('29')
  const box = (await polar.boundingBox())!
  await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2)
  await expect(leaf.locator('.chart-said').first()).toContainText('Crank angle')
})

test('another bearing, another frame, and only inertia: the choice is the table’s too', async ({ page }) => {
  const { leaf } = await openLoads(page)
  await leaf.getByRole('button', { name: 'main M3' }).click()
  await expect(leaf.getByRole('heading', { name: 'Load of main M3' })).toBeVisible()
  await leaf.getByRole('radio', { name: 'In the block' }).click()
  await expect(leaf.getByText(/The bore in the block is least loaded from \d+° to \d+°/)).toBeVisible()
  await leaf.getByRole('switch', { name: 'gas' }).click()
  await leaf.getByRole('switch', { name: 'total' }).click()
  const polar = leaf.getByRole('slider', { name: 'Load of main M3' })
  await polar.focus()
  await page.keyboard.press('Home')
  await expect(polar).toHaveAttribute(
    'aria-valuetext',
    /^Crank angle 0°: inertia [^,]*, inertia .* on its area$/,
  )
})

test('the point of the clock moves on the polar without the leaf being drawn anew', async ({ page }) => {
  const { bench, leaf } = await openLoads(page)
  const spot = leaf.locator('g[data-live]:has(.spot)')
  const before = await spot.getAttribute('transform')
  await bench.still('90')
  await expect(spot).not.toHaveAttribute('transform', before!)
})

test('a flywheel for a wanted fluctuation, what is refused, and the way into the parts list', async ({
  page,
}) => {
  const { bench, leaf } = await openLoads(page)
  const wanted = leaf.getByRole('textbox', { name: 'Speed may vary by' })
  await wanted.fill('-1 %')
  await wanted.blur()
  await expect(wanted).toHaveValue('-1 %')
  await expect(bench.note).toContainText('Read as −1')
  await expect(bench.note).toContainText('1.00 % still stands')
  await leaf.getByRole('button', { name: 'Keep 1.00 %' }).click()
  await expect(bench.note).toHaveCount(0)
  await expect(wanted).toHaveValue('1.00')
  await wanted.fill('0.5')
  await wanted.blur()
  await expect(leaf.getByText(/It takes 0\.220 kg m² in all/)).toBeVisible()
  await leaf.getByRole('button', { name: /^Take .* as the flywheel$/ }).click()
  await expect(leaf.getByText(/: enough\./)).toBeVisible()
  await expect(bench.field('Flywheel inertia')).not.toHaveValue('0.140')
  const given = leaf.getByRole('textbox', { name: 'Flywheel and free end together' })
  await given.fill('0.11 kg m²')
  await expect(leaf.getByText(/The speed varies by (0\.99\d|1\.00\d) %/)).toBeVisible()
})

test('an order is chosen by key, its star follows, and majors are told in words', async ({ page }) => {
  const { leaf } = await openLoads(page)
  await expect(leaf.getByText('All cylinders are in phase at orders 2, 4, 6, 8, 10, 12.')).toBeVisible()
  const bars = leaf.getByRole('slider', { name: 'Turning moment by order, total' })
  await bars.focus()
  await page.keyboard.press('Home')
  await page.keyboard.press('ArrowRight')
  await expect(bars).toHaveAttribute('aria-valuetext', /^Order, per crank turn 1:/)
  await page.keyboard.press('Enter')
  await expect(leaf.getByRole('heading', { name: 'Cylinders at order 1' })).toBeVisible()
  await expect(leaf.getByText(/At order 1 the vectors of 4 cylinders add up to 0\.00 of 4/)).toBeVisible()
})

test('the sweep goes to over-speed with its red line, whatever is chosen', async ({ page }) => {
  const { leaf } = await openLoads(page)
  const sweep = leaf.getByRole('region', { name: /^Speed sweep/ })
  await expect(sweep.getByText('red line', { exact: true })).toBeVisible()
  await expect(sweep.getByText(/At the red line, 6,800 rpm: order 1/)).toBeVisible()
  await sweep.getByRole('combobox').selectOption('Piston acceleration')
  await expect(sweep.getByText(/^At 6,000 rpm: [\d,]+ g\. At the red line/)).toBeVisible()
  const chart = sweep.getByRole('slider', { name: 'Piston acceleration over speed' })
  await chart.focus()
  await page.keyboard.press('End')
  await expect(chart).toHaveAttribute('aria-valuetext', /^Speed 7,820 rpm/)
})

test('the leaf has no barriers and keeps its caution and its method', async ({ page }) => {
  const { leaf } = await openLoads(page)
  await expect(leaf.getByText(/as if the crank were hinged at every main/)).toBeVisible()
  for (const section of [/^Method/, /^Torsion/])
    await expect(
      leaf.getByRole('region', { name: section }).getByText(/a qualified person come first/),
    ).toBeVisible()
  await benchPage(page).expectNoBarriers('.leaf')
})
