import { describe, expect, it } from 'vitest'
import { indicatedDoubts } from '@/lib/mechanics/indicated-doubts'

const engine = (grossBar: number, peakBar: number, netBar = grossBar) => ({
  netPressure: netBar * 1e5,
  grossPressure: grossBar * 1e5,
  power: 1,
  cylinders: [{ netWork: 1, grossWork: 1, swept: 1, peakPressure: peakBar * 1e5, peakAngle: 0 }],
})
const codes = (...given: Parameters<typeof engine>) =>
  indicatedDoubts(engine(...given)).map(({ code }) => code)

describe('indicatedDoubts(engine)', () => {
  it('has nothing to say of usual figures', () => {
    expect(codes(13.4, 70)).toEqual([])
    expect(codes(24, 180)).toEqual([])
  })

  it('takes 1,950 bar for kilopascals, and says what they would be', () => {
    const [doubt] = indicatedDoubts(engine(1950, 9000))
    expect(doubt).toMatchObject({ code: 'mean-pressure-high' })
    expect(doubt.message).toContain('1,950 bar is not possible here')
    expect(doubt.message).toContain('19.5 bar')
  })

  it('says that a peak of 15 bar cannot go with a mean of 19.5', () => {
    expect(indicatedDoubts(engine(19.5, 15))).toEqual([
      {
        code: 'peak-pressure-low',
        message:
          'Peak pressure must be well above the mean: 15 bar at a mean of 19.5 bar; expected 58.5 bar and more.',
      },
    ])
  })

  it('tells a peak that no cylinder holds, and gas that takes work from the crank', () => {
    expect(codes(20, 900)).toEqual(['peak-pressure-high'])
    expect(codes(-2, 40, -2.3)).toEqual(['mean-pressure-negative'])
  })
})
