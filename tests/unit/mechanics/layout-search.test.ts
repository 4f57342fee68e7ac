import { describe, expect, it } from 'vitest'
import { legalFiringOrders } from '@/lib/mechanics/firing-orders'
import { leastCounterweights } from '@/lib/mechanics/layouts/counterweights'
import { findLayouts } from '@/lib/mechanics/layouts/find-layouts'
import type { LayoutRequest } from '@/lib/mechanics/layouts/layout'
import { balanceOf, webPlaces } from '@/lib/mechanics/layouts/phasing-balance'
import { orderSearch } from '@/lib/mechanics/layouts/phasing-orders'
import { phasings } from '@/lib/mechanics/layouts/phasings'
import {
  bankAngleOf,
  bankOf,
  pinAngle,
  regularDivisions,
  searchSize,
  spaces,
  type Space,
} from '@/lib/mechanics/layouts/space'
import { succession } from '@/lib/mechanics/succession'
import { orderOf, type Place } from '@/tests/support/mechanics/layout'
import { DEG, inLine, pins, searchLayouts, vee } from '@/tests/support/mechanics/layout-search'
import { crankTrainSchema, type CrankTrainInput } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'
import { trainOf } from './trains'

/** Reproducible chance (a linear congruential sequence). */
function chance(seed: number) {
  let state = seed
  return (below: number) => {
    state = (state * 1_664_525 + 1_013_904_223) % 2 ** 32
    return Math.floor((state / 2 ** 32) * below)
  }
}

const requests: [string, LayoutRequest][] = [
  ['I4', inLine(4)],
  ['I5', inLine(5)],
  ['V6 75°, split', vee(6, 75, { splits: [-18 * DEG, 25 * DEG], rodOffset: 0.21 })],
  ['V8 90°', vee(8, 90)],
  ['flat six, banks in turn', inLine(6, { bankAngles: [Math.PI] })],
  ['V5 80°, banks in turn', inLine(5, { bankAngles: [80 * DEG] })],
]

const placesOf = (space: Space, units: ArrayLike<number>, rodOffset: number): Place[] =>
  Array.from(units).flatMap((unit, k) =>
    Array.from({ length: space.rodsPerThrow }, (_, rod) => ({
      pin: pinAngle(space, k, unit, rod) / DEG,
      bank: bankAngleOf(space, bankOf(space, k, rod)) / DEG,
      z: k - (space.throws - 1) / 2 + (space.rodsPerThrow === 2 ? (rod - 0.5) * rodOffset : 0),
    })),
  )

describe('balanceOf(space, request)(units) against analyse of a train', () => {
  it.each(requests)('%s: orders 1 and 2 of 6 chosen phasings agree to 1e-9', (name, request) => {
    const next = chance(name.length)
    for (const space of spaces(request).slice(0, 6)) {
      const units = Int32Array.from({ length: space.throws }, (_, k) => (k === 0 ? 0 : next(space.divisions)))
      const got = balanceOf(space, request)(units)
      const places = placesOf(space, units, request.rodOffset)
      const [first, second] = [orderOf(places, 1), orderOf(places, 2)]
      const near = (value: number, wanted: number) =>
        expect(Math.abs(value - wanted)).toBeLessThan(1e-9 * places.length * 3)
      near(got.force1.forward, first.force.forward)
      near(got.force1.backward, first.force.backward)
      near(got.couple1.forward, first.couple.forward)
      near(got.couple1.backward, first.couple.backward)
      near(got.force2.forward, second.force.forward)
      near(got.force2.backward, second.force.backward)
      near(got.couple2.forward, second.couple.forward)
      near(got.couple2.backward, second.couple.backward)
      near(got.secondForce, second.force.max)
      near(got.secondCouple, second.couple.max)
    }
  })

  it('a balance factor of a half leaves the backward part alone, none at all the whole ellipse', () => {
    const of = (balanceFactor: number) => {
      const request = inLine(2, { balanceFactor })
      const [space] = spaces(request).filter(({ divisions }) => divisions === 72)
      return { ...balanceOf(space, request)([0, 18]) }
    }
    const [half, none] = [of(0.5), of(0)]
    expect(half.firstForce).toBeCloseTo(half.force1.backward, 12)
    expect(none.firstForce).toBeCloseTo(Math.SQRT2, 12)
    expect(none.firstCouple).toBeCloseTo(Math.SQRT1_2, 12)
  })
})

