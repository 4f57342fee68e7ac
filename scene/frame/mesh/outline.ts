/** A closed plane curve as flat x, y pairs, counter-clockwise, without its first point repeated. */
export type Outline = number[]

/** Chords to a whole turn: enough for a moving picture. */
export const TURN_STEPS = 48

/** Joints of an outline that turn more than this are corners; less is a curve. acos 0.88. */
const CORNER = 0.4949

const steps = (angle: number, turnSteps: number) =>
  Math.max(1, Math.round((Math.abs(angle) / (2 * Math.PI)) * turnSteps - 1e-9))

/** The points one after another. */
export const through = (...points: [x: number, y: number][]): Outline => points.flat()

/** Both ends included; from a larger to a smaller angle it runs clockwise. */
export function arc(
  x: number,
  y: number,
  radius: number,
  from: number,
  to: number,
  turnSteps = TURN_STEPS,
): Outline {
  const count = steps(to - from, turnSteps)
  const points: Outline = []
  for (let i = 0; i <= count; i++) {
    const angle = from + ((to - from) * i) / count
    points.push(x + radius * Math.cos(angle), y + radius * Math.sin(angle))
  }
  return points
}

export function circle(x: number, y: number, radius: number, turnSteps = TURN_STEPS): Outline {
  return arc(x, y, radius, 0, 2 * Math.PI, turnSteps).slice(0, -2)
}

export const rectangle = (x0: number, y0: number, x1: number, y1: number): Outline =>
  through([x0, y0], [x1, y0], [x1, y1], [x0, y1])

function reversed(outline: Outline): Outline {
  const points: Outline = []
  for (let i = outline.length - 2; i >= 0; i -= 2) points.push(outline[i], outline[i + 1])
  return points
}

/** The left half put beside a right half that runs upwards from bottom to top, both off the y axis. */
export function bothSides(right: Outline): Outline {
  const left = reversed(right)
  for (let i = 0; i < left.length; i += 2) left[i] = -left[i]
  return [...right, ...left]
}

/** Convex hull of a circle about (0, y0) and one about (0, y1) above it. */
export function eggOutline(y0: number, r0: number, y1: number, r1: number, turnSteps = TURN_STEPS): Outline {
  const rise = y1 - y0
  if (rise <= Math.abs(r1 - r0)) return r0 >= r1 ? circle(0, y0, r0, turnSteps) : circle(0, y1, r1, turnSteps)
  const tangent = Math.asin((r0 - r1) / rise)
  return [
    ...arc(0, y1, r1, tangent, Math.PI - tangent, turnSteps),
    ...arc(0, y0, r0, Math.PI - tangent, 2 * Math.PI + tangent, turnSteps),
  ]
}

/** Area and first moments of area about the axes. */
export function areaMoments(outline: Outline): { area: number; x: number; y: number } {
  let area = 0
  let x = 0
  let y = 0
  for (let i = 0; i < outline.length; i += 2) {
    const j = (i + 2) % outline.length
    const cross = outline[i] * outline[j + 1] - outline[j] * outline[i + 1]
    area += cross / 2
    x += ((outline[i] + outline[j]) * cross) / 6
    y += ((outline[i + 1] + outline[j + 1]) * cross) / 6
  }
  return { area, x, y }
}

/** Is the joint at point i (counted in points) of a closed or open polyline a corner? */
export function isCorner(line: Outline, i: number, closed: boolean): boolean {
  const count = line.length / 2
  if (!closed && (i === 0 || i === count - 1)) return true
  const before = 2 * ((i + count - 1) % count)
  const here = 2 * i
  const after = 2 * ((i + 1) % count)
  const ax = line[here] - line[before]
  const ay = line[here + 1] - line[before + 1]
  const bx = line[after] - line[here]
  const by = line[after + 1] - line[here + 1]
  return Math.abs(Math.atan2(ax * by - ay * bx, ax * bx + ay * by)) > CORNER
}

export function turned(outline: Outline, angle: number): Outline {
  const cos = Math.cos(angle)
  const sin = Math.sin(angle)
  const points: Outline = []
  for (let i = 0; i < outline.length; i += 2) {
    points.push(cos * outline[i] - sin * outline[i + 1], sin * outline[i] + cos * outline[i + 1])
  }
  return points
}

/** Counter-clockwise convex hull of a set of points (Andrew's monotone chain). */
export function convexHull(points: Outline): Outline {
  const order = Array.from({ length: points.length / 2 }, (_, i) => i).sort(
    (a, b) => points[2 * a] - points[2 * b] || points[2 * a + 1] - points[2 * b + 1],
  )
  const chain = (indices: number[]) => {
    const hull: number[] = []
    for (const i of indices) {
      while (hull.length > 1 && !leftTurn(points, hull[hull.length - 2], hull[hull.length - 1], i)) hull.pop()
      hull.push(i)
    }
    return hull.slice(0, -1)
  }
  return [...chain(order), ...chain(order.reverse())].flatMap((i) => [points[2 * i], points[2 * i + 1]])
}

function leftTurn(points: Outline, a: number, b: number, c: number): boolean {
  const ux = points[2 * b] - points[2 * a]
  const uy = points[2 * b + 1] - points[2 * a + 1]
  const vx = points[2 * c] - points[2 * b]
  const vy = points[2 * c + 1] - points[2 * b + 1]
  return ux * vy - uy * vx > 1e-9 * Math.hypot(ux, uy) * Math.hypot(vx, vy)
}
