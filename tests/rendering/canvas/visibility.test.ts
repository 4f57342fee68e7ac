import { describe, expect, it } from 'vitest'
import { GHOST, HIDDEN, LIT, SHOWN } from '@/scene/frame/types'
import { barMesh, boxMesh, frameOf, poseOf, rigOf, slate, vellum } from '@/tests/support/drawing/small-rig'
import { colourAt, count, drawn, inkAt, inkIn, partAt } from '@/tests/support/drawing/picture'

const look = { eye: [3, 4, -9] as [number, number, number], fov: 0.3 }
const rig = rigOf([{ mesh: boxMesh(1, 1, 1) }, { mesh: barMesh(0.3, 2.4) }])
const frame = frameOf(poseOf({}, {}), look)

describe('setVisibility(raster, visibility)', () => {
  it('draws nothing of a hidden part', () => {
    const hidden = drawn(rig, frame, { visibility: [HIDDEN, SHOWN] })
    const alone = drawn(rigOf([{ mesh: barMesh(0.3, 2.4) }]), frameOf(poseOf({}), look))
    expect(hidden.image).toEqual(alone.image)
    expect(hidden.image).not.toEqual(drawn(rig, frame).image)
  })

  it('leaves the paper where all is hidden', () => {
    const empty = drawn(rig, frame, { visibility: [HIDDEN, HIDDEN] })
    expect(count(empty, (x, y) => colourAt(empty, x, y) !== vellum.paper)).toBe(0)
  })

  it('draws a ghost as a thin outline without a fill or an edge inside', () => {
    const ghost = drawn(rigOf([{ mesh: boxMesh(1, 1, 1) }]), frameOf(poseOf({}), look), {
      visibility: [GHOST],
    })
    const shown = drawn(rigOf([{ mesh: boxMesh(1, 1, 1) }]), frameOf(poseOf({}), look))
    expect(count(ghost, (x, y) => partAt(ghost, x, y) === 0)).toBe(0)
    const inside = (x: number, y: number) => {
      for (let dy = -6; dy <= 6; dy += 3)
        for (let dx = -6; dx <= 6; dx += 3) if (partAt(shown, x + dx, y + dy) < 0) return false
      return true
    }
    expect(count(shown, (x, y) => inside(x, y) && inkAt(shown, x, y) > 0)).toBeGreaterThan(20)
    expect(count(ghost, (x, y) => inside(x, y) && inkAt(ghost, x, y) > 0)).toBe(0)
    const outline = inkIn(ghost, 0, 0, 200, 200)
    expect(outline).toBeGreaterThan(30)
    expect(outline).toBeLessThan(0.5 * inkIn(shown, 0, 0, 200, 200))
  })

  it('hides a ghost behind what is before it, and nothing behind a ghost', () => {
    const pair = rigOf([{ mesh: boxMesh(1, 1, 1) }, { mesh: boxMesh(0.4, 0.4, 0.4) }])
    const straight = { eye: [0, 0, -9] as [number, number, number], fov: 0.3 }
    const inFront = frameOf(poseOf({}, {}), straight)
    const ghostInside = drawn(pair, inFront, { visibility: [SHOWN, GHOST] })
    expect(ghostInside.image).toEqual(drawn(pair, inFront, { visibility: [SHOWN, HIDDEN] }).image)
    const ghostAround = drawn(pair, inFront, { visibility: [GHOST, SHOWN] })
    const alone = drawn(pair, inFront, { visibility: [HIDDEN, SHOWN] })
    expect(count(ghostAround, (x, y) => partAt(ghostAround, x, y) === 1)).toBe(
      count(alone, (x, y) => partAt(alone, x, y) === 1),
    )
    expect(inkIn(ghostAround, 0, 0, 200, 200)).toBeGreaterThan(inkIn(alone, 0, 0, 200, 200) + 20)
  })

  it.each([
    ['vellum', vellum],
    ['slate', slate],
  ] as const)('washes a lit part in pencil in %s', (_, theme) => {
    const raster = drawn(rig, frame, { visibility: [LIT, SHOWN], theme })
    const bare = (part: number) => {
      const colours = new Set<number>()
      for (let y = 0; y < 200; y++)
        for (let x = 0; x < 200; x++)
          if (partAt(raster, x, y) === part && inkAt(raster, x, y) === 0) colours.add(colourAt(raster, x, y))
      return colours
    }
    expect([...bare(1)].every((colour) => colour === theme.part || colour === theme.metal)).toBe(true)
    expect(bare(0).has(theme.pencilWash)).toBe(true)
    expect(bare(0).has(theme.part) || bare(0).has(theme.metal)).toBe(false)
    expect(bare(0).size).toBeLessThanOrEqual(2)
  })

  it('mixes a crown towards the gas colour with the pressure over its own cylinder only', () => {
    const crown = (cylinder: number) => {
      const mesh = boxMesh(0.8, 0.8, 0.8)
      return {
        mesh: { ...mesh, surfaces: mesh.surfaces.map((s) => ({ ...s, fill: 'crown' as const })) },
        part: { cylinder },
      }
    }
    const pair = rigOf([crown(0), crown(1)], [[0, 1, 0], [0, 1, 1]]) // prettier-ignore
    const at = { eye: [0, 5, -9] as [number, number, number], fov: 0.3 }
    const top = (tint: number[]) => {
      const raster = drawn(pair, frameOf(poseOf({ x: 0.6 }, { x: -0.6 }), at, tint))
      const colours = [0, 1].map((part) => {
        for (let x = part * 100; x < 200; x++)
          if (partAt(raster, x, 80) === part && inkAt(raster, x, 80) === 0) return colourAt(raster, x, 80)
        return -1
      })
      return colours
    }
    const [bare] = top([0, 0])
    expect(bare).toBe(vellum.metal)
    expect(top([0, 1])[0]).toBe(bare)
    const half = top([0, 0.5])[1]
    const full = top([0, 1])[1]
    const distance = (a: number, b: number) =>
      [0, 8, 16].reduce((sum, k) => sum + Math.abs(((a >> k) & 255) - ((b >> k) & 255)), 0)
    expect(distance(half, vellum.gas)).toBeLessThan(distance(bare, vellum.gas))
    expect(distance(full, vellum.gas)).toBeLessThan(distance(half, vellum.gas))
  })
})
