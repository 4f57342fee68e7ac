import type { ClearanceSizes, Stretch } from '@/lib/mechanics/clearance/sizes'
import type { Train } from '@/lib/mechanics/train'
import type { CrankTrain } from '@/scene/model/crank-train'
import { crankLayout, type CrankLayout, type Pin } from './crank-layout'
import { pistonSize } from './parts/piston-size'
import { shankOf } from './parts/rod'
import { rodSize } from './parts/rod-size'
import { readShape } from './shape'
import type { Mesh, Part, Rig } from './types'

/** The bodies of an engine for the kernel's clearances, and which bare web of them is which part of the drawing. */
export interface ClearanceBodies {
  sizes: ClearanceSizes
  webParts: Part[]
}

/**
 * What the document states; what it leaves out, as it is drawn: rod shanks and the bores' lower edges always are, the
 * radius of the counterweights where none is given.
 */
export function clearanceBodies(document: CrankTrain, train: Train, rig: Rig): ClearanceBodies {
  const shape = readShape(document, train)
  const layout = crankLayout(train, shape)
  const given = document.shape ?? {}
  const drawn = new Map(rig.parts.map((part) => [part.id, rig.meshes[part.mesh]]))
  const counterweights = train.counterweights.map(({ id }) => {
    const mesh = drawn.get(`counterweight:${id}`)
    const radius = (given.counterweightRadiusMm ?? 0) / 1000
    return mesh ? { ...stretchOf(mesh), radius: radius || reachOf(mesh) } : null
  })
  const bare = bareWebs(layout, rig, counterweights)
  const pistons = train.cylinders.map((_, i) => pistonSize(document, train, shape, i))
  return {
    webParts: bare.map(({ part }) => part),
    sizes: {
      pistons: pistons.map(({ rodLength }) =>
        rodLength > 0 ? null : { crown: shape.compressionHeight, skirt: shape.skirtBelowPin },
      ),
      rods: train.cylinders.map((cylinder, i) => {
        const pin = layout.pins.find((stretch) => stretch.throw === cylinder.throw) as Pin
        const size = rodSize(train, shape, pin, i, pistons[i])
        return { shank: shankOf(size), eye: size.bigRadius }
      }),
      boreBottoms: train.cylinders.map(({ id }) => drawn.get(`liner:${id}`)!.box[1]),
      counterweights,
      webs: bare.map(({ part, throws }) => ({
        ...stretchOf(rig.meshes[part.mesh]),
        pins: throws.map((own) => ({
          angle: train.throws[own].angle,
          throwRadius: train.throws[own].radius,
          radius: shape.pinRadius,
        })),
      })),
      deck: given.deckHeightMm === undefined ? null : given.deckHeightMm / 1000,
    },
  }
}

const stretchOf = ({ box }: Mesh): Stretch => ({ from: box[2], to: box[5] })

/** Webs in which no counterweight lies, each with the throws that it joins. */
function bareWebs({ webs }: CrankLayout, rig: Rig, counterweights: (Stretch | null)[]) {
  const parts = rig.parts.filter(({ kind }) => kind === 'web')
  return parts.flatMap((part) => {
    const { from, to } = stretchOf(rig.meshes[part.mesh])
    const holds = (middle: number) => middle > from && middle < to
    if (counterweights.some((weight) => weight && holds((weight.from + weight.to) / 2))) return []
    const web = webs.find((stretch) => holds((stretch.from + stretch.to) / 2))
    return web ? [{ part, throws: [web.throw, web.other].filter((own) => own >= 0) }] : []
  })
}

function reachOf({ positions }: Mesh): number {
  let reach = 0
  for (let i = 0; i < positions.length; i += 3)
    reach = Math.max(reach, Math.hypot(positions[i], positions[i + 1]))
  return reach
}
