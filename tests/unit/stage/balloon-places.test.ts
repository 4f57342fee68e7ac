import { assert, double, integer, property, array, record } from 'fast-check'
import { describe, expect, it } from 'vitest'
import { createPlaces, cross, layOut, uncross, type BalloonPlaces } from '@/scene/stage/balloon-places'

const sheet = { width: 760, height: 640, top: 104, bottom: 36, edge: 26, pitch: 34 }

const dots = (max: number) =>
  array(
    record({ x: double({ min: 60, max: 700, noNaN: true }), y: double({ min: 0, max: 640, noNaN: true }) }),
    { minLength: 1, maxLength: max },
  )

const crossings = (places: BalloonPlaces) => {
  let count = 0
  for (let i = 0; i < places.count; i++)
    for (let j = i + 1; j < places.count; j++) if (cross(places, i, j)) count++
  return count
}

const placesFor = (points: { x: number; y: number }[]) => {
  const places = createPlaces(points.length)
  points.forEach(({ x, y }, i) => places.dot.set([x, y], 2 * i))
  return places
}

describe('layOut(places, sheet)', () => {
  it('leaders never cross, wherever the dots are', () => {
    assert(
      property(dots(24), (points) => {
        const places = placesFor(points)
        layOut(places, sheet)
        expect(crossings(places)).toBe(0)
      }),
      { numRuns: 300 },
    )
  })

  it('every balloon has a place of its own on the sheet, a pitch from its neighbours while there is room', () => {
    assert(
      property(dots(24), (points) => {
        const places = placesFor(points)
        layOut(places, sheet)
        expect(new Set(places.at).size).toBe(points.length)
        const columns = new Map<number, number[]>()
        for (let i = 0; i < points.length; i++) {
          const x = places.place[2 * i]
          columns.set(x, [...(columns.get(x) ?? []), places.place[2 * i + 1]])
        }
        for (const [x, ys] of columns) {
          expect([sheet.edge, sheet.width - sheet.edge]).toContain(x)
          ys.sort((a, b) => a - b)
          expect(ys[0]).toBeGreaterThanOrEqual(sheet.top - 1e-9)
          expect(ys[ys.length - 1]).toBeLessThanOrEqual(sheet.height - sheet.bottom + 1e-9)
          ys.slice(1).forEach((y, i) => expect(y - ys[i]).toBeGreaterThanOrEqual(sheet.pitch - 1e-9))
        }
      }),
      { numRuns: 200 },
    )
  })

  it('a small sheet gets a smaller pitch rather than balloons off its edge', () => {
    const places = placesFor(Array.from({ length: 20 }, (_, i) => ({ x: 60 + 10 * i, y: 100 })))
    layOut(places, { ...sheet, height: 300 })
    for (let i = 0; i < 20; i++)
      expect(places.place[2 * i + 1]).toBeLessThanOrEqual(300 - sheet.bottom + 1e-9)
  })
})

describe('uncross(places)', () => {
  it('dots that move while the engine runs never end with crossed leaders', () => {
    assert(
      property(dots(16), integer({ min: 1, max: 1000 }), (points, seed) => {
        const places = placesFor(points)
        layOut(places, sheet)
        for (let step = 0; step < 8; step++) {
          for (let i = 0; i < points.length; i++) {
            places.dot[2 * i] += 30 * Math.sin(seed * (i + 1) + step)
            places.dot[2 * i + 1] += 30 * Math.cos(seed * (i + 2) + step)
          }
          uncross(places)
          expect(crossings(places)).toBe(0)
        }
      }),
      { numRuns: 150 },
    )
  })

  it('leaves balloons where they are when nothing crosses', () => {
    const places = placesFor([
      { x: 100, y: 200 },
      { x: 600, y: 300 },
    ])
    layOut(places, sheet)
    const before = [...places.at]
    expect(uncross(places)).toBe(false)
    expect([...places.at]).toEqual(before)
  })
})
