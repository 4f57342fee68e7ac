import { describe, expect, it } from 'vitest'
import { bestCollectorGroups } from '@/lib/mechanics/collector-groups'
import { exhaustPulses, usualWindow } from '@/lib/mechanics/exhaust-pulses'
import { firingAngles, firingEvents, firingIntervals } from '@/lib/mechanics/firing'
import { intervalSpread } from '@/lib/mechanics/interval-spread'
import type { Train } from '@/lib/mechanics/train'
import { DEG, inline, presetTrain, trainOf } from './trains'

const pinsOf = (count: number) => Array.from({ length: count }, (_, k) => (k * k * 17 + k * 41) % 360)
/** Cylinders in line firing in the order in which their pins come up, within the first turn, and every other one a turn later. */
const uneven = (count: number): Train => {
  const pins = pinsOf(count)
  const fires = pins.map((pin, k) => ((360 - pin) % 360) + 360 * (k % 2))
  const order = pins.map((_, k) => k).sort((a, b) => fires[a] - fires[b])
  return trainOf(inline(pins, { firingOrder: order.map((k) => `${k + 1}`) }))
}

/** Every split of n things into k groups whose sizes differ by one at most, the plain way. */
function splits(things: number[], k: number): number[][][] {
  const most = Math.ceil(things.length / k)
  const least = Math.floor(things.length / k)
  const grow = (rest: number[], groups: number[][]): number[][][] => {
    if (rest.length === 0)
      return groups.length === k && groups.every((group) => group.length >= least) ? [groups] : []
    const [next, ...others] = rest
    const placed = groups.flatMap((group, at) =>
      group.length < most ? grow(others, groups.with(at, [...group, next])) : [],
    )
    return groups.length < k ? [...placed, ...grow(others, [...groups, [next]])] : placed
  }
  return grow(things, [])
}

describe('bestCollectorGroups(train, count)', () => {
  it.each([
    ['i5-2500', 2],
    ['r7-11', 3],
    ['i4x-1000', 2],
    ['v8x-5000', 3],
  ])('%s into %i has as small a worst spread as any split has', (id, count) => {
    const train = presetTrain(id)
    const angles = firingAngles(train)
    const spreadOf = (group: number[]) =>
      intervalSpread(
        firingIntervals(
          group.map((cylinder) => angles[cylinder]).sort((a, b) => a - b),
          train.cycle,
        ).intervals,
      ).spread
    const all = splits(
      train.cylinders.map((_, index) => index),
      count,
    ).map((groups) => groups.map(spreadOf))
    const best = Math.min(...all.map((spreads) => Math.max(...spreads)))
    const total = Math.min(
      ...all
        .filter((spreads) => Math.max(...spreads) < best + 1e-6)
        .map((spreads) => spreads.reduce((a, b) => a + b, 0)),
    )
    const { groupings, complete } = bestCollectorGroups(train, count)
    expect(complete).toBe(true)
    expect(groupings[0].worstSpread).toBeCloseTo(best, 6)
    expect(groupings[0].totalSpread).toBeCloseTo(total, 6)
  })

  it.each([2, 3, 4])(
    'deals every one of 16 uneven cylinders once into %i groups within 2 s of work',
    (count) => {
      const train = uneven(16)
      const start = process.cpuUsage()
      const { groupings, complete } = bestCollectorGroups(train, count)
      expect(process.cpuUsage(start).user / 1000).toBeLessThan(2000)
      expect(complete).toBe(true)
      for (const { groups, worstSpread } of groupings) {
        expect(groups.flatMap(({ cylinders }) => cylinders).toSorted((a, b) => a - b)).toEqual(
          train.cylinders.map((_, index) => index),
        )
        const sizes = groups.map(({ cylinders }) => cylinders.length)
        expect(Math.max(...sizes) - Math.min(...sizes)).toBeLessThanOrEqual(1)
        expect(worstSpread).toBeGreaterThanOrEqual(groupings[0].worstSpread - 1e-9)
      }
    },
  )

  it('counts the banks that share a collector', () => {
    const [cross] = bestCollectorGroups(presetTrain('v8x-5000'), 2).groupings
    expect(cross.crossings).toBe(2)
    expect(bestCollectorGroups(presetTrain('v8f-4200'), 2).groupings[0].crossings).toBe(0)
  })

  it('refuses more collectors than cylinders, and none', () => {
    const train = presetTrain('i4-2000')
    for (const count of [0, 5, 1.5]) expect(() => bestCollectorGroups(train, count)).toThrow(RangeError)
    expect(bestCollectorGroups(train, 4).groupings[0].groups).toHaveLength(4)
  })
})

