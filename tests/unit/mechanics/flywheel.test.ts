import { describe, expect, it } from 'vitest'
import { flywheelInertia, speedFluctuation, speedRange } from '@/lib/mechanics/loads/flywheel'

describe('flywheelInertia(energy, fluctuation, speed)', () => {
  it('is E/(C·ω²), and speedFluctuation goes back', () => {
    expect(flywheelInertia(1641, 0.01, 100)).toBeCloseTo(16.41, 12)
    const inertia = flywheelInertia(1641, 0.013, 314)
    expect(speedFluctuation(1641, inertia, 314)).toBeCloseTo(0.013, 12)
  })
})

describe('speedRange(energy, inertia, speed)', () => {
  it('has the given energy between its extremes, and the speed half-way between them', () => {
    const { most, least } = speedRange(56_000, 21_060, 12.566)
    expect((21_060 * (most ** 2 - least ** 2)) / 2).toBeCloseTo(56_000, 6)
    expect((most + least) / 2).toBeCloseTo(12.566, 12)
  })
})
