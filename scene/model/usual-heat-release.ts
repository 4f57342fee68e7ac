import type { CrankTrain } from './crank-train'

/** Joule of heat a cycle and cubic centimetre of a cylinder (common practice: a petrol engine at full load). */
const HEAT = 2.6

/** A heat-release model with sane figures to begin with. */
export function usualHeatRelease({
  cylinderDefaults,
}: CrankTrain): Extract<CrankTrain['gas'], { model: 'heat-release' }> {
  const { boreMm = 90, strokeMm = 80 } = cylinderDefaults
  return {
    model: 'heat-release',
    intakePressureBar: 1,
    exhaustPressureBar: 1.05,
    gamma: 1.32,
    heatPerCycleJ: Math.round((HEAT * (Math.PI / 4) * boreMm ** 2 * strokeMm) / 1000),
    combustionStartDeg: -18,
    combustionDurationDeg: 55,
    wiebeA: 6.9,
    wiebeM: 2,
    intakeClosesDeg: -140,
    exhaustOpensDeg: 135,
    blowdownDeg: 14,
  }
}
