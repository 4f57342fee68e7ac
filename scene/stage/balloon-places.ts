/**
 * Where balloons stand: in a column down each side of the sheet, so joined to their dots by straight leaders that no two
 * leaders cross. Two crossing leaders always get shorter together when they change places, so changing places until
 * none cross must end; while the engine runs only the leaders that have come to cross change.
 */
export interface BalloonPlaces {
  count: number
  /** Places, x and y in turn. */
  place: Float64Array
  /** Dots, x and y in turn. */
  dot: Float64Array
  /** Which place each balloon has. */
  at: Int32Array
}

export interface Sheet {
  width: number
  height: number
  /** Kept free down each side's top for the legend, and at the bottom. */
  top: number
  bottom: number
  /** Distance of a column's centre line from the edge. */
  edge: number
  /** Least distance between two balloons of a column. */
  pitch: number
}

export const createPlaces = (count: number): BalloonPlaces => ({
  count,
  place: new Float64Array(2 * count),
  dot: new Float64Array(2 * count),
  at: Int32Array.from({ length: count }, (_, i) => i),
})

/** Lays the places out afresh for the dots as they are, half of them left and half right, then uncrosses. */
export function layOut(places: BalloonPlaces, sheet: Sheet): void {
  const { count, place, dot, at } = places
  const order = Array.from({ length: count }, (_, i) => i).sort((a, b) => dot[2 * a] - dot[2 * b])
  const left = Math.ceil(count / 2)
  layColumn(places, order.slice(0, left), sheet, sheet.edge, 0)
  layColumn(places, order.slice(left), sheet, sheet.width - sheet.edge, left)
  for (let i = 0; i < count; i++)
    if (!(place[2 * at[i]] >= 0)) throw new RangeError('a balloon without a place')
  uncross(places)
}

function layColumn(places: BalloonPlaces, balloons: number[], sheet: Sheet, x: number, first: number) {
  const { place, dot, at } = places
  const sorted = [...balloons].sort((a, b) => dot[2 * a + 1] - dot[2 * b + 1])
  const room = Math.max(0, sheet.height - sheet.top - sheet.bottom)
  const pitch = Math.min(sheet.pitch, sorted.length > 1 ? room / (sorted.length - 1) : room)
  // As near the dots as the pitch allows: down pushing, then back up from the foot.
  const ys = sorted.map((balloon) => Math.min(Math.max(dot[2 * balloon + 1], sheet.top), sheet.top + room))
  for (let i = 1; i < ys.length; i++) ys[i] = Math.max(ys[i], ys[i - 1] + pitch)
  for (let i = ys.length - 1, limit = sheet.top + room; i >= 0; i--, limit -= pitch)
    ys[i] = Math.min(ys[i], limit)
  sorted.forEach((balloon, i) => {
    place[2 * (first + i)] = x
    place[2 * (first + i) + 1] = ys[i]
    at[balloon] = first + i
  })
}

/** Lets balloons change places until no two leaders cross; true when any did. */
export function uncross(places: BalloonPlaces): boolean {
  const { count, at } = places
  let changed = false
  let again = true
  // Each change shortens the leaders, so this ends; the bound is for rounding alone.
  for (let round = 0; again && round < 4 * count * count; round++) {
    again = false
    for (let i = 0; i < count; i++)
      for (let j = i + 1; j < count; j++) {
        if (!cross(places, i, j)) continue
        const place = at[i]
        at[i] = at[j]
        at[j] = place
        again = true
        changed = true
      }
  }
  return changed
}

const side = (px: number, py: number, qx: number, qy: number, rx: number, ry: number) =>
  (qx - px) * (ry - py) - (qy - py) * (rx - px)

/** Do the leaders of balloons i and j cross? */
export function cross({ place, dot, at }: BalloonPlaces, i: number, j: number): boolean {
  const p = 2 * at[i]
  const q = 2 * at[j]
  const ax = place[p]
  const ay = place[p + 1]
  const bx = dot[2 * i]
  const by = dot[2 * i + 1]
  const cx = place[q]
  const cy = place[q + 1]
  const dx = dot[2 * j]
  const dy = dot[2 * j + 1]
  const c = side(ax, ay, bx, by, cx, cy)
  const d = side(ax, ay, bx, by, dx, dy)
  const a = side(cx, cy, dx, dy, ax, ay)
  const b = side(cx, cy, dx, dy, bx, by)
  return c * d < 0 && a * b < 0
}
