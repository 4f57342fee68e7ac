import { expect, test } from '@playwright/test'

test('the canvas project has no WebGL at all', async ({ page }) => {
  const kinds = ['webgl', 'webgl2', 'experimental-webgl']
  const contexts = await page.evaluate(
    (names) => names.map((name) => document.createElement('canvas').getContext(name)),
    kinds,
  )
  expect(contexts).toEqual([null, null, null])
})
