import { energyFluctuation } from '@/lib/mechanics/analysis/torque'
import { answer, instants } from '../kernel'
import { inputs, type Case, type Figures } from './entry'
import { DEG, FOOT, POUND, radPerSecond, single } from './rig'

type Inputs = Record<string, number>
const TURN = 2 * Math.PI

/** Energy fluctuation by the kernel of a torque given as a function of the crank angle. */
function fluctuation(torque: (angle: number) => number, cycle: number) {
  const count = 7200
  return energyFluctuation(
    Array.from({ length: count }, (_, i) => torque((cycle * i) / count)),
    cycle,
  )
}

/** Energy fluctuation by the kernel of a torque that runs in triangles of these areas over and under its mean. */
function fluctuationOfAreas(areas: number[]) {
  const steps = 24 // samples a triangle, so that its corners are samples
  const length = 1 / areas.length
  const torque = areas.flatMap((area) =>
    Array.from({ length: steps }, (_, i) => ((2 * area) / length) * (1 - Math.abs((2 * i) / steps - 1))),
  )
  return energyFluctuation(torque, 1)
}

/** m k² = ΔE / (speed fluctuation · ω²). */
const inertiaFor = (energy: number, share: number, speed: number) => energy / (share * speed ** 2)

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
  'FLY-03': {
    figures: (i) => {
      const { energyExtremes_mm2 } = inputs<{ energyExtremes_mm2: number[] }>('FLY-03')
      const energy = fluctuationOfAreas(fromExtremes(energyExtremes_mm2)) * i.energyPerArea_J_mm2
      const inertia = inertiaFor(energy, i.totalSpeedFluctuation, radPerSecond(i.speed_rpm))
      return { flywheelMass_kg: inertia / i.gyration_m ** 2 }
    },
  },
  'FLY-04': {
    figures: (i) => {
      const { energyExtremes_mm2 } = inputs<{ energyExtremes_mm2: number[] }>('FLY-04')
      const energy = fluctuationOfAreas(fromExtremes(energyExtremes_mm2)) * i.energyPerArea_J_mm2
      const inertia = i.flywheelMass_kg * (i.gyration_mm / 1000) ** 2
      return {
        speedFluctuationCoefficient_percent: (100 * energy) / (inertia * radPerSecond(i.speed_rpm) ** 2),
      }
    },
  },
  'FLY-05': {
    figures: (i) => {
      const { areas_cm2 } = inputs<{ areas_cm2: number[] }>('FLY-05')
      const energy = fluctuationOfAreas(areas_cm2) * i.torqueScale_Nm_per_cm * i.angleScale_deg_per_cm * DEG
      const inertia = inertiaFor(energy, i.speedFluctuationCoefficient, radPerSecond(i.speed_rpm))
      return { flywheelMass_kg: inertia / i.gyration_m ** 2, energyFluctuation_J: energy }
    },
  },
  'FLY-06': { figures: (i) => twoTriangles(i) },
  'FLY-08': {
    figures: (i) => {
      const net = (i.power_kW * 1000 * 60) / (i.speed_rpm / 2)
      const energy = expansionTriangle(net, i.expansionWorkToNetWork * net)
      return {
        flywheelInertia_kg_m2: inertiaFor(energy, i.totalSpeedFluctuation, radPerSecond(i.speed_rpm)),
      }
    },
  },
  'FLY-09': {
    figures: (i) => {
      const energy = fluctuation((a) => 20000 + 9500 * Math.sin(2 * a) - 5700 * Math.cos(2 * a), TURN)
      const inertia = inertiaFor(energy, i.totalSpeedFluctuation, radPerSecond(i.speed_rpm))
      return {
        energyFluctuation_J: energy,
        flywheelInertia_kg_m2: inertia,
        angularAcceleration45_rad_s2: 9500 / inertia,
      }
    },
    without: { power_kW: 'mean of a given torque times speed: the kernel’s mean torque is of a train' },
  },
  'FLY-11': {
    figures: (i) => {
      const share = (energy: number) =>
        (100 * energy) / (i.flywheelInertia_kg_m2 * radPerSecond(i.speed_rpm) ** 2)
      return {
        speedFluctuation_percent: share(fluctuation((a) => 5000 + 1500 * Math.sin(3 * a), TURN)),
        part2_speedFluctuation_percent: share(
          fluctuation((a) => 1500 * Math.sin(3 * a) - 600 * Math.sin(a), TURN),
        ),
      }
    },
    without: { power_kW: 'mean of a given torque times speed: the kernel’s mean torque is of a train' },
  },
  'FLY-19': {
    figures: (i) => {
      const poundForce = POUND * FOOT * i.gravity_ft_s2
      const net = (i.indicatedPower_hp * 550 * poundForce * FOOT * 60) / (i.speed_rpm / 2)
      const energy = expansionTriangle(
        net,
        (net * i.expansionToCompressionWork) / (i.expansionToCompressionWork - 1),
      )
      const inertia = inertiaFor(energy, i.speedFluctuationCoefficient, radPerSecond(i.speed_rpm))
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
      inertiaFor(torque.energyFluctuationJ, i.totalSpeedFluctuation, speed) / i.gyration_m ** 2,
    minSpeedAngle_deg: crossing(5),
    maxSpeedAngle_deg: crossing(90),
  }
}
