import { expect, test } from './serve'

const withoutOffscreen = () => void delete (window as { OffscreenCanvas?: unknown }).OffscreenCanvas

test.describe('createCanvasRenderer(canvas)', () => {
  for (const where of [
    'in a worker',
    'on the page where there is no OffscreenCanvas',
    'on the page where the worker does not load',
  ]) {
    test(`draws ${where} what the poster draws, and tells once when it is ready`, async ({
      page,
      address,
    }) => {
      if (where.includes('OffscreenCanvas')) await page.addInitScript(withoutOffscreen)
      if (where.includes('does not load')) await page.route(/worker/, (route) => route.abort())
      const workers: string[] = []
      page.on('worker', (worker) => workers.push(worker.url()))
      await page.goto(address)
      expect(await page.evaluate(() => window.drawing.still())).toEqual({ ready: 1, painted: 1 })
      expect(workers.length > 0).toBe(where === 'in a worker')
    })
  }

  test('repaints the whole canvas when the theme changes', async ({ page, address }) => {
    await page.goto(address)
    expect(await page.evaluate(() => window.drawing.retheme())).toBe(true)
  })

  test('refuses a frame while the last one is in the worker', async ({ page, address }) => {
    await page.goto(address)
    expect(await page.evaluate(() => window.drawing.busy())).toBe(false)
  })
})
