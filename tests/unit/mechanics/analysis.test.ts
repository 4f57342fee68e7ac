import { describe, expect, it } from 'vitest'
import { analyse, analysisParts, type Analysis } from '@/lib/mechanics/analysis'
import { energyFluctuation } from '@/lib/mechanics/analysis/torque'
import { presets } from '@/scene/model/presets'
import { inline, presetDocument, presetTrain, RPM, trainOf } from './trains'

const numbersIn = (value: unknown): number[] =>
  typeof value === 'number'
    ? [value]
    : typeof value === 'object' && value !== null
      ? Object.values(value).flatMap(numbersIn)
      : []

const peak = (signal: ArrayLike<number>) => Math.max(...Array.from(signal, Math.abs))

describe('analyse(train, { speed, stepDeg, include })', () => {
  it.each(presets.map(({ id }) => id))('%s: every figure of every part is finite, at any speed', (id) => {
    const train = presetTrain(id)
    for (const speed of [0, train.operating.rated!, 1.2 * train.operating.max!]) {
      const numbers = numbersIn(analyse(train, { speed, stepDeg: 10 }))
      expect(numbers.length).toBeGreaterThan(500)
      expect(numbers.every(Number.isFinite)).toBe(true)
    }
  })

  it('has exactly the keys of the contract', () => {
    const answer = analyse(presetTrain('r7-11'), { speed: 200, stepDeg: 90 })
    expect(Object.keys(answer).toSorted()).toEqual(['train', 'angleDeg', ...analysisParts].toSorted())
    expect(Object.keys(answer.train)).toEqual([
      'title',
      'cylinderCount',
      'displacementCc',
      'meanPistonSpeedMS',
    ])
    expect(answer.angleDeg).toEqual([0, 90, 180, 270, 360, 450, 540, 630])
    expect(Object.keys(answer.kinematics!['1']).toSorted()).toEqual([
      'accelerationMS2',
      'bdcDeg',
      'pinHeightMm',
      'rodAngleDeg',
      'strokeMm',
      'tdcDeg',
      'travelMm',
      'velocityMS',
    ])
    expect(Object.keys(answer.gas!['1'])).toEqual(['pressureBar'])
    const common = ['gasForceN', 'pistonPinN', 'sideThrustN']
    expect(Object.keys(answer.loads!['1']).toSorted()).toEqual([...common, 'crankPinN'].toSorted())
    expect(Object.keys(answer.loads!['2']).toSorted()).toEqual([...common, 'knuckleN'].toSorted())
    expect(Object.keys(answer.loads!['1'].crankPinN!)).toEqual([
      'radial',
      'tangential',
      'vertical',
      'horizontal',
    ])
    expect(Object.keys(answer.mains!['M1'])).toEqual(['vertical', 'horizontal', 'peakN', 'meanN'])
    expect(Object.keys(answer.torque!)).toEqual([
      ...['gasNm', 'inertiaNm', 'totalNm', 'meanNm', 'peakNm', 'energyFluctuationJ'],
    ])
    expect(Object.keys(answer.shaking!)).toEqual([
      ...['verticalN', 'horizontalN', 'coupleVerticalNm', 'coupleHorizontalNm'],
    ])
    expect(Object.keys(answer.orders![0])).toEqual([
      ...['order', 'vertical', 'horizontal', 'forwardN', 'backwardN'],
      ...['coupleVertical', 'coupleHorizontal', 'forwardNm', 'backwardNm', 'torqueNm'],
    ])
    expect(Object.keys(answer.firing!).toSorted()).toEqual([
      'alternatesBanks',
      'banks',
      'collectors',
      'even',
      'events',
      'intervalsDeg',
    ])
    expect(Object.keys(answer.balance!)).toEqual(['cylinders', 'bobWeights', 'residual', 'grade'])
  })

  it('include: only what is asked for is there, besides train and angles', () => {
    const train = presetTrain('i3-1000')
    for (const part of analysisParts) {
      const answer = analyse(train, { speed: 300, stepDeg: 30, include: [part] })
      expect(Object.keys(answer).toSorted()).toEqual(['angleDeg', 'train', part].toSorted())
    }
    expect(Object.keys(analyse(train, { speed: 300, include: [] }))).toEqual(['train', 'angleDeg'])
  })

  it('a part alone is the same as among all', () => {
    const train = presetTrain('v6-90s-3200')
    const all = analyse(train, { speed: 600, stepDeg: 5 })
    for (const part of analysisParts)
      expect(analyse(train, { speed: 600, stepDeg: 5, include: [part] })[part]).toEqual(all[part])
  })

  it('stepDeg: a coarse answer is a selection of the fine one, and its peaks, means and orders are the same', () => {
    const train = presetTrain('v2-45-1600')
    const fine = analyse(train, { speed: 500, stepDeg: 1 })
    const coarse = analyse(train, { speed: 500, stepDeg: 15 })
    coarse.angleDeg.forEach((angle, k) => {
      expect(coarse.torque!.totalNm[k]).toBeCloseTo(fine.torque!.totalNm[angle], 9)
      expect(coarse.kinematics!['2'].pinHeightMm[k]).toBeCloseTo(fine.kinematics!['2'].pinHeightMm[angle], 11)
    })
    expect(coarse.torque!.peakNm).toBe(fine.torque!.peakNm)
    expect(coarse.torque!.energyFluctuationJ).toBe(fine.torque!.energyFluctuationJ)
    expect(coarse.mains!.M1.peakN).toBe(fine.mains!.M1.peakN)
    expect(coarse.orders).toEqual(fine.orders)
  })

  it('stepDeg: refuses a step that does not divide 360', () => {
    const train = presetTrain('single-450')
    for (const stepDeg of [7, 0, -1, NaN, 0.001, 1000])
      expect(() => analyse(train, { speed: 300, stepDeg })).toThrow(RangeError)
    expect(analyse(train, { speed: 300, stepDeg: 0.1, include: ['gas'] }).angleDeg[3]).toBe(0.3)
  })

  it('mains: fewer than two give an empty object', () => {
    const train = trainOf(inline([0], { mains: [{ id: 'M', axialMm: 0 }] }))
    expect(analyse(train, { speed: 300 }).mains).toEqual({})
    expect(analyse(trainOf(inline([0], { mains: [] })), { speed: 300 }).mains).toEqual({})
  })

  it('an id may be any text, “__proto__” too', () => {
    const document = inline([0, 180])
    document.cylinders[1].id = '__proto__'
    document.firingOrder = ['1', '__proto__']
    const answer = analyse(trainOf(document), { speed: 300, stepDeg: 90, include: ['gas'] })
    expect(Object.keys(answer.gas!)).toEqual(['1', '__proto__'])
    expect(JSON.parse(JSON.stringify(answer)).gas['__proto__'].pressureBar).toHaveLength(8)
  })
})