describe('leastCounterweights(unbalances, places)', () => {
  it.each(requests)(
    '%s: leave no force and no couple, and the largest is the figure of the layout',
    (name, request) => {
      const next = chance(7 * name.length)
      const [space] = spaces(request).slice(-1)
      const units = Int32Array.from({ length: space.throws }, (_, k) => (k === 0 ? 0 : next(space.divisions)))
      const bob = request.rotating + request.balanceFactor
      const unbalances = placesOf(space, units, request.rodOffset).map(({ pin, z }) => ({
        place: z,
        moment: { re: bob * Math.cos(pin * DEG), im: bob * Math.sin(pin * DEG) },
      }))
      const webs = webPlaces(space.throws)
      const weights = leastCounterweights(unbalances, webs)
      const all = [...unbalances, ...weights.map((moment, i) => ({ place: webs[i], moment }))]
      for (const arm of [() => 1, (place: number) => place]) {
        expect(all.reduce((sum, { place, moment }) => sum + arm(place) * moment.re, 0)).toBeCloseTo(0, 10)
        expect(all.reduce((sum, { place, moment }) => sum + arm(place) * moment.im, 0)).toBeCloseTo(0, 10)
      }
      const largest = Math.max(...weights.map(({ re, im }) => Math.hypot(re, im)))
      expect(balanceOf(space, request)(units).counterweight).toBeCloseTo(largest, 10)
    },
  )
})

/** A train with a pin for each rod, as the finder numbers cylinders; no order yet. */
function trainFrom(space: Space, units: ArrayLike<number>) {
  const places = placesOf(space, units, 0)
  const ids = places.map((_, i) => `${i + 1}`)
  const document: CrankTrainInput = {
    format: 'crank-train/1',
    cycle: 'four-stroke',
    cylinderDefaults: { boreMm: 80, strokeMm: 80, rodLengthMm: 140, compressionRatio: 10 },
    masses: { pistonKg: 0.4, rod: { massKg: 0.6, cgFromBigEndMm: 42 } },
    banks: ids.map((id, i) => ({ id, angleDeg: places[i].bank })),
    throws: ids.map((id, i) => ({ id, angleDeg: places[i].pin, axialMm: 100 * i })),
    cylinders: ids.map((id, i) => ({ id, bank: id, throw: id, axialMm: 100 * i })),
    firingOrder: [],
  }
  return toTrain(crankTrainSchema.parse(document))
}

describe('orderSearch(space).search(units, admits, found)', () => {
  it.each(requests)(
    '%s: finds the orders that legalFiringOrders lists, each with its intervals',
    (name, request) => {
      const [natural, regular] = spaces(request)
      let seen = 0
      for (const space of [natural, regular]) {
        const orders = orderSearch(space)
        for (const units of phasings(space)) {
          if (seen > 12) break
          seen++
          const found = new Set<string>()
          orders.search(
            units,
            () => true,
            (figures, late) => {
              const { order, intervals } = orders.orderOf(units, late)
              found.add(order.join())
              expect(intervals.reduce((sum, interval) => sum + interval, 0)).toBeCloseTo(space.cycle, 9)
              expect(figures.unevenness).toBeCloseTo(Math.max(...intervals) - Math.min(...intervals), 9)
            },
          )
          const legal = [...legalFiringOrders(trainFrom(space, units), { even: false })].map((order) =>
            order.join(),
          )
          expect([...found].sort()).toEqual(legal.sort())
        }
      }
      expect(seen, name).toBeGreaterThan(0)
    },
  )

  it.each([
    // 1-8-4-3-6-5-7-2 on a cross-plane V8: 2 on one bank, 3 on one throw, 2 on the next (common practice)
    [
      'cross-plane V8',
      vee(8, 90, { wishes: { unevenness: { atMost: 0 }, secondForce: { atMost: 0 } } }),
      [2, 3, 5],
    ],
    // 1-5-3-6-2-4 and its mirror: none on the same or a neighbouring throw (common practice)
    ['I6', inLine(6, { wishes: { unevenness: { atMost: 0 }, secondCouple: { atMost: 0 } } }), [0, 0, 0]],
  ] as const)('%s: successions of the best order', (_, request, wanted) => {
    const [best] = searchLayouts(request).layouts
    expect([best.sameBank, best.sameThrow, best.nearThrow]).toEqual(wanted)
  })

  it('counts successions as succession(train, order) does', () => {
    const request = vee(8, 90, { wishes: { unevenness: { atMost: 0 } } })
    for (const layout of searchLayouts(request).layouts) {
      const train = trainOf({
        format: 'crank-train/1',
        cycle: 'four-stroke',
        cylinderDefaults: { boreMm: 80, strokeMm: 80, rodLengthMm: 140, compressionRatio: 10 },
        masses: { pistonKg: 0.4, rod: { massKg: 0.6, cgFromBigEndMm: 42 } },
        banks: [
          { id: 'A', angleDeg: -45 },
          { id: 'B', angleDeg: 45 },
        ],
        throws: layout.throwAngles.map((angle, k) => ({
          id: `${k}`,
          angleDeg: angle / DEG,
          axialMm: 100 * k,
        })),
        cylinders: layout.order.map((_, i) => ({
          id: `${i}`,
          bank: 'AB'[i % 2],
          throw: `${i >> 1}`,
          axialMm: 50 * i,
        })),
        firingOrder: layout.order.map(String),
      })
      const counted = succession(train, layout.order)
      expect([layout.sameBank, layout.sameThrow, layout.nearThrow]).toEqual([
        counted.sameBank,
        counted.sameThrow,
        counted.sameThrow + counted.adjacentThrow,
      ])
    }
  })
})

