import { answer } from '../kernel'
import type { Case, Figures } from './entry'
import { squareAngle, squeezed } from './kinematics'
import {
  FOOT,
  INCH,
  POUND_FORCE,
  PSI,
  radPerSecond,
  rodSwing,
  root,
  single,
  textbook,
  twoTerm,
  WEIGHTLESS,
  type Single,
} from './rig'

type Inputs = Record<string, number>
const area = (bore: number) => (Math.PI / 4) * bore ** 2
const pick = <T extends object, K extends keyof T>(from: T, ...keys: K[]) =>
  Object.fromEntries(keys.map((k) => [k, from[k]])) as Pick<T, K>

/** The chain from the piston to the crank, as `exact` names it. */
function chain(it: Single, speed: number, angleDeg: number) {
  const at = textbook(it, speed, angleDeg)
  return {
    netPistonForce_N: at.netPistonForce,
    sideThrust_N: at.sideThrust,
    rodForce_N: at.rodForce,
    crankTangentialForce_N: at.crankTangential,
    crankRadialForce_N: at.crankRadial,
    torque_Nm: at.torque,
  }
}

/** The same chain with the print's two-term acceleration: its inertia force is put on as gas force instead. */
function printedChain(it: Single, speed: number, angleDeg: number) {
  const inertia = (it.mass ?? 0) * twoTerm(it, speed, angleDeg).acceleration
  return chain(
    { ...it, mass: WEIGHTLESS, pressure: it.pressure! - inertia / area(it.bore!) },
    speed,
    angleDeg,
  )
}

/** Both chains, key by key. */
function bothChains(it: Single, speed: number, angleDeg: number) {
  const [exact, printed] = [chain(it, speed, angleDeg), printedChain(it, speed, angleDeg)]
  const both = (key: keyof typeof exact) => ({ exact: exact[key], printed: printed[key] })
  return {
    netPistonForce_N: both('netPistonForce_N'),
    sideThrust_N: both('sideThrust_N'),
    rodForce_N: both('rodForce_N'),
    crankTangentialForce_N: both('crankTangentialForce_N'),
    crankRadialForce_N: both('crankRadialForce_N'),
    torque_Nm: both('torque_Nm'),
  }
}

/** Speed, rpm, at which the net piston force vanishes. */
const zeroLoadSpeed = (force: (speed: number) => number) => root((rpm) => force(radPerSecond(rpm)), 100, 6000)

/** A piston rod through the cover takes its area from the crank end's pressure. */
const doubleActing = (cover: number, crankEnd: number, bore: number, pistonRod: number) =>
  cover - crankEnd * (1 - (pistonRod / bore) ** 2)

const flywheel = (torque: number, i: Inputs) =>
  (torque - (i.loadPower_kW * 1000) / radPerSecond(i.speed_rpm)) /
  (i.flywheelMass_kg * i.flywheelGyration_m ** 2)

