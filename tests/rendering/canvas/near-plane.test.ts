import { describe, expect, it } from 'vitest'
import { boxMesh, frameOf, poseOf, rigOf } from '@/tests/support/drawing/small-rig'
import { count, drawn, inkAt, partAt } from '@/tests/support/drawing/picture'

describe('paint(raster, frame): parts that cross the near plane', () => {
  // A floor that reaches from behind the eye to 10 m before it: its far border is the horizon.
  const floor = rigOf([{ mesh: boxMesh(40, 0.1, 20) }])
  const frame = frameOf(poseOf({ y: -1.05 }), { eye: [0, 0, 0], at: [0, 0, 1], fov: 0.6 })
  const raster = drawn(floor, frame)
  const horizon = 100 + (1 / 10) * (100 / Math.tan(0.3))

  it('fills what is before it without a gap', () => {
    for (let y = 0; y < 200; y++)
      for (let x = 0; x < 200; x++) expect(partAt(raster, x, y)).toBe(y + 0.5 >= horizon ? 0 : -1)
  })

  it('keeps the depth right: a part on the floor covers it and is covered by nothing', () => {
    const rig = rigOf([{ mesh: boxMesh(40, 0.1, 20) }, { mesh: boxMesh(0.4, 0.4, 0.4) }])
    const pose = poseOf({ y: -1.05 }, { y: -0.8 })
    const both = drawn(rig, frameOf(pose, { eye: [0, 0, -5], at: [0, 0, 1], fov: 0.6 }))
    const alone = drawn(rig, frameOf(pose, { eye: [0, 0, -5], at: [0, 0, 1], fov: 0.6 }), {
      visibility: [0, 1],
    })
    const box = count(alone, (x, y) => partAt(alone, x, y) === 1)
    expect(box).toBeGreaterThan(300)
    expect(count(both, (x, y) => partAt(both, x, y) === 1)).toBe(box)
  })

  it('inks the horizon and nothing where the floor was cut', () => {
    for (let x = 3; x < 197; x++) {
      expect(
        inkAt(raster, x, Math.floor(horizon)) + inkAt(raster, x, Math.floor(horizon) - 1),
      ).toBeGreaterThan(200)
      for (let y = Math.ceil(horizon) + 3; y < 200; y++) expect(inkAt(raster, x, y)).toBe(0)
    }
  })

  it('draws nothing of a part behind the eye', () => {
    const behind = drawn(
      rigOf([{ mesh: boxMesh(1, 1, 1) }]),
      frameOf(poseOf({}), { eye: [0, 0, 3], at: [0, 0, 4] }),
    )
    expect(count(behind, (x, y) => partAt(behind, x, y) >= 0 || inkAt(behind, x, y) > 0)).toBe(0)
  })
})
