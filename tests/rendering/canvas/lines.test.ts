import { describe, expect, it } from 'vitest'
import type { RigShape } from '@/scene/canvas/raster/prepare'
import {
  barMesh,
  boxMesh,
  frameOf,
  latheMesh,
  poseOf,
  rigOf,
  type Look,
} from '@/tests/support/drawing/small-rig'
import { colourAt, count, drawn, inkAt, inkIn, partAt } from '@/tests/support/drawing/picture'

const straight: Look = { eye: [0, 0, -10], fov: 0.3 }
/** Picture pixels of a metre 10 m from the eye. */
const metre = 200 / (2 * Math.tan(0.15) * 10)

describe('paint(raster, frame): lines', () => {
  it('inks the silhouette of a round bar, where it has no edge of its own', () => {
    const raster = drawn(rigOf([{ mesh: barMesh(0.5, 2) }]), frameOf(poseOf({}), straight))
    const left = Math.round(100 - 0.5 * metre)
    const right = Math.round(100 + 0.5 * metre)
    for (let y = 60; y < 140; y++) {
      expect(inkIn(raster, left - 3, y, left + 3, y + 1)).toBeGreaterThan(1.2)
      expect(inkIn(raster, right - 3, y, right + 3, y + 1)).toBeGreaterThan(1.2)
      expect(inkIn(raster, left + 6, y, right - 6, y + 1)).toBe(0)
    }
  })

  it('draws no line that another part hides', () => {
    const front = { mesh: boxMesh(2, 2, 1) }
    const back = { mesh: boxMesh(0.8, 0.6, 3) }
    const pose = poseOf({}, { x: 0.2, y: -0.1, turn: 0.4 })
    const frame = frameOf(pose, { eye: [0, 0, -14], fov: 0.3 })
    // The small box is longer: only its near face stands out, its sides behind the big one do not.
    const both = drawn(rigOf([front, back]), frame)
    const alone = drawn(rigOf([front, back]), frame, { visibility: [1, 0] })
    const box = count(both, (x, y) => partAt(both, x, y) === 1)
    expect(box).toBeGreaterThan(1000)
    const changed = count(both, (x, y) => inkAt(both, x, y) > 0 && inkAt(alone, x, y) === 0)
    const rim = count(both, (x, y) => {
      for (let dy = -2; dy <= 2; dy++)
        for (let dx = -2; dx <= 2; dx++) if (partAt(both, x + dx, y + dy) === 1) return true
      return false
    })
    expect(changed).toBeGreaterThan(0)
    expect(changed).toBeLessThan(rim)
    const hidden = drawn(rigOf([front, { mesh: boxMesh(0.8, 0.6, 0.5) }]), frame)
    expect(hidden.image).toEqual(alone.image)
  })

  it('draws outlines heavier than the edges inside', () => {
    const raster = drawn(
      rigOf([{ mesh: boxMesh(1.6, 1.6, 1.6) }]),
      frameOf(poseOf({}), { eye: [7, 0, -7], fov: 0.3 }),
    )
    const across = Array.from({ length: 200 }, (_, x) => inkAt(raster, x, 100) / 255)
    const inkAround = (x: number) => across.slice(x - 4, x + 5).reduce((sum, ink) => sum + ink, 0)
    const outline = across.findIndex((ink) => ink > 0) + 2
    expect(inkAround(outline)).toBeCloseTo(1.6, 1)
    expect(inkAround(100)).toBeCloseTo(1.1, 1)
  })

  it('draws the edge between two parts as inside when they are one body, as outline when they are two', () => {
    const rig = (body: number) =>
      rigOf([
        { mesh: boxMesh(1, 1, 1), part: { body: 0 } },
        { mesh: boxMesh(4, 4, 0.2), part: { body } },
      ])
    const ink = (body: number) => {
      const raster = drawn(rig(body), frameOf(poseOf({}, {}), straight))
      return (
        inkIn(raster, Math.round(100 - metre * 0.53) - 4, 90, Math.round(100 - metre * 0.53) + 4, 110) / 20
      )
    }
    expect(ink(0)).toBeCloseTo(1.1, 1)
    expect(ink(1)).toBeCloseTo(1.6, 1)
  })

  it('draws the far bank thinner and paler than the near one', () => {
    const cylinder = (bank: number) => ({
      mesh: boxMesh(0.5, 0.5, 0.5),
      part: { bank, cylinder: bank, body: bank },
    })
    const rig = rigOf([cylinder(0), cylinder(1)], [[-1, 1, 0], [1, 1, 0]]) // prettier-ignore
    const frame = frameOf(poseOf({ x: -1, y: 0.6 }, { x: 1, y: -0.6 }), { eye: [-12, 0, -3], fov: 0.3 })
    const raster = drawn(rig, frame)
    const strongest = (part: number) => {
      let ink = 0
      let sum = 0
      const [from, to] = part === 0 ? [0, 100] : [100, 200]
      for (let y = from; y < to; y++)
        for (let x = 0; x < 200; x++) {
          ink = Math.max(ink, inkAt(raster, x, y))
          sum += inkAt(raster, x, y)
        }
      return { ink, sum }
    }
    expect(strongest(0).ink).toBe(255)
    expect(strongest(1).ink).toBeLessThan(0.7 * 255)
    expect(strongest(1).sum).toBeLessThan(0.6 * strongest(0).sum)
    const end = drawn(
      rig,
      frameOf(poseOf({ x: -1, y: 0.6 }, { x: 1, y: -0.6 }), { eye: [0, 0, -12], fov: 0.3 }),
    )
    expect(inkIn(end, 0, 0, 100, 200)).toBeCloseTo(inkIn(end, 100, 0, 200, 200), -1)
  })

  it('joins the pieces of a line without dots: no pixel of a round rim is lighter or darker than its neighbours by much', () => {
    const raster = drawn(
      rigOf([{ mesh: barMesh(1, 0.2) }]),
      frameOf(poseOf({}), { eye: [0, 10, -0.01], fov: 0.3 }),
    )
    const around = Array.from({ length: 360 }, (_, degree) => {
      const angle = (degree * Math.PI) / 180
      let sum = 0
      for (let r = 0.9 * metre; r < 1.15 * metre; r += 0.25) {
        const x = 100 + r * Math.cos(angle)
        const y = 100 + r * Math.sin(angle)
        sum += 0.25 * (inkAt(raster, Math.floor(x), Math.floor(y)) / 255)
      }
      return sum
    })
    expect(Math.min(...around)).toBeGreaterThan(1)
    expect(Math.max(...around)).toBeLessThan(2.3)
  })

  it('thins the lines of crowded grooves so that they never clot', () => {
    const grooves: number[] = [0, -1]
    for (let i = 0; i < 40; i++)
      grooves.push(
        0.8,
        -1 + i * 0.05,
        0.8,
        -0.975 + i * 0.05,
        0.79,
        -0.975 + i * 0.05,
        0.79,
        -0.95 + i * 0.05,
      )
    grooves.push(0, 1)
    const rig = rigOf([{ mesh: latheMesh(grooves) }])
    const raster = drawn(rig, frameOf(poseOf({}), { eye: [0, 0, -30], fov: 0.3 }), {
      width: 120,
      height: 120,
    })
    const middle = inkIn(raster, 50, 50, 70, 70) / 400
    expect(middle).toBeGreaterThan(0.05)
    expect(middle).toBeLessThan(0.45)
  })

  it('inks where two parts run into each other, although no mesh has an edge there', () => {
    const rig: RigShape = rigOf([{ mesh: boxMesh(4, 4, 0.2) }, { mesh: barMesh(0.5, 6) }])
    const raster = drawn(rig, frameOf(poseOf({}, { turn: 0 }), { eye: [0, 6, -8], fov: 0.3 }))
    let seam = 0
    for (let y = 3; y < 197; y++)
      for (let x = 3; x < 197; x++)
        if (partAt(raster, x, y) === 0 && partAt(raster, x + 1, y) === 1) {
          expect(Math.max(inkAt(raster, x, y), inkAt(raster, x + 1, y))).toBeGreaterThan(80)
          seam++
        }
    expect(seam).toBeGreaterThan(20)
  })

  it('keeps line widths in CSS pixels at two picture pixels a CSS pixel', () => {
    const frame = frameOf(poseOf({}), straight)
    const rig = rigOf([{ mesh: barMesh(0.5, 2) }])
    const single = drawn(rig, frame)
    const double = drawn(rig, frame, { width: 400, height: 400, scale: 2 })
    const left = 100 - 0.5 * metre
    const one = inkIn(single, Math.round(left) - 4, 90, Math.round(left) + 4, 110) / 20
    const two = inkIn(double, Math.round(2 * left) - 8, 180, Math.round(2 * left) + 8, 220) / 40
    expect(two).toBeCloseTo(2 * one, 1)
  })

  it('mixes ink with the fill under it', () => {
    const raster = drawn(rigOf([{ mesh: barMesh(0.5, 2) }]), frameOf(poseOf({}), straight))
    expect(colourAt(raster, 2, 2)).toBe(0xf5f2ea)
    expect(count(raster, (x, y) => inkAt(raster, x, y) === 255 && colourAt(raster, x, y) !== 0x20262b)).toBe(
      0,
    )
    expect(count(raster, (x, y) => colourAt(raster, x, y) === 0x20262b)).toBeGreaterThan(50)
  })
})
