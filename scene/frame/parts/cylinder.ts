import type { Pin } from '../crank-layout'
import type { Room } from '../room'
import type { Travel } from '../travels'
import { addLiner } from './fixed'
import { linerSize, openingOf } from './liner-size'
import { addPiston, addPistonPin, addRings } from './piston'
import { pistonSize, type PistonSize } from './piston-size'
import { addRod, addRodCap } from './rod'
import { rodSize, type RodSize } from './rod-size'

export interface CylinderParts {
  /** Part index of the piston, and the height of its crown over the piston pin, m. */
  piston: number
  crown: number
  /** Height of the deck over the crank axis, m. */
  deck: number
}

/** Rod, piston and bore of one cylinder. `reach` is how far the crank's own parts turn. */
export function addCylinder(room: Room, index: number, travel: Travel, reach: number): CylinderParts {
  const { document, train, shape, layout } = room
  const pin = layout.pins.find((stretch) => stretch.throw === train.cylinders[index].throw) as Pin
  const size = pistonSize(document, train, shape, index)
  const rod = rodSize(train, shape, pin, index, size)
  const liner = linerSize(train, index, size, travel, reach)
  addRodParts(room, index, rod)
  const piston = addPistonParts(room, index, size, rod.smallHalf)
  addBore(room, index, liner)
  return { piston, crown: size.crown, deck: liner.deck }
}

const belongs = ({ train }: Room, index: number) => {
  const { bank, throw: own } = train.cylinders[index]
  return { bank, cylinder: index, throw: own }
}

function addRodParts(room: Room, index: number, rod: RodSize) {
  const { parts, train, mirror } = room
  const { id, axial, link } = train.cylinders[index]
  const common = {
    ...belongs(room, index),
    group: 'rods',
    body: parts.newBody(),
    motion: { kind: 'rod', cylinder: index },
  } as const
  const key = JSON.stringify(rod)
  const name = link ? 'Link rod' : rod.knuckles.length > 0 ? 'Master rod' : 'Rod'
  const mesh = parts.mesh(`rod ${key}`, axial, (builder) => addRod(builder, rod, mirror))
  parts.add({ ...common, id: `rod:${id}`, kind: 'rod', label: `${name} ${id}` }, mesh)
  if (rod.onePiece) return
  const cap = parts.mesh(`cap ${key}`, axial, (builder) => addRodCap(builder, rod))
  parts.add({ ...common, id: `rod-cap:${id}`, kind: 'rod-cap', label: `Rod cap ${id}` }, cap)
}

function addPistonParts(room: Room, index: number, size: PistonSize, smallEndHalf: number): number {
  const { parts, train } = room
  const { id, axial } = train.cylinders[index]
  const common = {
    ...belongs(room, index),
    group: 'pistons',
    body: parts.newBody(),
    motion: { kind: 'piston', cylinder: index },
  } as const
  const key = JSON.stringify(size)
  const body = parts.mesh(`piston ${key} ${smallEndHalf}`, axial, (builder) =>
    addPiston(builder, size, smallEndHalf),
  )
  const piston = parts.add({ ...common, id: `piston:${id}`, kind: 'piston', label: `Piston ${id}` }, body)
  const rings = parts.mesh(`rings ${key}`, axial, (builder) => addRings(builder, size))
  parts.add({ ...common, id: `ring:${id}`, kind: 'ring', label: `Rings of piston ${id}` }, rings)
  const pin = parts.mesh(`piston pin ${key}`, axial, (builder) => addPistonPin(builder, size))
  const label = `${size.rodLength > 0 ? 'Crosshead pin' : 'Piston pin'} ${id}`
  parts.add({ ...common, id: `piston-pin:${id}`, kind: 'piston-pin', label }, pin)
  return piston
}

function addBore({ parts, train, mirror }: Room, index: number, size: ReturnType<typeof linerSize>) {
  const { id, axial, bank, offset } = train.cylinders[index]
  const { angle } = train.banks[bank]
  const opening = openingOf(angle, mirror)
  const mesh = parts.mesh(`liner ${JSON.stringify(size)} ${opening}`, axial, (builder) =>
    addLiner(builder, size, opening),
  )
  const named = {
    id: `liner:${id}`,
    kind: 'liner',
    group: 'bores',
    body: parts.newBody(),
    motion: { kind: 'fixed' },
    bank,
    cylinder: index,
    label: `Bore ${id}`,
  } as const
  parts.add(named, mesh, { phase: angle, x: mirror * offset * Math.cos(angle), y: -offset * Math.sin(angle) })
}
