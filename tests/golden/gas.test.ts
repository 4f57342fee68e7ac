import { describe, expect, it } from 'vitest'
import type { CrankTrainInput } from '@/scene/model/crank-train'
import { expectClose } from '@/tests/support/mechanics/close'
import { answer, instants } from '@/tests/support/mechanics/kernel'
import { preset, presetIds, ratedRpm } from '@/tests/support/mechanics/presets'
import { single } from '@/tests/support/mechanics/published/rig'
import { randomTrain } from '@/tests/support/mechanics/random-train'
import { reference } from '@/tests/support/mechanics/reference'

const gasOf = (id: string) =>
  preset(id).gas as Extract<NonNullable<CrankTrainInput['gas']>, { model: 'heat-release' }>

describe('gas: the heat-release model against an adaptive integrator', () => {
  const odd = (change: object, more: object = {}) => ({
    ...preset('single-450'),
    ...more,
    gas: { ...gasOf('single-450'), ...change },
  })
  it.each([
    ...[201, 202, 203, 204].map((seed) => ({
      name: `train ${seed}`,
      document: randomTrain(seed, { gas: 'heat-release' }),
    })),
    { name: 'no heat at all', document: odd({ heatPerCycleJ: 0 }) },
    { name: 'burning that begins at full rate (m 0)', document: odd({ wiebeM: 0 }) },
    { name: 'burning with m 0.3', document: odd({ wiebeM: 0.3 }) },
    {
      name: 'burning within two degrees',
      document: odd({ combustionStartDeg: -1, combustionDurationDeg: 2 }),
    },
    { name: 'burning cut short by the exhaust', document: odd({ combustionDurationDeg: 170 }) },
    {
      name: 'a large offset',
      document: odd({}, { cylinderDefaults: { ...preset('single-450').cylinderDefaults, offsetMm: -20 } }),
    },
  ])('analyse(train, …).gas of $name: 1e-6 of the peak', ({ document }) => {
    const { gas, angleDeg } = answer(document, 3000, 2)
    const { pressures, train } = reference(document, 3000, [...angleDeg])
    train.cylinders.forEach((c, i) => {
      expectClose(
        c.id,
        gas[c.id].pressureBar,
        pressures[i].map((p) => p / 1e5),
        1e-6,
      )
    })
    expect.hasAssertions()
  })

  it('analyse(train, …).gas starts the cycle at intake pressure exactly half a cycle from firing', () => {
    for (const id of ['i6-3000', 'v8x-5000', 'v12-60-6000', 'single-125-2t', 'm6-2t-520']) {
      const document = preset(id)
      const { gas, firing } = answer(document, 1000)
      const cycle = document.cycle === 'four-stroke' ? 720 : 360
      for (const { cylinder, angleDeg } of firing.events) {
        const seam = Math.round(angleDeg + cycle / 2) % cycle
        expect(gas[cylinder].pressureBar[seam], `${id} ${cylinder}`).toBeCloseTo(
          gasOf(id).intakePressureBar,
          9,
        )
      }
    }
  })

  it('heat not burnt at the end of the duration is never burnt', () => {
    const base = preset('single-450')
    const run = (wiebeA: number) =>
      instants({ ...base, gas: { ...gasOf('single-450'), wiebeA, exhaustOpensDeg: 150 } }, 1000)(140)
        .pressure[0]
    const [half, all] = [run(Math.LN2), run(40)]
    expect(half).toBeLessThan(all * 0.75)
  })
})

