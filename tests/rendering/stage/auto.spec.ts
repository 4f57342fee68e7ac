import { expect, test } from '../harness/harness'

test('auto takes the canvas where WebGL is missing or drawn by software, and says why', async ({ open }) => {
  const page = await open({ preset: 'v2-90-1000', renderer: 'auto' })
  await expect(page.locator('#host')).toHaveAttribute('data-renderer', 'canvas')
  const [event] = await page.evaluate(() => window.harness.events)
  expect(event.value).toEqual(['canvas', expect.stringMatching(/^Drawn without 3D graphics: .+\.$/)])
})
