import { array, assert, double, integer, property, tuple } from 'fast-check'
import { describe, expect, it } from 'vitest'
import { addLathe, tubeProfile } from '@/scene/frame/mesh/lathe'
import { MeshBuilder } from '@/scene/frame/mesh/mesh-builder'
import { areaMoments, circle, convexHull, eggOutline, rectangle } from '@/scene/frame/mesh/outline'
import { addPrism } from '@/scene/frame/mesh/prism'
import { triangulate } from '@/scene/frame/mesh/triangulate'
import { eulerNumber, measured, openEdges } from './rigs'

const made = (build: (builder: MeshBuilder) => void) => {
  const builder = new MeshBuilder()
  build(builder)
  return builder.finish()
}

describe('addPrism(builder, { outline, from, to })', () => {
  const box = made((builder) => addPrism(builder, { outline: rectangle(0, 0, 2, 3), from: 0, to: 4 }))

  it('is a closed box of the right volume, facing out', () => {
    expect(openEdges(box)).toBe(0)
    expect(measured(box).volume).toBeCloseTo(24, 6)
    expect(eulerNumber(box)).toBe(2)
  })

  it('gives a box six surfaces, its twelve edges as creases, and no smooth edge', () => {
    expect(box.surfaces).toHaveLength(6)
    expect(box.creases.length / 4).toBe(12)
    expect(box.smooth).toHaveLength(0)
  })

  it('keeps volume and closed edges on every axis, with holes and with pockets', () => {
    for (const axis of ['x', 'y', 'z'] as const) {
      const plate = made((builder) =>
        addPrism(builder, {
          outline: rectangle(-5, -5, 5, 5),
          holes: [circle(2, 2, 1)],
          pockets: { outlines: [rectangle(-4, -4, -1, -1)], depth: 0.5 },
          from: -1,
          to: 1,
          axis,
        }),
      )
      const hole = areaMoments(circle(2, 2, 1)).area
      expect(openEdges(plate)).toBe(0)
      expect(measured(plate).volume).toBeCloseTo(2 * (100 - hole) - 2 * 9 * 0.5, 4)
      expect(eulerNumber(plate)).toBe(0)
    }
  })

  it('takes a curve for one surface: a round bar has three, two rings of creases, and smooth edges up its side', () => {
    const bar = made((builder) => addPrism(builder, { outline: circle(0, 0, 1, 48), from: 0, to: 1 }))
    expect(bar.surfaces).toHaveLength(3)
    expect(bar.creases.length / 4).toBe(96)
    expect(bar.smooth.length / 4).toBe(48)
  })

  it('draws no ink on the borders of a side that lies against another part', () => {
    const buried = (point: number) => point === 0
    const wall = made((builder) =>
      addPrism(builder, { outline: rectangle(0, 0, 1, 1), from: 0, to: 1, isBuried: buried }),
    )
    expect(openEdges(wall)).toBe(0)
    expect(wall.creases.length / 4).toBe(8)
  })
})

describe('addLathe(builder, { profile })', () => {
  it('turns a tube: closed, one hole through it, volume of its polygon', () => {
    const tube = made((builder) => addLathe(builder, { profile: tubeProfile(1, 2, 0, 3), steps: 64 }))
    const ring = (64 / 2) * Math.sin((2 * Math.PI) / 64) * (4 - 1)
    expect(openEdges(tube)).toBe(0)
    expect(eulerNumber(tube)).toBe(0)
    expect(measured(tube).volume).toBeCloseTo(3 * ring, 4)
  })

  it('closes a sector with two cut faces', () => {
    const sector = made((builder) =>
      addLathe(builder, { profile: tubeProfile(1, 2, 0, 3), steps: 48, sector: { first: 5, count: 24 } }),
    )
    expect(openEdges(sector)).toBe(0)
    expect(eulerNumber(sector)).toBe(2)
    expect(sector.surfaces.filter(({ cut }) => cut)).toHaveLength(2)
    expect(measured(sector).volume).toBeCloseTo(1.5 * 24 * Math.sin((2 * Math.PI) / 48) * 3, 4)
  })

  it('states the mean width of a surface: a long narrow band is about as wide as it is high', () => {
    const band = made((builder) => addLathe(builder, { profile: tubeProfile(0.99, 1, 0, 0.01), steps: 48 }))
    for (const { meanWidth } of band.surfaces) expect(meanWidth).toBeCloseTo(0.01, 3)
  })
})

describe('triangulate(outer, holes)', () => {
  it('uses every point, also those that lie straight between their neighbours', () => {
    const outer = [0, 0, 1, 0, 2, 0, 3, 0, 3, 3, 0, 3, 0, 2, 0, 1]
    const triangles = triangulate(outer)
    expect(new Set(triangles).size).toBe(8)
    expect(triangles.length / 3).toBe(6)
    const area = (i: number) =>
      areaMoments(triangles.slice(i, i + 3).flatMap((k) => [outer[2 * k], outer[2 * k + 1]])).area
    let sum = 0
    for (let i = 0; i < triangles.length; i += 3) sum += area(i)
    expect(sum).toBeCloseTo(9, 12)
  })

  it('covers any star with round holes: no overlap, every edge of every loop in one triangle', () => {
    const part = double({ min: 0, max: 1, noNaN: true })
    assert(
      property(
        array(part, { minLength: 7, maxLength: 60 }),
        array(tuple(part, integer({ min: 3, max: 40 })), { maxLength: 4 }),
        (reaches, rounds) => {
          const outer = reaches.flatMap((reach, i) => {
            const angle = (2 * Math.PI * i) / reaches.length
            return [(2 + 8 * reach) * Math.cos(angle), (2 + 8 * reach) * Math.sin(angle)]
          })
          const holes = rounds.map(([size, steps], i) =>
            circle(0.7 * Math.cos(1.6 * i), 0.7 * Math.sin(1.6 * i), 0.05 + 0.35 * size, steps),
          )
          const loops = [outer, ...holes]
          const points = loops.flat()
          const triangles = triangulate(outer, holes)
          expect(triangles.length / 3).toBe(points.length / 2 + 2 * holes.length - 2)
          const sides = new Set<string>()
          let sum = 0
          for (let i = 0; i < triangles.length; i += 3) {
            const corners = triangles.slice(i, i + 3)
            corners.forEach((from, k) => sides.add(`${from}-${corners[(k + 1) % 3]}`))
            const { area } = areaMoments(corners.flatMap((k) => [points[2 * k], points[2 * k + 1]]))
            expect(area).toBeGreaterThan(0)
            sum += area
          }
          const area = (loop: number[]) => areaMoments(loop).area
          expect(sum).toBeCloseTo(area(outer) - holes.reduce((all, hole) => all + area(hole), 0), 9)
          let first = 0
          loops.forEach((loop, hole) => {
            const count = loop.length / 2
            for (let i = 0; i < count; i++) {
              const [a, b] = [first + i, first + ((i + 1) % count)]
              expect(sides.has(hole ? `${b}-${a}` : `${a}-${b}`)).toBe(true)
            }
            first += count
          })
        },
      ),
      { seed: 1, numRuns: 300 },
    )
  })
})

describe('eggOutline(y0, r0, y1, r1)', () => {
  it('is convex and holds both circles', () => {
    const egg = eggOutline(0, 3, 4, 2)
    expect(areaMoments(convexHull([...egg, ...circle(0, 0, 2.99), ...circle(0, 4, 1.99)])).area).toBeCloseTo(
      areaMoments(egg).area,
      9,
    )
  })
})
