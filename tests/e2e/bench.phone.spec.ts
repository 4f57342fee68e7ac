import { benchPage } from './bench-page'
import { expect, test } from './support/test'

test('at 360 px the bench works without sideways scroll', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000')
  await bench.expectNoSidewaysScroll()
  await bench.still('22')
  await bench.expectAngle('22.0')
  await page.getByRole('button', { name: 'On 1 degree' }).tap()
  await bench.expectAngle('23.0')
  await bench.type('Bore', '93')
  await expect(bench.field('Bore')).toHaveValue('93.0')
  await page.getByRole('radio', { name: 'in, oz' }).tap()
  await expect(bench.field('Stroke')).toHaveValue('3.472')
  await page.getByRole('radio', { name: 'mm, g' }).tap()
  await page.getByRole('button', { name: 'Cylinder by cylinder, 8' }).tap()
  await bench.type('Rod, centres', '40')
  await page.getByRole('button', { name: 'Show', exact: true }).tap()
  await bench.expectNoSidewaysScroll()
  await bench.expectNoBarriers()
})

test('a finger finds its targets: buttons of the sheet are 44 px high', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=v8x-5000', 'running')
  for (const name of ['Pause', 'On 1 degree', 'Show', 'Presets…', 'Save version 1']) {
    const box = await page.getByRole('button', { name, exact: true }).boundingBox()
    expect(Math.round(box!.height), name).toBeGreaterThanOrEqual(44)
  }
  await page.getByRole('button', { name: 'Sheets' }).tap()
  await expect(page.getByRole('link', { name: 'Scenes' })).toBeVisible()
})
