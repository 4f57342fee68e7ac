import type { CrankTrainInput } from '@/scene/model/crank-train'
import { answer, instants } from '../kernel'
import { root, single } from './rig'

export interface IdealCycle {
  bore: number
  stroke: number
  compressionRatio: number
  gamma: number
  /** Before compression, bar. */
  startBar: number
  /** After burning at constant volume, bar, from the pressure at the end of compression. */
  peakBar?: (compressedBar: number) => number
  /** Volume, m³, at which burning at constant pressure ends, from the clearance volume and the swept one. */
  cutOff?: (clearance: number, swept: number) => number
}

const STEP = 0.25

/**
 * An air-standard four-stroke cycle of textbooks on the kernel's own volumes, adiabats and work: compression and
 * expansion are its pressure with no heat in it, the work is its mean torque over the cycle.
 */
export function idealCycle(it: IdealCycle) {
  const base = single({ radius: it.stroke / 2, rod: 2 * it.stroke, bore: it.bore })
  const geometry = {
    ...base,
    cylinderDefaults: { ...base.cylinderDefaults, compressionRatio: it.compressionRatio },
  }
  const cold: CrankTrainInput = {
    ...geometry,
    crankcasePressureBar: it.startBar,
    gas: {
      model: 'heat-release',
      intakePressureBar: it.startBar,
      exhaustPressureBar: it.startBar,
      gamma: it.gamma,
      heatPerCycleJ: 0,
      combustionStartDeg: -10,
      combustionDurationDeg: 20,
      wiebeM: 2,
      intakeClosesDeg: -180,
      exhaustOpensDeg: 181,
    },
  }
  const at = instants(cold, 60)
  const adiabat = (angleDeg: number) => at(angleDeg).pressure[0] / 1e5
  const swept = answer(cold, 60, 5).train.displacementCc / 1e6
  const full = (swept * it.compressionRatio) / (it.compressionRatio - 1)
  const volume = (angleDeg: number) => full * (it.startBar / adiabat(angleDeg)) ** (1 / it.gamma)

  const compressed = adiabat(0)
  const peak = it.peakBar?.(compressed) ?? compressed
  const clearance = volume(0)
  const cutOffVolume = it.cutOff?.(clearance, swept) ?? clearance
  const cutOffAngle = cutOffVolume > clearance ? root((a) => volume(a) - cutOffVolume, 0, 180) : 0
  const expanding = (angleDeg: number) => (peak * adiabat(angleDeg)) / adiabat(cutOffAngle)

  const points: [number, number][] = [[-360, it.startBar]]
  for (let a = -180; a <= 0; a += STEP) points.push([a, adiabat(a + 720)])
  points.push([1e-6, peak])
  if (cutOffAngle > 0) points.push([cutOffAngle, peak])
  for (let a = STEP; a <= 180; a += STEP) if (a > cutOffAngle) points.push([a, expanding(a)])
  points.push([180 + 1e-6, it.startBar])
  const hot = answer(
    {
      ...cold,
      gas: { model: 'trace', angleDeg: points.map((p) => p[0]), pressureBar: points.map((p) => p[1]) },
    },
    60,
    STEP,
  )
  const work = hot.torque.meanNm * 4 * Math.PI
  const heat =
    1e5 *
    (((peak - compressed) * clearance) / (it.gamma - 1) +
      (it.gamma / (it.gamma - 1)) * peak * (cutOffVolume - clearance))
  /** Temperature of the charge, by the gas law from its start. */
  const temperature = (startK: number, bar: number, at: number) => (startK * bar * at) / (it.startBar * full)
  return {
    compressed,
    peak,
    end: expanding(180),
    swept,
    clearance,
    cutOffVolume,
    full,
    work,
    efficiency: work / heat,
    meanPressureBar: work / swept / 1e5,
    temperature,
  }
}
