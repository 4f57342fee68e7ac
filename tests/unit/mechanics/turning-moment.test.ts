import { describe, expect, it } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import { cycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { bankCylinders, momentFigures, torqueSignal } from '@/lib/mechanics/loads/turning-moment'
import { expectClose } from '@/tests/support/mechanics/close'
import { trainOf } from '@/tests/support/mechanics/kernel'
import { preset, presetIds, ratedRpm } from '@/tests/support/mechanics/presets'
import { RPM } from './trains'

describe('torqueSignal(parts, part, speed, cylinders)', () => {
  it.each(['i4-2000', 'v8x-5000', 'r7-11'])('of the cylinders and banks of %s adds up to the whole', (id) => {
    const train = trainOf(preset(id))
    const [parts, speed] = [cycleParts(train, 2), ratedRpm(preset(id)) * RPM]
    const { torque } = analyse(train, { speed, stepDeg: 2, include: ['torque'] })
    const adds = (groups: number[][]) => {
      const all = groups.map((group) => torqueSignal(parts, 'total', speed, group))
      return all[0].map((_, j) => all.reduce((sum, one) => sum + one[j], 0))
    }
    expectClose('cylinders', adds(train.cylinders.map((_, i) => [i])), torque!.totalNm, 1e-9)
    expectClose(
      'banks',
      adds(train.banks.map((_, bank) => bankCylinders(parts, bank))),
      torque!.totalNm,
      1e-9,
    )
    expectClose('gas', torqueSignal(parts, 'gas', speed), torque!.gasNm, 1e-9)
    expectClose('inertia', torqueSignal(parts, 'inertia', speed), torque!.inertiaNm, 1e-9)
  })

  it('of one cylinder is the throw’s radius × what its rod puts on the pin across the throw', () => {
    const train = trainOf(preset('i4-2000'))
    const speed = 4000 * RPM
    const { loads } = analyse(train, { speed, stepDeg: 2, include: ['loads'] })
    const one = torqueSignal(cycleParts(train, 2), 'total', speed, [1])
    const byPin = loads!['2'].crankPinN!.tangential.map((force) => force * train.throws[1].radius)
    expectClose('torque', one, byPin, 1e-9)
  })
})

describe('momentFigures(torque, cycle)', () => {
  it('of 20 + 9.5 sin 2θ has mean 20, the extremes where they are, and energy 9.5 (area under half a wave)', () => {
    const cycle = 4 * Math.PI
    const torque = Array.from({ length: 7200 }, (_, j) => 20 + 9.5 * Math.sin((2 * cycle * j) / 7200))
    const figures = momentFigures(torque, cycle)
    expect(figures.mean).toBeCloseTo(20, 9)
    expect(figures.most.value).toBeCloseTo(29.5, 9)
    expect(figures.most.angle).toBeCloseTo(Math.PI / 4, 9)
    expect(figures.least.value).toBeCloseTo(10.5, 9)
    expect(figures.least.angle).toBeCloseTo((3 * Math.PI) / 4, 9)
    expect(figures.energy).toBeCloseTo(9.5, 4)
  })

  it('has the mean and energy fluctuation of the analysis', () => {
    const train = trainOf(preset('v6-60-3000'))
    const speed = 5000 * RPM
    const { torque } = analyse(train, { speed, include: ['torque'] })
    const { mean, energy } = momentFigures(torqueSignal(cycleParts(train), 'total', speed), train.cycle)
    expect(mean / torque!.meanNm).toBeCloseTo(1, 9)
    expect(energy / torque!.energyFluctuationJ).toBeCloseTo(1, 9)
  })

  // net indicated mean effective pressure: ∮ p dV over the cycle ÷ swept volume, from the very trace that drives the piston
  it.each(presetIds.filter((id) => preset(id).gas?.model !== 'none'))(
    'of %s has the mean of net IMEP × swept volume ÷ 4π (2π two-stroke) within 0.1 %%',
    (id) => {
      const document = preset(id)
      const train = trainOf(document)
      const speed = ratedRpm(document) * RPM
      const { gas, kinematics } = analyse(train, { speed, stepDeg: 0.25, include: ['gas', 'kinematics'] })
      const work = train.cylinders.reduce((sum, { id: cylinder, bore }) => {
        const pressure = gas![cylinder].pressureBar
        const travel = kinematics![cylinder].travelMm
        const area = (Math.PI / 4) * bore * bore
        return travel.reduce((all, at, j) => {
          const next = (j + 1) % travel.length
          return all + ((pressure[j] + pressure[next]) / 2) * 1e5 * area * ((travel[next] - at) / 1000)
        }, sum)
      }, 0)
      const swept = train.cylinders.reduce(
        (sum, { id: cylinder, bore }) =>
          sum + ((Math.PI / 4) * bore * bore * kinematics![cylinder].strokeMm) / 1000,
        0,
      )
      const netImep = work / swept
      const wanted = (netImep * swept) / (train.cycle === 4 * Math.PI ? 4 * Math.PI : 2 * Math.PI)
      const { mean } = momentFigures(torqueSignal(cycleParts(train), 'total', speed), train.cycle)
      expect(netImep).toBeGreaterThan(1e5)
      expect(Math.abs(mean / wanted - 1)).toBeLessThan(0.001)
    },
  )
})
