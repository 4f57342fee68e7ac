import { answer, instants } from '../kernel'
import type { Case, Figures } from './entry'
import { idealCycle } from './ideal-cycle'
import { radPerSecond, root, single } from './rig'

/** A cylinder whose size the source leaves open. */
const ANY = { bore: 0.1, stroke: 0.1 }

/** Pressure above the crankcase all the way down after top dead centre and none elsewhere: its mean is the indicated one. */
const block = (half: number, bar: number) => ({
  model: 'trace' as const,
  angleDeg: [-half, -half / 2, 0, 1e-6, 90, 180 - 1e-6, ...(half > 180 ? [180, 270] : [])],
  pressureBar: [1, 1, 1, 1 + bar, 1 + bar, 1 + bar, ...(half > 180 ? [1, 1] : [])],
})

export const gas: Record<string, Case> = {
  'GAS-01': {
    figures: (i) => {
      const air = i.cv_kJ_kgK * (i.gamma - 1)
      const heatPerBarM3 = (i.heatAdded_kJ_kg * 100) / (air * i.T1_K) // kJ for each bar·m³ of fresh charge
      const it = idealCycle({
        ...ANY,
        compressionRatio: i.compressionRatio,
        gamma: i.gamma,
        startBar: i.p1_bar,
        peakBar: (p2) => p2 + ((i.gamma - 1) * heatPerBarM3 * i.compressionRatio * i.p1_bar) / 100,
      })
      const burnt = suddenlyBurnt(i, heatPerBarM3)
      return {
        p2_bar: burnt.before,
        T2_K: it.temperature(i.T1_K, burnt.before, it.clearance),
        p3_bar: burnt.after,
        T3_K: it.temperature(i.T1_K, burnt.after, it.clearance),
        p4_bar: burnt.end,
        T4_K: it.temperature(i.T1_K, burnt.end, it.full),
        work_kJ_kg: (burnt.work * air * i.T1_K) / (i.p1_bar * 100 * it.full * 1000),
        efficiency: it.efficiency,
      }
    },
  },
  'GAS-03': {
    figures: (i) => {
      const startBar = i.p1_kPa / 100
      const hot = (t2: number) => t2 + i.heatAdded_kJ_kg / i.cp_kJ_kgK
      const t2 = i.T1_K * compressionOf(i, startBar)
      const it = idealCycle({
        ...ANY,
        compressionRatio: i.compressionRatio,
        gamma: i.gamma,
        startBar,
        cutOff: (clearance) => (clearance * hot(t2)) / t2,
      })
      return {
        T2_K: it.temperature(i.T1_K, it.compressed, it.clearance),
        p2_MPa: it.compressed / 10,
        T3_K: it.temperature(i.T1_K, it.peak, it.cutOffVolume),
        T4_K: it.temperature(i.T1_K, it.end, it.full),
        efficiency: it.efficiency,
        meanEffectivePressure_kPa: it.meanPressureBar * 100,
      }
    },
  },
  'GAS-04': {
    figures: (i) => {
      const it = idealCycle({
        bore: i.bore_mm / 1000,
        stroke: i.stroke_mm / 1000,
        compressionRatio: i.compressionRatio,
        gamma: i.gamma,
        startBar: i.p1_bar,
        cutOff: (clearance, swept) => clearance + i.cutOff_shareOfStroke * swept,
      })
      return {
        T2_K: it.temperature(i.T1_K, it.compressed, it.clearance),
        p2_bar: it.compressed,
        V2_m3: it.clearance,
        T3_K: it.temperature(i.T1_K, it.peak, it.cutOffVolume),
        V3_m3: it.cutOffVolume,
        T4_K: it.temperature(i.T1_K, it.end, it.full),
        p4_bar: it.end,
        V4_m3: it.full,
        efficiency: it.efficiency,
        meanEffectivePressure_bar: it.meanPressureBar,
        power_kW: (it.work * i.cyclesPerMinute) / 60 / 1000,
      }
    },
  },
  'GAS-07': {
    figures: (i) => {
      const compressed = compressionOf(i, i.p1_bar)
      const t2 = i.T1_K * compressed
      const p2 = i.p1_bar * compressed * i.compressionRatio
      const t3 = (t2 * i.maxPressure_bar) / p2
      const t4 = t3 + (i.heatAdded_kJ_kg - i.cv_kJ_kgK * (t3 - t2)) / i.cp_kJ_kgK
      const it = idealCycle({
        ...ANY,
        compressionRatio: i.compressionRatio,
        gamma: i.gamma,
        startBar: i.p1_bar,
        peakBar: () => i.maxPressure_bar,
        cutOff: (clearance) => (clearance * t4) / t3,
      })
      // the print's heats are not quite in the ratio gamma: its efficiency is by its heats, its work by the gas law
      const lost = i.cv_kJ_kgK * (it.temperature(i.T1_K, it.end, it.full) - i.T1_K)
      return {
        T2_K: it.temperature(i.T1_K, it.compressed, it.clearance),
        p2_bar: it.compressed,
        T3_K: it.temperature(i.T1_K, it.peak, it.clearance),
        T4_K: it.temperature(i.T1_K, it.peak, it.cutOffVolume),
        T5_K: it.temperature(i.T1_K, it.end, it.full),
        p5_bar: it.end,
        efficiency: 1 - lost / i.heatAdded_kJ_kg,
        meanEffectivePressure_bar: it.meanPressureBar,
      }
    },
  },
  'GAS-08': {
    figures: (i) => {
      const it = idealCycle({
        ...ANY,
        compressionRatio: i.compressionRatio,
        gamma: i.gamma,
        startBar: 1,
        peakBar: (p2) => p2 * i.explosionRatio,
        cutOff: (clearance, swept) => clearance + i.cutOff_shareOfStroke * swept,
      })
      return { efficiency: it.efficiency }
    },
  },
  'GAS-09': {
    figures: (i) => {
      const compressionRatio = ratioOf(i)
      const it = idealCycle({
        bore: i.bore_mm / 1000,
        stroke: i.stroke_mm / 1000,
        compressionRatio,
        gamma: i.gamma,
        startBar: 1,
        cutOff: (clearance, swept) => clearance + i.cutOff_shareOfStroke * swept,
      })
      return { efficiency: it.efficiency, compressionRatio, cutOffRatio: it.cutOffVolume / it.clearance }
    },
  },
  'GAS-10': {
    figures: (i) => {
      const compressionRatio = ratioOf(i)
      const it = idealCycle({
        bore: i.bore_mm / 1000,
        stroke: i.stroke_mm / 1000,
        compressionRatio,
        gamma: i.gamma,
        startBar: i.p1_bar,
        peakBar: () => i.maxPressure_bar,
      })
      return {
        compressionRatioRounded: Math.round(compressionRatio),
        efficiency: it.efficiency,
        meanEffectivePressure_bar: it.meanPressureBar,
        compressionRatio,
        sweptVolume_m3: it.swept,
      }
    },
  },
  'GAS-11': {
    figures: (i) => {
      const { torque } = answer(
        {
          ...single({ radius: i.stroke_mm / 2000, rod: i.stroke_mm / 500, bore: i.bore_mm / 1000 }),
          cycle: 'two-stroke',
          gas: block(180, i.indicatedMeanEffectivePressure_bar),
          crankcasePressureBar: 1,
        },
        i.speed_rpm,
      )
      return { indicatedPower_kW: (torque.meanNm * radPerSecond(i.speed_rpm)) / 1000 }
    },
  },
  'GAS-13': {
    figures: (i) => {
      const of = (bore: number) =>
        answer(
          {
            ...single({ radius: bore / 2, rod: 2 * bore, bore }),
            gas: block(360, i.brakeMeanEffectivePressure_bar),
            crankcasePressureBar: 1,
          },
          i.speed_rpm,
        )
      const bore = root((x) => of(x).torque.meanNm * i.cylinders - i.brakeTorque_Nm, 0.05, 0.2)
      return { displacementOfEngine_cm3: of(bore).train.displacementCc * i.cylinders, bore_mm: bore * 1000 }
    },
  },
  'GAS-14': {
    figures: (i) => {
      const speed = (stroke: number) =>
        answer(single({ radius: stroke / 2, rod: 2 * stroke }), i.speed_rpm, 5).train.meanPistonSpeedMS
      return { stroke_mm: 1000 * root((x) => speed(x) - i.meanPistonSpeed_m_s, 0.02, 0.5) }
    },
  },
  'GAS-16': { figures: (i) => burningLaw(i) },
}

