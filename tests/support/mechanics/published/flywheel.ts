import { energyFluctuation } from '@/lib/mechanics/analysis/torque'
import { flywheelInertia, speedFluctuation, speedRange } from '@/lib/mechanics/loads/flywheel'
import { momentFigures } from '@/lib/mechanics/loads/turning-moment'
import { answer, instants } from '../kernel'
import { inputs, type Case, type Figures } from './entry'
import { DEG, FOOT, POUND, radPerSecond, single } from './rig'

type Inputs = Record<string, number>
const TURN = 2 * Math.PI

/** Mean and energy fluctuation by the kernel of a torque given as a function of the crank angle. */
function figuresOf(torque: (angle: number) => number, cycle: number) {
  const count = 7200
  return momentFigures(
    Array.from({ length: count }, (_, i) => torque((cycle * i) / count)),
    cycle,
  )
}
const fluctuation = (torque: (angle: number) => number, cycle: number) => figuresOf(torque, cycle).energy
const kilowatts = (torque: number, speedRpm: number) => (torque * radPerSecond(speedRpm)) / 1000

/** Energy fluctuation by the kernel of a torque that runs in triangles of these areas over and under its mean. */
function fluctuationOfAreas(areas: number[]) {
  const steps = 24 // samples a triangle, so that its corners are samples
  const length = 1 / areas.length
  const torque = areas.flatMap((area) =>
    Array.from({ length: steps }, (_, i) => ((2 * area) / length) * (1 - Math.abs((2 * i) / steps - 1))),
  )
  return energyFluctuation(torque, 1)
}

/** Between the extremes of energy and back to where it began. */
const fromExtremes = ([high, low]: number[]) => [high, low - high, -low]

/** A four-stroke single whose expansion stroke gives a triangle of torque and whose compression takes one. */
function expansionTriangle(net: number, expansion: number) {
  const triangle = (work: number, angle: number) =>
    ((2 * work) / Math.PI) * (1 - Math.abs((2 * angle) / Math.PI - 1))
  return fluctuation((angle) => {
    const stroke = Math.floor(angle / Math.PI)
    const within = angle - stroke * Math.PI
    return stroke === 2 ? triangle(expansion, within) : stroke === 1 ? triangle(net - expansion, within) : 0
  }, 2 * TURN)
}

export const flywheel: Record<string, Case> = {
  'FLY-01': {
    figures: (i) => {
      const inertia = i.flywheelMass_kg * i.gyration_m ** 2
      const { most, least } = speedRange(i.energyFluctuation_J, inertia, radPerSecond(i.meanSpeed_rpm))
      return { maxSpeed_rpm: most / radPerSecond(1), minSpeed_rpm: least / radPerSecond(1) }
    },
  },
  'FLY-02': {
    figures: (i) => {
      const workPerCycle = (i.power_kW * 1000 * 60) / i.speed_rpm
      const energy = i.energyFluctuationCoefficient * workPerCycle
      const inertia = flywheelInertia(energy, i.speedFluctuationCoefficient, radPerSecond(i.speed_rpm))
      return { flywheelMass_kg: inertia / i.gyration_m ** 2 }
    },
  },
  'FLY-03': {
    figures: (i) => {
      const { energyExtremes_mm2 } = inputs<{ energyExtremes_mm2: number[] }>('FLY-03')
      const energy = fluctuationOfAreas(fromExtremes(energyExtremes_mm2)) * i.energyPerArea_J_mm2
      const inertia = flywheelInertia(energy, i.totalSpeedFluctuation, radPerSecond(i.speed_rpm))
      return { flywheelMass_kg: inertia / i.gyration_m ** 2 }
    },
  },
  'FLY-04': {
    figures: (i) => {
      const { energyExtremes_mm2 } = inputs<{ energyExtremes_mm2: number[] }>('FLY-04')
      const energy = fluctuationOfAreas(fromExtremes(energyExtremes_mm2)) * i.energyPerArea_J_mm2
      const inertia = i.flywheelMass_kg * (i.gyration_mm / 1000) ** 2
      return {
        speedFluctuationCoefficient_percent:
          100 * speedFluctuation(energy, inertia, radPerSecond(i.speed_rpm)),
      }
    },
  },
  'FLY-05': {
    figures: (i) => {
      const { areas_cm2 } = inputs<{ areas_cm2: number[] }>('FLY-05')
      const energy = fluctuationOfAreas(areas_cm2) * i.torqueScale_Nm_per_cm * i.angleScale_deg_per_cm * DEG
      const inertia = flywheelInertia(energy, i.speedFluctuationCoefficient, radPerSecond(i.speed_rpm))
      return { flywheelMass_kg: inertia / i.gyration_m ** 2, energyFluctuation_J: energy }
    },
  },
  'FLY-06': { figures: (i) => twoTriangles(i) },
  'FLY-08': {
    figures: (i) => {
      const net = (i.power_kW * 1000 * 60) / (i.speed_rpm / 2)
      const energy = expansionTriangle(net, i.expansionWorkToNetWork * net)
      return {
        flywheelInertia_kg_m2: flywheelInertia(energy, i.totalSpeedFluctuation, radPerSecond(i.speed_rpm)),
      }
    },
  },
  'FLY-09': {
    figures: (i) => {
      const { energy, mean } = figuresOf((a) => 20000 + 9500 * Math.sin(2 * a) - 5700 * Math.cos(2 * a), TURN)
      const inertia = flywheelInertia(energy, i.totalSpeedFluctuation, radPerSecond(i.speed_rpm))
      return {
        energyFluctuation_J: energy,
        flywheelInertia_kg_m2: inertia,
        angularAcceleration45_rad_s2: 9500 / inertia,
        power_kW: kilowatts(mean, i.speed_rpm),
      }
    },
  },
  'FLY-11': {
    figures: (i) => {
      const share = (energy: number) =>
        100 * speedFluctuation(energy, i.flywheelInertia_kg_m2, radPerSecond(i.speed_rpm))
      const { energy, mean } = figuresOf((a) => 5000 + 1500 * Math.sin(3 * a), TURN)
      return {
        power_kW: kilowatts(mean, i.speed_rpm),
        speedFluctuation_percent: share(energy),
        part2_speedFluctuation_percent: share(
          fluctuation((a) => 1500 * Math.sin(3 * a) - 600 * Math.sin(a), TURN),
        ),
      }
    },
  },
  'FLY-13': {
    figures: (i) => {
      const mean = (i.maxSpeed_rad_s + i.minSpeed_rad_s) / 2
      const share = (i.maxSpeed_rad_s - i.minSpeed_rad_s) / mean
      return { flywheelInertia_kg_m2: flywheelInertia(i.energyFluctuation_J, share, mean) }
    },
  },
  'FLY-14': {
    // C·ω² does not depend on ω, so at 1 rad/s C is ω·(ω_max − ω_min)
    figures: (i) => ({
      meanSpeed_rpm:
        speedFluctuation(i.energyFluctuation_J, i.flywheelInertia_kg_m2, 1) /
        radPerSecond(i.speedFluctuation_rpm) /
        radPerSecond(1),
    }),
  },
  'FLY-15': {
    // a solid disc: I = m d²/8
    figures: (i) => ({
      flywheelMass_kg:
        (8 *
          flywheelInertia(
            i.energyFluctuation_J,
            i.speedFluctuationCoefficient,
            radPerSecond(i.meanSpeed_rpm),
          )) /
        i.maxDiameter_m ** 2,
    }),
  },
  'FLY-16': {
    figures: (i) => {
      const { mean } = figuresOf((a) => 10000 + 1000 * Math.sin(2 * a) - 1200 * Math.cos(2 * a), TURN)
      return { power_kW: kilowatts(mean, i.speed_rpm) }
    },
  },
  'FLY-19': {
    figures: (i) => {
      const poundForce = POUND * FOOT * i.gravity_ft_s2
      const net = (i.indicatedPower_hp * 550 * poundForce * FOOT * 60) / (i.speed_rpm / 2)
      const energy = expansionTriangle(
        net,
        (net * i.expansionToCompressionWork) / (i.expansionToCompressionWork - 1),
      )
      const inertia = flywheelInertia(energy, i.speedFluctuationCoefficient, radPerSecond(i.speed_rpm))
      return { flywheelInertia_lb_ft2: inertia / POUND / FOOT ** 2 }
    },
  },
}

