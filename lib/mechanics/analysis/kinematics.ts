import type { Plan } from '../instant'
import { byId, DEGREES, MM, signal, type Recorder, type Samples } from './recorder'

export interface CylinderKinematics {
  pinHeightMm: number[]
  /** Down from exact top dead centre. */
  travelMm: number[]
  velocityMS: number[]
  accelerationMS2: number[]
  rodAngleDeg: number[]
  /** Exact dead centres, 0 ≤ x < 360. */
  tdcDeg: number
  bdcDeg: number
  /** True travel between them. */
  strokeMm: number
}

export function kinematicsRecorder(
  plan: Plan,
  { shown: count }: Samples,
): Recorder<Record<string, CylinderKinematics>> {
  const all = plan.centres.map(({ top, bottom, topHeight, bottomHeight }): CylinderKinematics => ({
    pinHeightMm: signal(count),
    travelMm: signal(count),
    velocityMS: signal(count),
    accelerationMS2: signal(count),
    rodAngleDeg: signal(count),
    tdcDeg: top * DEGREES,
    bdcDeg: bottom * DEGREES,
    strokeMm: (topHeight - bottomHeight) * MM,
  }))
  return {
    record(instant, _, shown) {
      if (shown < 0) return
      for (let i = 0; i < all.length; i++) {
        const out = all[i]
        out.pinHeightMm[shown] = instant.pinHeight[i] * MM
        out.travelMm[shown] = instant.travel[i] * MM
        out.velocityMS[shown] = instant.velocity[i]
        out.accelerationMS2[shown] = instant.acceleration[i]
        out.rodAngleDeg[shown] = instant.rodAngle[i] * DEGREES
      }
    },
    answer: () => byId(plan.train.cylinders, (_, index) => all[index]),
  }
}