describe('torque', () => {
  it('meanNm times the cycle is the work of the gas: net mean effective pressure × swept volume', () => {
    for (const id of ['i4-2000', 'single-125-2t', 'r7-11']) {
      const train = presetTrain(id)
      const { torque, gas, kinematics } = analyse(train, { speed: train.operating.rated!, stepDeg: 0.25 })
      let work = 0
      for (const [index, cylinder] of train.cylinders.entries()) {
        const area = (Math.PI / 4) * train.cylinders[index].bore ** 2
        const { pressureBar } = gas![cylinder.id]
        const { travelMm } = kinematics![cylinder.id]
        pressureBar.forEach((p, k) => {
          const next = (k + 1) % pressureBar.length
          work += ((p + pressureBar[next]) / 2) * 1e5 * area * ((travelMm[next] - travelMm[k]) / 1000)
        })
      }
      expect(torque!.meanNm / (work / train.cycle)).toBeCloseTo(1, 4)
    }
  })

  it('inertia alone does no work over a cycle', () => {
    const document = { ...presetDocument('v2-45-1600'), gas: { model: 'none' as const } }
    const { torque } = analyse(trainOf(document), { speed: 600 })
    expect(Math.abs(torque!.meanNm)).toBeLessThan(1e-10 * torque!.peakNm)
  })

  it('energyFluctuation(torque, cycle): a sine about its mean gives twice its amplitude over its order', () => {
    // T = 100 + 30 cos 3θ: the range of (30/3) sin 3θ
    const torque = Array.from({ length: 7200 }, (_, k) => 100 + 30 * Math.cos((3 * 2 * Math.PI * k) / 7200))
    expect(energyFluctuation(torque, 2 * Math.PI)).toBeCloseTo(20, 4)
    expect(energyFluctuation([5, 5, 5], 2 * Math.PI)).toBe(0)
  })

  it('energyFluctuation finds extremes between samples', () => {
    // a triangle wave of ±1: energy swings by ½ × half a period × 1, wherever the samples stand
    const triangle = (x: number) => 1 - 4 * Math.abs((((x % 1) + 1) % 1) - 0.5)
    const at = (shift: number) => Array.from({ length: 40 }, (_, k) => triangle(k / 40 + shift))
    expect(energyFluctuation(at(0), 1)).toBeCloseTo(0.25, 12)
    expect(energyFluctuation(at(0.0125), 1)).toBeCloseTo(0.25, 2)
  })
})

