import { describe, expect, it } from 'vitest'
import type { AnalysisAnswer } from '@/lib/contracts/analyses'
import { bearingLoadsSchema, type BearingLoadsAnswer } from '@/lib/contracts/bearing-loads'
import { speedSweepSchema, type SpeedSweepAnswer } from '@/lib/contracts/speed-sweeps'
import { turningMomentSchema, type TurningMomentAnswer } from '@/lib/contracts/turning-moment'
import type { Issue } from '@/scene/model/issue'
import { call } from './support/call'
import { preset } from './support/documents'
import { useServer } from './support/server'

useServer()

const post = (path: string, body: unknown) => call('POST', `/api/v1/${path}`, { body })
const issuesOf = (body: unknown) => (body as { issues: Issue[] }).issues
const speedRpm = 3000

async function analysisOf(train: unknown) {
  const { body } = await post('analyses', { train, speedRpm, stepDeg: 5 })
  return body as Required<AnalysisAnswer>
}

function near(actual: number[], wanted: number[]) {
  expect(actual).toHaveLength(wanted.length)
  const peak = Math.max(...wanted.map(Math.abs))
  actual.forEach((value, j) => expect(Math.abs(value - wanted[j])).toBeLessThanOrEqual(1e-9 * peak))
}

describe('POST /bearing-loads', () => {
  it.each(['v8x-5000', 'r7-11', 'single-125-2t'])(
    'POST /bearing-loads of %s answers a stranger in the form of the contract, and agrees with the analysis',
    async (name) => {
      const train = preset(name)
      const { status, body } = await post('bearing-loads', { train, speedRpm, stepDeg: 5 })
      expect(status).toBe(200)
      const answer: BearingLoadsAnswer = bearingLoadsSchema.parse(body)
      expect(answer).toEqual(body)
      const { loads, mains, angleDeg } = await analysisOf(train)
      expect(answer.angleDeg).toEqual(angleDeg)
      expect(answer.bearings).toHaveLength(train.throws.length + train.cylinders.length + train.mains.length)
      for (const { kind, id, areaMm2, total, leastLoaded } of answer.bearings) {
        expect(leastLoaded.journal.toDeg - leastLoaded.journal.fromDeg).toBeCloseTo(60, 6)
        if (kind === 'main') {
          near([total!.peakN, total!.meanN], [mains[id].peakN, mains[id].meanN])
          near(total!.verticalN, mains[id].vertical)
          expect(leastLoaded.block).not.toBeNull()
        }
        if (kind === 'rod') {
          near(total!.radialN, loads[id].crankPinN!.radial)
          near(total!.tangentialN, loads[id].crankPinN!.tangential)
          expect(total!.peakMPa).toBeCloseTo(total!.peakN / areaMm2!, 9)
        }
        if (kind === 'knuckle') {
          near(total!.verticalN, loads[id].knuckleN!.vertical)
          expect(total!.peakMPa).toBeNull()
        }
      }
    },
  )

  it('POST /bearing-loads adds gas and inertia to the total, and answers only what is included', async () => {
    const train = preset('i4-2000')
    const { body } = await post('bearing-loads', { train, speedRpm, stepDeg: 10 })
    for (const { gas, inertia, total } of (body as BearingLoadsAnswer).bearings)
      near(
        total!.verticalN,
        gas!.verticalN.map((force, j) => force + inertia!.verticalN[j]),
      )
    const { body: some } = await post('bearing-loads', { train, speedRpm, stepDeg: 10, include: ['gas'] })
    for (const { gas, inertia, total } of (some as BearingLoadsAnswer).bearings)
      expect([gas !== undefined, inertia, total]).toEqual([true, undefined, undefined])
  })

  it('POST /bearing-loads refuses more figures than one answer holds, with a step that would do', async () => {
    const train = preset('v12-60-6000')
    const { status, body } = await post('bearing-loads', { train, speedRpm, stepDeg: 0.05 })
    expect(status).toBe(422)
    const [{ path, fix }] = issuesOf(body)
    expect(path).toBe('stepDeg')
    const step = Number(/[\d.]+/.exec(fix)![0])
    expect((await post('bearing-loads', { train, speedRpm, stepDeg: step })).status).toBe(200)
  })
})

