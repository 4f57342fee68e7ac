import { expect, still, test } from '../harness/harness'

test('a context lost while the engine runs: the canvas takes over, says so, and the engine goes on', async ({
  open,
}) => {
  const page = await open({ preset: 'v2-90-1000', renderer: 'webgl', size: '450x320' })
  await page.evaluate(() => {
    const { clock, host } = window.harness
    clock.setRate(1)
    clock.play()
    const canvas = host.querySelector<HTMLCanvasElement>('.stage-engine')
    canvas?.getContext('webgl2')?.getExtension('WEBGL_lose_context')?.loseContext()
  })
  await expect(page.locator('#host')).toHaveAttribute('data-renderer', 'canvas')
  const last = await page.evaluate(
    () => window.harness.events.filter(({ name }) => name === 'renderer').at(-1)?.value,
  )
  expect(last).toEqual(['canvas', expect.stringMatching(/^Drawn without 3D graphics: .+\.$/)])
  const before = await page.evaluate(() => window.harness.ticks.count)
  await page.waitForFunction((count) => window.harness.ticks.count > count + 5, before)
  await page.evaluate(() => window.harness.clock.pause())
  await still(page)
  expect(await page.locator('#host canvas').count()).toBe(2)
})

test('setRenderer() changes the renderer and back while the picture stands', async ({ open }) => {
  const page = await open({ preset: 'v2-90-1000', renderer: 'canvas', size: '450x320' })
  for (const kind of ['webgl', 'canvas'] as const) {
    await page.evaluate((next) => window.harness.stage.setRenderer(next), kind)
    await expect(page.locator('#host')).toHaveAttribute('data-renderer', kind)
    await still(page)
  }
  expect(await page.locator('#host canvas').count()).toBe(2)
})

test('eighteen WebGL stages that came and went leave no context behind', async ({ open, page }) => {
  // Eighteen times four shaders are compiled by software here.
  test.setTimeout(180_000)
  const warnings: string[] = []
  page.on('console', (message) => void (message.type() === 'warning' && warnings.push(message.text())))
  await open({ preset: 'v2-90-1000', renderer: 'webgl', size: '450x320' })
  await page.evaluate(async () => {
    const pane = document.createElement('div')
    pane.style.cssText = 'position: relative; width: 200px; height: 150px'
    document.body.append(pane)
    for (let i = 0; i < 18; i++) {
      const stage = window.harness.mount(pane)
      await new Promise<void>((resolve) => {
        const look = () => (pane.dataset.frames ? resolve() : requestAnimationFrame(look))
        look()
      })
      stage.dispose()
    }
  })
  // The browser drops the oldest of more than sixteen contexts, and says so.
  expect(warnings.filter((text) => /too many active webgl contexts/i.test(text))).toEqual([])
  await expect(page.locator('#host')).toHaveAttribute('data-renderer', 'webgl')
})
