import type { CrankTrain } from './crank-train'
import type { Scene, SceneView } from './scene'

const FALLBACK_RPM = 3000
/** The crank is shown turning no faster than this, so that each stroke can be followed by eye. */
const SHOWN_RPM = 30
const slowdowns = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000]

/** How a train is looked at before anybody has chosen: running slowly at its rated speed, framed as a whole. */
export function defaultView(train: CrankTrain): SceneView {
  const { ratedRpm, maxRpm, idleRpm } = train.operating ?? {}
  const speedRpm = ratedRpm ?? maxRpm ?? idleRpm ?? FALLBACK_RPM
  return {
    angleDeg: 0,
    speedRpm,
    slowdown: slowdowns.find((slowdown) => speedRpm / slowdown <= SHOWN_RPM) ?? 2000,
    reverse: false,
    playing: true,
    camera: null,
    hidden: [],
    ghost: [],
    sectionAxialMm: null,
    overlays: {
      gas: false,
      inertia: false,
      total: true,
      on: { pistons: true, crankPins: false, mains: false },
      shaking: true,
      orbit: true,
      firing: true,
      pressure: true,
      labels: true,
    },
  }
}

export const newScene = (train: CrankTrain): Scene => ({ format: 'scene/1', train, view: defaultView(train) })
