import { describe, expect, it } from 'vitest'
import { clearanceModel, gapOf } from '@/lib/mechanics/clearance/clearances'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { clearancesOf, tightest } from '@/tests/support/mechanics/clearances'
import { preset } from '@/tests/support/mechanics/presets'

const withShape = (id: string, shape: object, more: object = {}) => {
  const document = preset(id)
  return { ...document, ...more, shape: { ...document.shape, ...shape } }
}

describe('skirt to counterweight', () => {
  it('is least at exact bottom dead centre, also with an offset: √((l − r)² − e²) − skirt − R', () => {
    const document = preset('i4-2000')
    const { strokeMm, rodLengthMm, offsetMm } = document.cylinderDefaults as Record<string, number>
    const { skirtBelowPinMm, counterweightRadiusMm } = document.shape as Record<string, number>
    const { clearances } = clearancesOf(document)
    const { gapMm, angleDeg } = tightest(
      clearances.filter(({ parts }) => parts[0] === 'piston:1'),
      'skirt-counterweight',
    )!
    const r = strokeMm / 2
    expect(gapMm).toBeCloseTo(
      Math.sqrt((rodLengthMm - r) ** 2 - offsetMm ** 2) - skirtBelowPinMm - counterweightRadiusMm,
      9,
    )
    expect(angleDeg).toBeCloseTo(180 + (Math.asin(offsetMm / (rodLengthMm - r)) * 180) / Math.PI, 4)
  })

  it('is of the drawn counterweight where the document gives no radius', () => {
    const given = clearancesOf(preset('single-450'))
    const free = preset('single-450')
    const { counterweightRadiusMm, ...shape } = free.shape as Record<string, number>
    const drawn = clearancesOf({ ...free, shape })
    expect(counterweightRadiusMm).toBeGreaterThan(0)
    const [a, b] = [given, drawn].map(({ sizes }) => sizes.counterweights[0]!.radius)
    expect(a).toBeCloseTo(counterweightRadiusMm / 1000, 12)
    expect(b).toBeGreaterThan(0.02)
    expect(b).not.toBeCloseTo(a, 4)
  })

  it('is looked at under a piston only: no pair with a counterweight beyond its bore', () => {
    const { clearances, train } = clearancesOf(preset('i4-2000'))
    const pairs = clearances.flatMap(({ pair }) => (pair.kind === 'skirt-counterweight' ? [pair] : []))
    expect(pairs).toHaveLength(8)
    for (const { cylinder, counterweight } of pairs) {
      const apart = Math.abs(train.counterweights[counterweight].axial - train.cylinders[cylinder].axial)
      expect(apart).toBeLessThan(train.cylinders[cylinder].bore / 2 + 0.02)
    }
  })

  it('gives way to bare webs where the crank has no counterweights, between throws of a boxer the tightest', () => {
    const { clearances } = clearancesOf({ ...preset('b4-2000'), counterweights: [] })
    expect(tightest(clearances, 'skirt-counterweight')).toBeNull()
    const web = tightest(clearances, 'skirt-web')!
    // the opposed throw's pin stands straight under the piston: l − r − skirt − (r + half the pin)
    expect(web.gapMm).toBeCloseTo(5.5, 9)
  })
})

