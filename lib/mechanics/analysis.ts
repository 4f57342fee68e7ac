import { balanceAnswer, type Balance } from './analysis/balance'
import { cautions, type Caution } from './analysis/cautions'
import { firingAnswer, type FiringAnswer } from './analysis/firing'
import { gasRecorder, type CylinderGas } from './analysis/gas'
import { kinematicsRecorder, type CylinderKinematics } from './analysis/kinematics'
import { loadsRecorder, type CylinderLoads } from './analysis/loads'
import { mainsRecorder, type MainLoads } from './analysis/mains'
import { ordersRecorder, type Order } from './analysis/orders'
import { DEGREES, type Recorder } from './analysis/recorder'
import { shakingRecorder, type Shaking } from './analysis/shaking'
import { trainSummary, type TrainSummary } from './analysis/summary'
import { torqueRecorder, type Torque } from './analysis/torque'
import { buildInstant, buildPlan, fillInstant } from './plan'
import type { Train } from './train'

export const analysisParts = [
  'kinematics',
  'gas',
  'loads',
  'mains',
  'torque',
  'shaking',
  'orders',
  'firing',
  'balance',
  'cautions',
] as const
export type AnalysisPart = (typeof analysisParts)[number]

/** The answer of an analysis: each part is there when it was asked for. Signals run along `angleDeg`. */
export interface Analysis {
  train: TrainSummary
  /** One whole cycle, the end left out. */
  angleDeg: number[]
  kinematics?: Record<string, CylinderKinematics>
  gas?: Record<string, CylinderGas>
  loads?: Record<string, CylinderLoads>
  mains?: Record<string, MainLoads>
  torque?: Torque
  shaking?: Shaking
  orders?: Order[]
  firing?: FiringAnswer
  balance?: Balance
  cautions?: Caution[]
}

export interface AnalysisOptions {
  /** rad/s, 0 or more. */
  speed: number
  /** Divides 360; default 1. */
  stepDeg?: number
  /** Default all. */
  include?: readonly AnalysisPart[]
  /** Balance quality grade of ISO 21940-11, mm/s; default G 16. */
  gradeMmS?: number
}

/** The finest step, degrees. */
export const LEAST_STEP_DEG = 0.05

/**
 * What a crank train does over one cycle, in the units of the contract: a loop over `fillInstant`.
 *
 * Means, peaks, energy fluctuation and orders are taken from samples at most 1° apart, which contain the angles of the
 * answer: at a step of 1° or finer they are those of the very signals given, and a coarser step does not blur them.
 * Throws RangeError for a step that does not divide 360 or is finer than `LEAST_STEP_DEG`, and for what `buildPlan` refuses.
 */
export function analyse(train: Train, options: AnalysisOptions): Analysis {
  const { speed, stepDeg = 1, include = analysisParts, gradeMmS = 16 } = options
  const perTurn = stepsPerTurn(stepDeg)
  const plan = buildPlan(train, speed)
  const asked = new Set(include)

  const turns = Math.round(train.cycle / (2 * Math.PI))
  const between =
    asked.has('mains') || asked.has('torque') || asked.has('orders') ? Math.ceil(360 / perTurn - 1e-9) : 1
  const samples = { shown: perTurn * turns, all: perTurn * turns * between }

  const answers: Partial<Analysis> = {}
  const recorders: Recorder<unknown>[] = []
  const record = <K extends AnalysisPart>(part: K, build: () => Recorder<NonNullable<Analysis[K]>>) => {
    if (!asked.has(part)) return
    const recorder = build()
    recorders.push({ record: recorder.record, answer: () => (answers[part] = recorder.answer()) })
  }
  record('kinematics', () => kinematicsRecorder(plan, samples))
  record('gas', () => gasRecorder(plan, samples))
  record('loads', () => loadsRecorder(plan, samples))
  record('mains', () => mainsRecorder(plan, samples))
  record('torque', () => torqueRecorder(plan, samples))
  record('shaking', () => shakingRecorder(samples))
  record('orders', () => ordersRecorder(plan, samples))

  if (recorders.length > 0) {
    const instant = buildInstant(plan)
    for (let sample = 0; sample < samples.all; sample++) {
      fillInstant(instant, plan, (360 * sample) / (perTurn * between) / DEGREES)
      const shown = sample % between === 0 ? sample / between : -1
      for (const recorder of recorders) recorder.record(instant, sample, shown)
    }
    for (const recorder of recorders) recorder.answer()
  }
  if (asked.has('firing')) answers.firing = firingAnswer(plan)
  if (asked.has('balance')) answers.balance = balanceAnswer(plan, gradeMmS)
  if (asked.has('cautions')) answers.cautions = cautions(plan)

  return {
    train: trainSummary(plan),
    angleDeg: Array.from({ length: samples.shown }, (_, index) => (index * 360) / perTurn),
    ...answers,
  }
}

/** Steps of `stepDeg` in a turn; RangeError where it does not divide 360 or is finer than `LEAST_STEP_DEG`. */
export function stepsPerTurn(stepDeg: number): number {
  const steps = Math.round(360 / stepDeg)
  const divides = steps >= 1 && Math.abs(steps * stepDeg - 360) < 1e-6
  if (!divides || stepDeg < LEAST_STEP_DEG)
    throw new RangeError(`The step must divide 360° and be ${LEAST_STEP_DEG}° or more, not ${stepDeg}°.`)
  return steps
}