export const forces: Record<string, Case> = {
  'FOR-01': {
    figures: (i) => {
      const it = {
        radius: i.crankRadius_mm / 1000,
        rod: i.rodLength_mm / 1000,
        bore: i.bore_mm / 1000,
        mass: i.reciprocatingMass_kg,
        pressure: i.netGasPressure_MPa * 1e6,
      }
      return bothChains(it, radPerSecond(i.speed_rpm), i.crankAngleFromTdc_deg)
    },
  },
  'FOR-03': {
    figures: (i) => {
      const it = {
        radius: i.crankRadius_mm / 1000,
        rod: i.rodLength_mm / 1000,
        bore: i.bore_mm / 1000,
        mass: i.reciprocatingMass_kg,
        pressure: i.gasPressure_MPa * 1e6,
      }
      const speed = radPerSecond(i.speed_rpm)
      const angle = root((a) => textbook(it, speed, a).travel * 1000 - i.pistonTravelFromTdc_mm, 0, 90)
      const [exact, printed] = [chain(it, speed, angle), printedChain(it, speed, i.crankAngleUsed_deg)]
      return {
        ...exact,
        netPistonForce_N: { exact: exact.netPistonForce_N, printed: printed.netPistonForce_N },
        rodForce_N: { exact: exact.rodForce_N, printed: printed.rodForce_N },
        sideThrust_N: { exact: exact.sideThrust_N, printed: printed.sideThrust_N },
        crankAngleFromTdc_deg: angle,
        speedOfZeroPinLoad_rpm: zeroLoadSpeed(
          (w) => printedChain(it, w, i.crankAngleUsed_deg).netPistonForce_N,
        ),
      }
    },
  },
  'FOR-04': {
    figures: (i) => {
      const radius = i.crankRadius_mm / 1000
      const it = {
        radius,
        rod: radius * i.rodToCrankRatio,
        bore: i.bore_mm / 1000,
        mass: i.reciprocatingMass_kg,
        pressure: i.gasPressure_MPa * 1e6 - i.frictionForce_N / area(i.bore_mm / 1000),
      }
      const angle = i.crankAngleFromTdc_deg
      const speed = Math.sqrt(i.pistonAcceleration_m_s2 / textbook(it, 1, angle).acceleration)
      return chain(it, speed, angle)
    },
  },
  'FOR-05': {
    figures: (i) => {
      const it = {
        radius: i.stroke_mm / 2000,
        rod: i.rodLength_mm / 1000,
        bore: i.bore_mm / 1000,
        mass: i.reciprocatingMass_kg,
        pressure:
          1000 * doubleActing(i.coverPressure_kPa, i.crankEndPressure_kPa, i.bore_mm, i.pistonRodDiameter_mm),
      }
      const both = bothChains(it, radPerSecond(i.speed_rpm), i.crankAngleFromTdc_deg)
      return { ...both, flywheelAngularAcceleration_rad_s2: flywheel(both.torque_Nm.printed, i) }
    },
  },
  'FOR-07': {
    figures: (i) => {
      const weight = i.reciprocatingMass_kg * i.gravity_m_s2
      const it = {
        radius: i.stroke_mm / 2000,
        rod: i.rodLength_mm / 1000,
        bore: i.bore_mm / 1000,
        mass: i.reciprocatingMass_kg,
        pressure: i.gasPressure_kPa * 1000 + weight / area(i.bore_mm / 1000),
      }
      const angle = i.crankAngleFromTdc_deg
      return {
        ...bothChains(it, radPerSecond(i.speed_rpm), angle),
        speedOfZeroPinLoad_rpm: zeroLoadSpeed((w) => printedChain(it, w, angle).netPistonForce_N),
      }
    },
  },
  'FOR-09': {
    figures: (i) => {
      const bore = i.bore_mm / 1000
      const radius = (bore * i.strokeToBore) / 2
      const it = {
        radius,
        rod: radius * i.rodToCrankRatio,
        bore,
        pressure:
          1000 * doubleActing(i.coverPressure_kPa, i.crankEndPressure_kPa, i.bore_mm, i.pistonRodDiameter_mm),
      }
      const exact = chain(it, radPerSecond(i.speed_rpm), i.crankAngleFromTdc_deg)
      return { ...exact, flywheelAngularAcceleration_rad_s2: flywheel(exact.torque_Nm, i) }
    },
  },
  'FOR-10': {
    figures: (i) => {
      const [bore, radius] = [i.bore_mm / 1000, i.stroke_mm / 2000]
      const it = {
        radius,
        rod: radius * i.rodToCrankRatio,
        bore,
        mass: i.reciprocatingMass_kg,
        pressure: i.netGasPressure_kPa * 1000 + (i.reciprocatingMass_kg * i.gravity_m_s2) / area(bore),
      }
      return bothChains(it, radPerSecond(i.speed_rpm), i.crankAngleFromTdc_deg)
    },
  },
  'FOR-11': {
    figures: (i) => {
      const [bore, radius] = [i.bore_mm / 1000, i.stroke_mm / 2000]
      const bare = { radius, rod: i.rodLength_mm / 1000, bore, mass: i.reciprocatingMass_kg }
      const speed = radPerSecond(i.speed_rpm)
      const angle = i.crankAngleFromTdc_deg
      const volume = squeezed(bare, i.compressionRatio)
      const [full, clearance] = [volume(180), volume(0)]
      const burnt = clearance + i.constantPressureCombustionShareOfStroke * (full - clearance)
      const top = i.suctionPressure_MPa * 1e6 * (full / clearance) ** i.polytropicIndex
      const pressure = top * (burnt / volume(angle)) ** i.polytropicIndex
      const net =
        pressure - i.suctionPressure_MPa * 1e6 + (i.reciprocatingMass_kg * i.gravity_m_s2) / area(bore)
      return {
        ...bothChains({ ...bare, pressure: net }, speed, angle),
        gasPressure_MPa: pressure / 1e6,
      }
    },
  },
  'FOR-12': {
    figures: (i) => {
      const it = {
        radius: (i.stroke_in * INCH) / 2,
        rod: i.rodLength_in * INCH,
        bore: i.bore_in * INCH,
        pressure:
          PSI * doubleActing(i.headPressure_psi, i.crankEndPressure_psi, i.bore_in, i.pistonRodDiameter_in),
      }
      const angle = i.crankAngleFromTdc_deg
      const exact = chain(it, 1, angle)
      return {
        torque_lbf_ft: {
          exact: exact.torque_Nm / POUND_FORCE / FOOT,
          // the print's torque arm is the two-term piston speed over the crank's
          printed: (exact.netPistonForce_N * twoTerm(it, 1, angle).velocity) / POUND_FORCE / FOOT,
        },
        netPistonForce_lbf: exact.netPistonForce_N / POUND_FORCE,
        sideThrust_lbf: exact.sideThrust_N / POUND_FORCE,
        rodForce_lbf: exact.rodForce_N / POUND_FORCE,
      }
    },
  },
  'FOR-13': {
    figures: (i) => {
      const it = {
        radius: i.stroke_mm / 2000,
        rod: i.rodLength_mm / 1000,
        bore: i.bore_mm / 1000,
        pressure: 1e6,
      }
      const at = chain(it, 1, squareAngle(it))
      return { sideThrust_N: (i.rodForce_N * at.sideThrust_N) / at.rodForce_N }
    },
  },
  'FOR-14': {
    figures: (i) => {
      const bore = i.bore_mm / 1000
      const it = {
        radius: i.stroke_mm / 2000,
        rod: i.rodLength_mm / 1000,
        bore,
        pressure: i.gasPressure_bar * 1e5 - i.frictionForce_N / area(bore),
      }
      const angle = i.crankAngleFromTdc_deg
      const [plain, offset] = [
        chain(it, 1, angle),
        chain({ ...it, offset: i.pistonPinOffset_mm / 1000 }, 1, angle),
      ]
      return {
        rodForceNoOffset_N: plain.rodForce_N,
        sideThrustNoOffset_N: plain.sideThrust_N,
        sideThrustWithOffset_N: offset.sideThrust_N,
        rodForceWithOffset_N: offset.rodForce_N,
        torqueWithOffset_Nm: offset.torque_Nm,
      }
    },
  },
  'FOR-15': {
    figures: (i) => {
      const bore = 0.1
      const it = {
        radius: i.crankRadius_mm / 1000,
        rod: i.rodLength_mm / 1000,
        bore,
        pressure: i.pistonForce_N / area(bore),
      }
      return pick(chain(it, 1, i.crankAngleFromTdc_deg), 'torque_Nm')
    },
  },
  'FOR-17': {
    figures: (i) => {
      const it = { radius: i.stroke_mm / 2000, rod: i.rodLength_mm / 1000, mass: i.reciprocatingMass_kg }
      const { shaking } = answer(single(it), i.speed_rpm)
      return { inertiaForce_N: shaking.verticalN[i.crankAngleFromTdc_deg] }
    },
  },
  'FOR-18': {
    figures: (i) => {
      const rod = i.rodLength_mm / 1000
      const rodCg = rod - i.rodCgFromPistonPin_mm / 1000
      const it = {
        radius: i.crankRadius_mm / 1000,
        rod,
        rodMass: i.rodMass_kg,
        rodCg,
        rodInertia: i.rodMass_kg * (i.rodGyration_mm / 1000) ** 2,
      }
      const at = textbook(it, radPerSecond(i.speed_rpm), i.crankAngleFromTdc_deg)
      const { pistonPinU, pistonPinV, crankPinVertical, crankPinHorizontal, rodAngle } = at.instant
      const [p, q] = [
        [pistonPinU[0], pistonPinV[0]],
        [-crankPinVertical[0], -crankPinHorizontal[0]],
      ]
      // the rod's axis points from the crank pin up and away from it
      const [up, across] = [Math.cos(rodAngle[0]), -Math.sin(rodAngle[0])]
      const turn = (arm: number, [u, v]: number[]) => arm * (up * v - across * u)
      return {
        pistonAcceleration_m_s2: at.acceleration,
        rodInertiaForce_N: Math.hypot(p[0] + q[0], p[1] + q[1]),
        rodInertiaCouple_Nm: turn(rod - rodCg, p) + turn(-rodCg, q),
      }
    },
  },
  'MAS-01': {
    figures: (i) =>
      equivalentPair(i.rodMass_kg, i.cgFromSmallEnd_mm / 1000, i.momentOfInertiaAboutCg_kg_mm2 / 1e6),
  },
  'MAS-02': {
    figures: (i) => {
      const h = i.suspensionToCg_mm / 1000
      const gyration2 = i.gravity_m_s2 * h * (i.pendulumPeriod_s / (2 * Math.PI)) ** 2 - h * h
      return equivalentPair(i.rodMass_kg, i.smallEndCentreToCg_mm / 1000, i.rodMass_kg * gyration2)
    },
    without: { gyration_mm: 'a pendulum test of the rod: the document takes the inertia it gives' },
  },
  'MAS-03': {
    figures: (i) => {
      const [mass, rod, small] = [i.rodMass_kg, i.rodLength_mm / 1000, i.cgFromSmallEnd_mm / 1000]
      const inertia = mass * (i.gyration_mm / 1000) ** 2
      const split = answer(single({ radius: 0.05, rod, rodMass: mass, rodCg: rod - small }), 60).balance
        .cylinders['1']
      return {
        ...equivalentPair(mass, small, inertia),
        correctionCouple_Nm: correction(mass, rod, small, inertia) * i.rodAngularAcceleration_rad_s2,
        simpleSplit_smallEnd_kg: split.reciprocatingKg,
        simpleSplit_bigEnd_kg: split.rotatingKg,
      }
    },
  },
  'MAS-05': { figures: (i) => lumpedAndCorrected(i) },
}

