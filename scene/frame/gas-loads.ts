import type { Instant } from '@/lib/mechanics/instant'
import type { Train } from '@/lib/mechanics/train'
import type { Drive } from './pose'

/** What the gas forces alone would put on each crank pin, engine frame, N; with scratch for the sums on each rod. */
export interface GasLoads {
  vertical: Float64Array
  horizontal: Float64Array
  readonly onRod: Float64Array // 3 a cylinder: force vertical, horizontal and moment about the big end from link rods
}

export const buildGasLoads = (train: Train): GasLoads => ({
  vertical: new Float64Array(train.throws.length),
  horizontal: new Float64Array(train.throws.length),
  onRod: new Float64Array(3 * train.cylinders.length),
})

/**
 * Rods without mass between frictionless pins and walls. The gas force G pushes the piston pin with −G·u + N·v, where
 * the wall's thrust N follows from moments about the rod's big end: N·(a × v) = G·(a × u) − M, a from big end to piston
 * pin and M the moment of the link rods' forces on this rod (a × v = a·u, since u × v = 1). A link rod passes its sum to its
 * master at the knuckle, the others to their crank pin. The drive must have been posed at the instant's angle.
 */
export function fillGasLoads(out: GasLoads, drive: Drive, train: Train, instant: Instant): GasLoads {
  const { order, master, cosBank, sinBank, points } = drive
  const { vertical, horizontal, onRod } = out
  vertical.fill(0)
  horizontal.fill(0)
  onRod.fill(0)
  for (let k = order.length - 1; k >= 0; k--) {
    const i = order[k]
    const at = 6 * i
    const cos = cosBank[i]
    const sin = sinBank[i]
    const armV = points[at + 2] - points[at]
    const armH = points[at + 3] - points[at + 1]
    const gas = instant.gasForce[i]
    const wall = (gas * (armV * sin - armH * cos) - onRod[3 * i + 2]) / (armV * cos + armH * sin)
    const loadV = onRod[3 * i] - gas * cos - wall * sin
    const loadH = onRod[3 * i + 1] - gas * sin + wall * cos
    const host = master[i]
    if (host < 0) {
      const pin = train.cylinders[i].throw
      vertical[pin] += loadV
      horizontal[pin] += loadH
      continue
    }
    const knuckleV = points[at] - points[6 * host]
    const knuckleH = points[at + 1] - points[6 * host + 1]
    onRod[3 * host] += loadV
    onRod[3 * host + 1] += loadH
    onRod[3 * host + 2] += knuckleV * loadH - knuckleH * loadV
  }
  return out
}