/** Temperature ratio of the compression, from the kernel's pressure with no heat. */
function compressionOf(i: Record<string, number>, startBar: number) {
  const it = idealCycle({ ...ANY, compressionRatio: i.compressionRatio, gamma: i.gamma, startBar })
  return it.temperature(1, it.compressed, it.clearance)
}

/** Compression ratio from a clearance volume and the kernel's displacement. */
function ratioOf(i: Record<string, number>) {
  const document = single({ radius: i.stroke_mm / 2000, rod: i.stroke_mm / 500, bore: i.bore_mm / 1000 })
  const swept = answer(document, 60, 5).train.displacementCc / 1e6
  return (swept + i.clearanceVolume_m3) / i.clearanceVolume_m3
}

/** The kernel's heat-release model with all its heat let go within a hundredth of a degree after top dead centre. */
function suddenlyBurnt(i: Record<string, number>, heatPerBarM3: number) {
  const stroke = ANY.stroke
  const base = single({ radius: stroke / 2, rod: 2 * stroke, bore: ANY.bore })
  const swept = answer(base, 60, 5).train.displacementCc / 1e6
  const full = (swept * i.compressionRatio) / (i.compressionRatio - 1)
  const document = {
    ...base,
    cylinderDefaults: { ...base.cylinderDefaults, compressionRatio: i.compressionRatio },
    crankcasePressureBar: i.p1_bar,
    gas: {
      model: 'heat-release' as const,
      intakePressureBar: i.p1_bar,
      exhaustPressureBar: i.p1_bar,
      gamma: i.gamma,
      heatPerCycleJ: 1000 * heatPerBarM3 * i.p1_bar * full,
      combustionStartDeg: 0,
      combustionDurationDeg: 0.01,
      wiebeA: 30,
      wiebeM: 2,
      intakeClosesDeg: -180,
      exhaustOpensDeg: 180,
      blowdownDeg: 0.01,
    },
  }
  const at = instants(document, 60)
  const bar = (angleDeg: number) => at(angleDeg).pressure[0] / 1e5
  return {
    before: bar(0),
    after: bar(0.01),
    end: bar(180),
    work: answer(document, 60, 0.25).torque.meanNm * 4 * Math.PI,
  }
}

