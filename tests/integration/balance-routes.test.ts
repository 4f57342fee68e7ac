import { describe, expect, it } from 'vitest'
import {
  balanceOrders,
  bobWeightCard,
  designBalanceShafts,
  residualBalance,
  solveBalance,
} from '@/lib/contracts/balance'
import { analyse } from '@/lib/mechanics/analysis'
import { presets } from '@/scene/model/presets'
import { readTrain, type Issue } from '@/scene/model/read-train'
import { call } from './support/call'
import { preset } from './support/documents'
import { useServer } from './support/server'

useServer()

const post = (what: string, body: unknown) => call('POST', `/api/v1/balance/${what}`, { body })
const issuesOf = (body: unknown) => (body as { issues: Issue[] }).issues

async function good<T>(contract: { answer: { parse(body: unknown): T } }, what: string, body: unknown) {
  const answer = await post(what, body)
  expect(answer.status, JSON.stringify(answer.body)).toBe(200)
  const parsed = contract.answer.parse(answer.body)
  // nothing that the contract does not name, at any depth
  expect(parsed).toEqual(answer.body)
  return parsed
}

/** What the analysis, asked anew, says of the train with these counterweights. */
function residualOf(train: unknown) {
  const read = readTrain(train)
  if (!read.ok) throw new Error(JSON.stringify(read.issues))
  return analyse(read.train, { speed: 100, include: ['balance'] }).balance!.residual
}

describe('POST /balance/solve', () => {
  it.each(presets.map(({ id }) => id))(
    'balances %s with entries that stand in the train as they are',
    async (id) => {
      const train = preset(id)
      for (const more of [{}, { rule: 'even' }]) {
        const answer = await good(solveBalance, 'solve', { train, ...more })
        const residual = residualOf({ ...train, counterweights: answer.counterweights })
        const marine = id === 'm6-2t-520' ? 1e3 : 1
        expect(residual.staticKgMm).toBeLessThan(1e-5 * marine)
        expect(residual.coupleKgMm2).toBeLessThan(1e-3 * marine)
        expect(answer.residual.staticKgMm).toBeLessThan(1e-5 * marine)
        expect(answer.residual.coupleKgMm2).toBeLessThan(1e-3 * marine)
        const sum = answer.counterweights.reduce((total, { massKg }) => total + massKg, 0)
        expect(answer.totalMassKg).toBeCloseTo(sum, 9)
        expect(answer.capacity).toHaveLength(answer.counterweights.length)
      }
    },
  )

  it('takes the places of the counterweights, or the webs where there are none', async () => {
    const train = preset('v8x-5000')
    const own = await good(solveBalance, 'solve', { train })
    expect(own.counterweights.map(({ id, axialMm, radiusMm }) => [id, axialMm, radiusMm])).toEqual(
      train.counterweights.map(({ id, axialMm, radiusMm }) => [id, axialMm, radiusMm]),
    )
    const webs = await good(solveBalance, 'solve', { train: { ...train, counterweights: [] } })
    expect(webs.counterweights.map(({ id }) => id)).toEqual(train.counterweights.map(({ id }) => id))
    // the file has its weights in the middle of the webs of its shape
    webs.counterweights.forEach(({ axialMm }, i) =>
      expect(axialMm).toBeCloseTo(train.counterweights[i].axialMm, 6),
    )
  })

  it('takes planes of the asker, and leaves a fixed weight as it is', async () => {
    const train = preset('i3-1000')
    const planes = [
      { id: 'free end', axialMm: -98.75, radiusMm: 40 },
      { id: 'middle', axialMm: 5, radiusMm: 38, fixed: { massKg: 0.2, angleDeg: 75 } },
      { id: 'drive end', axialMm: 98.75, radiusMm: 42 },
    ]
    const { counterweights, leastMassKg, totalMassKg } = await good(solveBalance, 'solve', { train, planes })
    expect(counterweights.map(({ id }) => id)).toEqual(['free end', 'middle', 'drive end'])
    expect(counterweights[1]).toMatchObject({
      massKg: expect.closeTo(0.2, 12),
      angleDeg: expect.closeTo(75, 10),
    })
    const residual = residualOf({ ...train, counterweights })
    expect(residual.staticKgMm).toBeLessThan(1e-9)
    expect(residual.coupleKgMm2).toBeLessThan(1e-7)
    expect(totalMassKg - leastMassKg).toBeLessThan(1e-9)
  })

  it('names the web that is beyond its half disc, and the slug that closes it', async () => {
    const train = preset('v8x-5000')
    const { capacity, web } = await good(solveBalance, 'solve', { train, slug: { densityKgM3: 17_500 } })
    expect(web).toMatchObject({ outerRadiusMm: 89.5, thicknessMm: 20, densityKgM3: 7850, stated: true })
    const beyond = capacity.filter(({ share }) => share > 1)
    expect(beyond.map(({ id }) => id)).toEqual(['1F', '4D'])
    for (const { slug, momentKgMm, capacityKgMm } of beyond) {
      // (2/3)·ρ·t·R³
      expect(capacityKgMm).toBeCloseTo((2 / 3) * 7850e-9 * 20 * 89.5 ** 3, 9)
      const added = (slug!.densityKgM3 - 7850) * 1e-9 * slug!.volumeCm3 * 1e3 * slug!.radiusMm
      expect(added).toBeCloseTo(momentKgMm - capacityKgMm, 9)
      expect(slug!.massKg).toBeCloseTo(17_500e-6 * slug!.volumeCm3, 12)
    }
    const within = await good(solveBalance, 'solve', { train, withinCapacity: true })
    expect(Math.max(...within.capacity.map(({ share }) => share))).toBeLessThan(1 + 1e-9)
    expect(residualOf({ ...train, counterweights: within.counterweights }).staticKgMm).toBeLessThan(1e-9)
  })

  it('refuses what cannot be, with the path and a way out', async () => {
    const train = preset('v8x-5000')
    const refusals: [unknown, string, string][] = [
      [{ train, planes: [{ id: 'a', axialMm: 0, radiusMm: 50 }] }, 'planes', 'one-place'],
      [{ train, planes: [] }, 'planes', 'no-plane'],
      [
        { train: { ...train, counterweights: train.counterweights.slice(0, 1) } },
        'train.counterweights',
        'one-place',
      ],
      [{ train, withinCapacity: true, web: { outerRadiusMm: 30 } }, 'train.counterweights', 'full'],
      [{ train, slug: { densityKgM3: 7000 } }, 'slug.densityKgM3', 'too-light'],
      [{ train, planes: [{ id: 'a', axialMm: 0, radiusMm: 0 }] }, 'planes.0.radiusMm', ''],
    ]
    for (const [body, path, code] of refusals) {
      const answer = await post('solve', body)
      expect(answer.status).toBe(422)
      const [issue] = issuesOf(answer.body)
      expect(issue.path).toBe(path)
      if (code) expect(issue.code).toBe(code)
      expect(issue.message).not.toBe('')
      expect(issue.fix).not.toBe('')
    }
  })
})

