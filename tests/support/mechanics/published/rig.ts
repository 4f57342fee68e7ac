import type { CrankTrainInput } from '@/scene/model/crank-train'
import { slope } from '../fourier'
import { answer, instants, RAD_S } from '../kernel'

/** The units of the sources. */
export const INCH = 0.0254
export const FOOT = 0.3048
export const POUND = 0.45359237
/** Standard weight of one pound, and the printed 32.2 ft/s² of the older books. */
export const POUND_FORCE = 4.4482216152605
export const PSI = POUND_FORCE / INCH ** 2
export const DEG = Math.PI / 180

/** So light that no figure of a source shows it. */
export const WEIGHTLESS = 1e-12

export interface Single {
  /** m */
  radius: number
  rod: number
  offset?: number
  bore?: number
  /** kg */
  mass?: number
  rodMass?: number
  rodCg?: number
  rodInertia?: number
  bearing?: number
  /** Pa above the crankcase, the same all cycle */
  pressure?: number
  balanceFactor?: number
}

/** One upright cylinder with everything but what a source names left weightless. */
export function single(it: Single): CrankTrainInput {
  const crankcase = 1 + Math.max(0, -(it.pressure ?? 0) / 1e5)
  const angleDeg = Array.from({ length: 24 }, (_, i) => 30 * i - 360)
  return {
    format: 'crank-train/1',
    cycle: 'four-stroke',
    cylinderDefaults: {
      boreMm: (it.bore ?? 0.1) * 1000,
      strokeMm: it.radius * 2000,
      rodLengthMm: it.rod * 1000,
      offsetMm: (it.offset ?? 0) * 1000,
      compressionRatio: 10,
    },
    masses: {
      pistonKg: it.mass || WEIGHTLESS,
      rod: {
        massKg: it.rodMass ?? WEIGHTLESS,
        cgFromBigEndMm: (it.rodCg ?? it.rod / 3) * 1000,
        ...(it.rodInertia === undefined ? {} : { inertiaKgMm2: it.rodInertia * 1e6 }),
      },
      bigEndBearingKg: it.bearing ?? 0,
    },
    balanceFactor: it.balanceFactor ?? 0,
    banks: [{ id: 'A', angleDeg: 0 }],
    throws: [{ id: '1', angleDeg: 0, axialMm: 0 }],
    cylinders: [{ id: '1', bank: 'A', throw: '1', axialMm: 0 }],
    firingOrder: ['1'],
    crankcasePressureBar: crankcase,
    gas: it.pressure
      ? { model: 'trace', angleDeg, pressureBar: angleDeg.map(() => crankcase + it.pressure! / 1e5) }
      : { model: 'none' },
  }
}

/** What the kernel says of a single upright cylinder at one crank angle, by the names of textbooks; SI. */
export function textbook(it: Single, speed: number, angleDeg: number) {
  const i = instants(single(it), speed / RAD_S)(angleDeg)
  const [cos, sin] = [Math.cos(angleDeg * DEG), Math.sin(angleDeg * DEG)]
  const [vertical, horizontal] = [i.crankPinVertical[0], i.crankPinHorizontal[0]]
  return {
    instant: i,
    height: i.pinHeight[0],
    travel: i.travel[0],
    /** Towards the crank. */
    velocity: -i.velocity[0],
    acceleration: -i.acceleration[0],
    rodAngle: i.rodAngle[0],
    netPistonForce: -i.pistonPinU[0],
    rodForce: Math.hypot(i.pistonPinU[0], i.pistonPinV[0]),
    sideThrust: -i.sideThrust[0],
    crankTangential: horizontal * cos - vertical * sin,
    /** Towards the crank axis. */
    crankRadial: -(vertical * cos + horizontal * sin),
    torque: i.gasTorque + i.inertiaTorque,
    inertiaTorque: i.inertiaTorque,
  }
}

/**
 * The textbook's two-term piston motion with the kernel's figures in it: its first harmonic, and for the ratio of
 * crank to rod the sine of its greatest rod angle.
 */
export function twoTerm(it: Single, speed: number, angleDeg: number) {
  const first = answer(
    single({ ...it, pressure: undefined, mass: 1, rodMass: WEIGHTLESS, rodInertia: undefined }),
    speed / RAD_S,
  ).orders.find((o) => o.order === 1)!.vertical.amplitudeN
  const ratio = Math.sin(textbook(it, speed, 90).rodAngle)
  const a = angleDeg * DEG
  return {
    acceleration: first * (Math.cos(a) + ratio * Math.cos(2 * a)),
    velocity: (first / speed) * (Math.sin(a) + (ratio / 2) * Math.sin(2 * a)),
  }
}

/** Slopes by crank angle, once and twice, of the kernel's rod angle, of its sine, and of points of the rod. */
export function rodSwing(it: Single, atDeg: number) {
  const { pinHeightMm, rodAngleDeg } = answer(single(it), 60, 1, ['kinematics']).kinematics['1']
  const turn = (values: number[]) => values.slice(0, 360)
  const heights = turn(pinHeightMm).map((mm) => mm / 1000)
  const angles = turn(rodAngleDeg).map((deg) => deg * DEG)
  const twice = (values: number[]) => {
    const once = slope(values, 1)
    return { at: values[atDeg], d1: once[atDeg], d2: slope(once, 1)[atDeg] }
  }
  /** A point of the rod at a share of its length from the crank pin. */
  const point = (share: number) => {
    const back = it.rod * (1 - share)
    const up = twice(heights.map((s, i) => s - back * Math.cos(angles[i])))
    const across = twice(angles.map((a) => (it.offset ?? 0) + back * Math.sin(a)))
    return { up, across, speed: Math.hypot(up.d1, across.d1), acceleration: Math.hypot(up.d2, across.d2) }
  }
  return { angle: twice(angles), sine: twice(angles.map(Math.sin)), point }
}

/** Where a function that changes sign between two places is zero: regula falsi with the Illinois step. */
export function root(f: (x: number) => number, low: number, high: number) {
  let [a, b, fa, fb] = [low, high, f(low), f(high)]
  if (fa === 0) return a
  if (fa * fb > 0) throw new Error(`no change of sign between ${low} and ${high}`)
  for (let i = 0; i < 200; i++) {
    const c = b - (fb * (b - a)) / (fb - fa)
    const fc = f(c)
    if (fc === 0 || Math.abs(c - b) < 1e-14 * Math.abs(high - low)) return c
    if (fc * fb < 0) [a, fa] = [b, fb]
    else fa /= 2
    ;[b, fb] = [c, fc]
  }
  return b
}

export const radPerSecond = (rpm: number) => rpm * RAD_S
