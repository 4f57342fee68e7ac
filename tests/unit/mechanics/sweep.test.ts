import { describe, expect, it } from 'vitest'
import { analyse, type Analysis } from '@/lib/mechanics/analysis'
import { massSplit } from '@/lib/mechanics/balance'
import { cycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { buildSweep, sweepPoint, type SweepPoint } from '@/lib/mechanics/loads/speed-sweep'
import { OVER_SPEED, sweepBounds, sweepSpeeds } from '@/lib/mechanics/loads/sweep-bounds'
import type { Train } from '@/lib/mechanics/train'
import { trainOf } from '@/tests/support/mechanics/kernel'
import { preset } from '@/tests/support/mechanics/presets'
import { randomTrain } from '@/tests/support/mechanics/random-train'
import { DEG, RPM } from './trains'

/** The same figures from a whole analysis at that one speed. */
function byAnalysis(train: Train, speed: number): SweepPoint {
  const {
    kinematics,
    loads,
    mains,
    torque,
    orders,
    train: summary,
  } = analyse(train, { speed }) as Required<Analysis>
  const major = (order: number) => orders.find((one) => one.order === order)!
  const pulls = train.cylinders.flatMap((cylinder) =>
    kinematics[cylinder.id].accelerationMS2.map(
      (acceleration, j) =>
        -(loads[cylinder.id].gasForceN[j] + massSplit(cylinder).reciprocating * acceleration) /
        Math.cos(kinematics[cylinder.id].rodAngleDeg[j] * DEG),
    ),
  )
  const pins = train.throws.flatMap((_, index) => {
    const on = train.cylinders
      .filter((one) => one.throw === index && !one.link)
      .map(({ id }) => loads[id].crankPinN!)
    return on[0].vertical.map((__, j) =>
      Math.hypot(
        on.reduce((sum, one) => sum + one.vertical[j], 0),
        on.reduce((sum, one) => sum + one.horizontal[j], 0),
      ),
    )
  })
  return {
    speed,
    force1: major(1).forwardN + major(1).backwardN,
    force2: major(2).forwardN + major(2).backwardN,
    couple1: major(1).forwardNm + major(1).backwardNm,
    couple2: major(2).forwardNm + major(2).backwardNm,
    acceleration: greatest(Object.values(kinematics).flatMap((one) => one.accelerationMS2.map(Math.abs))),
    rodTension: greatest([0, ...pulls]),
    rodCompression: greatest([0, ...pulls.map((pull) => -pull)]),
    pin: greatest(pins),
    main: greatest([0, ...Object.values(mains).map(({ peakN }) => peakN)]),
    meanPistonSpeed: summary.meanPistonSpeedMS,
    meanTorque: torque.meanNm,
    power: torque.meanNm * speed,
  }
}

const greatest = (values: number[]) => values.reduce((peak, value) => Math.max(peak, value), -Infinity)
const sweepOf = (train: Train) => buildSweep(cycleParts(train))

describe('sweepPoint(sweep, speed)', () => {
  it.each([
    ['single-450', trainOf(preset('single-450'))],
    ['v8x-5000', trainOf(preset('v8x-5000'))],
    ['m6-2t-520', trainOf(preset('m6-2t-520'))],
    ['r7-11', trainOf(preset('r7-11'))],
    ['train 41', trainOf(randomTrain(41))],
    ['train 42', trainOf(randomTrain(42))],
  ])('of %s is a whole analysis at each speed, 1e-9', (_, train) => {
    const sweep = sweepOf(train)
    const { from, to } = sweepBounds(train, sweep.longestTravel)
    for (const speed of [from, (from + to) / 2, to]) {
      const [point, wanted] = [sweepPoint(sweep, speed), byAnalysis(train, speed)]
      // what cancels is measured against what it is left over from
      const arm = 1 // m
      const whole = {
        force: wanted.pin,
        couple: wanted.pin * arm,
        meanTorque: wanted.pin * arm,
        power: wanted.pin * arm * speed,
      }
      for (const key of Object.keys(wanted) as (keyof SweepPoint)[]) {
        const [, floor] = Object.entries(whole).find(([start]) => key.startsWith(start)) ?? ['', 0]
        const off = Math.abs(point[key] - wanted[key])
        expect(off, `${key} at ${speed}`).toBeLessThanOrEqual(1e-9 * Math.max(floor, Math.abs(wanted[key])))
      }
    }
  })

  it('follows the square of the speed where only inertia acts', () => {
    const sweep = sweepOf(trainOf({ ...preset('v8x-5000'), gas: { model: 'none' } }))
    const [slow, fast] = [sweepPoint(sweep, 200), sweepPoint(sweep, 600)]
    const squares = [
      'force1',
      'force2',
      'couple1',
      'couple2',
      'acceleration',
      'rodTension',
      'pin',
      'main',
    ] as const
    const scale = fast.pin
    for (const key of squares)
      expect(Math.abs(fast[key] - 9 * slow[key])).toBeLessThanOrEqual(1e-12 * Math.max(scale, fast[key]))
    expect(fast.pin).toBeGreaterThan(1000)
    expect(fast.meanPistonSpeed / slow.meanPistonSpeed).toBeCloseTo(3, 12)
  })

  it('keeps shaking and acceleration on the square, also with gas', () => {
    const sweep = sweepOf(trainOf(preset('i4-2000')))
    const [slow, fast] = [sweepPoint(sweep, 150), sweepPoint(sweep, 600)]
    expect(fast.force2 / slow.force2).toBeCloseTo(16, 9)
    expect(fast.acceleration / slow.acceleration).toBeCloseTo(16, 9)
    // pins are governed by gas at one end and inertia at the other, so they do not follow it
    expect(fast.pin / slow.pin).toBeLessThan(10)
  })

  it('at standstill has gas alone', () => {
    const point = sweepPoint(sweepOf(trainOf(preset('i4-2000'))), 0)
    expect(point).toMatchObject({ force1: 0, force2: 0, acceleration: 0, meanPistonSpeed: 0, power: 0 })
    expect(point.rodCompression).toBeGreaterThan(10_000)
    expect(point.rodTension).toBeLessThan(point.rodCompression / 50)
  })
})

describe('sweepBounds(train, travel)', () => {
  const train = trainOf(preset('i4-2000'))
  const bounds = (operating: Train['operating']) => sweepBounds({ ...train, operating }, 0.08)

  it('goes from idle to over-speed, with the maximum as red line', () => {
    expect(bounds({ idle: 80, rated: 600, max: 700 })).toEqual({
      from: 80,
      to: 700 * OVER_SPEED,
      redline: 700,
      fromIs: 'idle',
      toIs: 'max',
    })
  })

  it('without a maximum takes the rated speed, without that 20 m/s of mean piston speed; a tenth without idle', () => {
    expect(bounds({ rated: 600 })).toMatchObject({
      from: 69,
      fromIs: 'tenth',
      toIs: 'rated',
      redline: undefined,
    })
    const free = bounds({})
    expect((free.to * 0.08) / Math.PI / OVER_SPEED).toBeCloseTo(20, 9)
    expect(free.from).toBeCloseTo(free.to / 10, 9)
    expect(free.toIs).toBe('piston-speed')
  })
})

describe('sweepSpeeds(from, to, count)', () => {
  it('are even, both ends in', () => {
    expect(sweepSpeeds(10, 50, 5)).toEqual([10, 20, 30, 40, 50])
    expect(sweepSpeeds(700 * RPM, 8000 * RPM, 50)).toHaveLength(50)
  })
})
