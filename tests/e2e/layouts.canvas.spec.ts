import { benchPage } from './bench-page'
import { expect, test } from './support/test'

test('a layout is looked for, read off the plot and the table, and opened as one step', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000')
  await page.getByRole('tab', { name: 'Layouts' }).click()
  const leaf = page.getByRole('article', { name: 'Layouts' })
  await leaf.getByLabel('Even firing: at most').fill('0')
  await leaf.getByLabel('Banks alternate: at most').fill('0')
  await leaf.getByRole('button', { name: 'Search' }).press('Enter')
  await expect(leaf).toContainText('0/180/180/0 is first')
  await expect(leaf.getByRole('status').first()).toContainText('phasings')

  const plot = leaf.getByRole('slider', { name: 'Layouts' })
  await plot.focus()
  await plot.press('End')
  await expect(plot).toHaveAttribute('aria-valuetext', /F2/)
  await plot.press('Enter')
  const last = await plot.getAttribute('aria-valuemax')
  await expect(leaf.getByText(`layout ${last}`, { exact: true })).toBeVisible()

  await leaf.getByRole('button', { name: 'Force 2' }).click()
  await leaf.getByRole('button', { name: 'Open layout 1 on the bench' }).click()
  await expect(bench.title).toHaveValue('90° V8, 0/180/180/0')
  await expect(bench.field('Throws')).toHaveValue('0/180/180/0')
  await expect(bench.field('Bore')).toHaveValue('95.0')
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(bench.title).toHaveValue('90° V8 5.0 L, cross plane')
  await expect(bench.field('Throws')).toHaveValue('0/90/270/180')

  await page.getByRole('tab', { name: 'Drawing' }).click()
  await page.getByRole('tab', { name: 'Layouts' }).click()
  await expect(leaf).toContainText('0/180/180/0 is first')
})

test('wishes that nothing fulfils name themselves and the nearest miss, which opens too', async ({
  page,
}) => {
  const bench = benchPage(page)
  await bench.open('?preset=v6-60-3000')
  await page.getByRole('tab', { name: 'Layouts' }).click()
  const leaf = page.getByRole('article', { name: 'Layouts' })
  await leaf.getByLabel('Number of cylinders').fill('6')
  await leaf.getByLabel('Angles between banks').fill('90')
  await leaf.getByLabel('Even firing: at most').fill('0')
  await leaf.getByRole('button', { name: 'Search' }).click()
  await expect(leaf).toContainText('Nothing on these grids has unevenness at most 0°.')
  await leaf.getByRole('button', { name: 'Open on the bench' }).click()
  await expect(bench.title).toHaveValue(/^90° V6, 0\//)
  await expect(bench.note).toHaveCount(0)
})

test('a number of cylinders that cannot be is refused beside its field, and mended with one press', async ({
  page,
}) => {
  const bench = benchPage(page)
  await bench.open('?preset=i4-2000')
  await page.getByRole('tab', { name: 'Layouts' }).click()
  const leaf = page.getByRole('article', { name: 'Layouts' })
  const field = leaf.getByLabel('Number of cylinders')
  await field.fill('40')
  await field.blur()
  await expect(field).toHaveValue('40')
  await expect(field).toHaveAttribute('aria-invalid', 'true')
  await expect(leaf.getByRole('alert')).toContainText('it can be 1 to 12')
  await expect(leaf.getByRole('button', { name: 'Search' })).toBeDisabled()
  await leaf.getByRole('button', { name: 'Use 8' }).click()
  await expect(field).toHaveValue('8')
  await expect(leaf.getByRole('button', { name: 'Search' })).toBeEnabled()
})

test('the leaf has no barriers, before and after a search', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=i4-2000')
  await page.getByRole('tab', { name: 'Layouts' }).click()
  const leaf = page.getByRole('article', { name: 'Layouts' })
  await expect(leaf.getByRole('heading', { name: 'Wishes' })).toBeVisible()
  await bench.expectNoBarriers('.leaf')
  await leaf.getByRole('button', { name: 'Search' }).click()
  await expect(leaf.getByRole('heading', { name: 'Trade-off' })).toBeVisible()
  await bench.expectNoBarriers('.leaf')
})
