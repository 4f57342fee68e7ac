import type { Page } from '@playwright/test'
import { benchPage } from './bench-page'
import { expect, test } from './support/test'

async function openLeaf(page: Page, preset: string) {
  const bench = benchPage(page)
  await bench.open(`?preset=${preset}`)
  await page.getByRole('tab', { name: 'Balance', exact: true }).first().click()
  await expect(page.getByRole('heading', { name: 'Counterweights, a web at a time' })).toBeVisible()
  const leaf = page.getByRole('article', { name: 'Balance' })
  return { bench, leaf, cell: (name: string) => leaf.getByRole('textbox', { name, exact: true }) }
}

const number = (text: string) => Number(text.replace(/[^\d.−-]/g, '').replace('−', '-'))

test('counterweights are solved, said to be beyond their web, closed by a slug, and taken back in one step', async ({
  page,
}) => {
  const { leaf, cell } = await openLeaf(page, 'v8x-5000')
  await expect(leaf.locator('.leaf-head')).toContainText(
    'is taken by counterweights; it takes no balance shaft',
  )
  await expect(cell('Moment of 1F')).toHaveValue('74,078')
  await leaf.getByRole('button', { name: 'Balance in these places' }).click()
  await expect(leaf).toContainText('Balanced with')
  await expect(leaf.locator('.slugs')).toContainText('1F:')
  await expect(leaf.locator('.web-table .beyond')).toHaveCount(2)
  expect(number(await cell('Mass of 2D').inputValue())).toBe(0)
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(cell('Moment of 1F')).toHaveValue('74,078')
  await leaf.getByRole('switch', { name: 'Within what each web holds' }).click()
  await leaf.getByRole('button', { name: 'Balance in these places' }).click()
  await expect(leaf.locator('.web-table .beyond')).toHaveCount(0)
  await expect(leaf.locator('.leaf-head')).toContainText('is taken by counterweights')
})

test('the arrow of a web is moved by keys and by pointer, a gesture one step; a moment can be typed', async ({
  page,
}) => {
  const { leaf, cell } = await openLeaf(page, 'v8x-5000')
  const undo = page.getByRole('button', { name: 'Undo' })
  const handle = leaf.getByRole('slider')
  await leaf.getByRole('button', { name: 'Show web 2F' }).click()
  await handle.press('ArrowRight')
  await expect(cell('Angle of 2F')).toHaveValue('199.4')
  await handle.press('Shift+ArrowLeft')
  await expect(cell('Angle of 2F')).toHaveValue('199.3')
  await handle.press('+')
  // 1 % of what the half disc holds
  await expect(cell('Moment of 2F')).toHaveValue('33,717')
  for (let step = 0; step < 3; step++) await undo.click()
  await expect(cell('Moment of 2F')).toHaveValue('32,967')
  await expect(cell('Angle of 2F')).toHaveValue('198.4')

  const box = (await handle.locator('.web-grip').boundingBox())!
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2]
  await page.mouse.move(x, y)
  await page.mouse.down()
  await page.mouse.move(x + 30, y + 10, { steps: 4 })
  await page.mouse.move(x + 60, y + 10, { steps: 4 })
  await page.mouse.up()
  expect(number(await cell('Angle of 2F').inputValue())).toBeLessThan(180)
  await undo.click()
  await expect(cell('Angle of 2F')).toHaveValue('198.4')

  await cell('Moment of 2F').fill('50 oz in')
  await cell('Moment of 2F').blur()
  await expect(cell('Moment of 2F')).toHaveValue('36,004')
  await cell('Moment of 2F').fill('heavy')
  await expect(leaf.locator('.errnote')).toContainText('Could not read')
  await leaf.getByRole('button', { name: /^Back to 36,004/ }).click()
  await expect(cell('Moment of 2F')).toHaveValue('36,004')
})

test('the factor is quoted both ways, and a heavier piston shows in the planes', async ({ page }) => {
  const { leaf, cell } = await openLeaf(page, 'v8x-5000')
  await expect(leaf.locator('.card-table tfoot')).toContainText('1,739.8 g')
  await cell('Of one cylinder’s reciprocating mass').fill('90')
  await expect(cell('Of all reciprocating mass on the pin')).toHaveValue('45.0')
  await page.getByRole('button', { name: 'Undo' }).click()
  await cell('Heavier by').fill('8')
  await leaf.getByRole('combobox', { name: 'In cylinder' }).selectOption('all alike')
  const planes = leaf.getByRole('table', { name: 'Residual unbalance with the changed part' })
  await expect(planes).toContainText('out of limit')
  await expect(leaf.getByRole('table', { name: 'Residual unbalance in two planes' })).toContainText(
    '274 g mm',
  )
  await expect(leaf.getByRole('table', { name: 'Residual unbalance in two planes' })).not.toContainText(
    'out of',
  )
})

test('shafts for what turns backward: wrongly phased they add, rightly they go into the engine', async ({
  page,
}) => {
  const { leaf, cell } = await openLeaf(page, 'i3-1000')
  await expect(leaf.locator('.leaf-head')).toContainText('needs a shaft at crank speed against the crank')
  await cell('Set wrong by').fill('180')
  await expect(leaf).toContainText('they add to the couple: worse than no shafts.')
  await cell('Set wrong by').fill('0')
  await leaf.getByRole('button', { name: 'Add to the engine' }).click()
  await expect(leaf.locator('.leaf-head')).toContainText('is taken by a shaft against the crank')
  await expect(page.getByRole('button', { name: 'Balance shafts, 2' })).toBeVisible()
})

test('a crank without counterweights says what to do, and no part of the leaf is closed to anybody', async ({
  page,
}) => {
  const { bench, leaf } = await openLeaf(page, 'm6-2t-520')
  await expect(leaf).toContainText('This crank has no counterweights.')
  await bench.expectNoBarriers('.leaf')
  await page.goto('/bench?preset=v8x-5000')
  await page.getByRole('tab', { name: 'Balance', exact: true }).first().click()
  await expect(leaf.getByRole('slider')).toBeVisible()
  await bench.expectNoBarriers('.leaf')
  await bench.expectNoSidewaysScroll()
})
