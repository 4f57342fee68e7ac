import { expect, test } from '@playwright/test'

test('the webgl project draws with WebGL', async ({ page }) => {
  const version = await page.evaluate(() =>
    document.createElement('canvas').getContext('webgl2')?.getParameter(7938),
  )
  expect(version).toContain('WebGL 2')
})
