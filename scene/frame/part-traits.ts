import { analyse } from '@/lib/mechanics/analysis'
import type { Train } from '@/lib/mechanics/train'
import type { Quantity } from '@/lib/units/quantities'
import type { VectorId } from '@/scene/model/anchor'
import type { CrankTrain } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'
import { crankLayout, type CrankLayout, type Pin, type Stretch } from './crank-layout'
import { pistonSize } from './parts/piston-size'
import { rodSize } from './parts/rod-size'
import { readShape, type Shape } from './shape'

/** What makes a part what it is: a figure in SI of the document, or words. */
export interface Trait {
  name: string
  quantity?: Quantity
  value: number | string
}

interface Engine {
  document: CrankTrain
  train: Train
  shape: Shape
  layout: CrankLayout
}

const engines = new WeakMap<CrankTrain, Engine>()

function engineOf(document: CrankTrain): Engine {
  const known = engines.get(document)
  if (known) return known
  const train = toTrain(document)
  const shape = readShape(document, train)
  const engine = { document, train, shape, layout: crankLayout(train, shape) }
  engines.set(document, engine)
  return engine
}

/**
 * The parameters of one part, found by what the document calls it, without a mesh: null where the rig of this document
 * has no such part. `speed` (rad/s) is for the resultants alone.
 */
export function partTraits(document: CrankTrain, partId: string, speed: number): Trait[] | null {
  const at = partId.indexOf(':')
  const [kind, own] = at < 0 ? [partId, ''] : [partId.slice(0, at), partId.slice(at + 1)]
  const engine = engineOf(document)
  if (kind === 'vector') return resultant(engine, partId as VectorId, speed)
  const traits = Object.hasOwn(TRAITS, kind) ? TRAITS[kind](engine, own) : null
  return traits && [...traits, words('Rotation from the free end', document.rotation)]
}

const words = (name: string, value: string): Trait => ({ name, value })
const figure = (name: string, quantity: Quantity, value: number): Trait => ({ name, quantity, value })
const length = (name: string, value: number) => figure(name, 'length', value)
const place = (axial: number) => length('Place along the crank', axial)
const middle = ({ from, to }: Stretch) => (from + to) / 2
const extent = ({ from, to }: Stretch) => to - from

/** From 0 to a whole turn. */
function turn(name: string, value: number): Trait {
  const whole = 2 * Math.PI
  return figure(name, 'angle', ((value % whole) + whole) % whole)
}

const byId = <T extends { id: string }>(list: readonly T[], id: string) => list.find((each) => each.id === id)

function journal({ train, shape, layout }: Engine, own: string, bearing: boolean): Trait[] | null {
  const found = layout.journals.find(({ main }, i) => {
    if (main >= 0) return train.mains[main].id === own
    return !bearing && own === (i === 0 ? 'free' : 'drive')
  })
  if (!found) return null
  return [
    place(found.main >= 0 ? train.mains[found.main].axial : middle(found)),
    length('Diameter', 2 * shape.mainRadius),
    length('Bore through it', 2 * shape.mainBore),
    length('Length', extent(found)),
  ]
}

function ofThrow(train: Train, index: number): Trait[] {
  const { radius, angle, unbalance } = train.throws[index]
  return [
    length('Throw radius', radius),
    turn('Angle of the throw', angle),
    figure('Unbalance of the throw', 'unbalance', unbalance),
  ]
}

function crankPin({ train, shape, layout }: Engine, own: string): Trait[] | null {
  const pin = layout.pins.find((stretch) => train.throws[stretch.throw].id === own)
  if (!pin) return null
  return [
    ...ofThrow(train, pin.throw),
    place(train.throws[pin.throw].axial),
    length('Diameter', 2 * shape.pinRadius),
    length('Bore through it', 2 * shape.pinBore),
    length('Length', extent(pin)),
  ]
}

function web({ train, shape, layout }: Engine, own: string): Trait[] | null {
  const found = layout.webs.find(({ throw: index, other, side }) => {
    const { id } = train.throws[index]
    return own === (other >= 0 ? `${id}-${train.throws[other].id}` : `${id}${side === 'free' ? 'F' : 'D'}`)
  })
  if (!found) return null
  return [
    ...ofThrow(train, found.throw),
    place(middle(found)),
    length('Thickness', extent(found)),
    length('Width', shape.webWidth),
  ]
}

function counterweight({ train, shape }: Engine, own: string): Trait[] | null {
  const weight = byId(train.counterweights, own)
  if (!weight || weight.mass === 0) return null
  return [
    figure('Mass', 'mass', weight.mass),
    length('Centre of gravity from the axis', weight.radius),
    figure('Mass × radius', 'unbalance', weight.mass * weight.radius),
    turn('Angle', weight.angle),
    place(weight.axial),
    length('Outer radius', shape.counterweightRadius),
  ]
}

