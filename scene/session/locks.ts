import { deadCentres } from '@/lib/mechanics/dead-centres'
import { rodPaths } from '@/lib/mechanics/rod-path'
import type { CrankTrain } from '@/scene/model/crank-train'
import { cylinderValues } from '@/scene/model/cylinder-values'
import type { Scene } from '@/scene/model/scene'
import { toTrain } from '@/scene/model/to-train'
import { applyChanges, getAt, type Change, type ScenePath } from './path'

/**
 * What is held while something else is changed. A way of working, not a property of the engine: it belongs to the
 * session and is not in the document.
 */
export interface Locks {
  /** Bore and stroke follow each other so that the swept volume stays. */
  displacement: boolean
  /** Compression height follows rod and stroke (and the rod the compression height) so that the deck stays. */
  deck: boolean
}

export const noLocks: Locks = { displacement: false, deck: false }

const bore: ScenePath = ['train', 'cylinderDefaults', 'boreMm']
const stroke: ScenePath = ['train', 'cylinderDefaults', 'strokeMm']
const rod: ScenePath = ['train', 'cylinderDefaults', 'rodLengthMm']
const offset: ScenePath = ['train', 'cylinderDefaults', 'offsetMm']
const crown: ScenePath = ['train', 'shape', 'compressionHeightMm']

/** Swept volume by the true travel, mm³. NaN where the crank cannot turn. */
export function displacementOf(document: CrankTrain): number {
  const train = toTrain({ ...document, firingOrder: [] })
  return deadCentres(rodPaths(train)).reduce(
    (sum, { topHeight, bottomHeight }, i) =>
      sum + (Math.PI / 4) * train.cylinders[i].bore ** 2 * (topHeight - bottomHeight) * 1e9,
    0,
  )
}

/** Crown of the piston over the crank axis at exact top dead centre, mm; undefined without a compression height. */
export function deckOf(document: CrankTrain): number | undefined {
  const height = document.shape?.compressionHeightMm
  const reach = reachOf(document)
  return height === undefined || !(reach > 0) ? undefined : reach + height
}

function reachOf(document: CrankTrain): number {
  const own = document.cylinders.find(({ link }) => !link) ?? document.cylinders[0]
  const { rodLengthMm, strokeMm, offsetMm } = cylinderValues(document, own)
  return Math.sqrt((rodLengthMm + strokeMm / 2) ** 2 - offsetMm ** 2)
}

/** The changes with what the locks let follow: one step together. */
export function withFollowers(scene: Scene, changes: Change[], locks: Locks): Change[] {
  const bored = locks.displacement ? followDisplacement(scene, changes) : []
  const swept = [...changes, ...bored]
  return [...swept, ...(locks.deck ? followDeck(scene, swept) : [])]
}

const differs = (one: Scene, other: Scene, path: ScenePath) => getAt(one, path) !== getAt(other, path)

function followDisplacement(scene: Scene, changes: Change[]): Change[] {
  const next = applyChanges(scene, changes)
  const [bored, stroked] = [differs(scene, next, bore), differs(scene, next, stroke)]
  if (bored === stroked) return []
  const path = bored ? stroke : bore
  let value = Number(getAt(next, path))
  const wanted = displacementOf(scene.train)
  // Its travel is nearly its stroke, so each turn brings the last share of the volume closer.
  for (let turn = 0; turn < 60; turn++) {
    const share = wanted / displacementOf(applyChanges(next, [{ path, value }]).train)
    if (!(share > 0) || !Number.isFinite(share)) return []
    value *= bored ? share : Math.sqrt(share)
    if (Math.abs(share - 1) < 1e-15) break
  }
  return [{ path, value }]
}

function followDeck(scene: Scene, changes: Change[]): Change[] {
  const deck = deckOf(scene.train)
  const next = applyChanges(scene, changes)
  if (deck === undefined) return []
  if (differs(scene, next, crown)) {
    const { strokeMm = 0, offsetMm = 0 } = next.train.cylinderDefaults
    const reach = deck - (next.train.shape?.compressionHeightMm ?? NaN)
    const value = Math.sqrt(reach ** 2 + offsetMm ** 2) - strokeMm / 2
    return reach > 0 ? [{ path: rod, value }] : []
  }
  if (![stroke, rod, offset].some((path) => differs(scene, next, path))) return []
  const reach = reachOf(next.train)
  return reach > 0 ? [{ path: crown, value: Number((deck - reach).toPrecision(12)) }] : []
}
