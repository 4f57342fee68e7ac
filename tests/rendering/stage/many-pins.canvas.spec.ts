import { expect, still, test } from '../harness/harness'
import { axial, crown } from './pinned'

test('of two hundred pins as many get flags as have room, none over another; the others are dots', async ({
  open,
}) => {
  const pins = Array.from({ length: 200 }, (_, i) =>
    crown(i + 1, { point: [((i % 14) - 7) / 300, (i % 9) / 400, axial + ((i % 5) - 2) / 200] }),
  )
  const page = await open({ preset: 'i3-1000', renderer: 'canvas' })
  const cost = await page.evaluate(async (all) => {
    const { stage, pins, clock, ticks } = window.harness
    stage.enrich(pins.details)
    pins.set(all as never)
    const run = async () => {
      const from = ticks.count
      const began = performance.now()
      clock.setRate(1)
      clock.play()
      while (ticks.count - from < 40) await new Promise((next) => requestAnimationFrame(next))
      clock.pause()
      return (performance.now() - began) / 40
    }
    const many = await run()
    pins.set([])
    const none = await run()
    pins.set(all as never)
    return { many, none }
  }, pins)
  console.log(
    `200 pins: a frame takes ${cost.many.toFixed(1)} ms with them, ${cost.none.toFixed(1)} ms without`,
  )
  await still(page)
  const boxes = await page.locator('.stage-pin').evaluateAll((flags) =>
    flags.map((flag) => {
      const { left, top, bottom } = flag.getBoundingClientRect()
      return { left, top, bottom }
    }),
  )
  expect(boxes.length).toBeGreaterThan(30)
  expect(boxes.length).toBeLessThan(60)
  for (const one of boxes)
    for (const other of boxes)
      if (one !== other && one.left === other.left)
        expect(one.top >= other.bottom || other.top >= one.bottom).toBe(true)
})
