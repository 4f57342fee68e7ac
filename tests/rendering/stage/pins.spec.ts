import type { Page } from '@playwright/test'
import { crankTrainSchema } from '@/scene/model/crank-train'
import { cylinderValues } from '@/scene/model/cylinder-values'
import preset from '@/scene/model/presets/i3-1000.json' with { type: 'json' }
import { colourAt } from '../harness/compare'
import { expect, still, test } from '../harness/harness'
import { axial, crown } from './pinned'

const degree = Math.PI / 180
const [width, height] = [900, 640]
const camera = {
  yaw: -0.7,
  pitch: 0.35,
  distance: 1.9,
  fov: 0.279,
  target: [0, 0.1, 0.02] as [number, number, number],
}

const train = crankTrainSchema.parse(preset)
const { strokeMm, rodLengthMm, offsetMm } = cylinderValues(train, train.cylinders[0])

/** Height of the piston pin over the crank's axis, m, by the slider-crank relation. */
function pinHeight(angleDeg: number): number {
  const phase = train.throws.find(({ id }) => id === train.cylinders[0].throw)!.angleDeg
  const alpha = (angleDeg + phase - train.banks[0].angleDeg) * degree
  const radius = strokeMm / 2
  const lean = radius * Math.sin(alpha) - offsetMm
  return (radius * Math.cos(alpha) + Math.sqrt(rodLengthMm ** 2 - lean ** 2)) / 1000
}

/** A pinhole looking at the target: where it sees a point, CSS pixels. */
function seen([x, y, z]: readonly [number, number, number]): [number, number] {
  const { yaw, pitch, distance, fov, target } = camera
  const towards = [Math.sin(yaw) * Math.cos(pitch), Math.sin(pitch), -Math.cos(yaw) * Math.cos(pitch)]
  const flat = Math.hypot(towards[0], towards[2])
  const right = [towards[2] / flat, 0, -towards[0] / flat]
  const up = [
    towards[1] * right[2] - towards[2] * right[1],
    towards[2] * right[0] - towards[0] * right[2],
    towards[0] * right[1] - towards[1] * right[0],
  ]
  const from = [x, y, z].map((at, k) => at - target[k] - towards[k] * distance)
  const along = (axis: number[]) => axis.reduce((sum, value, k) => sum + value * from[k], 0)
  const scale = height / 2 / Math.tan(fov / 2) / -along(towards)
  return [width / 2 + along(right) * scale, height / 2 - along(up) * scale]
}

async function standAt(page: Page, angleDeg: number) {
  await page.evaluate((angle) => window.harness.clock.setAngle(angle), angleDeg * degree)
  await page.waitForFunction(
    (angle) => Math.abs(Number(window.harness.host.dataset.angle) - angle) < 0.05,
    angleDeg,
  )
  await still(page)
}

test('a pin stays within a pixel of its point on the piston through a cycle, and its dot is drawn there', async ({
  open,
}, { project }) => {
  const page = await open({ preset: 'i3-1000', renderer: project.name, pins: JSON.stringify([crown(2)]) })
  await page.evaluate((to) => window.harness.stage.setCamera(to), camera)
  const flag = page.getByRole('button', { name: 'Note 2' })
  // each another angle than the one before, so that the picture waited for is the one with this camera and angle
  for (const angleDeg of [63, 125, 190, 251.5, 300, 419, 480, 555, 640, 719, 0]) {
    await standAt(page, angleDeg)
    const expected = seen([-offsetMm / 1000, pinHeight(angleDeg) + 0.02, axial])
    const [x, y] = ((await flag.getAttribute('data-at')) ?? '').split(' ').map(Number)
    expect(Math.hypot(x - expected[0], y - expected[1]), `at ${angleDeg}°`).toBeLessThan(1)
  }
  const [x, y] = ((await flag.getAttribute('data-at')) ?? '').split(' ').map(Number)
  const picture = await page.locator('#host').screenshot()
  const [red, green, blue] = await colourAt(picture, Math.round(x), Math.round(y))
  // copying pencil: more blue than red, more red than green
  expect(blue).toBeGreaterThan(red + 20)
  expect(red).toBeGreaterThan(green + 20)
})

test('a flag tells its number when it is pressed, and goes when its part is hidden', async ({ open }, {
  project,
}) => {
  const page = await open({ preset: 'i3-1000', renderer: project.name, pins: JSON.stringify([crown(7)]) })
  await page.getByRole('button', { name: 'Note 7' }).click()
  const told = () => page.evaluate(() => window.harness.events.filter(({ name }) => name === 'pin'))
  expect(await told()).toEqual([{ name: 'pin', value: 7 }])
  await page.evaluate(() => window.harness.stage.setLook({ ...window.harness.look, hidden: ['pistons'] }))
  await expect(page.getByRole('button', { name: 'Note 7' })).toHaveCount(0)
})
