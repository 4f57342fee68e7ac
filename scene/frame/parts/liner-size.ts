import type { Train } from '@/lib/mechanics/train'
import { defaultDirection } from '../view-direction'
import type { Travel } from '../travels'
import { LINER_STEPS, type LinerSize } from './fixed'
import type { PistonSize } from './piston-size'

export function linerSize(
  train: Train,
  index: number,
  piston: PistonSize,
  travel: Travel,
  reach: number,
): LinerSize {
  const { bore } = train.cylinders[index]
  const wall = wallOf(train, index)
  const deck = travel.top + piston.crown + 0.008 * bore
  const lowest = travel.bottom + Math.max(piston.beltBottom, piston.skirtBottom) - 0.08 * bore
  const least = Math.max(lowest, 1.04 * reach, crossing(train, index, bore / 2 + wall))
  return { bore, wall, deck, bottom: Math.min(least, deck - 0.4 * (travel.top - travel.bottom)) }
}

/** As thick as its neighbour along the bank allows. */
function wallOf({ cylinders }: Train, index: number): number {
  const { axial, bank, bore } = cylinders[index]
  const gaps = cylinders
    .filter((other, i) => i !== index && other.bank === bank && other.axial !== axial)
    .map((other) => Math.abs(other.axial - axial) - (other.bore + bore) / 2)
  return Math.max(Math.min(0.045 * bore, ...gaps.map((gap) => 0.4 * gap)), 0.012 * bore)
}

/** Height at which this liner would run into one of another bank beside it. */
function crossing({ cylinders, banks }: Train, index: number, outside: number): number {
  const own = cylinders[index]
  const heights = cylinders.map((other) => {
    const apart = Math.abs(banks[other.bank].angle - banks[own.bank].angle)
    const between = Math.min(apart, 2 * Math.PI - apart)
    const beside = Math.abs(other.axial - own.axial) < 2 * outside
    return beside && between > 0.05 && between < Math.PI ? (1.02 * outside) / Math.tan(between / 2) : 0
  })
  return Math.max(0, ...heights)
}

/** The way a liner of a bank opens, as a step of its turn from z towards x: to the viewer of the default view. */
export function openingOf(bankAngle: number, mirror: -1 | 1): number {
  const [x, y, z] = defaultDirection
  const turn = -mirror * bankAngle
  const across = x * Math.cos(turn) + y * Math.sin(turn)
  return Math.round((Math.atan2(across, z) / (2 * Math.PI)) * LINER_STEPS)
}
