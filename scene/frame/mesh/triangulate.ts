import type { Outline } from './outline'

/**
 * Triangles of a plane region, as counter-clockwise triplets of indices counted through all loops in turn. Every
 * edge of every loop is an edge of exactly one triangle, also where points lie straight between their neighbours, so
 * that faces which meet the region along a loop share all its edges. Holes are joined to the outer loop by bridges, then
 * ears are cut off: for the few points of a part this needs no index.
 */
export function triangulate(outer: Outline, holes: Outline[] = []): number[] {
  const loops = [outer, ...holes]
  const points = loops.flat()
  let first = 0
  const rings = loops.map((loop, i) => {
    const ring = Array.from({ length: loop.length / 2 }, (_, k) => first + k)
    first += ring.length
    return signedArea(points, ring) > 0 === (i === 0) ? ring : ring.reverse()
  })
  const [ring, ...inner] = rings
  while (inner.length > 0) join(points, ring, inner)
  return cutEars(points, ring)
}

/** Twice the area of the triangle, positive counter-clockwise. */
const turn = (p: number[], a: number, b: number, c: number) =>
  (p[2 * b] - p[2 * a]) * (p[2 * c + 1] - p[2 * a + 1]) -
  (p[2 * b + 1] - p[2 * a + 1]) * (p[2 * c] - p[2 * a])

const square = (p: number[], a: number, b: number) =>
  (p[2 * b] - p[2 * a]) ** 2 + (p[2 * b + 1] - p[2 * a + 1]) ** 2

function signedArea(points: number[], ring: number[]): number {
  let sum = 0
  for (let i = 2; i < ring.length; i++) sum += turn(points, ring[0], ring[i - 1], ring[i])
  return sum
}

/** Takes one hole into the ring, by the shortest way from ring to hole that runs through the region. */
function join(p: number[], ring: number[], holes: number[][]) {
  for (let tried = -1; ;) {
    let [length, h, k, i] = [Infinity, 0, 0, 0]
    for (let hole = 0; hole < holes.length; hole++)
      for (let to = 0; to < holes[hole].length; to++)
        for (let from = 0; from < ring.length; from++) {
          const far = square(p, ring[from], holes[hole][to])
          if (far > tried && far < length) [length, h, k, i] = [far, hole, to, from]
        }
    if (
      length === Infinity ||
      (opens(p, ring, i, holes[h][k]) && isClear(p, ring[i], holes[h][k], [ring, ...holes]))
    ) {
      const [hole] = holes.splice(h, 1)
      ring.splice(i, 0, ring[i], ...hole.slice(k), ...hole.slice(0, k + 1))
      return
    }
    tried = length
  }
}

/** Does the way to this point leave the ring's corner into the region? */
function opens(p: number[], ring: number[], i: number, to: number): boolean {
  const before = ring[(i + ring.length - 1) % ring.length]
  const after = ring[(i + 1) % ring.length]
  const past = turn(p, ring[i], after, to) > 0
  const short = turn(p, before, ring[i], to) > 0
  return turn(p, before, ring[i], after) > 0 ? past && short : past || short
}

/** Does the way from one point to another cross no side of these loops? */
const isClear = (p: number[], from: number, to: number, loops: number[][]): boolean =>
  loops.every((loop) =>
    loop.every((a, at) => {
      const b = loop[(at + 1) % loop.length]
      if (a === to || b === to || square(p, a, from) === 0 || square(p, b, from) === 0) return true
      return (
        turn(p, from, to, a) > 0 === turn(p, from, to, b) > 0 ||
        turn(p, a, b, from) > 0 === turn(p, a, b, to) > 0
      )
    }),
  )

/** Flatter than this share of its longest side squared is no ear. */
const flat = 1e-9

/** Cuts one corner after another whose triangle holds no other corner; only corners that bend inwards can be in the way. */
function cutEars(p: number[], ring: number[]): number[] {
  const triangles: number[] = []
  const count = ring.length
  const before = ring.map((_, i) => (i + count - 1) % count)
  const after = ring.map((_, i) => (i + 1) % count)
  const bend = (i: number) => turn(p, ring[before[i]], ring[i], ring[after[i]])
  let inward = ring.flatMap((_, i) => (bend(i) <= 0 ? [i] : []))

  const isEar = (i: number): boolean => {
    const [a, b, c] = [ring[before[i]], ring[i], ring[after[i]]]
    if (bend(i) <= flat * Math.max(square(p, a, b), square(p, b, c))) return false
    for (const other of inward) {
      const v = ring[other]
      if (v === a || v === b || v === c) continue
      if (turn(p, a, b, v) < 0 || turn(p, b, c, v) < 0 || turn(p, c, a, v) < 0) continue
      // the two banks of a bridge lie on one another
      if (square(p, v, a) > 0 && square(p, v, b) > 0 && square(p, v, c) > 0) return false
    }
    return true
  }

  for (let left = count, i = 0; left > 2; left--) {
    for (let tries = 0; tries < left && !isEar(i); tries++) i = after[i]
    triangles.push(ring[before[i]], ring[i], ring[after[i]])
    after[before[i]] = after[i]
    before[after[i]] = before[i]
    inward = inward.filter((other) => other !== i && bend(other) <= 0)
    // not the next corner, so that ears do not all meet in one point
    i = after[after[i]]
  }
  return triangles
}
