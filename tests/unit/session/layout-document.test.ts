import { describe, expect, it } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import { massSplit, residualUnbalance } from '@/lib/mechanics/balance'
import type { LayoutRequest } from '@/lib/mechanics/layouts/layout'
import { presetById } from '@/scene/model/presets'
import { toTrain } from '@/scene/model/to-train'
import { judge } from '@/scene/session/judge'
import { layoutDocument } from '@/scene/session/layout-document'
import { DEG, inLine, searchLayouts, vee } from '@/tests/support/mechanics/layout-search'

const base = presetById('v8x-5000')!.train
const even = { unevenness: { atMost: 0 } }
const cases: [string, LayoutRequest][] = [
  ['one cylinder', inLine(1)],
  ['I3', inLine(3, { wishes: even })],
  ['I4, anything', inLine(4)],
  ['V2 60°', vee(2, 60)],
  ['V6 90°, split', vee(6, 90, { splits: [0, -30 * DEG, 30 * DEG] })],
  ['V8 90°', vee(8, 90)],
  ['flat four, banks in turn', inLine(4, { bankAngles: [Math.PI] })],
  ['two-stroke three', inLine(3, { cycle: 2 * Math.PI })],
]

describe('layoutDocument(layout, base)', () => {
  it.each(cases)('%s: every row is a crank train that runs, with the intervals of the row', (_, request) => {
    const { layouts } = searchLayouts(request)
    for (const layout of [...layouts.slice(0, 12), ...layouts.slice(-4)]) {
      const document = layoutDocument(layout, base)
      expect(judge(document)).toEqual([])
      const { firing } = analyse(toTrain(document), { speed: 300, include: ['firing'] })
      expect(firing!.events.map(({ cylinder }) => Number(cylinder) - 1)).toEqual(layout.order)
      firing!.intervalsDeg.forEach((interval, i) =>
        expect(interval).toBeCloseTo(layout.intervals[i] / DEG, 5),
      )
    }
  })

  it.each(cases)(
    '%s: forces of order 1 and 2 are those of the row, the crank with its bob-weights in balance',
    (_, request) => {
      for (const layout of searchLayouts({ ...request, balanceFactor: base.balanceFactor }).layouts.slice(
        0,
        6,
      )) {
        const train = toTrain(layoutDocument(layout, base))
        const speed = 500
        const [one] = train.cylinders
        const unit = massSplit(one).reciprocating * train.throws[one.throw].radius * speed ** 2
        const { orders } = analyse(train, { speed, include: ['orders'] })
        const first = orders!.find(({ order }) => order === 1)!
        expect(first.forwardN / unit).toBeCloseTo(
          Math.abs(1 - 2 * base.balanceFactor) * layout.force1.forward,
          7,
        )
        expect(first.backwardN / unit).toBeCloseTo(layout.force1.backward, 7)
        const second = orders!.find(({ order }) => order === 2)!
        expect(second.forwardN * layout.force2.backward).toBeCloseTo(
          second.backwardN * layout.force2.forward,
          4,
        )
        const left = residualUnbalance(train)
        expect(left.static.size).toBeLessThan(1e-11)
        expect(left.couple.size).toBeLessThan(1e-12)
      }
    },
  )

  it('takes sizes, masses, speeds and gas from the present document', () => {
    const [layout] = searchLayouts(inLine(4, { wishes: even })).layouts
    const document = layoutDocument(layout, base)
    expect(document.cylinderDefaults).toEqual(base.cylinderDefaults)
    expect(document.masses).toEqual(base.masses)
    expect(document.operating).toEqual(base.operating)
    expect(document.gas).toEqual(base.gas)
    expect(document.balanceFactor).toBe(base.balanceFactor)
    expect(document.title).toBe('4 in line, 0/180/180/0')
  })

  it('a split pin is two throws side by side without a main between them', () => {
    const [layout] = searchLayouts(vee(6, 90, { splits: [-30 * DEG], wishes: even })).layouts
    const { throws, mains, cylinders } = layoutDocument(layout, base)
    expect(throws.map(({ id, angleDeg }) => `${id} ${angleDeg}`)).toEqual([
      '1a 0',
      '1b 330',
      '2a 120',
      '2b 90',
      '3a 240',
      '3b 210',
    ])
    expect(cylinders.map((cylinder) => cylinder.throw)).toEqual(['1a', '1b', '2a', '2b', '3a', '3b'])
    expect(mains).toHaveLength(4)
    for (const { axialMm } of mains)
      for (const at of [0, 2, 4])
        expect(axialMm > throws[at].axialMm && axialMm < throws[at + 1].axialMm).toBe(false)
  })

  it('keeps the spacing of the throws where as many rods stand on each', () => {
    const [v] = searchLayouts(vee(8, 90, { wishes: even })).layouts
    const apart = (document: ReturnType<typeof layoutDocument>) =>
      document.throws[1].axialMm - document.throws[0].axialMm
    expect(apart(layoutDocument(v, base))).toBeCloseTo(106, 6)
  })

  it('states firing angles where the order alone would be read as other intervals, and only there', () => {
    const { layouts } = searchLayouts(vee(2, 60))
    const [nearer, farther] = layouts.map((layout) =>
      layoutDocument(layout, base).cylinders.map(({ firesAtDeg }) => firesAtDeg),
    )
    expect(nearer).toEqual([undefined, undefined])
    expect(farther.every((angle) => angle !== undefined)).toBe(true)
  })
})
