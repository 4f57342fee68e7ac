import type { Web } from '../crank-layout'
import { arc, convexHull, turned, type Outline } from '../mesh/outline'
import { addPrism, type Prism } from '../mesh/prism'
import { crankPart } from '../rig-parts'
import type { Room } from '../room'
import {
  counterweightSector,
  rimSector,
  sectorOutline,
  sideLength,
  type CounterweightDemand,
  type CounterweightSector,
} from './counterweight'
import { isDisc, radiusAt, webBesideSector, webOutline } from './web-outline'

/** A counterweight that cannot lie flush in its web stands proud of it on both faces by this share of its thickness. */
const PROUD = 0.05
/** A segment let into a disc leaves this much of its radius inside. */
const RIM = 0.97

/** A web with its outline in the coordinates of its throw, y along it. */
interface Arm {
  web: Web
  outline: Outline
}

/** Webs and counterweights, each weight in the web it lies in. Returns how far from the axis they reach. */
export function addWebs(room: Room): number {
  const arms = room.layout.webs.map((web): Arm => ({ web, outline: outlineOf(room, web) }))
  const free = new Set(arms)
  let reach = Math.max(...arms.map(({ outline }) => reachOf(outline)))
  room.train.counterweights.forEach(({ axial, mass }, index) => {
    if (mass === 0) return
    const arm = [...free].find(({ web }) => axial > web.from && axial < web.to)
    if (arm) free.delete(arm)
    reach = Math.max(reach, arm ? addOnWeb(room, index, arm) : addAlone(room, index))
  })
  for (const arm of free) addWeb(room, arm)
  return reach
}

function reachOf(outline: Outline): number {
  let reach = 0
  for (let i = 0; i < outline.length; i += 2) reach = Math.max(reach, Math.hypot(outline[i], outline[i + 1]))
  return reach
}

/** Angle in a part's own plane of a direction that stands `angle` ahead of its y axis in the sense of rotation. */
const planeTurn = (angle: number, mirror: -1 | 1) => -mirror * angle

/** Of a whole web, in the coordinates of its throw. */
export function outlineOf(
  { train, shape, mirror }: Pick<Room, 'train' | 'shape' | 'mirror'>,
  web: Web,
): Outline {
  const first = train.throws[web.throw]
  const own = webOutline(shape, first.radius)
  if (web.other < 0) return own
  const second = train.throws[web.other]
  const turn = planeTurn(second.angle - first.angle, mirror)
  return convexHull([...own, ...turned(webOutline(shape, second.radius), turn)])
}

function addWeb({ parts, train }: Room, { web, outline }: Arm, more: Pick<Prism, 'holes' | 'isBuried'> = {}) {
  const { id: own, angle } = train.throws[web.throw]
  const named =
    web.other >= 0
      ? {
          id: `web:${own}-${train.throws[web.other].id}`,
          label: `Web between throws ${own} and ${train.throws[web.other].id}`,
        }
      : {
          id: `web:${own}${web.side === 'free' ? 'F' : 'D'}`,
          label: `Web of throw ${own}, ${web.side} end`,
        }
  const mesh = slab(parts, web, { outline, ...more })
  parts.add({ ...crankPart, ...named, kind: 'web', throw: web.throw }, mesh, { phase: angle })
}

/** A plate over this stretch of the crank. */
function slab(
  parts: Room['parts'],
  { from, to }: Pick<Web, 'from' | 'to'>,
  plate: Pick<Prism, 'outline' | 'holes' | 'isBuried'>,
): number {
  const half = (to - from) / 2
  const key = `slab ${half} ${plate.outline.join()} ${plate.holes?.join() ?? ''}`
  return parts.mesh(key, (from + to) / 2, (builder) => addPrism(builder, { ...plate, from: -half, to: half }))
}

