import type { Page } from '@playwright/test'
import { saveScene, shareScene } from './support/scenes'
import { expect, signIn, signUp, test } from './support/test'

const rule = (page: Page) => page.getByRole('slider', { name: 'Crank angle' })

test('an unknown and a withdrawn link show the same neutral page, which no robot keeps', async ({
  page,
  person,
  guest,
}) => {
  expect(person.email).toContain('@')
  const scene = await saveScene(page, 'i3-1000')
  const withdrawn = await shareScene(page, scene, { label: 'to be withdrawn' })
  const { links } = await (await page.request.get(`/api/v1/scenes/${scene}/share-links`)).json()
  const { id } = links.find((link: { label: string }) => link.label === 'to be withdrawn')
  await page.request.delete(`/api/v1/share-links/${id}`, { headers: { 'sec-fetch-site': 'same-origin' } })

  const texts = new Set<string>()
  for (const address of [withdrawn, '/s/not-a-token-that-anybody-was-given']) {
    const answer = await guest.goto(address)
    expect(answer?.status()).toBe(404)
    expect(answer?.headers()['cache-control']).toContain('no-store')
    texts.add(await guest.locator('main').innerText())
    // the framework says so once more by itself
    expect(await guest.locator('meta[name="robots"]').first().getAttribute('content')).toContain('noindex')
    expect(await guest.locator('meta[name="referrer"]').getAttribute('content')).toBe('no-referrer')
  }
  expect([...texts]).toHaveLength(1)
  expect([...texts][0]).toContain('This link is not available.')
})

test('a link’s page counts itself once somebody has it before them, not when it is only fetched', async ({
  page,
  person,
  guest,
}) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'i3-1000')
  const address = await shareScene(page, scene)
  const opened = async () => {
    const { links } = await (await page.request.get(`/api/v1/scenes/${scene}/share-links`)).json()
    return links[0].opened
  }
  expect((await page.request.get(address)).status()).toBe(200)
  expect(await opened()).toBe(0)
  const told = guest.waitForResponse((answer) => answer.url().endsWith('/openings'))
  await guest.goto(address)
  expect((await told).status()).toBe(200)
  expect(await opened()).toBe(1)
})

test('a pinned link keeps its version while the latest one moves on', async ({ page, person, guest }) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'i4-2000', { angleDeg: 45 })
  const [pinned, latest] = [await shareScene(page, scene, { version: 1 }), await shareScene(page, scene)]
  const opened = await (await page.request.get(`/api/v1/scenes/${scene}`)).json()
  const { document } = opened.version
  document.view.angleDeg = 90
  const saved = await page.request.post(`/api/v1/scenes/${scene}/versions`, {
    data: { base: 1, message: 'a quarter turn on', document },
    headers: { 'sec-fetch-site': 'same-origin' },
  })
  expect(saved.status()).toBe(201)
  await guest.goto(pinned)
  await expect(rule(guest)).toHaveAttribute('aria-valuenow', '45.0')
  await guest.goto(latest)
  await expect(rule(guest)).toHaveAttribute('aria-valuenow', '90.0')
})

test('the poster and the figures are there with scripts turned off', async ({
  page,
  person,
  browser,
  care,
}) => {
  expect(person.name).not.toBe('')
  const address = await shareScene(page, await saveScene(page, 'v8x-5000'))
  const context = await browser.newContext({ javaScriptEnabled: false })
  await care(context)
  const plain = await context.newPage()
  await plain.goto(address)
  const poster = plain.locator('.poster img:visible')
  await expect(poster).toHaveCount(1)
  expect(await poster.evaluate((image: HTMLImageElement) => image.naturalWidth)).toBeGreaterThan(600)
  await expect(plain.getByRole('row', { name: /Shaking force, at most/ })).toBeVisible()
  await context.close()
})

test('a forgotten password is set anew with the link of the mail, once', async ({
  page,
  stranger,
  guest,
}) => {
  await signUp(page, stranger)
  await guest.goto('/sign-in')
  await guest.getByRole('link', { name: 'Forgotten password' }).click()
  const form = guest.getByRole('form', { name: 'Forgotten password' })
  await form.getByLabel('Mail address').fill(stranger.email)
  await form.getByRole('button', { name: 'Send link' }).click()
  await expect(guest.getByRole('heading', { name: 'A mail is on its way' })).toBeVisible()

  await guest.goto('/local/mail')
  const mail = guest.getByRole('article').filter({ hasText: stranger.email })
  const address = await mail.getByRole('link').getAttribute('href')
  const renewed = `${stranger.password} again`
  for (const attempt of ['first', 'second']) {
    await guest.goto(new URL(address ?? '').pathname + new URL(address ?? '').search)
    await guest.getByLabel('Password', { exact: true }).fill(renewed)
    await guest.getByRole('button', { name: 'Set password' }).click()
    if (attempt === 'first') await guest.waitForURL('**/sign-in')
  }
  await expect(guest.getByRole('form').getByRole('alert')).toContainText(/link/)
  await signIn(guest, { email: stranger.email, password: renewed })
  await expect(guest.getByRole('heading', { name: 'Scenes' })).toBeVisible()
  await page.goto('/scenes')
  await expect(page).toHaveURL(/sign-in/)
})

test('the register finds, renames, duplicates, archives and restores', async ({ page, person }) => {
  expect(person.name).not.toBe('')
  await saveScene(page, 'v2-45-1600')
  await saveScene(page, 'r7-11')
  await page.goto('/scenes')
  const row = (title: string) =>
    page.getByRole('row').filter({ has: page.getByRole('link', { name: title, exact: true }) })
  await expect(row('Seven-cylinder radial 11 L')).toBeVisible()

  await page.getByLabel('Find a scene').fill('V-twin')
  await expect(row('Seven-cylinder radial 11 L')).toHaveCount(0)
  await row('45° V-twin 1.6 L, common pin')
    .getByRole('button', { name: /Rename/ })
    .click()
  await page.getByRole('dialog').getByLabel('Title').fill('Twin for the counter')
  await page.getByRole('button', { name: 'Rename', exact: true }).click()
  await expect(page.getByRole('dialog')).toHaveCount(0)
  await page.getByLabel('Find a scene').fill('')
  await expect(row('Twin for the counter')).toBeVisible()

  await row('Twin for the counter')
    .getByRole('button', { name: /Archive/ })
    .click()
  await expect(row('Twin for the counter')).toHaveCount(0)
  await page.getByRole('tab', { name: 'Archived' }).click()
  await row('Twin for the counter')
    .getByRole('button', { name: /^Restore/ })
    .click()
  await page.getByRole('tab', { name: 'Current' }).click()
  await expect(row('Twin for the counter')).toBeVisible()

  await row('Seven-cylinder radial 11 L')
    .getByRole('button', { name: /Duplicate/ })
    .click()
  await expect(page.getByRole('status').filter({ hasText: 'in the register' })).toBeVisible()
  await expect(page.getByRole('row').filter({ hasText: 'Seven-cylinder radial' })).toHaveCount(2)
})
