import { get } from 'node:http'
import type { Page } from '@playwright/test'
import { saveScene, shareScene } from './support/scenes'
import { expect, signUp, test } from './support/test'

/** Bytes of an answer's body as they come over the wire, compressed as browsers ask for it. */
const wireSize = (url: string) =>
  new Promise<number>((resolve, reject) => {
    get(url, { headers: { 'accept-encoding': 'gzip, deflate, br' } }, (answer) => {
      let size = 0
      answer.on('data', (piece: Buffer) => (size += piece.length))
      answer.on('end', () => resolve(size))
      answer.on('error', reject)
    }).on('error', reject)
  })

/** kB of the scripts of these addresses, each counted once: the browser keeps what it has. */
async function weigh(urls: Iterable<string>): Promise<number> {
  const sizes = await Promise.all([...new Set(urls)].map(wireSize))
  return sizes.reduce((sum, size) => sum + size, 0) / 1000
}

/** When each script was asked for, by page or worker; ms of the wall clock. */
function watchScripts(page: Page): { url: string; asked: number }[] {
  const scripts: { url: string; asked: number }[] = []
  page.on('requestfinished', (request) => {
    const { origin, pathname } = new URL(request.url())
    if (/\.js$/.test(pathname)) scripts.push({ url: origin + pathname, asked: request.timing().startTime })
  })
  return scripts
}

/** The stage marks the moment when two pictures at two angles have been on the sheet, and what drew them. */
async function firstMove(page: Page): Promise<{ renderer: string; at: number }> {
  await page.waitForFunction(() => performance.getEntriesByName('moving').length > 0)
  return page.evaluate(() => {
    const [mark] = performance.getEntriesByName('moving') as PerformanceMark[]
    return { renderer: String(mark.detail), at: performance.timeOrigin + mark.startTime }
  })
}

const report = (project: string, what: string, weight: number) =>
  console.log(`page weight, ${project}: ${what} ${weight.toFixed(1)} kB of scripts`)

// What a guest on a phone waits for before anything moves, and all that the page fetches until it rests: the second is
// what was measured once the page counted how long it is looked at and took questions, and may only go down.
const limits: Record<string, { moving: number; rest: number }> = {
  canvas: { moving: 170, rest: 201.5 },
  webgl: { moving: 420, rest: 390.5 },
}

test('the sheet that a share link opens moves under its limit of scripts', async ({
  page,
  stranger,
  guest,
}, info) => {
  const { name } = info.project
  await signUp(page, stranger)
  const address = await shareScene(page, await saveScene(page, 'v8x-5000', { playing: true }))
  const scripts = watchScripts(guest)
  await guest.emulateMedia({ reducedMotion: 'no-preference' })
  await guest.goto(address, { waitUntil: 'networkidle' })
  const moving = await firstMove(guest)
  // the second step has come: forces, marks and the drive
  await expect(guest.getByRole('slider', { name: 'Crank angle' })).toBeVisible()
  expect(moving.renderer).toBe(name)
  const first = await weigh(scripts.filter(({ asked }) => asked <= moving.at).map(({ url }) => url))
  const all = await weigh(scripts.map(({ url }) => url))
  report(name, 'share page until it moves', first)
  report(name, 'share page until it rests', all)
  expect(first).toBeGreaterThan(100)
  expect(first).toBeLessThan(limits[name].moving)
  expect(all).toBeGreaterThan(first)
  expect(all).toBeLessThan(limits[name].rest)
})

test('a plain page is lighter than one that draws', async ({ guest }, info) => {
  const scripts = watchScripts(guest)
  await guest.goto('/sign-in', { waitUntil: 'networkidle' })
  const weight = await weigh(scripts.map(({ url }) => url))
  report(info.project.name, 'plain page', weight)
  expect(weight).toBeGreaterThan(100)
  expect(weight).toBeLessThan(limits.canvas.moving)
})
