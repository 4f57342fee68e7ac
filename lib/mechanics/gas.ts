import { wrapCentred } from '@/lib/numerics/wrap'
import { chamberKey, type Chamber } from './chamber'
import {
  heatReleasePressure,
  heatReleaseTable,
  type HeatRelease,
  type HeatReleaseTable,
} from './heat-release'
import { pressureTrace, tracePressure, type PressureTrace } from './pressure-trace'
import type { Train } from './train'

/** The gas model made ready: a trace with its end closed, or a heat-release table for each cylinder. */
export type GasPlan =
  | { model: 'none' }
  | { model: 'trace'; trace: PressureTrace }
  | { model: 'heat-release'; gas: HeatRelease; tables: HeatReleaseTable[] }

export function gasPlan({ gas, cycle }: Train, chambers: readonly Chamber[]): GasPlan {
  if (gas.model === 'none') return { model: 'none' }
  if (gas.model === 'trace') return { model: 'trace', trace: pressureTrace(gas, cycle) }
  const shared = new Map<string, HeatReleaseTable>()
  const tables = chambers.map((chamber) => {
    const key = chamberKey(chamber)
    const table = shared.get(key) ?? heatReleaseTable(gas, chamber)
    shared.set(key, table)
    return table
  })
  return { model: 'heat-release', gas, tables }
}

/** Absolute pressure over a piston at crank angle θ, where the piston has come down by `travel`, Pa. */
export function cylinderPressure(
  train: Train,
  plan: GasPlan,
  chamber: Chamber,
  theta: number,
  travel: number,
): number {
  if (plan.model === 'none') return train.crankcasePressure
  const angle = wrapCentred(theta - chamber.fires, train.cycle)
  if (plan.model === 'trace') return tracePressure(plan.trace, angle)
  const volume = chamber.clearance + chamber.area * travel
  return heatReleasePressure(plan.gas, plan.tables[chamber.index], chamber, angle, volume)
}