/** Couple by which a rod's two-mass equivalent overstates its inertia, per unit of angular acceleration, from two runs. */
function correction(mass: number, rod: number, cgFromSmallEnd: number, inertia: number) {
  const it = { radius: rod / 5, rod, rodMass: mass, rodCg: rod - cgFromSmallEnd }
  const torque = (rodInertia?: number) => textbook({ ...it, rodInertia }, 100, 30).inertiaTorque
  const { d1, d2 } = rodSwing(it, 30).angle
  return (torque(inertia) - torque()) / (d1 * d2 * 100 ** 2)
}

/**
 * The rod as two masses, one at the small end, that keep mass, centre of gravity and inertia: the second stands where
 * the kernel's rigid rod and its two-mass rod turn the crank alike.
 */
function equivalentPair(mass: number, cgFromSmallEnd: number, inertia: number): Figures {
  const second = root((b) => correction(mass, cgFromSmallEnd + b, cgFromSmallEnd, inertia), 1e-4, 2)
  const rod = cgFromSmallEnd + second
  const split = answer(single({ radius: rod / 5, rod, rodMass: mass, rodCg: second }), 60).balance.cylinders[
    '1'
  ]
  return {
    massAtSmallEnd_kg: split.reciprocatingKg,
    secondMass_kg: split.rotatingKg,
    secondMassFromCg_mm: second * 1000,
  }
}

