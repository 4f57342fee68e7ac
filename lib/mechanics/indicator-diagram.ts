import { chamberVolume } from './chamber'
import { cylinderPressure } from './gas'
import type { Plan } from './instant'

/** Pressure against angle and volume in one cylinder: a closed loop, from half a cycle before firing top dead centre on. */
export interface IndicatorDiagram {
  /** From firing top dead centre, rad. */
  angle: Float64Array
  volume: Float64Array // m³
  pressure: Float64Array // Pa, absolute
}

/** The indicator diagram of a cylinder at `steps` even angles of a cycle, the end left out. */
export function indicatorDiagram(plan: Plan, index: number, steps: number): IndicatorDiagram {
  const { train, gas } = plan
  const chamber = plan.chambers[index]
  const angle = Float64Array.from({ length: steps }, (_, i) => train.cycle * (i / steps - 0.5))
  const volume = angle.map((at) => chamberVolume(chamber, at))
  const pressure = angle.map((at, i) => {
    const travel = (volume[i] - chamber.clearance) / chamber.area
    return cylinderPressure(train, gas, chamber, chamber.fires + at, travel)
  })
  return { angle, volume, pressure }
}