describe('phasings(space)', () => {
  it.each([
    ['I4', inLine(4)],
    ['V6 60°', vee(6, 60)],
    ['V6 60°, rods side by side', vee(6, 60, { rodOffset: 0.2 })],
    ['flat four, banks in turn', inLine(4, { bankAngles: [Math.PI] })],
    ['V4 70°, banks in turn', inLine(4, { bankAngles: [70 * DEG] })],
    ['V5 70°, banks in turn', inLine(5, { bankAngles: [70 * DEG] })],
  ])('%s: what symmetry leaves out has the figures of something that stays', (_, request) => {
    const key = (balance: ReturnType<ReturnType<typeof balanceOf>>) =>
      [balance.force1, balance.couple1, balance.force2, balance.couple2]
        .flatMap(({ forward, backward }) => [forward, backward])
        .concat(balance.counterweight)
        .map((value) => Math.round(value * 1e6))
        .join()
    const grid = { ...request, divisions: [6] }
    const [natural, regular] = spaces(grid)
    for (const space of [natural, regular]) {
      const none = { mirror: false, endForEnd: false, both: false }
      const of = balanceOf(space, grid)
      const kept = Array.from(phasings(space), (units) => key(of(units)))
      const every = Array.from(phasings({ ...space, symmetry: none }), (units) => key(of(units)))
      expect(kept.length).toBeLessThanOrEqual(every.length)
      expect(new Set(kept)).toEqual(new Set(every))
    }
  })

  it('the grid of even firing holds just the phasings of which an order is even', () => {
    const request = vee(8, 90, { divisions: [8] })
    const [natural, regular] = spaces(request)
    const evenOf = (space: Space) => {
      const orders = orderSearch(space)
      const out = new Set<string>()
      for (const units of phasings(space)) {
        let even = false
        orders.search(
          units,
          () => true,
          ({ unevenness }) => (even ||= unevenness < 1e-9),
        )
        if (even) out.add(Array.from(units, (unit) => (360 * unit) / space.divisions).join('/'))
      }
      return out
    }
    expect(evenOf(natural)).toEqual(evenOf(regular))
    expect(evenOf(natural).size).toBe([...phasings(natural)].length)
  })
})

