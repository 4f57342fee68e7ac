import type { Page } from '@playwright/test'
import { benchPage } from './bench-page'
import { expect, test } from './support/test'

async function openGas(page: Page, preset: string) {
  const bench = benchPage(page)
  await bench.open(`?preset=${preset}`)
  await page.getByRole('tab', { name: 'Gas' }).click()
  const leaf = page.getByRole('article', { name: 'Gas' })
  await expect(leaf).toBeVisible()
  return { bench, leaf, figures: leaf.getByRole('region', { name: 'Indicated figures' }) }
}

const trace = (row: (angle: number) => string) =>
  Buffer.from(['deg;bar absolute', ...Array.from({ length: 720 }, (_, i) => row(i - 360))].join('\n'), 'utf8')
const bring = (page: Page, name: string, buffer: Buffer) =>
  page.getByLabel(/^Measured trace, a CSV file/).setInputFiles({ name, mimeType: 'text/csv', buffer })

test('a figure of the model moves the mean pressures at once, and what cannot be keeps its text and its reason', async ({
  page,
}) => {
  const { bench, leaf, figures } = await openGas(page, 'v8x-5000')
  await expect(figures.getByRole('row', { name: 'model engine' })).toContainText('13.40')
  const heat = leaf.getByRole('textbox', { name: 'Heat a cycle' })
  await heat.fill('800')
  await heat.press('Enter')
  await expect(figures.getByRole('row', { name: 'model engine' })).not.toContainText('13.40')
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(figures.getByRole('row', { name: 'model engine' })).toContainText('13.40')
  const closes = leaf.getByRole('textbox', { name: 'Intake closes' })
  await closes.fill('-400')
  await closes.blur()
  await expect(closes).toHaveValue('-400')
  await expect(leaf.locator('.errnote')).toContainText('360°')
  await leaf.getByRole('button', { name: 'Back to −140.0°' }).click()
  await expect(closes).toHaveValue('−140.0')
  await expect(bench.note).toHaveCount(0)
})

test('a measured trace is refused row by row, then shown over the model, taken in one step and given back', async ({
  page,
}) => {
  const { leaf, figures } = await openGas(page, 'i4-2000')
  await bring(
    page,
    'bad.csv',
    trace((a) => (a === -148 ? '-152;2' : a === 5 ? '5;?' : `${a};2`)),
  )
  await expect(leaf.getByRole('alert')).toContainText('bad.csv was not taken.')
  await expect(leaf.getByRole('row', { name: /^214 angle goes back from −149 to −152/ })).toBeVisible()
  await expect(leaf.getByRole('row', { name: /^367 “\?” is not a number/ })).toBeVisible()

  await bring(
    page,
    'good.csv',
    trace((a) => `${a};${(1 + 60 * Math.exp(-(((a - 12) / 45) ** 2))).toFixed(3)}`),
  )
  await expect(leaf.getByRole('alert')).toHaveCount(0)
  await expect(leaf.getByRole('status')).toContainText('good.csv: 720 points')
  await expect(figures.getByRole('row', { name: 'measured engine' })).toContainText('61.0')
  await expect(figures.getByRole('row', { name: 'model engine' })).toBeVisible()
  await leaf.getByRole('button', { name: 'Use the trace' }).press('Enter')
  await expect(page.getByLabel('Gas model')).toHaveValue('trace')
  await expect(leaf).toContainText('The measured trace indicates')
  await expect(figures.getByRole('row', { name: 'model engine' })).toBeVisible()
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(page.getByLabel('Gas model')).toHaveValue('heat-release')
  await page.getByRole('button', { name: 'Redo' }).click()
  await leaf.getByRole('button', { name: 'Back to the model' }).click()
  await expect(page.getByLabel('Gas model')).toHaveValue('heat-release')
})

test('an engine without gas says so and offers the model; the scales of the loop turn logarithmic by key', async ({
  page,
}) => {
  const { leaf } = await openGas(page, 'single-450')
  await page.getByLabel('Gas model').selectOption('none')
  await expect(leaf).toContainText('No gas works in this engine.')
  await leaf.getByRole('button', { name: 'Use the model' }).click()
  await expect(page.getByLabel('Gas model')).toHaveValue('heat-release')
  await leaf.getByRole('radio', { name: 'Even scales' }).press('ArrowRight')
  await expect(leaf).toContainText('On logarithmic scales compression and expansion are nearly straight.')
})

test('the leaf has no barriers and reads point by point', async ({ page }) => {
  const { leaf } = await openGas(page, 'v8x-5000')
  const chart = leaf.getByRole('slider', { name: 'Pressure over the cycle' })
  await chart.press('Home')
  await expect(chart).toHaveAttribute('aria-valuetext', /^Angle from firing top dead centre −360°: /)
  await benchPage(page).expectNoBarriers('.leaf-area')
})