function ofBore({ train }: Engine, index: number): Trait[] {
  const { bore, offset, axial, bank } = train.cylinders[index]
  return [
    length('Bore', bore),
    length('Offset', offset),
    turn('Angle of the bank', train.banks[bank].angle),
    place(axial),
  ]
}

const cylinderIndex = ({ train }: Engine, own: string) => train.cylinders.findIndex(({ id }) => id === own)

function piston(engine: Engine, own: string): Trait[] | null {
  const i = cylinderIndex(engine, own)
  if (i < 0) return null
  const { train, shape } = engine
  return [
    ...ofBore(engine, i),
    figure('Mass with pin and rings', 'mass', train.cylinders[i].pistonMass),
    length('Compression height', shape.compressionHeight),
    length('Skirt below the pin', shape.skirtBelowPin),
  ]
}

function rod(engine: Engine, own: string): Trait[] | null {
  const i = cylinderIndex(engine, own)
  if (i < 0) return null
  const { train } = engine
  const { rodLength, rod: body, link, axial, throw: pin } = train.cylinders[i]
  return [
    length('Length between centres', rodLength),
    figure('Mass', 'mass', body.mass),
    length('Centre of gravity from the big end', body.cgFromBigEnd),
    figure('Inertia', 'inertia', body.inertia),
    place(axial),
    words(
      'Runs on',
      link ? `master rod ${train.cylinders[link.master].id}` : `crank pin ${train.throws[pin].id}`,
    ),
    ...(link ? [length('Knuckle radius', link.knuckleRadius), turn('Knuckle angle', link.knuckleAngle)] : []),
  ]
}

function rodCap(engine: Engine, own: string): Trait[] | null {
  const { document, train, shape, layout } = engine
  const i = cylinderIndex(engine, own)
  const pin =
    i < 0 ? undefined : layout.pins.find((each): each is Pin => each.throw === train.cylinders[i].throw)
  if (!pin || rodSize(train, shape, pin, i, pistonSize(document, train, shape, i)).onePiece) return null
  return rod(engine, own)
}

function liner(engine: Engine, own: string): Trait[] | null {
  const i = cylinderIndex(engine, own)
  if (i < 0) return null
  const { train, document } = engine
  const deckMm = document.shape?.deckHeightMm
  return [
    ...ofBore(engine, i),
    length('Stroke', 2 * train.throws[train.cylinders[i].throw].radius),
    deckMm === undefined ? words('Deck height', 'not given') : length('Deck height', deckMm / 1000),
  ]
}

function balanceShaft({ train }: Engine, own: string): Trait[] | null {
  const shaft = byId(train.balanceShafts, own)
  if (!shaft) return null
  return [
    figure('Unbalance', 'unbalance', shaft.unbalance),
    figure('Speed to the crank', 'ratio', shaft.speedRatio),
    turn('Angle', shaft.angle),
    place(shaft.axial),
    length('Across the crank', shaft.horizontal),
    length('Over the crank', shaft.vertical),
  ]
}

function resultant({ train }: Engine, id: VectorId, speed: number): Trait[] {
  const { verticalN, horizontalN, coupleVerticalNm, coupleHorizontalNm } = analyse(train, {
    speed,
    include: ['shaking'],
  }).shaking!
  const most = (one: number[], other: number[]) =>
    one.reduce((peak, value, i) => Math.max(peak, Math.hypot(value, other[i])), 0)
  return id === 'vector:total-force'
    ? [figure('Force, at most', 'force', most(verticalN, horizontalN))]
    : [figure('Couple, at most', 'torque', most(coupleVerticalNm, coupleHorizontalNm))]
}

const TRAITS: Record<string, (engine: Engine, own: string) => Trait[] | null> = {
  'main-journal': (engine, own) => journal(engine, own, false),
  'main-bearing': (engine, own) => journal(engine, own, true),
  'crank-pin': crankPin,
  web,
  counterweight,
  piston,
  ring: piston,
  'piston-pin': piston,
  rod,
  'rod-cap': rodCap,
  liner,
  'balance-shaft': balanceShaft,
  flywheel: ({ train }) => [figure('Inertia', 'inertia', train.inertia.flywheel)],
  'free-end': ({ train, shape }) => [
    figure('Inertia', 'inertia', train.inertia.freeEnd),
    length('Diameter', 2 * shape.mainRadius),
  ],
}