/** Adds a counterweight where it lies in a web; returns how far it reaches. */
function addOnWeb(room: Room, index: number, arm: Arm): number {
  const { train, shape, mirror } = room
  const { web, outline } = arm
  const host = train.throws[web.throw]
  const turn = planeTurn(train.counterweights[index].angle - host.angle, mirror)
  const demand = demandOf(room, index, web.to - web.from)
  if (isDisc(shape, host.radius)) return addInDisc(room, index, arm, turn, demand)
  const sector = counterweightSector(demand)
  const from = Math.PI / 2 + turn - sector.halfAngle
  const to = Math.PI / 2 + turn + sector.halfAngle
  if (!liesWithin(outline, from, to, sector)) {
    addWeb(room, arm)
    return addProud(room, index, web)
  }
  const bottom = arc(0, 0, sector.inner, from, to)
  const rest = webBesideSector(outline, from, to, bottom)
  const inside = bottom.length / 2
  const last = rest.length / 2 - 1
  addWeb(room, { web, outline: rest }, { isBuried: (point) => point < inside || point === last })
  const body = flushSector(sector, radiusAt(outline, from), radiusAt(outline, to))
  const mesh = slab(room.parts, web, { outline: turned(body.outline, turn), isBuried: body.isBuried })
  return place(room, index, mesh, host.angle, sector)
}

/** May this sector replace the web's own metal between its two sides? */
function liesWithin(outline: Outline, from: number, to: number, sector: CounterweightSector): boolean {
  if (sector.halfAngle > 0.75 * Math.PI) return false
  const steps = 24
  const most = sideLength(sector)
  for (let i = 0; i <= steps; i++) {
    const radius = radiusAt(outline, from + ((to - from) * i) / steps)
    if (radius < sector.inner || radius > 0.99 * most) return false
  }
  return true
}

/** The sector's outline with the places put in where its sides come out of the web. */
function flushSector({ halfAngle, inner, outer }: CounterweightSector, right: number, left: number) {
  const plain = sectorOutline(halfAngle, inner, outer)
  const inside = arc(0, 0, inner, 0, 2 * halfAngle).length / 2
  const at = (angle: number, radius: number) => [radius * Math.cos(angle), radius * Math.sin(angle)]
  const up = Math.PI / 2
  const outline = [
    ...plain.slice(0, 2 * inside),
    ...at(up - halfAngle, right),
    ...plain.slice(2 * inside),
    ...at(up + halfAngle, left),
  ]
  const last = outline.length / 2 - 1
  return { outline, isBuried: (point: number) => point < inside || point === last }
}

/** A segment of a disc's rim, let into it: the line round it is all that shows. */
function addInDisc(room: Room, index: number, arm: Arm, turn: number, demand: CounterweightDemand): number {
  const { parts, train } = room
  const sector = rimSector({ ...demand, largest: Math.min(demand.largest, RIM * reachOf(arm.outline)) })
  const segment = turned(sectorOutline(sector.halfAngle, sector.inner, sector.outer), turn)
  addWeb(room, arm, { holes: [segment] })
  return place(
    room,
    index,
    slab(parts, arm.web, { outline: segment }),
    train.throws[arm.web.throw].angle,
    sector,
  )
}

const addProud = (room: Room, index: number, { from, to }: Web) =>
  addWhole(room, index, from - PROUD * (to - from), to + PROUD * (to - from))

/** A counterweight that lies in no web, a web thick. */
function addAlone(room: Room, index: number): number {
  const { axial } = room.train.counterweights[index]
  const half = room.shape.webThickness / 2
  return addWhole(room, index, axial - half, axial + half)
}

function addWhole(room: Room, index: number, from: number, to: number): number {
  const sector = counterweightSector(demandOf(room, index, to - from))
  const outline = sectorOutline(sector.halfAngle, sector.inner, sector.outer)
  const mesh = slab(room.parts, { from, to }, { outline })
  return place(room, index, mesh, room.train.counterweights[index].angle, sector)
}

function demandOf({ train, shape }: Room, index: number, thickness: number): CounterweightDemand {
  const { mass, radius } = train.counterweights[index]
  const inner = 1.03 * shape.mainRadius
  return { mass, radius, thickness, inner, largest: Math.max(shape.counterweightRadius, 1.25 * inner) }
}

function place(
  { parts, train }: Room,
  index: number,
  mesh: number,
  phase: number,
  sector: CounterweightSector,
) {
  const { id } = train.counterweights[index]
  const named = {
    ...crankPart,
    id: `counterweight:${id}`,
    kind: 'counterweight',
    label: `Counterweight ${id}`,
  } as const
  parts.add(named, mesh, { phase })
  return sector.outer
}
