import { describe, expect, it } from 'vitest'
import { indicated } from '@/lib/mechanics/indicated'
import { buildPlan } from '@/lib/mechanics/plan'
import type { CrankTrainInput } from '@/scene/model/crank-train'
import { RAD_S, trainOf } from '@/tests/support/mechanics/kernel'
import { entries } from '@/tests/support/mechanics/published/entry'
import { single } from '@/tests/support/mechanics/published/rig'
import { preset, presetIds, ratedRpm } from '@/tests/support/mechanics/presets'

/** Presets' gross mean effective pressure, bar: common practice on the same invented data, printed to 0.1 bar. */
const gross: Record<string, number> = {
  'single-450': 13.2,
  'p2-270-700': 12,
  'v2-45-1600': 11.2,
  'v2-90-1000': 13,
  'i3-1000': 21,
  'i4-2000': 19.5,
  'v8x-5000': 13.4,
  'v8f-4200': 13.8,
  'v12-60-6000': 13.6,
}

describe('indicated figures', () => {
  it.each(Object.entries(gross))('%s is set to %d bar gross (common practice, ±1.5 %%)', (id, bar) => {
    const document = preset(id)
    const { grossPressure } = indicated(buildPlan(trainOf(document), ratedRpm(document) * RAD_S))
    expect(Math.abs(grossPressure / 1e5 / bar - 1)).toBeLessThan(0.015)
  })

  it('GAS-11: a two-stroke of 110 × 140 mm at 6 bar and 1,000 rpm indicates 13.3 kW', () => {
    const { inputs, expected, source } = entries.find(({ id }) => id === 'GAS-11')!
    expect(source.author).toBe('R. K. Rajput')
    const of = (name: string) => Number(inputs[name])
    const base = single({ radius: of('stroke_mm') / 2000, rod: 0.28, bore: of('bore_mm') / 1000 })
    const mean = of('indicatedMeanEffectivePressure_bar')
    // the mean pressure on the way down, none on the way up
    const document: CrankTrainInput = {
      ...base,
      cycle: 'two-stroke',
      gas: { model: 'trace', angleDeg: [-180, 0, 1e-8, 180 - 1e-8], pressureBar: [1, 1, 1 + mean, 1 + mean] },
    }
    const engine = indicated(buildPlan(trainOf(document), of('speed_rpm') * RAD_S))
    expect(engine.netPressure / 1e5).toBeCloseTo(mean, 6)
    expect(Math.abs(engine.power / 1000 / Number(expected.indicatedPower_kW) - 1)).toBeLessThan(1e-3)
  })

  it('the air-standard Otto cycle has its closed mean pressure: p₁ r (r^(γ−1) − 1)(α − 1)/((γ − 1)(r − 1))', () => {
    const [ratio, gamma, alpha] = [9, 1.4, 3]
    const base = single({ radius: 0.045, rod: 0.15, bore: 0.09 })
    const plan = buildPlan(
      trainOf({ ...base, cylinderDefaults: { ...base.cylinderDefaults, compressionRatio: ratio } }),
      0,
    )
    const [chamber] = plan.chambers
    const volume = (angleDeg: number) => {
      const alphaRad = (angleDeg * Math.PI) / 180
      const s = 0.045 * Math.cos(alphaRad) + Math.sqrt(0.15 ** 2 - (0.045 * Math.sin(alphaRad)) ** 2)
      return chamber.clearance + chamber.area * (0.195 - s)
    }
    const adiabat = (angleDeg: number) => (volume(180) / volume(angleDeg)) ** gamma
    const points: [number, number][] = [[-360, 1]]
    const step = 0.1
    for (let k = -1800; k <= 0; k++) points.push([k * step, adiabat(k * step)])
    points.push([1e-8, alpha * adiabat(0)])
    for (let k = 1; k <= 1800; k++) points.push([k * step, alpha * adiabat(k * step)])
    points.push([180 + 1e-8, 1])
    const trace: CrankTrainInput = {
      ...base,
      cylinderDefaults: { ...base.cylinderDefaults, compressionRatio: ratio },
      gas: { model: 'trace', angleDeg: points.map(([a]) => a), pressureBar: points.map(([, p]) => p) },
    }
    const { netPressure } = indicated(buildPlan(trainOf(trace), 100))
    const closed = (ratio * (ratio ** (gamma - 1) - 1) * (alpha - 1)) / ((gamma - 1) * (ratio - 1))
    expect(Math.abs(netPressure / 1e5 / closed - 1)).toBeLessThan(2e-5)
  })

  it('every preset is covered by its class’s usual peak: above its mean, under 250 bar', () => {
    for (const id of presetIds) {
      const document = preset(id)
      const { cylinders, netPressure } = indicated(buildPlan(trainOf(document), 100))
      for (const { peakPressure } of cylinders) {
        expect(peakPressure).toBeGreaterThan(3 * netPressure)
        expect(peakPressure).toBeLessThan(250e5)
      }
    }
  })
})
