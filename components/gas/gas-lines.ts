import { indicated, type IndicatedEngine } from '@/lib/mechanics/indicated'
import { indicatorDiagram, type IndicatorDiagram } from '@/lib/mechanics/indicator-diagram'
import { buildPlan } from '@/lib/mechanics/plan'
import type { CrankTrain } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'
import { usualHeatRelease } from '@/scene/model/usual-heat-release'
import type { SessionState } from '@/scene/session/session'

export type Gas = CrankTrain['gas']
export type HeatRelease = Extract<Gas, { model: 'heat-release' }>
export type Trace = Extract<Gas, { model: 'trace' }>

/** One gas in this engine: what it indicates, and its diagram in the cylinder that is looked at. */
export interface GasLine {
  name: 'model' | 'measured'
  engine: IndicatedEngine
  diagram: IndicatorDiagram
}

/** Points of a diagram, one a degree of a four-stroke. */
const STEPS = 720

export function gasLine(
  name: GasLine['name'],
  gas: Gas,
  document: CrankTrain,
  speed: number,
  cylinder: number,
): GasLine {
  const plan = buildPlan(toTrain({ ...document, gas }), speed)
  return { name, engine: indicated(plan), diagram: indicatorDiagram(plan, cylinder, STEPS) }
}

/** The model that a trace is compared with: the last that this document had, else the usual one for its size. */
export function modelOf({ scene, past, base }: Pick<SessionState, 'scene' | 'past' | 'base'>): HeatRelease {
  const had = [scene.train.gas, ...past.map((step) => step.scene.train.gas).reverse(), base.train.gas]
  return had.find((gas): gas is HeatRelease => gas.model === 'heat-release') ?? usualHeatRelease(scene.train)
}
