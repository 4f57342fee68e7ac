import { centreClasses, type Space } from './space'

/**
 * Every phasing of a space as steps of its grid by throw, the first at 0: one array, changed between steps. Left out are
 * phasings in which more cylinders share a top dead centre than the cycle has turns, those that mirroring or exchanging
 * ends turns into one that is kept, and on the grid of even firing those that cannot fire evenly.
 */
export function* phasings(space: Space): Generator<Int32Array> {
  const { throws, divisions, rodsPerThrow: rods } = space
  const { of, count, capacity } = centreClasses(space, space.natural)
  const used = new Uint8Array(count)
  const units = new Int32Array(throws)

  /** Takes (or gives back) the top dead centres of a throw; false, and nothing taken, where one is full. */
  const take = (k: number) => {
    for (let rod = 0; rod < rods; rod++) {
      const own = of[(k * divisions + units[k]) * rods + rod]
      if (own >= 0 && used[own] < capacity) used[own]++
      else {
        give(k, rod)
        return false
      }
    }
    return true
  }
  const give = (k: number, upTo: number = rods) => {
    for (let rod = 0; rod < upTo; rod++) used[of[(k * divisions + units[k]) * rods + rod]]--
  }

  const canonical = canonicalTest(space)
  if (!take(0)) return
  if (throws === 1) {
    yield units
    return
  }
  let k = 1
  units[1] = -1
  while (k > 0) {
    if (++units[k] === divisions) {
      k--
      if (k > 0) give(k)
    } else if (take(k)) {
      if (k < throws - 1) units[++k] = -1
      else {
        if (canonical(units)) yield units
        give(k)
      }
    }
  }
}

/** Whether a phasing is the first, by its steps, of those that the symmetries of its space make the same engine. */
function canonicalTest({ throws, divisions, symmetry }: Space) {
  const last = throws - 1
  const images: ((units: Int32Array, k: number) => number)[] = []
  if (symmetry.mirror) images.push((units, k) => -units[k])
  if (symmetry.endForEnd) images.push((units, k) => units[last - k] - units[last])
  if (symmetry.both) images.push((units, k) => units[last] - units[last - k])
  const step = (value: number) => (value < 0 ? value + divisions : value)
  return (units: Int32Array) => {
    for (const image of images)
      for (let k = 1; k < throws; k++) {
        const other = step(image(units, k))
        if (other < units[k]) return false
        if (other > units[k]) break
      }
    return true
  }
}

/** Whether a phasing of a space stands on a grid gone through before with the same bank angle and split. */
export function beenThere(space: Space, before: readonly Space[]): (units: Int32Array) => boolean {
  const same = before.filter(({ bankAngle, split }) => bankAngle === space.bankAngle && split === space.split)
  const coarser = same.filter(({ natural }) => !natural)
  const even = same.some(({ natural }) => natural) ? evenTest(space) : () => false
  return (units) =>
    even(units) ||
    coarser.some(({ divisions }) => units.every((unit) => (unit * divisions) % space.divisions === 0))
}

/** Whether a phasing can fire evenly: then the grid of even firing holds it. */
function evenTest(space: Space): (units: Int32Array) => boolean {
  const { divisions, rodsPerThrow: rods } = space
  const { of, count, capacity } = centreClasses(space, true)
  const used = new Uint8Array(count)
  return (units) => {
    used.fill(0)
    for (let k = 0; k < units.length; k++)
      for (let rod = 0; rod < rods; rod++) {
        const own = of[(k * divisions + units[k]) * rods + rod]
        if (own < 0 || ++used[own] > capacity) return false
      }
    return true
  }
}