/** The burnt share read from the kernel's pressure in a cylinder whose volume hardly changes. */
function burningLaw(i: Record<string, number>): Figures {
  const base = single({ radius: 0.01, rod: 0.04, bore: 0.02 })
  const compressionRatio = 1 + 1e-6
  const swept = answer(base, 60, 5).train.displacementCc / 1e6
  const volume = (swept * compressionRatio) / (compressionRatio - 1)
  const gamma = 1.4
  const start = i.startOfCombustion_degAfterTdc
  const at = instants(
    {
      ...base,
      cylinderDefaults: { ...base.cylinderDefaults, compressionRatio },
      gas: {
        model: 'heat-release',
        intakePressureBar: 1,
        exhaustPressureBar: 1,
        gamma,
        heatPerCycleJ: (1e6 * volume) / (gamma - 1),
        combustionStartDeg: start,
        combustionDurationDeg: i.duration_deg,
        wiebeA: i.efficiencyParameter_a,
        wiebeM: i.formFactor_m,
        intakeClosesDeg: -150,
        exhaustOpensDeg: 150,
      },
    },
    60,
  )
  const burnt = (angleDeg: number) => (at(angleDeg + 720).pressure[0] - 1e5) / 1e6
  const end = start + i.duration_deg
  const bend = (a: number) => burnt(a + 0.1) - 2 * burnt(a) + burnt(a - 0.1)
  const where = (share: number) => root((a) => burnt(a) - share, start, end)
  return {
    burnedFractionAtEnd: burnt(end),
    ca10_degAfterTdc: where(0.1),
    ca50_degAfterTdc: where(0.5),
    ca90_degAfterTdc: where(0.9),
    peakBurnRateAngle_degAfterTdc: root(bend, 0, 30),
  }
}
