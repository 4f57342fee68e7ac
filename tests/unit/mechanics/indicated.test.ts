import { describe, expect, it } from 'vitest'
import { indicated } from '@/lib/mechanics/indicated'
import { indicatorDiagram } from '@/lib/mechanics/indicator-diagram'
import { buildPlan } from '@/lib/mechanics/plan'
import { answer, RAD_S, trainOf } from '@/tests/support/mechanics/kernel'
import { preset, presetIds, ratedRpm } from '@/tests/support/mechanics/presets'
import type { CrankTrainInput } from '@/scene/model/crank-train'

const of = (document: CrankTrainInput, rpm: number) => indicated(buildPlan(trainOf(document), rpm * RAD_S))

describe('indicated(plan)', () => {
  it.each(presetIds)(
    '%s: net work a cycle is mean torque × cycle angle, net power mean torque × speed',
    (id) => {
      const document = preset(id)
      const rpm = ratedRpm(document)
      const { torque, train } = answer(document, rpm, 0.5, ['torque'])
      const angle = document.cycle === 'four-stroke' ? 4 * Math.PI : 2 * Math.PI
      const { netPressure, power } = of(document, rpm)
      const wanted = (torque.meanNm * angle) / (train.displacementCc / 1e6)
      expect(Math.abs(netPressure / wanted - 1)).toBeLessThan(1e-4)
      expect(Math.abs(power / (torque.meanNm * rpm * RAD_S) - 1)).toBeLessThan(1e-4)
    },
  )

  it.each(['i4-2000', 'r7-11', 'single-125-2t'])(
    'work of %s is that of a very fine polygon through its diagram, within 1e-9',
    (id) => {
      const plan = buildPlan(trainOf(preset(id)), 100)
      const index = plan.train.cylinders.length - 1
      const polygon = (steps: number) => {
        const { pressure, volume } = indicatorDiagram(plan, index, steps)
        return pressure.reduce((sum, p, i) => {
          const next = (i + 1) % steps
          return sum + ((p + pressure[next]) / 2) * (volume[next] - volume[i])
        }, 0)
      }
      // Richardson: the polygon's error falls with the square of its step
      const [coarse, fine] = [polygon(36_000), polygon(72_000)]
      const wanted = fine + (fine - coarse) / 3
      expect(Math.abs(indicated(plan).cylinders[index].netWork / wanted - 1)).toBeLessThan(1e-9)
    },
  )

  it('gross leaves the gas exchange out: the difference is the loop between intake and exhaust pressure', () => {
    const document = preset('single-450')
    const still = { ...document, cylinderDefaults: { ...document.cylinderDefaults, offsetMm: 0 } }
    const pressures = { intakePressureBar: 1, exhaustPressureBar: 1, blowdownDeg: 1e-3 }
    const level = { ...still, gas: { ...still.gas, ...pressures } } as CrankTrainInput
    const back = { ...still, gas: { ...still.gas, ...pressures, exhaustPressureBar: 1.4 } } as CrankTrainInput
    expect(of(level, 1000).netPressure).toBeCloseTo(of(level, 1000).grossPressure, 3)
    const { netPressure, grossPressure } = of(back, 1000)
    // exhaust at 1.4 bar from bottom to top, and the stroke before bottom dead centre counts with the expansion
    expect((grossPressure - netPressure) / 1e5).toBeCloseTo(0.4, 6)
  })

  it('on a two-stroke net and gross are one', () => {
    const { netPressure, grossPressure } = of(preset('single-125-2t'), 5000)
    expect(netPressure).toBe(grossPressure)
  })

  it('of a trace is that of the polygon it is: a constant pressure does no work, a step does p × swept volume', () => {
    const document = preset('i4x-1000')
    const trace = (angleDeg: number[], pressureBar: number[]): CrankTrainInput => ({
      ...document,
      gas: { model: 'trace', angleDeg, pressureBar },
    })
    const flat = of(trace([-360, 0], [3, 3]), 3000)
    expect(Math.abs(flat.netPressure)).toBeLessThan(1e-6)
    const tiny = 1e-7
    const step = of(trace([-360, 0, tiny, 180, 180 + tiny], [1, 1, 11, 11, 1]), 3000)
    expect(step.netPressure / 1e5).toBeCloseTo(10, 6)
    expect(step.grossPressure / 1e5).toBeCloseTo(10, 6)
    expect(step.cylinders[0].peakPressure).toBeCloseTo(11e5, 6)
    expect((step.cylinders[0].peakAngle * 180) / Math.PI).toBeCloseTo(tiny, 9)
  })

  it('finds the peak between the angles of an analysis, higher than any of them', () => {
    const document = preset('v8x-5000')
    const { gas } = answer(document, 5000, 1, ['gas'])
    const sampled = Math.max(...gas['1'].pressureBar)
    const { peakPressure, peakAngle } = of(document, 5000).cylinders[0]
    expect(peakPressure / 1e5).toBeGreaterThanOrEqual(sampled)
    expect(peakPressure / 1e5 - sampled).toBeLessThan(0.05)
    expect((peakAngle * 180) / Math.PI).toBeGreaterThan(5)
    expect((peakAngle * 180) / Math.PI).toBeLessThan(25)
  })

  it('without a gas model there is no work', () => {
    const { netPressure, power } = of({ ...preset('i4-2000'), gas: { model: 'none' } }, 3000)
    expect(Math.abs(netPressure)).toBeLessThan(1e-6)
    expect(Math.abs(power)).toBeLessThan(1e-6)
  })
})
