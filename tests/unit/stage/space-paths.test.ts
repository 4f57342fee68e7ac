import { describe, expect, it } from 'vitest'
import type { Rig } from '@/scene/frame/types'
import { createPath, fillCoupleArc, fillRotation } from '@/scene/stage/space-paths'

const rig = (mirror: -1 | 1) =>
  ({
    mirror,
    bounds: Float64Array.of(-0.3, -0.2, 0, 0.3, 0.4, 0.6),
    anchors: { freeEnd: [0, 0, -0.05] },
  }) as unknown as Rig

const point = ({ points }: { points: Float64Array }, i: number) => [...points.subarray(3 * i, 3 * i + 3)]

describe('fillCoupleArc(path, rig, vertical, horizontal, peak, axial)', () => {
  it('a couple that pushes the drive end up ends higher than it began, there', () => {
    const path = createPath(32)
    fillCoupleArc(path, rig(-1), 10, 0, 10, 0.3)
    const [first, last] = [point(path, 0), point(path, path.count - 1)]
    expect(last[1]).toBeGreaterThan(first[1])
    expect(point(path, Math.floor(path.count / 2))[2]).toBeGreaterThan(0.3)
  })

  it('half the couple is half the arc; near nothing is none', () => {
    const path = createPath(32)
    const span = (size: number) => {
      fillCoupleArc(path, rig(1), size, 0, 10, 0)
      return path.count === 0
        ? 0
        : 2 * Math.atan2(point(path, path.count - 1)[1], point(path, path.count - 1)[2])
    }
    expect(span(5)).toBeCloseTo(span(10) / 2, 9)
    expect(span(0.05)).toBe(0)
  })
})

describe('fillRotation(path, rig)', () => {
  it('runs towards +90°, which is −x for an engine that turns clockwise seen from the free end', () => {
    for (const mirror of [-1, 1] as const) {
      const path = createPath(32)
      fillRotation(path, rig(mirror))
      expect(Math.sign(point(path, path.count - 1)[0] - point(path, 0)[0])).toBe(mirror)
    }
  })
})
