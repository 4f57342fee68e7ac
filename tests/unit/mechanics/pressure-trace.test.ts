import { describe, expect, it } from 'vitest'
import { pressureTrace, tracePressure } from '@/lib/mechanics/pressure-trace'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import { DEG, inline, trainOf } from './trains'

const trace = pressureTrace(
  { model: 'trace', angle: Float64Array.of(-4, -1, 0, 2), pressure: Float64Array.of(1, 4, 10, 2) },
  8,
)

describe('tracePressure(trace, angle)', () => {
  it.each([
    [-4, 1],
    [-2.5, 2.5],
    [-1, 4],
    [0.5, 8],
    [2, 2],
    [3, 1.5],
    [3.999, 1.0005],
  ])(
    'at %f is %f: linear between points, and from the last to the first of the next cycle',
    (angle, pressure) => {
      expect(tracePressure(trace, angle)).toBeCloseTo(pressure, 12)
    },
  )
})

it('a trace counts from each cylinder’s own firing top dead centre', () => {
  const angleDeg = Array.from({ length: 72 }, (_, k) => -360 + 10 * k)
  const train = trainOf(
    inline([0, 180], {
      gas: { model: 'trace', angleDeg, pressureBar: angleDeg.map((angle) => (angle === 0 ? 50 : 1)) },
      firingOrder: ['1', '2'],
    }),
  )
  const plan = buildPlan(train, 0)
  const instant = buildInstant(plan)
  fillInstant(instant, plan, 180 * DEG)
  expect(instant.pressure[1]).toBeCloseTo(50e5, 4)
  expect(instant.pressure[0]).toBeCloseTo(1e5, 6)
  expect(instant.gasForce[1]).toBeCloseTo((50e5 - 101325) * (Math.PI / 4) * 0.08 ** 2, 6)
  fillInstant(instant, plan, 185 * DEG)
  expect(instant.pressure[1]).toBeCloseTo(25.5e5, 4)
})
