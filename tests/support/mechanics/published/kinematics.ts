import { answer } from '../kernel'
import type { Case } from './entry'
import { FOOT, INCH, radPerSecond, rodSwing, root, single, textbook, twoTerm, type Single, DEG } from './rig'

const mm = (i: Record<string, number>): Single => ({
  radius: i.crankRadius_mm / 1000,
  rod: i.rodLength_mm / 1000,
})
const inches = (i: Record<string, number>): Single => ({
  radius: i.crankRadius_in * INCH,
  rod: i.rodLength_in * INCH,
})

/** Where crank and rod stand square to each other, degrees. */
export const squareAngle = (it: Single) => root((a) => a + textbook(it, 1, a).rodAngle / DEG - 90, 1, 90)

export const kinematics: Record<string, Case> = {
  'KIN-01': {
    figures: (i) => {
      const speed = radPerSecond(i.speed_rpm)
      const at = textbook(mm(i), speed, 60)
      const swing = rodSwing(mm(i), 60)
      // the print takes cos φ = 1 for the rod: the motion of sin φ
      return {
        pistonVelocity_m_s: at.velocity,
        pistonAcceleration_m_s2: at.acceleration,
        rodAngularVelocity_rad_s: { exact: speed * swing.angle.d1, printed: speed * swing.sine.d1 },
        rodAngularAcceleration_rad_s2: {
          exact: -(speed ** 2) * swing.angle.d2,
          printed: -(speed ** 2) * swing.sine.d2,
        },
        pistonDisplacementFromTdc_mm: at.travel * 1000,
        rodAngle_deg: at.rodAngle / DEG,
      }
    },
  },
  'KIN-03': {
    figures: (i) => {
      const [it, speed] = [mm(i), radPerSecond(i.speed_rpm)]
      const exact = root((a) => textbook(it, speed, a).acceleration, 0, 180)
      const printed = root((a) => twoTerm(it, speed, a).acceleration, 0, 180)
      return {
        crankAngleOfMaxVelocity_deg: { exact, printed },
        maxPistonVelocity_m_s: {
          exact: textbook(it, speed, exact).velocity,
          printed: twoTerm(it, speed, printed).velocity,
        },
      }
    },
  },
  'KIN-04': {
    figures: (i) => {
      const [it, speed] = [inches(i), i.crankSpeed_rad_s]
      const at = textbook(it, speed, i.crankAngleFromTdc_deg)
      return {
        pistonVelocity_in_s: at.velocity / INCH,
        rodAngularVelocity_rad_s: speed * rodSwing(it, i.crankAngleFromTdc_deg).angle.d1,
        rodDirectionAngle_deg: 180 - at.rodAngle / DEG,
        pistonAcceleration_in_s2: at.acceleration / INCH,
        pistonDisplacementFromTdc_in: at.travel / INCH,
      }
    },
  },
  'KIN-06': {
    figures: (i) => {
      const [it, speed] = [inches(i), radPerSecond(i.speed_rpm)]
      const swing = rodSwing(it, i.crankAngleFromTdc_deg)
      return {
        pistonVelocity_ft_s: textbook(it, speed, i.crankAngleFromTdc_deg).velocity / FOOT,
        crankPinVelocity_ft_s: (speed * swing.point(0).speed) / FOOT,
        rodAngularVelocity_rad_s: speed * swing.angle.d1,
      }
    },
  },
  'KIN-07': {
    figures: (i) => {
      const [speed, swing] = [radPerSecond(i.speed_rpm), rodSwing(mm(i), i.crankAngleFromTdc_deg)]
      const middle = swing.point(i.pointFromCrankPin_mm / i.rodLength_mm)
      return {
        rodMidpointVelocity_m_s: speed * middle.speed,
        rodMidpointAcceleration_m_s2: speed ** 2 * middle.acceleration,
        rodAngularVelocity_rad_s: speed * swing.angle.d1,
        rodAngularAcceleration_rad_s2: -(speed ** 2) * swing.angle.d2,
      }
    },
  },
  'KIN-09': {
    figures: (i) => {
      const speed = radPerSecond(i.speed_rpm)
      const gain = i.caseB_crankAngularAcceleration_rad_s2
      const { angle, point } = rodSwing(inches(i), i.crankAngleFromTdc_deg)
      const [pin, top] = [point(0), point(1)]
      // chain rule: a point's acceleration is ω²·x″ + ω̇·x′ of its path by crank angle
      const relative = (side: 'up' | 'across', extra: number) =>
        speed ** 2 * (top[side].d2 - pin[side].d2) + extra * (top[side].d1 - pin[side].d1)
      const apart = (extra: number) => Math.hypot(relative('up', extra), relative('across', extra)) / FOOT
      return {
        crankPinAcceleration_ft_s2: (speed ** 2 * pin.acceleration) / FOOT,
        caseA_rodAngularAcceleration_rad_s2: -(speed ** 2) * angle.d2,
        caseA_pinRelativeToCrankPinAcceleration_ft_s2: apart(0),
        caseB_rodAngularAcceleration_rad_s2: -(speed ** 2 * angle.d2 + gain * angle.d1),
        caseB_pinRelativeToCrankPinAcceleration_ft_s2: apart(gain),
      }
    },
  },
  'KIN-10': {
    figures: (i) => {
      const it = { radius: i.crankRadius_m, rod: i.rodLength_m, bore: 1 }
      return { crankSpeed_rad_s: i.pistonVelocity_m_s / textbook(it, 1, squareAngle(it)).velocity }
    },
  },
  'KIN-11': {
    figures: (i) => {
      const [speed, angle] = [i.crankSpeed_rad_s, i.crankAngleFromTdc_deg]
      const at = textbook(mm(i), speed, angle)
      const swing = rodSwing(mm(i), angle)
      const middle = swing.point(i.pointFromCrankPin_mm / i.rodLength_mm)
      return {
        pistonVelocity_m_s: at.velocity,
        pistonAcceleration_m_s2: at.acceleration,
        rodMidpointVelocity_m_s: speed * middle.speed,
        rodMidpointAcceleration_m_s2: speed ** 2 * middle.acceleration,
        rodAngularVelocity_rad_s: speed * swing.angle.d1,
      }
    },
  },
  'KIN-12': {
    figures: (i) => {
      const [speed, angle] = [radPerSecond(i.speed_rpm), i.crankAngleFromTdc_deg]
      const swing = speed * rodSwing(mm(i), angle).angle.d1
      // the rod swings against the crank on the crank pin, and alone on the piston pin
      return {
        rodAngularVelocity_rad_s: swing,
        crankPinRubbingSpeed_m_s: ((speed + swing) * i.crankPinDiameter_mm) / 2000,
        pistonPinRubbingSpeed_m_s: (swing * i.pistonPinDiameter_mm) / 2000,
        pistonVelocity_m_s: textbook(mm(i), speed, angle).velocity,
      }
    },
    without: { mainJournalRubbingSpeed_m_s: 'crank speed times radius: nothing the kernel works out' },
  },
  'KIN-13': {
    figures: (i) => {
      const it = { ...mm(i), offset: i.cylinderOffset_mm / 1000 }
      const { strokeMm, tdcDeg, bdcDeg } = answer(single(it), 60).kinematics['1']
      const at = textbook(it, i.crankSpeed_rad_s, i.crankAngle_deg)
      return {
        stroke_mm: strokeMm,
        tdcCrankAngle_deg: tdcDeg,
        bdcCrankAngle_deg: bdcDeg,
        downStrokeCrankAngle_deg: bdcDeg - tdcDeg,
        timeRatio: (bdcDeg - tdcDeg) / (360 - bdcDeg + tdcDeg),
        pistonPinHeight_mm: at.height * 1000,
        pistonVelocity_mm_s: at.velocity * 1000,
        pistonAcceleration_mm_s2: at.acceleration * 1000,
      }
    },
  },
  'KIN-16': {
    figures: (i) => {
      const it = (bore: number): Single => ({ radius: bore / 2, rod: i.rodLength_mm / 1000, bore })
      const displaced = (bore: number) =>
        (answer(single(it(bore)), i.speed_rpm).train.displacementCc * i.cylinders) / 1000
      const bore = root((x) => displaced(x) - i.displacement_L, 0.05, 0.12)
      const speed = radPerSecond(i.speed_rpm)
      const at = textbook(it(bore), speed, i.crankAngleAfterTdc_deg)
      const mean = answer(single(it(bore)), i.speed_rpm).train.meanPistonSpeedMS
      const volume = squeezed(it(bore), i.compressionRatio)
      return {
        bore_mm: bore * 1000,
        meanPistonSpeed_m_s: mean,
        clearanceVolume_cm3: volume(0) * 1e6,
        instantToMeanSpeedRatio: at.velocity / mean,
        pistonSpeed_m_s: at.velocity,
        pistonDisplacementFromTdc_mm: at.travel * 1000,
        cylinderVolume_cm3: volume(i.crankAngleAfterTdc_deg) * 1e6,
      }
    },
  },
  'KIN-17': {
    figures: (i) => {
      const it = { radius: 0.05, rod: 0.05 / i.crankToRodRatio, mass: 1 }
      const { orders } = answer(single(it), 600)
      const unit = it.radius * radPerSecond(600) ** 2
      const cosine = (n: number) => {
        const { amplitudeN, phaseDeg } = orders.find((o) => o.order === n)!.vertical
        return (amplitudeN * Math.cos(phaseDeg * DEG)) / unit
      }
      return {
        harmonic1: cosine(1),
        harmonic2: cosine(2),
        harmonic3: cosine(3),
        harmonic4: cosine(4),
        harmonic6: cosine(6),
      }
    },
  },
}

/** Cylinder volume, m³, at angles on the compression stroke, read from the kernel's pressure with no heat in it. */
export function squeezed(it: Single, compressionRatio: number) {
  const gamma = 1.4
  const document = single(it)
  const pressure = answer(
    {
      ...document,
      cylinderDefaults: { ...document.cylinderDefaults, compressionRatio },
      gas: {
        model: 'heat-release',
        intakePressureBar: 1,
        exhaustPressureBar: 1,
        gamma,
        heatPerCycleJ: 0,
        combustionStartDeg: -10,
        combustionDurationDeg: 40,
        wiebeM: 2,
        intakeClosesDeg: -180,
        exhaustOpensDeg: 181,
      },
    },
    60,
  ).gas['1'].pressureBar
  const swept = (Math.PI / 4) * it.bore! ** 2 * 2 * it.radius
  const full = (swept * compressionRatio) / (compressionRatio - 1)
  return (angleDeg: number) => full * (1 / pressure[angleDeg]) ** (1 / gamma)
}
