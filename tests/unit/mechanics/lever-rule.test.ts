import { describe, expect, it } from 'vitest'
import { carriedBy } from '@/lib/mechanics/lever-rule'

const mains = [{ axial: 0 }, { axial: 100 }, { axial: 300 }]

describe('carriedBy(mains, axial)', () => {
  it.each([
    [25, 0, 0.25],
    [0, 0, 0],
    [100, 0, 1],
    [150, 1, 0.25],
    [300, 1, 1],
  ])('a load at %i is on main %i and the next, %f of it on the next', (axial, first, share) => {
    expect(carriedBy(mains, axial)).toEqual({ first, share })
  })

  it('beyond the last main the last two carry it, one of them lifting', () => {
    expect(carriedBy(mains, 400)).toEqual({ first: 1, share: 1.5 })
    expect(carriedBy(mains, -50)).toEqual({ first: 0, share: -0.5 })
  })
})
