import type { Instant } from '@/lib/mechanics/instant'
import type { Train } from '@/lib/mechanics/train'
import type { Quantity } from '@/lib/units/quantities'
import type { Part, PartKind, Rig } from './types'

/** One line about a picked part: SI value at an instant, or one that does not change. */
export interface PartFigure {
  name: string
  quantity: Quantity
  value(instant: Instant): number
}

export interface PartFacts {
  label: string
  figures: PartFigure[]
}

/** What is known of a part: its name and its live figures. Null for an id that this rig does not have. */
export function partFacts(rig: Rig, train: Train, id: string): PartFacts | null {
  const part = rig.parts.find((candidate) => candidate.id === id)
  if (!part) return null
  return { label: part.label, figures: FIGURES[part.kind](train, part) }
}

const figure = (name: string, quantity: Quantity, value: (instant: Instant) => number): PartFigure => ({
  name,
  quantity,
  value,
})
const fixed = (name: string, quantity: Quantity, value: number): PartFigure =>
  figure(name, quantity, () => value)

/** The document's own id behind a part's. */
const ownId = ({ id }: Part) => id.slice(id.indexOf(':') + 1)

function piston(train: Train, { cylinder: i }: Part): PartFigure[] {
  return [
    figure('Travel from top dead centre', 'length', (now) => now.travel[i]),
    figure('Velocity', 'velocity', (now) => now.velocity[i]),
    figure('Acceleration', 'acceleration', (now) => now.acceleration[i]),
    figure('Pressure over it', 'pressure', (now) => now.pressure[i]),
    figure('Gas force', 'force', (now) => now.gasForce[i]),
    figure('Side thrust', 'force', (now) => now.sideThrust[i]),
    fixed('Mass with pin and rings', 'mass', train.cylinders[i].pistonMass),
  ]
}

function pistonPin(_: Train, { cylinder: i }: Part): PartFigure[] {
  return [
    figure('Load from the piston', 'force', (now) => Math.hypot(now.pistonPinU[i], now.pistonPinV[i])),
    figure('Along the cylinder', 'force', (now) => now.pistonPinU[i]),
    figure('Across it', 'force', (now) => now.pistonPinV[i]),
  ]
}

function rod(train: Train, { cylinder: i }: Part): PartFigure[] {
  const { rodLength, rod: body, link } = train.cylinders[i]
  const load = link
    ? figure('Load on its knuckle pin', 'force', (now) =>
        Math.hypot(now.knuckleVertical[i], now.knuckleHorizontal[i]),
      )
    : figure('Load on the crank pin', 'force', (now) =>
        Math.hypot(now.crankPinVertical[i], now.crankPinHorizontal[i]),
      )
  return [
    figure('Angle to the cylinder', 'angle', (now) => now.rodAngle[i]),
    load,
    fixed('Length between centres', 'length', rodLength),
    fixed('Mass', 'mass', body.mass),
  ]
}

function crankPin(train: Train, part: Part): PartFigure[] {
  const riders = train.cylinders.flatMap(({ throw: own, link }, i) =>
    own === part.throw && !link ? [i] : [],
  )
  const sum = (list: Float64Array) => riders.reduce((total, i) => total + list[i], 0)
  const vertical = (now: Instant) => sum(now.crankPinVertical)
  const horizontal = (now: Instant) => sum(now.crankPinHorizontal)
  const { angle, radius } = train.throws[part.throw]
  const along = (now: Instant) => now.angle + angle
  return [
    figure('Load', 'force', (now) => Math.hypot(vertical(now), horizontal(now))),
    figure(
      'Radial, outwards',
      'force',
      (now) => vertical(now) * Math.cos(along(now)) + horizontal(now) * Math.sin(along(now)),
    ),
    figure(
      'Tangential, forwards',
      'force',
      (now) => horizontal(now) * Math.cos(along(now)) - vertical(now) * Math.sin(along(now)),
    ),
    fixed('Throw radius', 'length', radius),
  ]
}

function main(train: Train, part: Part): PartFigure[] {
  const i = train.mains.findIndex(({ id }) => id === ownId(part))
  if (i < 0 || train.mains.length < 2) return []
  return [
    figure('Load', 'force', (now) => Math.hypot(now.mainVertical[i], now.mainHorizontal[i])),
    figure('Upwards', 'force', (now) => now.mainVertical[i]),
    figure('Sideways', 'force', (now) => now.mainHorizontal[i]),
  ]
}

function counterweight(train: Train, part: Part): PartFigure[] {
  const weight = train.counterweights.find(({ id }) => id === ownId(part))
  if (!weight) return []
  return [
    fixed('Mass', 'mass', weight.mass),
    fixed('Centre of gravity from the axis', 'length', weight.radius),
    fixed('Mass × radius', 'unbalance', weight.mass * weight.radius),
    fixed('Angle', 'angle', weight.angle),
  ]
}

function web(train: Train, part: Part): PartFigure[] {
  const { unbalance, angle } = train.throws[part.throw]
  return [
    fixed('Unbalance of the throw', 'unbalance', unbalance),
    fixed('Angle of the throw', 'angle', angle),
  ]
}

function liner(train: Train, { cylinder: i }: Part): PartFigure[] {
  const { bore, throw: own } = train.cylinders[i]
  return [
    fixed('Bore', 'length', bore),
    fixed('Stroke', 'length', 2 * train.throws[own].radius),
    figure('Pressure', 'pressure', (now) => now.pressure[i]),
    figure('Side thrust on the wall', 'force', (now) => now.sideThrust[i]),
  ]
}

function shaft(train: Train, part: Part): PartFigure[] {
  const body = train.balanceShafts.find(({ id }) => id === ownId(part))
  if (!body) return []
  return [
    fixed('Unbalance', 'unbalance', body.unbalance),
    fixed('Speed to the crank', 'ratio', body.speedRatio),
    figure('Angle', 'angle', (now) => body.angle + body.speedRatio * now.angle),
  ]
}

const flywheel = (train: Train): PartFigure[] => [
  fixed('Inertia', 'inertia', train.inertia.flywheel),
  figure('Torque from gas', 'torque', (now) => now.gasTorque),
  figure('Torque from inertia', 'torque', (now) => now.inertiaTorque),
]

const freeEnd = (train: Train): PartFigure[] => [fixed('Inertia', 'inertia', train.inertia.freeEnd)]

const FIGURES: Record<PartKind, (train: Train, part: Part) => PartFigure[]> = {
  piston,
  ring: piston,
  'piston-pin': pistonPin,
  rod,
  'rod-cap': rod,
  'crank-pin': crankPin,
  'main-journal': main,
  'main-bearing': main,
  web,
  counterweight,
  liner,
  flywheel,
  'free-end': freeEnd,
  'balance-shaft': shaft,
}
