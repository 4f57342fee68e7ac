import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { barMesh, boxMesh, frameOf, latheMesh, poseOf, rigOf } from '@/tests/support/drawing/small-rig'
import { count, drawn, partAt } from '@/tests/support/drawing/picture'

const direction = fc.tuple(
  fc.double({ min: -3, max: 3, noNaN: true }),
  fc.double({ min: -1.4, max: 1.4, noNaN: true }),
)
const eyeAt = ([yaw, pitch]: [number, number], distance: number): [number, number, number] => [
  distance * Math.sin(yaw) * Math.cos(pitch),
  distance * Math.sin(pitch),
  -distance * Math.cos(yaw) * Math.cos(pitch),
]

describe('paint(raster, frame): faces', () => {
  it('leaves no pin hole in a closed convex solid from any side', () => {
    const ball = Array.from({ length: 13 }, (_, i) => (Math.PI * i) / 12 - Math.PI / 2)
    const profile = ball.flatMap((a, i) => [i % 12 ? Math.cos(a) : 0, Math.sin(a)])
    const rig = rigOf([{ mesh: latheMesh(profile, 31) }])
    fc.assert(
      fc.property(direction, (at) => {
        const raster = drawn(rig, frameOf(poseOf({}), { eye: eyeAt(at, 8), fov: 0.3 }))
        let filled = 0
        for (let y = 0; y < raster.height; y++) {
          const row = Array.from({ length: raster.width }, (_, x) => partAt(raster, x, y))
          const first = row.indexOf(0)
          const last = row.lastIndexOf(0)
          if (first >= 0) expect(row.slice(first, last + 1).every((part) => part === 0)).toBe(true)
          filled += last - first + (first >= 0 ? 1 : 0)
        }
        expect(filled).toBeGreaterThan(200 * 200 * 0.3)
      }),
      { numRuns: 40, seed: 1 },
    )
  })

  it.each([0.11, 0.5, 1.3])(
    'covers the area of a square face within a pixel row at its border (turned %f rad)',
    (turn) => {
      const rig = rigOf([{ mesh: boxMesh(1, 1, 0.001) }])
      const raster = drawn(rig, frameOf(poseOf({ turn }), { eye: [0, 0, -10], fov: 0.2 }), {
        width: 300,
        height: 300,
      })
      const side = 300 / (2 * Math.tan(0.1) * (10 - 0.0005))
      const covered = count(raster, (x, y) => partAt(raster, x, y) === 0)
      expect(Math.abs(covered - side * side)).toBeLessThan(2 * side)
    },
  )

  it('shows the nearer part whatever the order of the parts', () => {
    const near = { mesh: boxMesh(1, 1, 1), part: { body: 1 } }
    const far = { mesh: boxMesh(3, 3, 0.2), part: { body: 2 } }
    const shift = { x: 0, y: 0 }
    const look = { eye: [4, 5, -20] as [number, number, number], fov: 0.25 }
    const one = drawn(rigOf([near, far]), frameOf(poseOf(shift, shift), look))
    const two = drawn(rigOf([far, near]), frameOf(poseOf(shift, shift), look))
    expect(two.image).toEqual(one.image)
    expect(partAt(one, 100, 100)).toBe(0)
  })

  it('resolves parts that run into each other pixel by pixel', () => {
    // Two bars crossing: along x in front where x > 0 of the plane z = x · 0.5.
    const bar = boxMesh(4, 0.4, 0.1)
    const lean = { ...boxMesh(0.4, 4, 0.1) }
    const raster = drawn(
      rigOf([{ mesh: bar }, { mesh: lean }]),
      frameOf(poseOf({}, { turn: 0.3 }), { eye: [6, 0, -9], fov: 0.4 }),
    )
    expect(count(raster, (x, y) => partAt(raster, x, y) === 0)).toBeGreaterThan(500)
    expect(count(raster, (x, y) => partAt(raster, x, y) === 1)).toBeGreaterThan(500)
  })

  it('gives a face the light tone where it looks towards the light from the upper left, else the shaded one', () => {
    const raster = drawn(
      rigOf([{ mesh: barMesh(1, 2) }]),
      frameOf(poseOf({ turn: Math.PI / 2 }), { eye: [0, 3, -8], fov: 0.4 }),
    )
    const tones = Array.from({ length: 200 }, (_, y) => [
      partAt(raster, 100, y),
      raster.pixels[(y + 1) * 200 + 100] & 1,
    ])
      .filter(([part]) => part === 0)
      .map(([, tone]) => tone)
    expect(tones[0]).toBe(1)
    expect(tones[tones.length - 1]).toBe(0)
    expect(tones.filter((tone, i) => i > 0 && tone !== tones[i - 1])).toHaveLength(1)
  })

  it('tells as many surfaces apart as the rig has', () => {
    const many = Array.from({ length: 400 }, () => ({ mesh: boxMesh(0.02, 0.02, 0.02) }))
    const pose = poseOf(
      ...many.map((_, i) => ({ x: ((i % 20) - 9.5) * 0.05, y: (Math.floor(i / 20) - 9.5) * 0.05 })),
    )
    const raster = drawn(rigOf(many), frameOf(pose, { eye: [0, 0, -5], fov: 0.25 }), {
      width: 400,
      height: 400,
    })
    const seen = new Set(
      Array.from({ length: 400 * 400 }, (_, i) => partAt(raster, i % 400, Math.floor(i / 400))),
    )
    expect(seen.size).toBe(401)
  })
})
