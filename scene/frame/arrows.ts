import type { Instant } from '@/lib/mechanics/instant'
import type { Train } from '@/lib/mechanics/train'
import type { Overlays } from '@/scene/model/scene'
import { buildGasLoads, fillGasLoads, type GasLoads } from './gas-loads'
import type { Drive } from './pose'
import type { Pose, Rig } from './types'

/** Meaning of an arrow, and with it colour and form. A couple's magnitude is in N m, all others' in N. */
export const GAS = 0
export const INERTIA = 1
export const RESULTANT = 2
export const COUPLE = 3

export const ON_PISTON = 0
export const ON_CRANK_PIN = 1
export const ON_MAIN = 2
export const ON_ENGINE = 3

/**
 * Force vectors in world coordinates, the first `count` of each list in use. They are, all drawn from where they act:
 *
 * - On a piston. Gas: the net gas force along the bore, from the crown. Inertia: −m·a of all that reciprocates with the
 *   piston, along the bore, from the piston pin. Total: what the piston puts on the rod at the piston pin, which is the
 *   sum of both and of the wall's side thrust.
 * - On a crank pin, from its middle, the sum over the rods that run on it. Total: what the rods put on the pin. Gas: the
 *   share of it that the gas forces alone would put there through rods without mass. Inertia: the rest. The split is
 *   exact, because the reactions are linear in the forces that cause them.
 * - On a main bearing: the total alone, from the crank's axis.
 * - On the engine: the shaking force at the crank axis, at the place couples are taken about; the shaking couple as a pair
 *   of opposite forces at the two outermost mains.
 */
export interface Arrows {
  count: number
  /** 3 an arrow, m. */
  tails: Float64Array
  tips: Float64Array
  kinds: Uint8Array
  magnitudes: Float64Array
  /** What it stands on and which one, in the train's indices. */
  on: Uint8Array
  index: Uint16Array
  /** Fixed for the train: read by `fillArrows`. */
  readonly train: Train
  readonly gasLoads: GasLoads
  readonly arm: number
}

/** Shorter than this share of the engine's size an arrow says nothing. */
const SHORTEST = 1e-3

export function buildArrows(rig: Rig, train: Train): Arrows {
  const most = 3 * train.cylinders.length + 3 * train.throws.length + train.mains.length + 3
  const { mains } = train
  const span = mains.length > 1 ? mains[mains.length - 1].axial - mains[0].axial : 0
  return {
    count: 0,
    tails: new Float64Array(3 * most),
    tips: new Float64Array(3 * most),
    kinds: new Uint8Array(most),
    magnitudes: new Float64Array(most),
    on: new Uint8Array(most),
    index: new Uint16Array(most),
    train,
    gasLoads: buildGasLoads(train),
    arm: span > 0 ? span : 0.5 * (rig.bounds[5] - rig.bounds[2]),
  }
}

/** `scale` is metres a newton. The pose must be that of the instant's angle. */
export function fillArrows(
  out: Arrows,
  rig: Rig,
  pose: Pose,
  instant: Instant,
  overlays: Overlays,
  scale: number,
): Arrows {
  out.count = 0
  if (overlays.on.pistons) addPistons(out, rig, pose, instant, overlays, scale)
  if (overlays.on.crankPins) addCrankPins(out, rig, instant, overlays, scale)
  if (overlays.on.mains && overlays.total) addMains(out, rig, instant, scale)
  if (overlays.shaking) addShaking(out, rig, instant, scale)
  return out
}

