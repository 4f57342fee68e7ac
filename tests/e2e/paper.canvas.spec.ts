import { readFile } from 'node:fs/promises'
import type { Page } from '@playwright/test'
import { benchPage } from './bench-page'
import { expect, test } from './support/test'

async function openPaper(page: Page, preset: string) {
  await benchPage(page).open(`?preset=${preset}`)
  await page.getByRole('tab', { name: 'Paper' }).click()
  const leaf = page.getByRole('article', { name: 'Paper' })
  await expect(leaf.getByRole('img', { name: /drawn at crank angle/ })).toBeVisible()
  return leaf
}

/** What a press hands over: its name and its bytes. */
async function savedBy(page: Page, press: () => Promise<void>) {
  const [download] = await Promise.all([page.waitForEvent('download'), press()])
  return { name: download.suggestedFilename(), bytes: await readFile(await download.path()) }
}

test('the design sheet is chosen by key and saved, at the angle taken', async ({ page }) => {
  const leaf = await openPaper(page, 'i4-2000')
  await leaf.getByRole('radiogroup', { name: 'Paper' }).getByRole('radio', { name: 'A4' }).focus()
  await page.keyboard.press('ArrowRight')
  await expect(leaf.getByRole('figure', { name: 'First sheet on Letter' })).toBeVisible()
  await leaf.getByRole('switch', { name: 'Loads' }).press('Space')
  await expect(leaf.getByRole('listitem').filter({ hasText: 'Loads' })).toHaveCount(0)
  await benchPage(page).still('30')
  await leaf.getByRole('button', { name: 'Take the angle shown now' }).click()
  await expect(leaf.getByRole('img', { name: /drawn at crank angle 30.0°/ })).toBeVisible()
  const press = () => leaf.getByRole('button', { name: 'Save the design sheet (PDF)' }).press('Enter')
  const { name, bytes } = await savedBy(page, press)
  expect(name).toMatch(/\.pdf$/)
  expect(bytes.subarray(0, 5).toString()).toBe('%PDF-')
  await expect(leaf.getByRole('status').filter({ hasText: 'The design sheet is saved' })).toBeVisible()
})

test('model, picture and figures are saved', async ({ page }) => {
  const leaf = await openPaper(page, 'i3-1000')
  const press = (name: string) => () => leaf.getByRole('button', { name }).click()
  const model = await savedBy(page, press('Save the model (.glb)'))
  expect(model.bytes.subarray(0, 4).toString()).toBe('glTF')
  const picture = await savedBy(page, press('Save the picture (PNG)'))
  expect(picture.bytes.subarray(1, 4).toString()).toBe('PNG')
  // 2000 wide, 1250 high and the title strip below
  expect([picture.bytes.readUInt32BE(16), picture.bytes.readUInt32BE(20)]).toEqual([2000, 1350])
  await leaf.getByLabel('Table', { exact: true }).selectOption('Bob-weights')
  const table = await savedBy(page, press('Save this table (CSV)'))
  expect(table.name).toBe('bob-weights.csv')
  expect(table.bytes.toString()).toContain('"Bob-weight, kg"')
  expect(table.bytes.toString()).toContain('rigid crank, constant speed')
})

test('a sheet that the server will not make now says why, and what to do', async ({ page }) => {
  const leaf = await openPaper(page, 'i3-1000')
  await page.route('**/api/v1/design-sheets', (route) =>
    route.fulfill({
      status: 429,
      contentType: 'application/problem+json',
      body: JSON.stringify({ detail: 'Too many sheets at once.', cure: 'Wait a minute.' }),
    }),
  )
  await leaf.getByRole('button', { name: 'Save the design sheet (PDF)' }).click()
  await expect(leaf).toContainText('Too many sheets at once. Wait a minute.')
})

test('the leaf has no fault that rules of accessibility find', async ({ page }) => {
  await openPaper(page, 'v8x-5000')
  await benchPage(page).expectNoBarriers('.leaf')
})
