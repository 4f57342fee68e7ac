import type { Page } from '@playwright/test'
import { benchPage } from './bench-page'
import { expect, test } from './support/test'

async function openCompare(page: Page) {
  await benchPage(page).open('?preset=v8x-5000')
  await page.getByRole('tab', { name: 'Compare' }).click()
  const leaf = page.getByRole('article', { name: 'Compare' })
  await leaf.getByLabel('Second engine', { exact: true }).selectOption({ label: '90° V8 4.2 L, flat plane' })
  await expect(leaf.getByRole('region', { name: /^2. 90° V8 4.2 L/ })).toBeVisible()
  return leaf
}

test('a cross-plane and a flat-plane V8 at equal rpm and displacement differ in banks and second order, not in intervals', async ({
  page,
}) => {
  const leaf = await openCompare(page)
  await leaf.getByRole('radiogroup', { name: 'Size' }).getByRole('radio', { name: 'As drawn' }).focus()
  await page.keyboard.press('ArrowRight')
  const table = leaf.getByRole('region', { name: 'What differs', exact: true }).getByRole('table')
  await expect(table.getByRole('row', { name: /^Bank A/ })).toContainText('every 180°, 4 times')
  await expect(table.getByRole('row', { name: /^Second order, horizontal 0.00/ })).toBeVisible()
  await expect(table.getByRole('row', { name: /^Intervals/ })).toHaveCount(0)
  await expect(table.getByRole('row', { name: /^Swept volume/ })).toHaveCount(0)
  await expect(leaf).toContainText('at equal displacement and rpm')
})

test('one clock, one scale: let go of them and each engine has its own', async ({ page }) => {
  const leaf = await openCompare(page)
  const rule = (number: number) => leaf.getByRole('slider', { name: `Crank angle of engine ${number}` })
  await rule(2).focus()
  await page.keyboard.press('PageUp')
  await expect(rule(1)).toHaveAttribute('aria-valuenow', '10.0')
  const perCm = leaf.getByText(/per cm/)
  const words = await perCm.allInnerTexts()
  expect(words).toHaveLength(2)
  expect(words[0]).toBe(words[1])
  await leaf.getByRole('switch', { name: 'One scale of force' }).press('Space')
  await expect(perCm.nth(1)).not.toHaveText(words[1])
  await leaf.getByRole('switch', { name: 'One clock' }).click()
  await rule(2).focus()
  await page.keyboard.press('PageUp')
  await expect(rule(2)).toHaveAttribute('aria-valuenow', '20.0')
  await expect(rule(1)).toHaveAttribute('aria-valuenow', '10.0')
})

test('a file that is no engine is refused where it was chosen, and the engine stays', async ({ page }) => {
  const leaf = await openCompare(page)
  await leaf.getByLabel('Second engine, from a file').setInputFiles({
    name: 'notes.json',
    mimeType: 'application/json',
    buffer: Buffer.from('{"format":"list/1"}'),
  })
  await expect(leaf).toContainText('notes.json, format: This is neither a scene nor a crank train.')
  await expect(leaf.getByRole('region', { name: /^2. 90° V8 4.2 L/ })).toBeVisible()
})

test('at 360 pixels one engine stands at a time, with a switch; rules of accessibility find no fault', async ({
  page,
}) => {
  await page.setViewportSize({ width: 360, height: 780 })
  const leaf = await openNarrow(page)
  await leaf.getByRole('radio', { name: 'Engine 2' }).click()
  await expect(leaf.getByRole('region', { name: /^2\. / })).toBeVisible()
  await expect(leaf.getByRole('region', { name: /^1\. / })).toHaveCount(0)
  await benchPage(page).expectNoBarriers('.leaf')
})

async function openNarrow(page: Page) {
  await benchPage(page).open('?preset=v8x-5000')
  await page.getByRole('tab', { name: 'Compare' }).click()
  return page.getByRole('article', { name: 'Compare' })
}
