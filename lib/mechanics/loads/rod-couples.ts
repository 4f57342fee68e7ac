import type { CycleParts } from './cycle-parts'

/** What two masses for a rod leave out; kg m², N m, rad. */
export interface RodCouple {
  cylinder: number
  /** The inertia entered, and m·h·(l − h) of the two masses, both about the rod's own centre of gravity. */
  inertia: number
  twoMass: number
  /** inertia − twoMass. */
  error: number
  /** Greatest size of error × angular acceleration of the rod, and its crank angle. */
  peak: number
  peakAngle: number
}

/**
 * The couple that the two-mass rod lacks (or has too much of) against the rigid rod, at a speed ω in rad/s, for each rod
 * whose own inertia J is given: (J − m h (l − h))·(angular acceleration of the rod), m its mass, h its centre of gravity
 * from the big end, l its length. It divides by l·cos ψ into the side thrust. All other figures have it in already.
 *
 * Source: two-mass equivalent and its correction couple, common practice of crank-train texts.
 */
export function rodCouples({ train, inertia, angle }: CycleParts, speed: number): RodCouple[] {
  return train.cylinders.flatMap(({ rod, rodLength }, cylinder) => {
    if (!rod.rigid) return []
    const twoMass = rod.mass * rod.cgFromBigEnd * (rodLength - rod.cgFromBigEnd)
    const error = rod.inertia - twoMass
    const turn = inertia.rodTurn[cylinder]
    let peak = 0
    for (let j = 1; j < turn.length; j++) if (Math.abs(turn[j]) > Math.abs(turn[peak])) peak = j
    return [
      {
        cylinder,
        inertia: rod.inertia,
        twoMass,
        error,
        peak: Math.abs(error * turn[peak]) * speed * speed,
        peakAngle: angle[peak],
      },
    ]
  })
}
