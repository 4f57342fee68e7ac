import { describe, expect, it } from 'vitest'
import { beatsBetween, beatsOf, tooFastToShow, type Beat } from '@/components/firing/rhythm'
import { exhaustPulses } from '@/lib/mechanics/exhaust-pulses'
import { firingAngles } from '@/lib/mechanics/firing'
import { DEG, presetTrain } from '../mechanics/trains'

const CYCLE = 720
const beats: Beat[] = [0, 180, 360, 540].map((angle, cylinder) => ({ cylinder, angle, side: 0 }))
const passed = (from: number, to: number) =>
  beatsBetween(beats, CYCLE, from, to).map(({ beat, angle }) => [beat.cylinder, angle])

describe('beatsOf(pulses)', () => {
  it('has a beat where each exhaust opens, the first collector left and the last right', () => {
    const train = presetTrain('v8x-5000')
    const found = beatsOf(exhaustPulses(train, { opens: 135 * DEG, length: 1 }))
    const angles = firingAngles(train)
    expect(found).toHaveLength(8)
    for (const { cylinder, angle, side } of found) {
      expect(Math.cos(angle - angles[cylinder] - 135 * DEG)).toBeCloseTo(1, 9)
      expect(side).toBe(train.collectors[0].cylinders.includes(cylinder) ? -1 : 1)
    }
    expect(found.map(({ angle }) => angle)).toEqual(found.map(({ angle }) => angle).toSorted((a, b) => a - b))
  })

  it('puts one collector in the middle', () => {
    for (const { side } of beatsOf(exhaustPulses(presetTrain('i4-2000'), { opens: 2, length: 1 })))
      expect(side).toBe(0)
  })
})

describe('beatsBetween(beats, cycle, from, to)', () => {
  it('passes each beat once, however the way is divided', () => {
    const whole = passed(-1, 2200)
    const parts = [-1, 50, 179.9, 180, 181, 719, 720, 1500, 2200].flatMap((to, index, all) =>
      index === 0 ? [] : passed(all[index - 1], to),
    )
    expect(parts).toEqual(whole)
    expect(whole).toHaveLength(13)
  })

  it('passes them the other way round when the crank turns backwards', () => {
    expect(passed(400, 100)).toEqual([
      [2, 360],
      [1, 180],
    ])
    expect(passed(10, -200)).toEqual([
      [0, 0],
      [3, -180],
    ])
  })

  it('passes none while the crank stands', () => {
    expect(passed(180, 180)).toEqual([])
  })
})

describe('tooFastToShow(beats, cycle, rate)', () => {
  it('is more than three changes a second', () => {
    expect(tooFastToShow(4, CYCLE, 539)).toBe(false)
    expect(tooFastToShow(4, CYCLE, 541)).toBe(true)
    expect(tooFastToShow(4, CYCLE, -541)).toBe(true)
  })
})