describe('POST /balance/card', () => {
  it.each(presets.map(({ id }) => id))('%s: every throw, adding up', async (id) => {
    const train = preset(id)
    const { throws } = await good(bobWeightCard, 'card', { train })
    expect(throws.map((card) => card.throw)).toEqual(train.throws.map((pin) => pin.id))
    for (const card of throws) {
      const whole = card.rotatingKg + card.oilKg + train.balanceFactor * card.reciprocatingKg
      expect(card.totalKg).toBeCloseTo(whole, 9)
    }
  })
})

describe('POST /balance/residual', () => {
  it('splits the permissible unbalance between the outer mains', async () => {
    const { grade, planes } = await good(residualBalance, 'residual', { train: preset('v8x-5000') })
    // ISO 21940-11, G 16: 25.8 kg at 7,200 rpm
    expect(grade!.permissibleKgMm * 1000).toBeCloseTo(547.5, 1)
    expect(planes.map(({ axialMm }) => axialMm)).toEqual([-212, 212])
    for (const plane of planes) {
      expect(plane.permissibleKgMm! * 1000).toBeCloseTo(273.7, 1)
      expect(plane.within).toBe(true)
    }
  })

  it('says what heavier pistons make of it', async () => {
    const train = preset('v8x-5000')
    const planesMm = [-159, 159]
    const change = { moves: 'reciprocating', massKg: 0.008 }
    const { changed } = await good(residualBalance, 'residual', { train, planesMm, change })
    // common practice: 372 g mm in each plane against 274 allowed
    for (const plane of changed!.planes) {
      expect(plane.unbalanceKgMm * 1000).toBeGreaterThan(371)
      expect(plane.unbalanceKgMm * 1000).toBeLessThan(373)
      expect(plane.within).toBe(false)
    }
    const one = { ...change, massKg: 0.002, cylinders: ['1'] }
    const single = await good(residualBalance, 'residual', { train, change: one, speedRpm: 7200 })
    expect(single.changed!.change.staticKgMm * 1000).toBeCloseTo(44.1, 9)
    expect(single.changed!.forceN!).toBeCloseTo(25.07, 2)
  })

  it('without a crank mass or a speed says nothing of a grade', async () => {
    const { crankMassKg: _, ...train } = preset('v8x-5000')
    const answer = await good(residualBalance, 'residual', { train })
    expect(answer.grade).toBeNull()
    expect(answer.planes.map(({ within }) => within)).toEqual([null, null])
  })

  it('refuses one plane twice, an unknown cylinder, and a part that would weigh nothing', async () => {
    const train = preset('v8x-5000')
    const pathOf = async (body: object) => {
      const { status, body: answer } = await post('residual', { train, ...body })
      expect(status).toBe(422)
      return issuesOf(answer)[0].path
    }
    const change = { moves: 'rotating', massKg: 0.001 }
    expect(await pathOf({ planesMm: [10, 10] })).toBe('planesMm')
    expect(await pathOf({ change: { ...change, cylinders: ['1', '99'] } })).toBe('change.cylinders.1')
    expect(await pathOf({ change: { ...change, massKg: -5 } })).toBe('change.massKg')
    const lone = { ...preset('single-450'), mains: [] }
    const { body } = await post('residual', { train: lone })
    expect(issuesOf(body)[0]).toMatchObject({ path: 'planesMm', code: 'no-planes' })
  })
})

