import type { Page } from '@playwright/test'
import { saveScene, shareScene } from './support/scenes'
import { expect, signUp, test } from './support/test'

/** Bytes of scripts over the wire, compressed, of everything that a page asks for until it rests. */
async function scriptsOf(page: Page, address: string) {
  const sizes: Promise<number>[] = []
  page.on('requestfinished', (request) => {
    if (!/\.js(\?|$)/.test(new URL(request.url()).pathname)) return
    sizes.push(request.sizes().then(({ responseBodySize }) => responseBodySize))
  })
  await page.goto(address, { waitUntil: 'networkidle' })
  return (await Promise.all(sizes)).reduce((sum, size) => sum + size, 0) / 1000
}

const report = (project: string, what: string, weight: number) =>
  console.log(`page weight, ${project}: ${what} ${weight.toFixed(1)} kB of scripts`)

// A guest on a phone waits for these bytes before anything moves. The goal is 170 kB on the canvas and 420 with WebGL; the
// first is not reached, so its limit is what was: it may only go down.
const limits: Record<string, number> = { canvas: 212, webgl: 420 }

test('the sheet that a share link opens moves under its limit of scripts', async ({
  page,
  stranger,
  guest,
}, info) => {
  await signUp(page, stranger)
  const address = await shareScene(page, await saveScene(page, 'v8x-5000', { playing: true }))
  const weight = await scriptsOf(guest, address)
  report(info.project.name, 'share page', weight)
  await expect(guest.locator('canvas').first()).toBeVisible()
  expect(weight).toBeGreaterThan(20)
  expect(weight).toBeLessThan(limits[info.project.name])
})

test('a plain page is lighter than one that draws', async ({ guest }, info) => {
  const weight = await scriptsOf(guest, '/sign-in')
  report(info.project.name, 'plain page', weight)
  expect(weight).toBeGreaterThan(20)
  expect(weight).toBeLessThan(limits.canvas)
})
