import earcut from 'earcut'
import type { Outline } from './outline'

/**
 * Triangles of a plane region, as counter-clockwise triplets of indices counted through all loops in turn. Every
 * edge of every loop is an edge of exactly one triangle, also where points lie straight between their neighbours, so
 * that faces which meet the region along a loop share all its edges.
 */
export function triangulate(outer: Outline, holes: Outline[] = []): number[] {
  const loops = [outer, ...holes]
  const points = loops.flat()
  const starts: number[] = []
  let count = 0
  for (const loop of loops) {
    starts.push(count)
    count += loop.length / 2
  }
  const triangles = earcut(points, starts.slice(1))
  if (signedArea(points, triangles) < 0) triangles.reverse()
  mend(triangles, points, rims(starts, count))
  return triangles
}

/** Of all triangles together: one alone may be a sliver of no sign. */
function signedArea(points: number[], triangles: number[]): number {
  let sum = 0
  for (let i = 0; i < triangles.length; i += 3) {
    const [a, b, c] = [2 * triangles[i], 2 * triangles[i + 1], 2 * triangles[i + 2]]
    const ux = points[b] - points[a]
    const uy = points[b + 1] - points[a + 1]
    sum += ux * (points[c + 1] - points[a + 1]) - uy * (points[c] - points[a])
  }
  return sum / 2
}

/** The point that follows each one along its loop. */
function rims(starts: number[], count: number): Int32Array {
  const next = Int32Array.from({ length: count }, (_, i) => i + 1)
  starts.forEach((start, i) => {
    next[(starts[i + 1] ?? count) - 1] = start
  })
  return next
}

/** Ear clipping leaves out points that lie straight between others: splits the triangles whose side runs through such points. */
function mend(triangles: number[], points: number[], next: Int32Array) {
  const count = next.length
  const before = new Int32Array(count)
  next.forEach((to, from) => (before[to] = from))
  for (let round = 0; round <= count; round++) {
    const sides = new Set<number>()
    for (let i = 0; i < triangles.length; i++) sides.add(triangles[i] * count + ahead(triangles, i))
    // a hole's loop, counter-clockwise like the outer one, is passed by the triangles the other way
    const onRim = (from: number, to: number) => next[from] === to || before[from] === to
    const open = triangles.flatMap((from, i) => {
      const to = ahead(triangles, i)
      return onRim(from, to) || sides.has(to * count + from) ? [] : [i]
    })
    if (open.length === 0) return
    const split = open.find((i) => {
      const between = nearestBetween(points, triangles[i], ahead(triangles, i), count)
      if (between >= 0) splitSide(triangles, i, between)
      return between >= 0
    })
    if (split === undefined) return
  }
}

const ahead = (triangles: number[], i: number) => triangles[i % 3 === 2 ? i - 2 : i + 1]

/** The point nearest to `from` that lies on the way from there to `to`, −1 where there is none. */
function nearestBetween(points: number[], from: number, to: number, count: number): number {
  const dx = points[2 * to] - points[2 * from]
  const dy = points[2 * to + 1] - points[2 * from + 1]
  const square = dx * dx + dy * dy
  let found = -1
  let nearest = 1
  for (let i = 0; i < count; i++) {
    if (i === from || i === to) continue
    const x = points[2 * i] - points[2 * from]
    const y = points[2 * i + 1] - points[2 * from + 1]
    const along = (x * dx + y * dy) / square
    if (along <= 0 || along >= nearest || Math.abs(x * dy - y * dx) > 1e-9 * square) continue
    nearest = along
    found = i
  }
  return found
}

function splitSide(triangles: number[], i: number, between: number) {
  const base = i - (i % 3)
  const from = triangles[i]
  const to = ahead(triangles, i)
  const apex = triangles[base + ((i + 2) % 3)]
  triangles.splice(base, 3, from, between, apex, between, to, apex)
}