describe('orders', () => {
  const force = (answer: Analysis, order: number) => answer.orders!.find((one) => one.order === order)!

  it('run ½, 1 … 12 for a four-stroke and 1, 2 … 12 for a two-stroke', () => {
    const of = (id: string) =>
      analyse(presetTrain(id), { speed: 100, include: ['orders'] }).orders!.map((o) => o.order)
    expect(of('single-450')).toEqual(Array.from({ length: 24 }, (_, k) => (k + 1) / 2))
    expect(of('m6-2t-520')).toEqual(Array.from({ length: 12 }, (_, k) => k + 1))
  })

  it('sum up to the shaking force', () => {
    const { orders, shaking, angleDeg } = analyse(presetTrain('v2-45-1600'), { speed: 500 })
    const largest = peak(shaking!.verticalN)
    angleDeg.forEach((angle, k) => {
      const sum = orders!.reduce(
        (total, { order, vertical }) =>
          total + vertical.amplitudeN * Math.cos(((order * angle - vertical.phaseDeg) * Math.PI) / 180),
        0,
      )
      expect(Math.abs(sum - shaking!.verticalN[k]) / largest).toBeLessThan(1e-6)
    })
  })

  it('split a single’s first order into equal forward and backward halves, and a 90° pair’s into forward alone', () => {
    const bare = (id: string) =>
      trainOf({
        ...presetDocument(id),
        counterweights: [],
        throws: presetDocument(id).throws.map((pin) => ({ ...pin, unbalanceKgMm: 0 })),
      })
    const single = force(analyse({ ...bare('single-125-2t') }, { speed: 500 }), 1)
    const rotating = single.forwardN - single.backwardN
    expect(rotating).toBeGreaterThan(0)
    const vertical = single.vertical.amplitudeN
    expect(single.forwardN + single.backwardN).toBeCloseTo(vertical, 6)
    const pair = force(analyse(bare('v2-90-1000'), { speed: 500 }), 1)
    expect(pair.backwardN / pair.forwardN).toBeLessThan(1e-12)
  })
})

describe('summary', () => {
  it('displacement is bore area times true travel; mean piston speed twice the travel a turn', () => {
    const { train } = analyse(presetTrain('v8x-5000'), { speed: 6500 * RPM, include: [] })
    expect(train.displacementCc).toBeCloseTo(((Math.PI / 4) * 95 ** 2 * 88.2 * 8) / 1000, 8)
    expect(train.meanPistonSpeedMS).toBeCloseTo((2 * 0.0882 * 6500) / 60, 12)
    expect(train.cylinderCount).toBe(8)
  })
})