describe('POST /balance/shafts', () => {
  it('removes what turns backward in the three and the second order of the four', async () => {
    const three = preset('i3-1000')
    const couple = await good(designBalanceShafts, 'shafts', { train: three, order: 1, remove: 'couple' })
    expect(couple.balanceShafts.map(({ speedRatio }) => speedRatio)).toEqual([-1, -1])
    expect(couple.after.couple.backward).toBeLessThan(1e-9 * couple.before.couple.backward)
    const four = preset('i4-2000')
    const force = await good(designBalanceShafts, 'shafts', { train: four, order: 2, remove: 'force' })
    expect(force.balanceShafts.map(({ speedRatio }) => speedRatio)).toEqual([2, -2])
    expect(force.after.force.major).toBeLessThan(1e-9 * force.before.force.major)
    // as the document takes them
    expect(readTrain({ ...four, balanceShafts: force.balanceShafts }).ok).toBe(true)
  })

  it('refuses a couple at one place', async () => {
    const body = { train: preset('i3-1000'), order: 1, remove: 'couple', placesMm: [0] }
    const answer = await post('shafts', body)
    expect([answer.status, issuesOf(answer.body)[0].path]).toEqual([422, 'placesMm'])
  })
})

describe('POST /balance/orders', () => {
  it.each(presets.map(({ id }) => id))('%s in the form of the contract', async (id) => {
    const answer = await good(balanceOrders, 'orders', { train: preset(id), speedRpm: 1000 })
    for (const list of [answer.exact, answer.textbook, answer.bare, answer.layout.exact])
      expect(list.map(({ order }) => order)).toEqual([1, 2, 4, 6])
  })

  it('v8f-4200 at 9,000 rpm: 31.8 kN across in the textbook’s second order, and the exact figure beside it', async () => {
    const { textbook, exact, layout, verdict } = await good(balanceOrders, 'orders', {
      train: preset('v8f-4200'),
      speedRpm: 9000,
    })
    expect(textbook[1].force.major / 1000).toBeCloseTo(31.8, 1)
    expect(textbook[1].force.tiltDeg).toBeCloseTo(90, 6)
    expect(textbook[1].force.minor).toBeLessThan(1)
    expect(exact[1].force.major).toBeGreaterThan(textbook[1].force.major)
    expect(layout.textbook[1].force.major).toBeCloseTo(4 * Math.SQRT2, 9)
    expect(verdict.map(({ remedy, kind }) => [remedy, kind])).toContainEqual([
      'shafts at twice the speed',
      'force',
    ])
  })
})