describe('bank to bank', () => {
  /** Both pistons as dense points, the gap as the least distance of any two: independent of any axis. */
  const byPoints = (id: string, thetaDeg: number) => {
    const { train, sizes } = clearancesOf(preset(id))
    const plan = buildPlan(train, 0)
    const instant = buildInstant(plan)
    fillInstant(instant, plan, (thetaDeg * Math.PI) / 180)
    const [a, b] = [0, 1].map((i) => {
      const { bore, bank } = train.cylinders[i]
      const { crown, skirt } = sizes.pistons[i]!
      const beta = train.banks[bank].angle
      const points: [number, number][] = []
      for (let k = 0; k <= 200; k++)
        for (const [u, v] of [
          [instant.pinHeight[i] - skirt, (k / 200 - 0.5) * bore],
          [instant.pinHeight[i] - skirt + ((crown + skirt) * k) / 200, bore / 2],
          [instant.pinHeight[i] - skirt + ((crown + skirt) * k) / 200, -bore / 2],
        ])
          points.push([u * Math.cos(beta) - v * Math.sin(beta), u * Math.sin(beta) + v * Math.cos(beta)])
      return points
    })
    let least = Infinity
    for (const [x, y] of a) for (const [p, q] of b) least = Math.min(least, Math.hypot(x - p, y - q))
    return least
  }

  it('is never more than the true distance, and near it where the pistons face each other', () => {
    const { train, sizes, clearances } = clearancesOf(preset('v2-45-1600'))
    const { pair } = tightest(clearances, 'bank-bank')!
    const gap = gapOf(clearanceModel(train, sizes), pair)
    for (const theta of [0, 60, 150, 180, 200, 300]) {
      const distance = byPoints('v2-45-1600', theta)
      expect(gap((theta * Math.PI) / 180)).toBeLessThanOrEqual(distance + 1e-6)
      expect(gap((theta * Math.PI) / 180)).toBeGreaterThan(0)
    }
    expect(gap(Math.PI) / byPoints('v2-45-1600', 180)).toBeGreaterThan(0.9)
  })

  it('looks at neighbours in another bank and never at opposed ones', () => {
    expect(tightest(clearancesOf(preset('b4-2000')).clearances, 'bank-bank')).toBeNull()
    const radial = clearancesOf(preset('r7-11')).clearances.filter(({ pair }) => pair.kind === 'bank-bank')
    expect(radial).toHaveLength(7)
  })

  it('takes pistons that overlap little along the crank at the width they have midway', () => {
    const { train, sizes, clearances } = clearancesOf(preset('v10-72-5000'))
    const apart = (one: number, other: number) =>
      Math.abs(train.cylinders[one].axial - train.cylinders[other].axial)
    const far = clearances.flatMap(({ pair }) =>
      pair.kind === 'bank-bank' && apart(pair.cylinder, pair.other) > train.cylinders[0].bore / 2
        ? [pair]
        : [],
    )
    expect(far.length).toBeGreaterThan(0)
    for (const pair of far) {
      const level = {
        ...train,
        cylinders: train.cylinders.map((cylinder) => ({ ...cylinder, axial: 0 })),
      }
      const [here, beside] = [train, level].map((of) => gapOf(clearanceModel(of, sizes), pair)(1))
      expect(here).toBeGreaterThan(beside + 0.005)
    }
  })
})

describe('rod to bore edge', () => {
  it('is the distance of the edge from the rod’s own axis in the drawing, less half the shank', () => {
    const { train, rig, sizes, clearances } = clearancesOf(preset('i4-2000'))
    const one = tightest(clearances, 'rod-bore')!
    const { cylinder } = one.pair
    const pose = fillPose(buildPose(rig), rig, one.angle!)
    const part = rig.parts.findIndex(({ id }) => id === one.parts[0])
    const [cos, sin, x, y] = pose.slice(4 * part, 4 * part + 4)
    const edges = [-1, 1].map((side) => {
      const { bore, offset } = train.cylinders[cylinder]
      const [px, py] = [rig.mirror * (offset + (side * bore) / 2) - x, sizes.boreBottoms[cylinder] - y]
      return { beside: Math.abs(cos * px + sin * py), along: -sin * px + cos * py }
    })
    const gaps = edges.map(({ beside, along }) => {
      const { shank } = sizes.rods[cylinder]
      const after = shank.findIndex((place) => place.along > along)
      const [a, b] = [shank[after - 1], shank[after]]
      return beside - (a.half + ((along - a.along) / (b.along - a.along)) * (b.half - a.half))
    })
    expect(Math.min(...gaps)).toBeCloseTo(one.gap, 8)
  })
})

describe('piston to deck', () => {
  it('is not known without a deck height, and says why', () => {
    const { clearances, notKnown } = clearancesOf(preset('i4-2000'))
    expect(tightest(clearances, 'piston-deck')).toBeNull()
    expect(notKnown).toEqual([{ name: 'Piston to deck', why: 'The deck height is not given.' }])
  })

  it('is deck height less s at top dead centre and compression height', () => {
    const { document, clearances } = clearancesOf(withShape('i4x-1000', { deckHeightMm: 160 }))
    const { strokeMm, rodLengthMm } = document.cylinderDefaults as Record<string, number>
    const { gapMm } = tightest(clearances, 'piston-deck')!
    expect(gapMm).toBeCloseTo(160 - strokeMm / 2 - rodLengthMm - document.shape!.compressionHeightMm!, 9)
  })
})

