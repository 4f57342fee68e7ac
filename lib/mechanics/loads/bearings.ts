import type { CycleParts, PlaneSignal } from './cycle-parts'
import { planeAt, type LoadPart } from './part-signals'

export const bearingKinds = ['pin', 'rod', 'knuckle', 'main'] as const
export type BearingKind = (typeof bearingKinds)[number]

/**
 * One bearing of a train, and how its journal stands: `pin` all rods of a throw together, `rod` one rod on its pin,
 * `knuckle` a link rod on its master, `main` the crank in the block.
 */
export interface Bearing {
  kind: BearingKind
  /** Of the throw, the cylinder or the main, and its index in the train. */
  id: string
  index: number
  /** Where 0° of the journal's own frame points in the engine frame at each sample, rad: the throw, the crank's 0°, or along the master rod. */
  stand: Float64Array
  /**
   * The side of the journal that is pressed: −1 against the load (a rod pushing down on its pin rubs the pin's top), +1
   * along it (a crank pushing down on its main rubs the journal's underside).
   */
  pressed: 1 | -1
}

/** Every bearing of a train: pins, rods (or knuckles), mains. */
export function bearings({ train, angle, rodAngle, gas }: CycleParts): Bearing[] {
  const turning = (zero: number) => angle.map((theta) => theta + zero)
  return [
    ...train.throws.map((pin, index): Bearing => ({
      kind: 'pin',
      id: pin.id,
      index,
      stand: turning(pin.angle),
      pressed: -1,
    })),
    ...train.cylinders.map((cylinder, index): Bearing => {
      const master = cylinder.link?.master
      return {
        kind: master === undefined ? 'rod' : 'knuckle',
        id: cylinder.id,
        index,
        stand:
          master === undefined
            ? turning(train.throws[cylinder.throw].angle)
            : rodAngle[master].map((lean) => train.banks[train.cylinders[master].bank].angle - lean),
        pressed: -1,
      }
    }),
    ...gas.mains.map((_, index): Bearing => ({
      kind: 'main',
      id: train.mains[index].id,
      index,
      stand: angle,
      pressed: 1,
    })),
  ]
}

const listOf = { pin: 'pins', rod: 'rods', knuckle: 'rods', main: 'mains' } as const

/** The load of one bearing at a speed (rad/s) in the engine frame, which is fixed in the block. */
export function bearingSignal(
  parts: CycleParts,
  bearing: Bearing,
  part: LoadPart,
  speed: number,
): PlaneSignal {
  const list = listOf[bearing.kind]
  return planeAt(parts.gas[list][bearing.index], parts.inertia[list][bearing.index], part, speed)
}

/** The same load by the journal: `radial` towards the 0° of its own frame, `tangential` to +90° of it. */
export function turnedSignal({ vertical, horizontal }: PlaneSignal, stand: Float64Array) {
  const radial = stand.map((at, j) => vertical[j] * Math.cos(at) + horizontal[j] * Math.sin(at))
  const tangential = stand.map((at, j) => horizontal[j] * Math.cos(at) - vertical[j] * Math.sin(at))
  return { radial, tangential }
}

export interface BearingSizes {
  pin?: { diameter: number; length: number } // m
  main?: { diameter: number; length: number }
}

/**
 * Projected area d·l of a bearing, m²; undefined where its size is not given, and for a knuckle. The rods on one pin share its length evenly.
 */
export function projectedArea(
  { train }: CycleParts,
  { kind, index }: Bearing,
  { pin, main }: BearingSizes,
): number | undefined {
  if (kind === 'knuckle') return undefined
  if (kind === 'main') return main && main.diameter * main.length
  if (kind === 'pin') return pin && pin.diameter * pin.length
  const on = train.cylinders[index].throw
  const rods = train.cylinders.filter((one) => one.throw === on && !one.link).length
  return pin && (pin.diameter * pin.length) / rods
}