describe('exhaustPulses(train, window)', () => {
  /** The plain way: how much of each window is covered, by standing at every tenth of a degree. */
  const covered = (opens: number[], own: number, lengthDeg: number, cycleDeg: number) => {
    let steps = 0
    for (let at = 0.05; at < lengthDeg; at += 0.1)
      if (
        opens.some(
          (open, index) =>
            index !== own && (((opens[own] + at - open) % cycleDeg) + cycleDeg) % cycleDeg < lengthDeg,
        )
      )
        steps++
    return steps / 10
  }

  it.each([
    ['v8x-5000', 120],
    ['i4x-1000', 200],
    ['m6-2t-520', 75],
    ['i6-3000', 500],
  ])('%s: the overlap is what of the window others cover, %i° long', (id, lengthDeg) => {
    const train = presetTrain(id)
    const cycleDeg = train.cycle / DEG
    const lanes = exhaustPulses(train, { opens: 130 * DEG, length: lengthDeg * DEG })
    for (const { pulses } of lanes) {
      const opens = pulses.map((pulse) => pulse.opens / DEG)
      pulses.forEach(({ overlap, gap }, index) => {
        expect(overlap / DEG).toBeCloseTo(covered(opens, index, Math.min(lengthDeg, cycleDeg), cycleDeg), 0)
        const last = opens.map((open) => (opens[index] - open + cycleDeg) % cycleDeg).filter((x) => x > 1e-6)
        expect(gap / DEG).toBeCloseTo(Math.min(...last), 6)
      })
    }
  })

  it('opens as the document’s heat release has it, and names the worst placed cylinder', () => {
    const train = presetTrain('v8x-5000')
    expect(usualWindow(train).opens / DEG).toBeCloseTo(135, 9)
    expect(usualWindow(train).length / DEG).toBeCloseTo(42, 9)
    const angles = firingAngles(train)
    const lanes = exhaustPulses(train, { opens: 135 * DEG, length: 120 * DEG })
    for (const { pulses, worst, gapSpread, collector } of lanes) {
      for (const { cylinder, opens } of pulses)
        expect(Math.cos(opens - angles[cylinder] - 135 * DEG)).toBeCloseTo(1, 9)
      // one bank of the cross-plane: two pulses 90° apart overlap by 30° each, the second of them has the least gap
      expect(train.collectors[collector!].cylinders).toContain(pulses[worst].cylinder)
      expect(pulses[worst].overlap / DEG).toBeCloseTo(30, 6)
      expect(pulses[worst].gap / DEG).toBeCloseTo(90, 6)
      expect(gapSpread / DEG).toBeCloseTo(180, 6)
    }
  })

  it('gives a cylinder by itself the whole cycle and no overlap, however long the window', () => {
    const [alone] = exhaustPulses(presetTrain('single-125-2t'), { opens: 98 * DEG, length: 360 * DEG })
    expect(alone.pulses).toHaveLength(1)
    expect(alone.pulses[0]).toMatchObject({ gap: 2 * Math.PI, overlap: 0 })
  })

  it('gives two that fire at once no gap and the whole window as overlap', () => {
    const document = inline([0, 0], { cycle: 'two-stroke', collectors: [{ id: 'A', cylinders: ['1', '2'] }] })
    const [both] = exhaustPulses(trainOf(document), { opens: 100 * DEG, length: 40 * DEG })
    for (const { gap, overlap } of both.pulses) {
      expect(gap).toBeCloseTo(0, 9)
      expect(overlap / DEG).toBeCloseTo(40, 9)
    }
    expect([both.gapSpread, both.overlapSpread]).toEqual([0, 0])
  })

  it('gives a cylinder in no collector a pipe of its own', () => {
    const train = trainOf(inline([0, 180], { collectors: [{ id: 'A', cylinders: ['1'] }] }))
    const lanes = exhaustPulses(train, usualWindow(train))
    expect(lanes.map(({ collector, pulses }) => [collector, pulses.map(({ cylinder }) => cylinder)])).toEqual(
      [
        [0, [0]],
        [null, [1]],
      ],
    )
    expect(firingEvents(train)).toHaveLength(2)
  })
})
