import { deadCentre, rodMotion } from './linkage'
import { integrated } from './ode'
import type { PlainTrain } from './plain-train'

const DEG = Math.PI / 180
const BAR = 1e5

/** The angle after firing top dead centre, from minus half a cycle up to, not including, half a cycle, degrees. */
function afterFiring(cycleDeg: number, angleDeg: number, firesAtDeg: number) {
  const raw = (angleDeg - firesAtDeg + cycleDeg / 2) / cycleDeg
  const share = raw - Math.floor(raw + 1e-12)
  return share * cycleDeg - cycleDeg / 2
}

/** Absolute pressure, Pa, of one cylinder at each of some crank angles, straight from the words of the document format. */
export function cylinderPressure(
  train: PlainTrain,
  index: number,
  firesAtDeg: number,
  anglesDeg: number[],
): number[] {
  const gas = train.document.gas ?? { model: 'none' as const }
  const crankcase = (train.document.crankcasePressureBar ?? 1.01325) * BAR
  if (gas.model === 'none') return anglesDeg.map(() => crankcase)
  const after = anglesDeg.map((angle) => afterFiring(train.cycleDeg, angle, firesAtDeg))
  if (gas.model === 'trace')
    return after.map((x) => BAR * onTrace(gas.angleDeg, gas.pressureBar, train.cycleDeg, x))

  const c = train.cylinders[index]
  const top = rodMotion(train, index, deadCentre(train, index, 'top')).s
  const swept = c.area * (top - rodMotion(train, index, deadCentre(train, index, 'bottom')).s)
  const clearance = swept / (c.compression - 1)
  const slope = (x: number, pressure: number) => {
    const { s, sD1 } = rodMotion(train, index, (firesAtDeg + x) * DEG)
    const volume = clearance + c.area * (top - s)
    const volumeSlope = -c.area * sD1 * DEG
    return ((gas.gamma - 1) * heatRate(x) - gas.gamma * pressure * volumeSlope) / volume
  }
  const a = gas.wiebeA ?? 6.9
  const heatRate = (x: number) => {
    const share = (x - gas.combustionStartDeg) / gas.combustionDurationDeg
    if (share <= 0 || share >= 1) return 0
    const m = gas.wiebeM
    return (
      ((gas.heatPerCycleJ * a * (m + 1)) / gas.combustionDurationDeg) *
      share ** m *
      Math.exp(-a * share ** (m + 1))
    )
  }
  const kinks = [gas.combustionStartDeg, gas.combustionStartDeg + gas.combustionDurationDeg].filter(
    (x) => x > gas.intakeClosesDeg && x < gas.exhaustOpensDeg,
  )
  const stops = [
    ...new Set([
      ...after.filter((x) => x > gas.intakeClosesDeg && x < gas.exhaustOpensDeg),
      ...kinks,
      gas.exhaustOpensDeg,
    ]),
  ]
  const closed = new Map<number, number>()
  let [x, p] = [gas.intakeClosesDeg, gas.intakePressureBar * BAR]
  for (const stop of stops.sort((l, r) => l - r)) {
    p = integrated(slope, x, p, stop)
    x = stop
    closed.set(stop, p)
  }
  const exhaust = gas.exhaustPressureBar * BAR
  return after.map((angle) => {
    if (angle <= gas.intakeClosesDeg) return gas.intakePressureBar * BAR
    if (angle < gas.exhaustOpensDeg) return closed.get(angle)!
    return exhaust + (p - exhaust) * Math.exp(-(angle - gas.exhaustOpensDeg) / (gas.blowdownDeg ?? 14))
  })
}

function onTrace(angles: number[], values: number[], cycle: number, x: number) {
  const after = angles.findIndex((a) => a > x)
  const [i, j] =
    after === -1 ? [angles.length - 1, 0] : after === 0 ? [angles.length - 1, 0] : [after - 1, after]
  const from = after === 0 ? angles[i] - cycle : angles[i]
  const to = after === -1 ? angles[j] + cycle : angles[j]
  return values[i] + ((values[j] - values[i]) * (x - from)) / (to - from)
}
