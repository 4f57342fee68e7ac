import type { Cylinder, Train } from '@/lib/mechanics/train'
import type { Pin } from '../crank-layout'
import type { Shape } from '../shape'
import type { PistonSize } from './piston-size'

/** The metal of one rod, in metres; y runs from the big end's centre to the small end's. */
export interface RodSize {
  length: number
  bigBore: number
  bigRadius: number
  /** Stretches along the crank of the big end, from the cylinder's own place: two for a fork. */
  bigEnds: { from: number; to: number }[]
  smallBore: number
  smallRadius: number
  smallHalf: number
  beamHalf: number
  onePiece: boolean
  knuckles: { angle: number; radius: number; pin: number }[]
}

/** Clearance between an eye and its pin, as a share of the pin's radius: seen as a thin ring, the bearing shell. */
const SHELL = 1.03

/** Common practice. */
const knucklePinRadius = (master: Cylinder) => 0.085 * master.bore

export function rodSize(train: Train, shape: Shape, pin: Pin, index: number, piston: PistonSize): RodSize {
  const cylinder = train.cylinders[index]
  const { link } = cylinder
  const crossPin = link ? knucklePinRadius(train.cylinders[link.master]) : shape.pinRadius
  const bigBore = SHELL * crossPin
  const linked = train.cylinders.filter((other) => other.link?.master === index)
  const bigEnds = link ? [slot(pin)] : bigEndPlaces(train, pin, index, linked.length > 0)
  const width = bigEnds[bigEnds.length - 1].to - bigEnds[0].from
  const smallBore = SHELL * piston.pinRadius
  const smallHalf = Math.min(0.46 * width, 0.17 * cylinder.bore)
  return {
    length: cylinder.rodLength,
    bigBore,
    bigRadius: (link ? 1.5 : 1.24) * crossPin,
    bigEnds: bigEnds.map(({ from, to }) => ({ from: from - cylinder.axial, to: to - cylinder.axial })),
    smallBore,
    smallRadius: Math.min(1.36 * piston.pinRadius, 0.4 * cylinder.rodLength),
    smallHalf,
    beamHalf: 0.72 * smallHalf,
    onePiece: (shape.builtUp && piston.rodLength === 0) || linked.length > 0 || link !== undefined,
    knuckles: linked.map((other) => ({
      angle: other.link!.knuckleAngle,
      radius: other.link!.knuckleRadius,
      pin: knucklePinRadius(cylinder),
    })),
  }
}

/** The middle of the pin, where link rods run between the two flanges of their master. */
function slot(pin: Pin) {
  const middle = (pin.from + pin.to) / 2
  const half = 0.2 * (pin.to - pin.from)
  return { from: middle - half, to: middle + half }
}

function bigEndPlaces(
  train: Train,
  pin: Pin,
  index: number,
  master: boolean,
): { from: number; to: number }[] {
  const { axial, throw: own } = train.cylinders[index]
  const length = pin.to - pin.from
  const play = 0.015 * length
  if (master) return [{ from: pin.from + 2 * play, to: pin.to - 2 * play }]
  const beside = train.cylinders.flatMap((other, i) =>
    other.throw === own && !other.link && i !== index ? [i] : [],
  )
  const same = beside.filter((i) => Math.abs(train.cylinders[i].axial - axial) < 0.05 * length)
  const others = beside.filter((i) => !same.includes(i)).map((i) => (train.cylinders[i].axial + axial) / 2)
  const from = Math.max(pin.from, ...others.filter((edge) => edge < axial)) + play
  const to = Math.min(pin.to, ...others.filter((edge) => edge > axial)) - play
  const half = Math.max(Math.min(axial - from, to - axial), 0.06 * length)
  if (same.length === 0) return [{ from: axial - half, to: axial + half }]
  // rods at one place: the first is the fork about the others, which share the middle
  const order = [index, ...same].sort((a, b) => a - b).indexOf(index)
  const middle = 0.46 * half
  if (order === 0) {
    return [
      { from: axial - half, to: axial - middle - play },
      { from: axial + middle + play, to: axial + half },
    ]
  }
  const blades = same.length
  const start = axial - middle + (2 * middle * (order - 1)) / blades
  return [{ from: start, to: start + (2 * middle) / blades - (order < blades ? play : 0) }]
}
