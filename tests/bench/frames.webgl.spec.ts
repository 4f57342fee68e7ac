import { expect } from '@playwright/test'
import { servedPage } from '@/tests/support/drawing/served-page'

const test = servedPage('tests/bench/frames-page')

const median = (times: number[]) => {
  const warm = times.slice(20).sort((a, b) => a - b)
  return warm[warm.length >> 1]
}

// Figures, not checks: there is no graphics card here, so WebGL is drawn by software in both of its lines.
test('a frame of the V8 at 1280 × 720: both renderers beside a bare three.js loop', async ({
  page,
  address,
}) => {
  test.setTimeout(180_000)
  await page.goto(address)
  const triangles = await page.evaluate(() => window.ways.triangles)
  const rounds: Record<'three' | 'webgl' | 'canvas', number[]> = { three: [], webgl: [], canvas: [] }
  for (let round = 0; round < 3; round++)
    for (const name of ['three', 'webgl', 'canvas'] as const)
      rounds[name].push(median(await page.evaluate((of) => window.ways[of](60), name)))
  const best = (name: keyof typeof rounds) => Math.min(...rounds[name])
  for (const name of ['three', 'webgl', 'canvas'] as const)
    console.log(
      `${triangles} triangles, ${name}: median ${rounds[name].map((ms) => ms.toFixed(1)).join(', ')} ms, ` +
        `${(best(name) / best('three')).toFixed(2)} of the bare loop`,
    )
  for (const times of Object.values(rounds)) expect(times.every((ms) => ms > 0)).toBe(true)
})
