import { describe, expect, it } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import { inline, presetTrain, RPM, trainOf } from './trains'

const codes = (train: Parameters<typeof analyse>[0], speed: number) =>
  analyse(train, { speed, include: ['cautions'] }).cautions!.map(({ code }) => code)

describe('cautions', () => {
  it('always say what the figures assume and whom they defer to', () => {
    for (const train of [presetTrain('i4-2000'), trainOf(inline([0], { mains: [] }))])
      expect(codes(train, 100)).toEqual(
        expect.arrayContaining(['maker-first', 'rigid-crank', 'constant-speed']),
      )
  })

  it('warn above the maximum speed, and only there', () => {
    const train = presetTrain('v8x-5000')
    expect(codes(train, 7200 * RPM)).not.toContain('over-speed')
    expect(codes(train, 7300 * RPM)).toContain('over-speed')
    const said = analyse(train, { speed: 7300 * RPM, include: ['cautions'] }).cautions!
    expect(said.find(({ code }) => code === 'over-speed')!.message).toContain(
      '7,300 rpm is above the maximum of 7,200 rpm',
    )
  })

  it('say what is special to this train', () => {
    expect(codes(presetTrain('i4-2000'), 0)).toContain('standing')
    expect(codes(presetTrain('i4-2000'), 10)).toEqual(
      expect.arrayContaining(['hinged-mains', 'heat-release']),
    )
    const bare = trainOf(inline([0, 120, 240], { mains: [], firingOrder: ['1', '3', '2'] }))
    expect(codes(bare, 10)).toEqual(expect.arrayContaining(['no-gas', 'two-mass-rod', 'bunched-firing']))
    expect(codes(bare, 10)).not.toContain('hinged-mains')
    expect(codes(presetTrain('i3-1000'), 10)).not.toContain('bunched-firing')
  })

  it('keep to the words of the house: no Greek letters, no hyphen for a minus', () => {
    for (const { message } of analyse(presetTrain('r7-11'), { speed: 9e3, include: ['cautions'] }).cautions!)
      expect(message).not.toMatch(/[α-ω]|(^|\s)-\d/)
  })
})
