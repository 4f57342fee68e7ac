import type { Pose, Rig, RigDrive } from './types'

/** How one part is moved: which of the motions below, whose, and the part's own angle at crank angle zero. */
export const FIXED = 0
export const CRANK = 1
export const ROD = 2
export const PISTON = 3
export const SHAFT = 4

/** Everything `fillPose` reads, in flat arrays; angles in the sense of rotation, x already mirrored where it is a place. */
export interface Drive extends RigDrive {
  mirror: number
  /** One entry a part. */
  kind: Uint8Array
  index: Int16Array
  /** Its angle: of what is FIXED, of CRANK and SHAFT at crank angle 0, as cosine and sine. */
  cosPhase: Float64Array
  sinPhase: Float64Array
  atX: Float64Array // FIXED and SHAFT: its place, m
  atY: Float64Array
  ratio: Float64Array // SHAFT: its speed ratio
  /** One entry a cylinder, masters before their links in `order`. */
  order: Uint16Array
  master: Int16Array // −1: on the crank pin
  cosThrow: Float64Array
  sinThrow: Float64Array
  radius: Float64Array
  /** The knuckle's place on its master, along the master rod's axis and ahead of it. */
  knuckleAlong: Float64Array
  knuckleAhead: Float64Array
  cosBank: Float64Array
  sinBank: Float64Array
  length: Float64Array
  offset: Float64Array
  /** Scratch, 6 a cylinder: big end vertical and horizontal, piston pin vertical and horizontal, rod direction v and h. */
  points: Float64Array
}

export const buildPose = (rig: Pick<Rig, 'parts'>): Pose => new Float64Array(4 * rig.parts.length)

/**
 * Places every part at a crank angle, exactly: the crank pin on its circle (or the knuckle on its master rod), the
 * piston pin where the rod's length puts it on the cylinder's axis. Nothing is allocated.
 */
export function fillPose(out: Pose, rig: Pick<Rig, 'drive'>, angle: number): Pose {
  const drive = rig.drive as Drive
  placeCylinders(drive, angle)
  const { kind, index, cosPhase, sinPhase, atX, atY, ratio, mirror, cosBank, sinBank, points } = drive
  const cosCrank = Math.cos(angle)
  const sinCrank = Math.sin(angle)
  for (let part = 0; part < kind.length; part++) {
    const at = 4 * part
    const i = index[part]
    let cos: number
    let sin: number
    let x = atX[part]
    let y = atY[part]
    if (kind[part] === PISTON) {
      cos = cosBank[i]
      sin = sinBank[i]
      y = points[6 * i + 2]
      x = mirror * points[6 * i + 3]
    } else if (kind[part] === ROD) {
      cos = points[6 * i + 4]
      sin = points[6 * i + 5]
      y = points[6 * i]
      x = mirror * points[6 * i + 1]
    } else {
      const still = kind[part] === FIXED
      const turns = kind[part] === SHAFT
      const cosTurn = still ? 1 : turns ? Math.cos(ratio[part] * angle) : cosCrank
      const sinTurn = still ? 0 : turns ? Math.sin(ratio[part] * angle) : sinCrank
      cos = cosTurn * cosPhase[part] - sinTurn * sinPhase[part]
      sin = sinTurn * cosPhase[part] + cosTurn * sinPhase[part]
    }
    out[at] = cos
    out[at + 1] = -mirror * sin
    out[at + 2] = x
    out[at + 3] = y
  }
  return out
}

/** Fills `points` for a crank angle. */
export function placeCylinders(drive: Drive, angle: number) {
  const { order, master, cosThrow, sinThrow, radius, cosBank, sinBank, length, offset, points } = drive
  const cosCrank = Math.cos(angle)
  const sinCrank = Math.sin(angle)
  for (let k = 0; k < order.length; k++) {
    const i = order[k]
    const at = 6 * i
    let vertical: number
    let horizontal: number
    if (master[i] < 0) {
      vertical = radius[i] * (cosCrank * cosThrow[i] - sinCrank * sinThrow[i])
      horizontal = radius[i] * (sinCrank * cosThrow[i] + cosCrank * sinThrow[i])
    } else {
      const on = 6 * master[i]
      const along = drive.knuckleAlong[i]
      const ahead = drive.knuckleAhead[i]
      vertical = points[on] + points[on + 4] * along - points[on + 5] * ahead
      horizontal = points[on + 1] + points[on + 5] * along + points[on + 4] * ahead
    }
    const u = vertical * cosBank[i] + horizontal * sinBank[i]
    const lean = horizontal * cosBank[i] - vertical * sinBank[i] - offset[i]
    const s = u + Math.sqrt(length[i] * length[i] - lean * lean)
    points[at] = vertical
    points[at + 1] = horizontal
    points[at + 2] = s * cosBank[i] - offset[i] * sinBank[i]
    points[at + 3] = s * sinBank[i] + offset[i] * cosBank[i]
    points[at + 4] = (points[at + 2] - vertical) / length[i]
    points[at + 5] = (points[at + 3] - horizontal) / length[i]
  }
}