/**
 * Two triangles of torque a turn, run through the whole kernel: a two-stroke single whose pressure trace is set so that
 * pressure times area times the kernel's own torque arm is that torque.
 */
function twoTriangles(i: Inputs): Figures {
  const [step, crankcase] = [0.25, 2000]
  const base = { ...single({ radius: 0.5, rod: 2, bore: 0.5 }), cycle: 'two-stroke' as const }
  const arm = instants(base, 60)
  const wanted = (angle: number) => {
    const within = angle % 180
    const top = angle < 180 ? i.strokeOnePeakTorque_Nm : i.strokeTwoPeakTorque_Nm
    return top * (within < 80 ? within / 80 : (180 - within) / 100)
  }
  const area = (Math.PI / 4) * 0.5 ** 2
  const bar = (angle: number) => crankcase + wanted(angle) / area / (-arm(angle).velocity[0] / TURN) / 1e5
  const angleDeg = [-180, ...Array.from({ length: 360 / step }, (_, k) => (k + 0.5) * step - 180)]
  const { torque, angleDeg: at } = answer(
    {
      ...base,
      crankcasePressureBar: crankcase,
      gas: {
        model: 'trace',
        angleDeg,
        pressureBar: angleDeg.map((a) => bar(a === -180 ? 180 + step / 2 : (a + 360) % 360)),
      },
    },
    0,
    step,
  )
  const crossing = (from: number) => {
    const k = at.findIndex(
      (a, j) =>
        a >= from && (torque.totalNm[j] - torque.meanNm) * (torque.totalNm[j + 1] - torque.meanNm) <= 0,
    )
    const [here, next] = [torque.totalNm[k] - torque.meanNm, torque.totalNm[k + 1] - torque.meanNm]
    return at[k] + (step * here) / (here - next)
  }
  const speed = radPerSecond(i.speed_rpm)
  return {
    meanTorque_Nm: torque.meanNm,
    energyFluctuationCoefficient_percent: (100 * torque.energyFluctuationJ) / (torque.meanNm * TURN),
    flywheelMass_kg:
      flywheelInertia(torque.energyFluctuationJ, i.totalSpeedFluctuation, speed) / i.gyration_m ** 2,
    minSpeedAngle_deg: crossing(5),
    maxSpeedAngle_deg: crossing(90),
  }
}
