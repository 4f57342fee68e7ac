import { analyse, type Analysis } from '@/lib/mechanics/analysis'
import { toSi } from '@/lib/units/units'
import type { Train } from '@/lib/mechanics/train'
import type { CrankTrain } from '@/scene/model/crank-train'
import type { Scene } from '@/scene/model/scene'
import { buildStageModel } from '@/scene/stage/build-stage-model'
import type { StageModel } from '@/scene/stage/types'
import { readOnce } from './judge'

/** Everything that follows from a document and a speed. Computed, never stored. */
export interface Results {
  document: CrankTrain
  train: Train
  speedRpm: number
  model: StageModel
  analysis: FullAnalysis
  /** Orders of the crank without counterweights and balance shafts. */
  bareOrders: FullAnalysis['orders']
  cycleDeg: number
  /** Firing events in order: cylinder and angle in the cycle. */
  eventsDeg: { id: string; at: number }[]
}

export type FullAnalysis = Required<Analysis>

/**
 * document → train → rig and plan → analysis, each remembered by the identity of what it came from: a change of the
 * view costs nothing, a change of the speed keeps the rig.
 */
export function createResults(): (scene: Scene) => Results {
  let last: Results | null = null
  return ({ train: document, view }) => {
    if (last && last.document === document && last.speedRpm === view.speedRpm) return last
    const read = readOnce(document)
    if (!read.ok) throw new Error(`A refused document reached the results: ${read.issues[0].message}`)
    const { train } = read
    const { speedRpm } = view
    const speed = toSi(speedRpm, 'rpm')
    const analysis = analyse(train, { speed }) as FullAnalysis
    const bare = { ...train, counterweights: [], balanceShafts: [] }
    last = {
      document,
      train,
      speedRpm,
      model: buildStageModel(document, train, speed),
      analysis,
      bareOrders: (analyse(bare, { speed, include: ['orders'] }) as FullAnalysis).orders,
      cycleDeg: document.cycle === 'two-stroke' ? 360 : 720,
      eventsDeg: analysis.firing.events.map(({ cylinder, angleDeg }) => ({ id: cylinder, at: angleDeg })),
    }
    return last
  }
}
