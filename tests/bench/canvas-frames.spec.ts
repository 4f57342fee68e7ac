import { expect, test } from '../rendering/canvas/serve'

// What a frame costs in the worker: JavaScript and putImageData, median of a run of the V8.
for (const [name, width, height, ratio, zoom] of [
  ['1280 × 720, a third of the picture', 1280, 720, 1, 0.75],
  ['1280 × 720, zoomed twice', 1280, 720, 1, 1.5],
  ['640 × 360 at two pixels a CSS pixel', 640, 360, 2, 1],
] as const)
  test(`frames in the worker, ${name}`, async ({ page, address }) => {
    await page.goto(address)
    const frames = 200
    const painted = await page.evaluate(([w, h, r, z, n]) => window.drawing.run(w, h, r, z, n), [
      width,
      height,
      ratio,
      zoom,
      frames,
    ] as const)
    const sorted = painted
      .slice(40)
      .map(({ milliseconds }) => milliseconds)
      .sort((a, b) => a - b)
    const sizes = [...new Set(painted.map((frame) => `${frame.width} × ${frame.height}`))]
    console.log(
      `${name}: median ${sorted[sorted.length >> 1].toFixed(1)} ms, least ${sorted[0].toFixed(1)} ms, drawn at ${sizes.join(', ')}`,
    )
    expect(painted).toHaveLength(frames)
  })
