import type { Solid } from './sizes'

/**
 * How far two convex solids stand apart, m: the greatest separation along any of their sides' normals (separating-axis
 * test), less their rounding. Positive when apart, then never more than the true distance; negative when they overlap,
 * then the least way that one must be moved to come free. Two circles: their distance less both radii.
 */
export function separation(a: Solid, b: Solid): number {
  let apart = -Infinity
  for (const [own, other] of [
    [a.points, b.points],
    [b.points, a.points],
  ])
    apart = Math.max(apart, alongNormals(own, other))
  if (a.points.length === 2 && b.points.length === 2)
    apart = Math.hypot(a.points[0] - b.points[0], a.points[1] - b.points[1])
  return apart - a.round - b.round
}

/** Over the sides of `own`: how far all of `other` lies beyond one of them. Either sense of turning round `own`. */
function alongNormals(own: Float64Array, other: Float64Array): number {
  const count = own.length
  if (count < 6) return -Infinity
  const turn = Math.sign(area(own))
  let apart = -Infinity
  for (let i = 0; i < count; i += 2) {
    const j = (i + 2) % count
    const [dx, dy] = [own[j] - own[i], own[j + 1] - own[i + 1]]
    const length = Math.hypot(dx, dy)
    if (length === 0) continue
    const [nx, ny] = [(turn * dy) / length, (-turn * dx) / length]
    let nearest = Infinity
    for (let k = 0; k < other.length; k += 2)
      nearest = Math.min(nearest, (other[k] - own[i]) * nx + (other[k + 1] - own[i + 1]) * ny)
    apart = Math.max(apart, nearest)
  }
  return apart
}

/** Twice the signed area. */
function area(points: Float64Array): number {
  let sum = 0
  for (let i = 0; i < points.length; i += 2) {
    const j = (i + 2) % points.length
    sum += points[i] * points[j + 1] - points[j] * points[i + 1]
  }
  return sum
}

/** A solid turned by the angle whose cosine and sine are given, and moved. */
export function placed({ points, round }: Solid, cos: number, sin: number, x: number, y: number): Solid {
  const out = new Float64Array(points.length)
  for (let i = 0; i < points.length; i += 2) {
    out[i] = cos * points[i] - sin * points[i + 1] + x
    out[i + 1] = sin * points[i] + cos * points[i + 1] + y
  }
  return { points: out, round }
}
