import { placeCylinders, type Drive } from './pose'

/** Greatest and least height of a piston pin over its crank's turn, along its cylinder, m. */
export interface Travel {
  top: number
  bottom: number
}

const STEPS = 720

/** By going round: fine enough to frame by, also for link rods, whose dead centres have no closed form. */
export function travels(drive: Drive): Travel[] {
  const found = Array.from({ length: drive.cylinders }, (): Travel => ({ top: -Infinity, bottom: Infinity }))
  for (let step = 0; step < STEPS; step++) {
    placeCylinders(drive, (2 * Math.PI * step) / STEPS)
    found.forEach((travel, i) => {
      const height = drive.points[6 * i + 2] * drive.cosBank[i] + drive.points[6 * i + 3] * drive.sinBank[i]
      travel.top = Math.max(travel.top, height)
      travel.bottom = Math.min(travel.bottom, height)
    })
  }
  return found
}