describe('findLayouts(request)', () => {
  it('is the best that going through everything without leaving anything early finds', () => {
    const request = vee(6, 90, {
      divisions: [12],
      splits: [0, -30 * DEG],
      wishes: { unevenness: {}, secondCouple: { weight: 2 }, sameBank: { weight: 0.5 } },
    })
    const { layouts } = searchLayouts(request)
    let least = Infinity
    for (const space of spaces(request)) {
      const [balance, orders] = [balanceOf(space, request), orderSearch(space)]
      for (const units of phasings(space)) {
        const couple = (2 * balance(units).secondCouple) / 4
        orders.search(
          units,
          () => true,
          ({ unevenness, sameBank }) => {
            least = Math.min(least, couple + unevenness / ((4 * Math.PI) / 6) + (0.5 * sameBank) / 6)
          },
        )
      }
    }
    expect(layouts[0].score).toBeCloseTo(least, 9)
  })

  it('a foremost layout is beaten by no other in all that is wished', () => {
    const wished = ['unevenness', 'secondForce', 'counterweight'] as const
    const { layouts } = searchLayouts(
      inLine(4, { wishes: { unevenness: {}, secondForce: {}, counterweight: {} } }),
    )
    const foremost = layouts.filter((layout) => layout.foremost)
    expect(foremost.length).toBeGreaterThan(10)
    for (const one of foremost)
      for (const other of layouts)
        expect(
          wished.every((criterion) => other[criterion] <= one[criterion] - 1e-9) &&
            wished.some((criterion) => other[criterion] < one[criterion] - 1e-9),
        ).toBe(false)
  })

  it('gives the same answer twice, no layout twice, at most 200, best first', () => {
    const request = vee(8, 90, { wishes: { unevenness: {}, counterweight: {}, secondForce: {} } })
    const [one, two] = [searchLayouts(request), searchLayouts(request)]
    expect(one).toEqual(two)
    expect(one.layouts.length).toBe(200)
    const keys = one.layouts.map(
      (layout) =>
        `${pins(layout)} ${layout.order.join('-')} ${layout.intervals.map((x) => x.toFixed(4)).join()}`,
    )
    expect(new Set(keys).size).toBe(200)
    for (let i = 1; i < 200; i++)
      expect(one.layouts[i].score).toBeGreaterThanOrEqual(one.layouts[i - 1].score - 1e-9)
  })

  it('every layout keeps every limit', () => {
    const { layouts } = searchLayouts(
      vee(8, 90, {
        wishes: {
          unevenness: { atMost: 90 * DEG },
          firstCouple: { atMost: 0.5 },
          counterweight: { atMost: 1, weight: 0 },
        },
      }),
    )
    expect(layouts.length).toBeGreaterThan(0)
    for (const layout of layouts) {
      expect(layout.unevenness).toBeLessThanOrEqual(90 * DEG + 1e-6)
      expect(layout.firstCouple).toBeLessThanOrEqual(0.5 + 1e-6)
      expect(layout.counterweight).toBeLessThanOrEqual(1 + 1e-6)
    }
  })

  it('nothing found: names the wishes that exclude all and the nearest miss', () => {
    const { layouts, miss } = searchLayouts(
      vee(4, 60, { wishes: { unevenness: { atMost: 0 }, secondForce: { atMost: 2.5 } } }),
    )
    expect(layouts).toEqual([])
    expect(miss?.impossible).toEqual(['unevenness'])
    expect(miss?.missed).toContain('unevenness')
    expect(miss?.layout.secondForce).toBeLessThanOrEqual(2.5 + 1e-6)
  })

  it('goes on by steps with rising progress, and can be left at any of them', () => {
    const steps = findLayouts(vee(8, 90, { wishes: { sameBank: {} } }))
    let last = 0
    for (let step = 0; step < 5; step++) {
      const { value, done } = steps.next()
      if (done) throw new Error('done too early')
      expect(value.progress).toBeGreaterThanOrEqual(last)
      expect(value.progress).toBeLessThanOrEqual(1)
      last = value.progress
    }
    expect(last).toBeGreaterThan(0)
    steps.return({} as never)
    expect(steps.next().done).toBe(true)
  })

  it('stops at the limit of phasings and says so', () => {
    const found = searchLayouts(vee(8, 90), { mostPhasings: 100 })
    expect([found.phasings, found.capped]).toEqual([100, true])
    expect(searchLayouts(inLine(1)).capped).toBe(false)
  })

  it.each([
    ['0 cylinders', inLine(0)],
    ['13 cylinders', inLine(13)],
    ['an odd V', vee(7, 90)],
    ['two rods on one bank', vee(4, 90, { bankAngles: [] })],
    ['no split', inLine(4, { splits: [] })],
    ['a split pin with one rod', inLine(4, { splits: [0.1] })],
  ])('refuses %s', (_, request) => expect(() => findLayouts(request).next()).toThrow(RangeError))

  it('a two-stroke in line has one order a phasing', () => {
    const { layouts } = searchLayouts(
      inLine(6, { cycle: 2 * Math.PI, wishes: { unevenness: { atMost: 0 } } }),
    )
    for (const layout of layouts) {
      expect(layout.alike).toBe(1)
      expect(layout.even).toBe(true)
    }
    expect(layouts.length).toBeGreaterThan(30)
  })
})

describe('searchSize(request)', () => {
  it.each(requests)('%s: is no less than the phasings gone through', (_, request) => {
    const { natural, regular } = searchSize(request)
    expect(natural + regular).toBeGreaterThanOrEqual(searchLayouts(request).phasings)
  })
  it('grids are as fine as the number of throws allows', () => {
    expect(regularDivisions(inLine(2))).toEqual([72])
    expect(regularDivisions(vee(8, 90))).toEqual([36, 24])
    expect(regularDivisions(inLine(8))).toEqual([4, 3])
  })
})
