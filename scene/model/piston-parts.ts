import type { PistonParts } from '@/lib/mechanics/balance/bob-weight-card'
import type { CrankTrain } from './crank-train'
import { cylinderValues } from './cylinder-values'

/** Every cylinder's piston by its parts, kg. */
export const pistonParts = (document: CrankTrain): PistonParts[] =>
  document.cylinders.map((entry) => {
    const { pistonKg, pistonPinKg, ringsKg, locksKg } = cylinderValues(document, entry)
    return { piston: pistonKg, pin: pistonPinKg, rings: ringsKg, locks: locksKg }
  })
