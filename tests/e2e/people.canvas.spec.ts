import type { Page } from '@playwright/test'
import { expectNoBarriers, expectNoSidewaysScroll } from './support/barriers'
import { expect, test } from './support/test'

const sameOrigin = { 'sec-fetch-site': 'same-origin' }

/** The workshop before whoever is signed in on the page. */
async function workshopOf(page: Page): Promise<string> {
  const { person } = await (await page.request.get('/api/v1/auth/session')).json()
  return person.workshop
}

/** The address in the last mail to somebody, as the post of this machine keeps it. */
async function linkIn(page: Page, email: string): Promise<string> {
  let address = ''
  await expect
    .poll(async () => {
      const { mails } = await (await page.request.get('/api/v1/local/mail')).json()
      const mail = mails.find(({ to }: { to: string }) => to.includes(email))
      address = /https?:\/\/\S+\/invitation\?token=[\w-]+/.exec(mail?.text ?? '')?.[0] ?? ''
      return address
    })
    .not.toBe('')
  const { pathname, search } = new URL(address)
  return pathname + search
}

test('an invitation by mail brings somebody in with a new account and the role that was given', async ({
  page,
  person,
  guest,
}) => {
  const email = `bram-${person.email}`
  await page.goto('/people')
  await expect(page.getByRole('row', { name: new RegExp(person.email) })).toContainText('you')
  await page.getByRole('button', { name: 'Invite…' }).click()
  const dialog = page.getByRole('dialog', { name: 'Invite somebody' })
  await dialog.getByLabel('Mail address').fill('bram at home')
  await dialog.getByLabel('Role').selectOption('service')
  await page.keyboard.press('Tab')
  await dialog.getByRole('button', { name: 'Send invitation' }).press('Enter')
  await expect(dialog.getByRole('alert')).not.toBeEmpty()
  await expect(dialog.getByLabel('Mail address')).toHaveValue('bram at home')
  await dialog.getByLabel('Mail address').fill(email)
  await dialog.getByLabel('Mail address').press('Enter')
  await expect(page.getByRole('row', { name: new RegExp(email) })).toContainText('open until')
  await expectNoBarriers(page)

  await guest.goto(await linkIn(page, email))
  await expect(guest.getByRole('heading', { level: 1 })).toContainText(`${person.name}’s workshop`)
  const form = guest.getByRole('form', { name: 'Invitation' })
  await form.getByLabel('Your name').fill('Bram Tollivane')
  await form.getByLabel('Password', { exact: true }).fill(person.password)
  await form.getByRole('button', { name: 'Join workshop' }).click()
  await guest.waitForURL('**/scenes')
  await expect(guest.getByRole('region', { name: 'Title block' })).toContainText('service')

  await page.getByRole('tab', { name: 'People' }).click()
  await page.reload()
  await expect(page.getByRole('combobox', { name: 'Role of Bram Tollivane' })).toHaveValue('service')
})

test('the only owner can neither leave nor become something else, and is told why', async ({
  page,
  person,
}) => {
  await page.goto('/people')
  const role = page.getByRole('combobox', { name: `Role of ${person.name}` })
  await expect(role).toBeDisabled()
  await expect(role).toHaveAccessibleDescription('The only owner: make somebody else one first.')
  await expect(page.getByRole('button', { name: 'Leave…' })).toBeDisabled()
  await expect(page.getByRole('region', { name: 'Title block' })).toContainText('The only owner')
  const id = await workshopOf(page)
  const left = await page.request.delete(`/api/v1/workshops/${id}/membership`, { headers: sameOrigin })
  expect(left.status()).toBe(409)
})

test('by keyboard: a second workshop, going over, a setting that is out of range, a token shown once', async ({
  page,
  person,
}) => {
  const first = await workshopOf(page)
  const made = await page.request.post('/api/v1/workshops', {
    data: { name: 'Second shop' },
    headers: sameOrigin,
  })
  expect(made.status()).toBe(201)
  await page.goto('/settings')
  const days = page.getByLabel('Openings of links are kept, days')
  await days.fill('900')
  await days.press('Enter')
  const refusal = page.getByRole('region', { name: 'Settings' }).getByRole('alert')
  await expect(refusal).not.toBeEmpty()
  await expect(days).toHaveValue('900')
  await expect(days).toHaveAttribute('aria-invalid', 'true')
  await days.fill('30')
  await days.press('Enter')
  await expect(page.getByRole('status').filter({ hasText: 'The settings are saved.' })).toBeVisible()

  await page.getByRole('button', { name: 'Second shop' }).press('Enter')
  await page.keyboard.press('Escape')
  await expect(page.getByRole('link', { name: 'People' })).toHaveCount(0)
  await page.keyboard.press('Enter')
  await page.getByRole('button', { name: /^Go over to / }).press('Enter')
  await page.waitForURL('**/scenes')
  await expect(page.getByRole('region', { name: 'Title block' })).toContainText(`${person.name}’s workshop`)
  expect(await workshopOf(page)).toBe(first)

  await page.goto('/account')
  await expect(page.getByRole('row', { name: /this one, now/ })).toBeVisible()
  await page.getByRole('button', { name: 'New token…' }).press('Enter')
  await page.getByLabel('What it is for').fill('Nightly export')
  await page.keyboard.press('Enter')
  const secret = await page.getByRole('dialog').getByLabel('Token').inputValue()
  const scenes = await page.request.get('/api/v1/scenes', { headers: { authorization: `Bearer ${secret}` } })
  expect(scenes.status()).toBe(200)
  await page.keyboard.press('Escape')
  await expect(page.getByRole('row', { name: /Nightly export/ })).toBeVisible()
  await expectNoBarriers(page)
  await page.setViewportSize({ width: 360, height: 780 })
  await expectNoSidewaysScroll(page)
})
