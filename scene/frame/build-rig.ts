import type { Train } from '@/lib/mechanics/train'
import type { CrankTrain } from '@/scene/model/crank-train'
import { crankLayout } from './crank-layout'
import { buildDrive } from './drive'
import { boundsOf, extentOf } from './extent'
import { addBalanceShafts } from './parts/balance-shaft'
import { addCrank } from './parts/crank'
import { addCylinder, type CylinderParts } from './parts/cylinder'
import { addEnds } from './parts/ends'
import { RigParts } from './rig-parts'
import type { Room } from './room'
import { readShape } from './shape'
import { travels } from './travels'
import type { Anchors, Rig } from './types'

/** All parts of a crank train with their meshes, found once; `document` gives the sizes, `train` the motion. */
export function buildRig(document: CrankTrain, train: Train): Rig {
  const mirror = train.rotation === 'clockwise' ? -1 : 1
  const shape = readShape(document, train)
  const parts = new RigParts()
  const room: Room = { parts, document, train, shape, layout: crankLayout(train, shape), mirror }
  const drive = buildDrive(train, mirror)
  const crank = addCrank(room)
  const ends = addEnds(room, crank.reach)
  addBalanceShafts(room)
  const cylinders = travels(drive).map((travel, index) => addCylinder(room, index, travel, crank.reach))
  const anchors: Anchors = {
    ...cylinderAnchors(room, cylinders),
    throwLabel: train.throws.map((pin, i) => ({
      part: crank.pins[i],
      local: [0, pin.radius + 1.5 * shape.pinRadius, pin.axial],
    })),
    main: train.mains.map(({ axial }) => [0, 0, axial]),
    freeEnd: [0, 0, ends.free],
    driveEnd: [0, 0, ends.drive],
  }
  const moving = { meshes: parts.meshes, parts: parts.parts, drive: parts.finish(drive) }
  const extent = extentOf(moving)
  return { ...moving, mirror, bounds: boundsOf(extent), extent, anchors }
}

type CylinderAnchors = Pick<Anchors, 'crown' | 'firing' | 'cylinderLabel'>

function cylinderAnchors({ train, mirror }: Room, cylinders: CylinderParts[]): CylinderAnchors {
  /** A place on a cylinder's axis at this height over the crank. */
  const over = (index: number, height: number): [number, number, number] => {
    const { axial, bank, offset } = train.cylinders[index]
    const cos = Math.cos(train.banks[bank].angle)
    const sin = Math.sin(train.banks[bank].angle)
    return [mirror * (height * sin + offset * cos), height * cos - offset * sin, axial]
  }
  return {
    crown: cylinders.map(({ piston, crown }, i) => ({
      part: piston,
      local: [0, crown, train.cylinders[i].axial],
    })),
    firing: cylinders.map(({ deck }, i) => over(i, deck + 0.2 * train.cylinders[i].bore)),
    cylinderLabel: cylinders.map(({ deck }, i) => over(i, deck + 0.5 * train.cylinders[i].bore)),
  }
}