describe('rod to rod on one master', () => {
  it('looks at neighbours round the master, each once, and widens as the knuckles move out', () => {
    const { clearances } = clearancesOf(preset('r7-11'))
    const rods = clearances.filter(({ pair }) => pair.kind === 'rod-rod')
    expect(rods).toHaveLength(7)
    expect(rods.filter(({ parts }) => parts.includes('rod:1'))).toHaveLength(2)
    const wider = preset('r7-11')
    wider.cylinders = wider.cylinders.map((cylinder) =>
      cylinder.link
        ? { ...cylinder, link: { ...cylinder.link, knuckleRadiusMm: cylinder.link.knuckleRadiusMm + 4 } }
        : cylinder,
    )
    const least = (list: typeof clearances) => tightest(list, 'rod-rod')!.gapMm
    expect(least(clearancesOf(wider).clearances)).toBeGreaterThan(least(clearances))
  })
})

describe('wall between bores', () => {
  it('is the pitch less the bore, between neighbours of one bank', () => {
    const { clearances } = clearancesOf(preset('v8x-5000'))
    const walls = clearances.filter(({ pair }) => pair.kind === 'bore-wall')
    expect(walls).toHaveLength(6)
    for (const { gap, angle } of walls) {
      expect(gap * 1000).toBeCloseTo(106 - 95, 9)
      expect(angle).toBeNull()
    }
  })
})

describe('a crosshead engine', () => {
  it('has no skirt near its crank: walls alone, and it is said', () => {
    const { clearances, notKnown } = clearancesOf(preset('m6-2t-520'))
    expect(new Set(clearances.map(({ pair }) => pair.kind))).toEqual(new Set(['bore-wall']))
    expect(notKnown[0].name).toBe('Skirts and banks')
  })
})

describe('laws', () => {
  it.each(['v2-45-1600', 'i4-2000', 'r7-11', 'b4-2000'])(
    'no crank angle of %s has less than the least',
    (id) => {
      const { train, sizes, clearances } = clearancesOf(preset(id))
      const model = clearanceModel(train, sizes)
      for (const { pair, gap, angle } of clearances) {
        const at = gapOf(model, pair)
        if (angle !== null) expect(at(angle)).toBeCloseTo(gap, 12)
        for (let degrees = 0; degrees < 360; degrees += 0.7)
          expect(at((degrees * Math.PI) / 180)).toBeGreaterThan(gap - 1e-11)
      }
    },
  )

  it.each(['v2-45-1600', 'i4-2000', 'r7-11'])('%s twice the size has twice the gaps', (id) => {
    const { train, sizes, clearances } = clearancesOf(preset(id))
    const twice = {
      ...train,
      throws: train.throws.map((pin) => ({ ...pin, radius: 2 * pin.radius, axial: 2 * pin.axial })),
      cylinders: train.cylinders.map((cylinder) => ({
        ...cylinder,
        bore: 2 * cylinder.bore,
        rodLength: 2 * cylinder.rodLength,
        offset: 2 * cylinder.offset,
        axial: 2 * cylinder.axial,
        link: cylinder.link && { ...cylinder.link, knuckleRadius: 2 * cylinder.link.knuckleRadius },
      })),
    }
    const double = {
      ...sizes,
      pistons: sizes.pistons.map((one) => one && { crown: 2 * one.crown, skirt: 2 * one.skirt }),
      rods: sizes.rods.map(({ shank, eye }) => ({
        eye: 2 * eye,
        shank: shank.map(({ along, half }) => ({ along: 2 * along, half: 2 * half })),
      })),
      boreBottoms: sizes.boreBottoms.map((bottom) => 2 * bottom),
      counterweights: sizes.counterweights.map((one) => one && { ...one, radius: 2 * one.radius }),
    }
    const [small, large] = [clearanceModel(train, sizes), clearanceModel(twice, double)]
    for (const { pair } of clearances)
      for (const theta of [0.1, 2, 4.4])
        expect(gapOf(large, pair)(theta)).toBeCloseTo(2 * gapOf(small, pair)(theta), 10)
  })
})
