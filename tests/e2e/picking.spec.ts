import { benchPage } from './bench-page'
import { expect, test } from './support/test'

test('a part is picked on the drawing and tells its live figures', async ({ page }) => {
  const bench = benchPage(page)
  await bench.open('?preset=single-450')
  await bench.still('30')
  await page.getByRole('radio', { name: 'Side' }).click()
  const box = (await bench.drawing.boundingBox())!
  await expect(async () => {
    await page.mouse.click(box.x + box.width / 2, box.y + box.height / 2)
    await expect(bench.picked).toBeVisible({ timeout: 1000 })
  }).toPass()
  await expect(bench.picked.locator('dd.n').first()).toHaveText(/\d/)
  await page.getByRole('button', { name: 'Put the part back' }).click()
  await expect(bench.picked).toHaveCount(0)
})