function addPistons(out: Arrows, rig: Rig, pose: Pose, instant: Instant, overlays: Overlays, scale: number) {
  const { cosBank, sinBank } = rig.drive as Drive
  const { crown } = rig.anchors
  for (let i = 0; i < crown.length; i++) {
    const { part, local } = crown[i]
    const pinX = pose[4 * part + 2]
    const pinY = pose[4 * part + 3]
    const crownX = pinX - pose[4 * part + 1] * local[1]
    const crownY = pinY + pose[4 * part] * local[1]
    const up = instant.pistonPinU[i]
    const side = instant.pistonPinV[i]
    const gas = -instant.gasForce[i]
    const inertia = up - gas
    const cos = cosBank[i]
    const sin = sinBank[i]
    const z = local[2]
    if (overlays.gas) add(out, rig, GAS, ON_PISTON, i, crownX, crownY, z, gas * cos, gas * sin, scale)
    if (overlays.inertia)
      add(out, rig, INERTIA, ON_PISTON, i, pinX, pinY, z, inertia * cos, inertia * sin, scale)
    if (overlays.total) {
      add(
        out,
        rig,
        RESULTANT,
        ON_PISTON,
        i,
        pinX,
        pinY,
        z,
        up * cos - side * sin,
        up * sin + side * cos,
        scale,
      )
    }
  }
}

function addCrankPins(out: Arrows, rig: Rig, instant: Instant, overlays: Overlays, scale: number) {
  const { train, gasLoads } = out
  const { master, points } = rig.drive as Drive
  fillGasLoads(gasLoads, rig.drive as Drive, train, instant)
  for (let pin = 0; pin < train.throws.length; pin++) {
    let vertical = 0
    let horizontal = 0
    let rider = -1
    for (let i = 0; i < master.length; i++) {
      if (train.cylinders[i].throw !== pin || master[i] >= 0) continue
      vertical += instant.crankPinVertical[i]
      horizontal += instant.crankPinHorizontal[i]
      rider = i
    }
    if (rider < 0) continue
    const gasV = gasLoads.vertical[pin]
    const gasH = gasLoads.horizontal[pin]
    const x = rig.mirror * points[6 * rider + 1]
    const y = points[6 * rider]
    const z = train.throws[pin].axial
    if (overlays.gas) add(out, rig, GAS, ON_CRANK_PIN, pin, x, y, z, gasV, gasH, scale)
    if (overlays.inertia) {
      add(out, rig, INERTIA, ON_CRANK_PIN, pin, x, y, z, vertical - gasV, horizontal - gasH, scale)
    }
    if (overlays.total) add(out, rig, RESULTANT, ON_CRANK_PIN, pin, x, y, z, vertical, horizontal, scale)
  }
}

function addMains(out: Arrows, rig: Rig, instant: Instant, scale: number) {
  const { mains } = out.train
  for (let i = 0; i < mains.length; i++) {
    const { mainVertical, mainHorizontal } = instant
    add(out, rig, RESULTANT, ON_MAIN, i, 0, 0, mains[i].axial, mainVertical[i], mainHorizontal[i], scale)
  }
}

function addShaking(out: Arrows, rig: Rig, instant: Instant, scale: number) {
  const { arm, train } = out
  const middle = train.referenceAxial
  add(
    out,
    rig,
    RESULTANT,
    ON_ENGINE,
    0,
    0,
    0,
    middle,
    instant.shakingVertical,
    instant.shakingHorizontal,
    scale,
  )
  const vertical = instant.coupleVertical / arm
  const horizontal = instant.coupleHorizontal / arm
  for (let end = -1; end <= 1; end += 2) {
    const at = out.count
    add(
      out,
      rig,
      COUPLE,
      ON_ENGINE,
      0,
      0,
      0,
      middle + (end * arm) / 2,
      end * vertical,
      end * horizontal,
      scale,
    )
    if (out.count > at) out.magnitudes[at] *= arm
  }
}

function add(
  out: Arrows,
  rig: Rig,
  kind: number,
  on: number,
  index: number,
  x: number,
  y: number,
  z: number,
  vertical: number,
  horizontal: number,
  scale: number,
) {
  const magnitude = Math.sqrt(vertical * vertical + horizontal * horizontal)
  if (!(magnitude * scale > SHORTEST * (rig.bounds[4] - rig.bounds[1]))) return
  const at = out.count++
  out.tails[3 * at] = x
  out.tails[3 * at + 1] = y
  out.tails[3 * at + 2] = z
  out.tips[3 * at] = x + rig.mirror * horizontal * scale
  out.tips[3 * at + 1] = y + vertical * scale
  out.tips[3 * at + 2] = z
  out.kinds[at] = kind
  out.magnitudes[at] = magnitude
  out.on[at] = on
  out.index[at] = index
}