describe('POST /turning-moment', () => {
  it.each(['v8x-5000', 'r7-11', 'single-125-2t'])(
    'POST /turning-moment of %s answers a stranger in the form of the contract, and agrees with the analysis',
    async (name) => {
      const train = preset(name)
      const { status, body } = await post('turning-moment', {
        train,
        speedRpm,
        stepDeg: 5,
        speedFluctuation: 0.01,
      })
      expect(status).toBe(200)
      const answer: TurningMomentAnswer = turningMomentSchema.parse(body)
      expect(answer).toEqual(body)
      const { torque, orders } = await analysisOf(train)
      near(answer.engine.totalNm, torque.totalNm)
      near(
        [answer.engine.meanNm, answer.engine.energyFluctuationJ],
        [torque.meanNm, torque.energyFluctuationJ],
      )
      const sum = answer.angleDeg.map((_, j) =>
        Object.values(answer.cylinders).reduce((all, { totalNm }) => all + totalNm[j], 0),
      )
      near(sum, torque.totalNm)
      expect(answer.orders.map(({ order }) => order)).toEqual(orders.map(({ order }) => order))
      near(
        answer.orders.map(({ total }) => total.amplitudeNm),
        orders.map(({ torqueNm }) => torqueNm),
      )
      const omega = (speedRpm * 2 * Math.PI) / 60
      const { wanted, inertiaKgM2, speedFluctuation } = answer.flywheel
      expect(wanted!.inertiaKgM2 * 0.01 * omega ** 2).toBeCloseTo(answer.engine.energyFluctuationJ, 6)
      expect(speedFluctuation! * inertiaKgM2! * omega ** 2).toBeCloseTo(answer.engine.energyFluctuationJ, 6)
      expect(answer.powerKW).toBeCloseTo((torque.meanNm * omega) / 1000, 9)
    },
  )

  it('POST /turning-moment tells what two masses leave out only of rods whose inertia is entered', async () => {
    const document = preset('i4-2000')
    const couples = async (rod: object) => {
      const train = { ...document, masses: { ...document.masses, rod } }
      const { body } = await post('turning-moment', { train, speedRpm, stepDeg: 90 })
      return (body as TurningMomentAnswer).rodCouples
    }
    expect(await couples({ massKg: 0.5, cgFromBigEndMm: 40 })).toEqual({})
    const entered = await couples({ massKg: 0.5, cgFromBigEndMm: 40, inertiaKgMm2: 2000 })
    expect(Object.keys(entered)).toEqual(['1', '2', '3', '4'])
    const twoMass = 0.5 * 40 * (document.cylinderDefaults!.rodLengthMm! - 40)
    expect(entered['1'].errorKgMm2).toBeCloseTo(2000 - twoMass, 6)
    expect(entered['1'].peakNm).toBeGreaterThan(0)
  })
})

describe('POST /speed-sweeps', () => {
  it('POST /speed-sweeps goes from idle to over-speed, and agrees with the analysis at a speed', async () => {
    const train = preset('v8x-5000')
    const { status, body } = await post('speed-sweeps', { train })
    expect(status).toBe(200)
    const answer: SpeedSweepAnswer = speedSweepSchema.parse(body)
    expect(answer).toEqual(body)
    const { idleRpm, maxRpm } = train.operating!
    expect(answer.redlineRpm).toBeCloseTo(maxRpm!, 9)
    expect(answer.points).toHaveLength(50)
    expect(answer.points[0].speedRpm).toBeCloseTo(idleRpm!, 9)
    expect(answer.points[49].speedRpm).toBeCloseTo(1.15 * maxRpm!, 9)
    expect(answer.bounds).toEqual({ from: 'idle', to: 'max' })

    const one = await post('speed-sweeps', { train, fromRpm: 1000, toRpm: speedRpm, count: 2 })
    const point = (one.body as SpeedSweepAnswer).points[1]
    const { orders, mains, torque } = await analysisOf(train)
    const second = orders.find(({ order }) => order === 2)!
    expect(point.force2N - (second.forwardN + second.backwardN)).toBeCloseTo(0, 4)
    near([point.mainN], [Math.max(...Object.values(mains).map(({ peakN }) => peakN))])
    near([point.meanTorqueNm], [torque.meanNm])
  })

  it('POST /speed-sweeps without operating speeds says what its ends were taken from', async () => {
    const { operating: _, ...train } = preset('i4-2000')
    const { body } = await post('speed-sweeps', { train, count: 5 })
    const { bounds, redlineRpm, points } = body as SpeedSweepAnswer
    expect(bounds).toEqual({ from: 'tenth', to: 'piston-speed' })
    expect(redlineRpm).toBeNull()
    expect(points[4].meanPistonSpeedMS).toBeCloseTo(1.15 * 20, 9)
  })

  it('POST /speed-sweeps refuses a sweep that ends where it begins or before', async () => {
    const train = preset('i4-2000')
    const asked = async (more: object) => {
      const { status, body } = await post('speed-sweeps', { train, ...more })
      return [status, issuesOf(body)[0].path]
    }
    expect(await asked({ fromRpm: 5000, toRpm: 5000 })).toEqual([422, 'toRpm'])
    expect(await asked({ fromRpm: 90_000 })).toEqual([422, 'fromRpm'])
    expect(await asked({ count: 1 })).toEqual([422, 'count'])
  })
})

describe.each(['bearing-loads', 'turning-moment', 'speed-sweeps'])('POST /%s', (path) => {
  it('refuses a train that cannot turn with the path from the root of the request', async () => {
    const train = preset('i4-2000')
    train.cylinders[1] = { ...train.cylinders[1], rodLengthMm: 10 }
    const { status, body } = await post(path, { train, speedRpm })
    expect(status).toBe(422)
    expect(issuesOf(body).map((issue) => issue.path)).toContain('train.cylinders.1.rodLengthMm')
  })

  it('is in the description of the interface', async () => {
    const { body } = await call('GET', '/api/v1/openapi.json')
    expect(Object.keys((body as { paths: object }).paths)).toContain(`/api/v1/${path}`)
  })
})