describe('gas: a trace', () => {
  const trace = {
    model: 'trace' as const,
    angleDeg: [-360, -200.5, -31, 0.25, 12, 95.5, 340],
    pressureBar: [1.1, 0.9, 14, 31, 55, 6, 1.4],
  }
  const at = instants({ ...single({ radius: 0.04, rod: 0.14 }), gas: trace }, 1000)

  it('pressure at its points is the trace’s, and linear between them', () => {
    trace.angleDeg.forEach((angle, i) => {
      expect(at(angle + 720).pressure[0] / 1e5, `at ${angle}`).toBeCloseTo(trace.pressureBar[i], 9)
    })
    expect(at(53.75).pressure[0] / 1e5).toBeCloseTo(30.5, 9)
    expect(at(720 - 280.25).pressure[0] / 1e5).toBeCloseTo(1, 9)
  })

  it('closes over the end of the cycle: between its last point and its first of the next cycle', () => {
    expect(at(350).pressure[0] / 1e5).toBeCloseTo(1.25, 9)
    expect(at(1070).pressure[0] / 1e5).toBeCloseTo(1.25, 9)
  })

  it('counts from each cylinder’s own firing top dead centre', () => {
    const document = { ...preset('v8x-5000'), gas: trace }
    const { gas, firing, angleDeg } = answer(document, 1000)
    const first = firing.events[0]
    for (const { cylinder, angleDeg: fires } of firing.events) {
      const shift = Math.round(fires - first.angleDeg)
      const own = Array.from(angleDeg, (_, i) => gas[cylinder].pressureBar[(i + shift + 720) % 720])
      expectClose(cylinder, own, gas[first.cylinder].pressureBar, 1e-12)
    }
  })
})

describe('gas: work', () => {
  /** Indicated mean effective pressure, bar, of the invented presets: a table of the same invented data, so ±0.5 %. */
  const imep: Record<string, number> = {
    'single-450': 13.2,
    'single-125-2t': 9.6,
    'p2-270-700': 12,
    'v2-45-1600': 11.2,
    'v2-90-1000': 13,
    'i3-1000': 21,
    'i4-2000': 19.5,
    'i4x-1000': 13.6,
    'i5-2500': 20.5,
    'i6-3000': 19,
    'i6d-12800': 24,
    'm6-2t-520': 19,
    'b4-2000': 13,
    'b6-3400': 13.4,
    'v6-60-3000': 13.2,
    'v6-90s-3200': 12.6,
    'v8x-5000': 13.4,
    'v8f-4200': 13.8,
    'v10-72-5000': 14.2,
    'v12-60-6000': 13.6,
    'r7-11': 9.6,
  }
  it.each(presetIds)(
    'mean torque of %s gives the mean effective pressure its data are set to (invented data, ±0.5 %)',
    (id) => {
      const document = preset(id)
      const { torque, train } = answer(document, ratedRpm(document))
      const angle = document.cycle === 'four-stroke' ? 4 * Math.PI : 2 * Math.PI
      const bar = (torque.meanNm * angle) / (train.displacementCc / 1e6) / 1e5
      expect(Math.abs(bar / imep[id] - 1)).toBeLessThan(0.005)
    },
  )

  it.each(presetIds)('mean torque × cycle angle of %s is Σ∮p dV of its own pressures', (id) => {
    const document = preset(id)
    const step = 0.25
    const { torque, gas, kinematics, angleDeg } = answer(document, ratedRpm(document), step)
    const turn = document.cycle === 'four-stroke' ? 4 * Math.PI : 2 * Math.PI
    const area = (Math.PI / 4) * (document.cylinderDefaults!.boreMm! / 1000) ** 2
    const work = document.cylinders.reduce((sum, { id: cylinder }) => {
      const { pressureBar } = gas[cylinder]
      const { travelMm } = kinematics[cylinder]
      return Array.from(angleDeg).reduce((total, _, i) => {
        const j = (i + 1) % angleDeg.length
        return (
          total + ((pressureBar[i] + pressureBar[j]) / 2) * 1e5 * area * ((travelMm[j] - travelMm[i]) / 1000)
        )
      }, sum)
    }, 0)
    expect(Math.abs((torque.meanNm * turn) / work - 1)).toBeLessThan(1e-4)
  })
})
