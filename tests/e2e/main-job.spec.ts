import type { Page } from '@playwright/test'
import { expect, test } from './support/test'

const rule = (page: Page) => page.getByRole('slider', { name: 'Crank angle' })

/** Stands the bench still at an angle by typing it into the strip. */
async function standAt(page: Page, degrees: string) {
  const field = page.getByLabel('Crank angle, degrees')
  await field.fill(degrees)
  await field.press('Enter')
  await expect(rule(page)).toHaveAttribute('aria-valuenow', degrees)
}

test('a stranger describes an engine, opens a workshop, saves and sends a link; a guest sees it at the same angle', async ({
  page,
  stranger,
  guest,
}) => {
  await page.goto('/bench?preset=v8f-4200')
  await standAt(page, '137.5')

  await page.getByRole('button', { name: 'Save version 1' }).click()
  await page.getByRole('link', { name: 'Open a workshop' }).click()
  await page.getByLabel('Your name').fill(stranger.name)
  await page.getByLabel('Mail address').fill(stranger.email)
  await page.getByLabel('Password', { exact: true }).fill(stranger.password)
  await page.getByRole('button', { name: 'Open workshop' }).click()

  await page.waitForURL('**/bench**')
  await expect(page.getByLabel('Title of the sheet')).toHaveValue('90° V8 4.2 L, flat plane')
  await expect(rule(page)).toHaveAttribute('aria-valuenow', '137.5')
  await page.getByRole('button', { name: 'Save version 1' }).click()
  await page.getByRole('dialog').getByRole('button', { name: 'Save version 1' }).click()
  await expect(page.getByRole('button', { name: 'Save version 2' })).toBeVisible()

  await page.getByRole('button', { name: 'Share…' }).click()
  await page.getByRole('button', { name: 'Make a link' }).click()
  const link = page.getByLabel(/The link/)
  await expect(link).toHaveValue(/\/s\/[\w-]{20,}$/)

  await guest.goto(new URL(await link.inputValue()).pathname)
  await expect(guest.getByRole('heading', { name: '90° V8 4.2 L, flat plane' })).toBeVisible()
  await expect(rule(guest)).toHaveAttribute('aria-valuenow', '137.5')
  await expect(guest.locator('.live-scene')).toHaveAttribute('data-running', 'true')
  await expect(guest.locator('.stage-host')).toHaveAttribute('data-angle', '137.50')
})

test('the first page runs an engine and leads to the bench', async ({ page }) => {
  await page.goto('/')
  await expect(page.locator('.live-scene')).toHaveAttribute('data-running', 'true')
  await page.getByRole('link', { name: 'Open the bench' }).click()
  await expect(page.getByRole('heading', { name: 'Parts list' })).toBeVisible()
})
