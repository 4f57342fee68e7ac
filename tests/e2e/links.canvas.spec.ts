import AxeBuilder from '@axe-core/playwright'
import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { saveScene, shareScene } from './support/scenes'
import { expect, test } from './support/test'

/** Another site on this machine: its page holds the frame of a link. */
async function otherSite(): Promise<{ origin: string; show(html: string): void; server: Server }> {
  let body = ''
  const server = createServer((_, answer) => {
    answer.setHeader('content-type', 'text/html')
    answer.end(`<!doctype html><html lang="en"><title>Another site</title>${body}</html>`)
  })
  await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready))
  const { port } = server.address() as AddressInfo
  return { origin: `http://127.0.0.1:${port}`, server, show: (html) => (body = html) }
}

test('a link with a password opens once it is given, by a plain form', async ({ page, person, guest }) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'single-450')
  const address = await shareScene(page, scene, { password: 'bob weight 64' })
  await guest.goto(address)
  expect(await guest.content()).not.toContain('Single')
  await guest.getByLabel('Password').fill('bob weight 65')
  await guest.getByLabel('Password').press('Enter')
  await expect(guest.getByRole('alert').filter({ hasText: 'not the password' })).toBeVisible()
  const { violations } = await new AxeBuilder({ page: guest }).analyze()
  expect(violations).toEqual([])
  await guest.getByLabel('Password').fill('bob weight 64')
  await guest.getByRole('button', { name: 'Open', exact: true }).click()
  await expect(guest.getByRole('slider', { name: 'Crank angle' })).toBeVisible()
  expect(new URL(guest.url()).pathname).toBe(address)
  await guest.reload()
  await expect(guest.getByRole('slider', { name: 'Crank angle' })).toBeVisible()
})

test('a guest asks a question by keyboard; the sender finds it and the opening with the link', async ({
  page,
  person,
  guest,
}) => {
  expect(person.name).not.toBe('')
  const scene = await saveScene(page, 'single-450', { angleDeg: 40 })
  // questions that come sooner than they can be written are refused
  await guest.clock.install()
  const counted = guest.waitForResponse((answer) => answer.url().endsWith('/openings'))
  await guest.goto(await shareScene(page, scene, { label: 'For Delphine' }))
  expect((await counted).status()).toBe(200)
  await guest.getByRole('button', { name: 'Ask a question' }).press('Enter')
  const dialog = guest.getByRole('dialog', { name: 'Ask a question' })
  await dialog.getByLabel('Your name').fill('Delphine Astercroft')
  await dialog.getByLabel('Mail address').fill('delphine')
  await dialog.getByLabel('Question').fill('Which rod is the long one, seen from the free end?')
  await guest.clock.fastForward('00:20')
  await dialog.getByRole('button', { name: 'Send' }).press('Enter')
  await expect(dialog.getByText('This is not an e-mail address.')).toBeVisible()
  await expect(dialog.getByLabel('Mail address')).toHaveValue('delphine')
  await dialog.getByLabel('Mail address').fill('delphine@example.com')
  await dialog.getByLabel('Mail address').press('Enter')
  await expect(guest.getByRole('status').filter({ hasText: 'has it' })).toBeVisible()

  await page.goto(`/scenes/${scene}/links`)
  await expect(page.getByRole('region', { name: 'Openings' }).getByRole('row')).toHaveCount(2)
  await page.getByRole('tab', { name: 'Openings' }).press('ArrowRight')
  await expect(page.getByText('Which rod is the long one')).toBeVisible()
  await expect(page.getByText('at 40.0°')).toBeVisible()
  const { violations } = await new AxeBuilder({ page }).analyze()
  expect(violations).toEqual([])
})

test('a named site frames the moving drawing without cookies, another site does not; focus can leave', async ({
  page,
  person,
  browser,
}) => {
  expect(person.name).not.toBe('')
  const [named, other] = [await otherSite(), await otherSite()]
  const scene = await saveScene(page, 'single-450')
  const shared = await shareScene(page, scene, { frameOrigins: [named.origin] })
  const framed = new URL(shared.replace('/s/', '/embed/'), page.url()).href
  for (const { show } of [named, other]) {
    show(`<iframe src="${framed}" width="900" height="620" title="Engine"></iframe><button>After it</button>`)
  }
  const context = await browser.newContext({ reducedMotion: 'reduce' })
  const host = await context.newPage()
  await host.goto(named.origin)
  const frame = host.frameLocator('iframe')
  await expect(frame.getByRole('slider', { name: 'Crank angle' })).toBeVisible()
  const ways = frame.getByRole('link', { name: 'Open the whole page' })
  expect(await ways.getAttribute('href')).toBe(shared)
  await ways.focus()
  const left = host.getByRole('button', { name: 'After it' })
  for (let step = 0; step < 20 && !(await left.evaluate((it) => it === document.activeElement)); step++)
    await host.keyboard.press('Tab')
  await expect(left).toBeFocused()
  expect(await context.cookies()).toEqual([])

  await host.goto(other.origin)
  await expect(host.frameLocator('iframe').getByRole('heading', { level: 1 })).toHaveCount(0)
  await context.close()
  for (const { server } of [named, other]) server.close()
})

test('with scripts off a frame shows the picture and the table', async ({ page, person, browser }) => {
  expect(person.name).not.toBe('')
  const site = await otherSite()
  const shared = await shareScene(page, await saveScene(page, 'single-450'), { frameOrigins: [site.origin] })
  const framed = new URL(shared.replace('/s/', '/embed/'), page.url()).href
  site.show(`<iframe src="${framed}" width="900" height="620" title="Engine"></iframe>`)
  const context = await browser.newContext({ javaScriptEnabled: false })
  const host = await context.newPage()
  await host.goto(site.origin)
  const frame = host.frameLocator('iframe')
  await expect(frame.getByRole('row', { name: /Shaking force, at most/ })).toBeVisible()
  const poster = frame.locator('.poster img:visible')
  await expect(poster).toHaveCount(1)
  expect(await poster.evaluate((image: HTMLImageElement) => image.naturalWidth)).toBeGreaterThan(600)
  await context.close()
  site.server.close()
})