/** A horizontal engine, its inertia split in the lumped part, the rod's correction and the weight of its big-end share. */
function lumpedAndCorrected(i: Inputs): Figures {
  const speed = 13.1 // as printed
  const angle = i.crankAngleFromTdc_deg
  const [rod, rodCg] = [i.rodLength_mm / 1000, i.rodCgFromCrankPin_mm / 1000]
  const it = { radius: i.stroke_mm / 2000, rod, mass: i.reciprocatingMass_kg, rodMass: i.rodMass_kg, rodCg }
  const { reciprocatingKg, rotatingKg } = answer(single(it), 60).balance.cylinders['1']
  const { angle: swing, sine, point } = rodSwing(it, angle)
  const force = reciprocatingKg * twoTerm(it, speed, angle).acceleration
  const torque = (force * textbook(it, speed, angle).velocity) / speed
  const inertia = i.rodMass_kg * (i.rodGyration_mm / 1000) ** 2
  const run = (rodInertia?: number) => textbook({ ...it, rodInertia }, speed, angle).inertiaTorque
  // the print takes cos φ = 1 for the rod's motion
  const corrected = -((run(inertia) - run()) * sine.d1 * sine.d2) / (swing.d1 * swing.d2)
  const weight = rotatingKg * i.gravity_m_s2 * point(0).up.at
  return {
    lumpedInertiaForce_N: force,
    lumpedInertiaTorque_Nm: torque,
    correctionTorque_Nm: corrected,
    weightTorque_Nm: weight,
    totalInertiaTorque_Nm: torque + corrected + weight,
  }
}
