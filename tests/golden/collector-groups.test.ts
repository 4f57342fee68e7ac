import { describe, expect, it } from 'vitest'
import { bestCollectorGroups } from '@/lib/mechanics/collector-groups'
import { firingOf } from '@/lib/mechanics/firing'
import { trainOf } from '@/tests/support/mechanics/kernel'
import { preset } from '@/tests/support/mechanics/presets'

// Groupings: common practice.

const DEG = Math.PI / 180
const degrees = (intervals: readonly number[]) => intervals.map((x) => Math.round((x / DEG) * 10) / 10)

function bestOf(id: string, count: number) {
  const train = trainOf(preset(id))
  const { groupings, complete } = bestCollectorGroups(train, count)
  expect(complete).toBe(true)
  return groupings[0].groups
    .map(({ cylinders, intervals }) => ({
      names: cylinders
        .map((cylinder) => train.cylinders[cylinder].id)
        .sort((one, other) => Number(one) - Number(other))
        .join(),
      intervals: degrees(intervals),
    }))
    .sort((one, other) => parseInt(one.names) - parseInt(other.names))
}

describe('bestCollectorGroups(train, count): common practice', () => {
  it('leads the cross-plane V8 as {1,4,6,7} and {2,3,5,8}, each every 180°, where the banks give 90, 180 and 270', () => {
    expect(bestOf('v8x-5000', 2)).toEqual([
      { names: '1,4,6,7', intervals: [180, 180, 180, 180] },
      { names: '2,3,5,8', intervals: [180, 180, 180, 180] },
    ])
    for (const bank of firingOf(trainOf(preset('v8x-5000'))).banks)
      expect(degrees(bank.intervals).toSorted((a, b) => a - b)).toEqual([90, 180, 180, 270])
  })

  it.each<[string, number, string[], number]>([
    ['i4-2000', 2, ['1,4', '2,3'], 360],
    ['b4-2000', 2, ['1,2', '3,4'], 360],
    ['i6-3000', 2, ['1,2,3', '4,5,6'], 240],
    ['i6-3000', 3, ['1,6', '2,5', '3,4'], 360],
    ['m6-2t-520', 2, ['1,2,3', '4,5,6'], 120],
    ['m6-2t-520', 3, ['1,4', '2,5', '3,6'], 180],
    ['b6-3400', 2, ['1,3,5', '2,4,6'], 240],
    ['v6-60-3000', 2, ['1,3,5', '2,4,6'], 240],
    ['v6-90s-3200', 3, ['1,4', '2,5', '3,6'], 360],
    ['v8x-5000', 4, ['1,6', '2,3', '4,7', '5,8'], 360],
    ['v8f-4200', 2, ['1,3,5,7', '2,4,6,8'], 180],
    ['v10-72-5000', 2, ['1,2,3,4,5', '6,7,8,9,10'], 144],
    ['v12-60-6000', 2, ['1,2,3,4,5,6', '7,8,9,10,11,12'], 120],
    ['v12-60-6000', 3, ['1,6,8,11', '2,5,9,10', '3,4,7,12'], 180],
    ['v12-60-6000', 4, ['1,2,3', '4,5,6', '7,8,9', '10,11,12'], 240],
  ])('%s into %i: %j, every %i°', (id, count, names, interval) => {
    const groups = bestOf(id, count)
    expect(groups.map((group) => group.names)).toEqual(names)
    for (const group of groups) for (const own of group.intervals) expect(own).toBeCloseTo(interval, 0)
  })

  it('i4x-1000 in pairs has 450 and 270 at best', () => {
    for (const { intervals } of bestOf('i4x-1000', 2))
      expect(intervals.toSorted((a, b) => a - b)).toEqual([270, 450])
  })
})
