import type { Plan } from '../instant'
import { byId, signal, type Recorder, type Samples } from './recorder'

export interface CylinderLoads {
  /** Net of the crankcase, positive towards the crank. */
  gasForceN: number[]
  /** The piston on the rod. */
  pistonPinN: { u: number[]; v: number[] }
  /** The piston on the wall, positive towards v. */
  sideThrustN: number[]
  /** The rod with its bearing on the pin; a master rod with all that its links put on it; absent for a link rod. */
  crankPinN?: { radial: number[]; tangential: number[]; vertical: number[]; horizontal: number[] }
  /** A link rod on its knuckle pin. */
  knuckleN?: { vertical: number[]; horizontal: number[] }
}

export function loadsRecorder(
  plan: Plan,
  { shown: count }: Samples,
): Recorder<Record<string, CylinderLoads>> {
  const { train, paths } = plan
  const plane = () => ({ vertical: signal(count), horizontal: signal(count) })
  const all = paths.map((path): CylinderLoads => ({
    gasForceN: signal(count),
    pistonPinN: { u: signal(count), v: signal(count) },
    sideThrustN: signal(count),
    ...(path.master < 0
      ? { crankPinN: { radial: signal(count), tangential: signal(count), ...plane() } }
      : { knuckleN: plane() }),
  }))
  return {
    record(instant, _, shown) {
      if (shown < 0) return
      for (let i = 0; i < all.length; i++) {
        const { gasForceN, pistonPinN, sideThrustN, crankPinN, knuckleN } = all[i]
        gasForceN[shown] = instant.gasForce[i]
        pistonPinN.u[shown] = instant.pistonPinU[i]
        pistonPinN.v[shown] = instant.pistonPinV[i]
        sideThrustN[shown] = instant.sideThrust[i]
        if (crankPinN) {
          const vertical = instant.crankPinVertical[i]
          const horizontal = instant.crankPinHorizontal[i]
          const stand = instant.angle + train.throws[train.cylinders[i].throw].angle
          const cos = Math.cos(stand)
          const sin = Math.sin(stand)
          crankPinN.vertical[shown] = vertical
          crankPinN.horizontal[shown] = horizontal
          crankPinN.radial[shown] = vertical * cos + horizontal * sin
          crankPinN.tangential[shown] = horizontal * cos - vertical * sin
        }
        if (knuckleN) {
          knuckleN.vertical[shown] = instant.knuckleVertical[i]
          knuckleN.horizontal[shown] = instant.knuckleHorizontal[i]
        }
      }
    },
    answer: () => byId(train.cylinders, (_, index) => all[index]),
  }
}
