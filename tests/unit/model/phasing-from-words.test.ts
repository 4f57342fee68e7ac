import { describe, expect, it } from 'vitest'
import { presets } from '@/scene/model/presets'
import { readPhasing } from '@/scene/model/read-phasing'
import { readTrain } from '@/scene/model/read-train'
import type { CrankTrain } from '@/scene/model/crank-train'

const documentOf = (id: string): CrankTrain => structuredClone(presets.find((one) => one.id === id)!.train)
function asked(document: CrankTrain, order: string, intervalsDeg?: number[]) {
  const read = readTrain(document)
  if (!read.ok) throw new Error('does not read')
  return readPhasing(read.document, read.train, order.split('-'), intervalsDeg)
}
const refusals = (id: string, order: string, intervalsDeg?: number[]) => {
  const answer = asked(documentOf(id), order, intervalsDeg)
  return answer.ok ? [] : answer.issues
}

describe('readPhasing(document, train, order, intervalsDeg)', () => {
  it('proposes throws that read and fire in the order, and the mirror in the order backwards', () => {
    for (const [id, order] of [
      ['i3-1000', '1-2-3'],
      ['i4-2000', '1-4-2-3'],
      ['i6-3000', '1-2-3-4-5-6'],
      ['b6-3400', '1-4-5-2-3-6'],
    ]) {
      const document = documentOf(id)
      const answer = asked(document, order)
      expect(answer.ok, order).toBe(true)
      if (!answer.ok || !answer.mirror.ok) throw new Error('no proposal')
      for (const { order: firingOrder, throws } of [answer.proposal, answer.mirror.proposal]) {
        const taken = {
          ...document,
          firingOrder,
          throws: document.throws.map((pin, index) => ({ ...pin, angleDeg: throws[index].angleDeg })),
        }
        expect(readTrain(taken).ok, `${id} ${firingOrder.join('-')}`).toBe(true)
      }
    }
  })

  it('i3-1000: 1-3-2 wants 0/240/120 and its mirror 1-2-3 wants 0/120/240', () => {
    const answer = asked(documentOf('i3-1000'), '1-3-2')
    if (!answer.ok || !answer.mirror.ok) throw new Error('no proposal')
    expect(answer.proposal.throws.map(({ angleDeg }) => angleDeg)).toEqual([0, 240, 120])
    expect(answer.mirror.proposal).toEqual({
      order: ['1', '2', '3'],
      throws: [
        { id: '1', angleDeg: 0 },
        { id: '2', angleDeg: 120 },
        { id: '3', angleDeg: 240 },
      ],
    })
  })

  it('takes uneven intervals: i4x-1000 gets its own throws back', () => {
    const document = documentOf('i4x-1000')
    const answer = asked(document, document.firingOrder.join('-'), [270, 180, 90, 180])
    if (!answer.ok) throw new Error('no proposal')
    answer.proposal.throws.forEach(({ angleDeg }, index) =>
      expect(angleDeg).toBeCloseTo(document.throws[index].angleDeg, 6),
    )
  })

  it('refuses a cylinder named twice, one that is missing and one that there is not', () => {
    expect(refusals('i4-2000', '1-3-3-2')[0].message).toBe(
      'The firing order has 4 entries for 4 cylinders; cylinder 3 appears more than once and 4 is missing.',
    )
    expect(refusals('i4-2000', '1-3-4-2-5').map(({ code, path }) => [code, path])).toEqual([
      ['unknown-cylinder', 'order'],
    ])
  })

  it('refuses intervals that do not close the cycle, or are not one a cylinder', () => {
    expect(refusals('i4-2000', '1-3-4-2', [180, 180, 180, 160])[0].message).toBe(
      'Intervals add up to 700°, must be 720°: one four-stroke cycle.',
    )
    expect(refusals('m6-2t-520', '1-5-3-4-2-6', [120, 120, 120, 120, 120, 120])[0].message).toBe(
      'Intervals add up to 720°, must be 360°: one two-stroke cycle.',
    )
    expect(refusals('i4-2000', '1-3-4-2', [360, 360])[0].message).toBe('2 intervals for 4 cylinders.')
    expect(refusals('i4-2000', '1-3-4-2', [-180, 540, 180, 180])[0].path).toBe('intervalsDeg')
    expect(refusals('i4-2000', '1-3-4-2', [NaN, 540, 180, 180])[0].path).toBe('intervalsDeg')
  })

  it('names the cylinders whose common throw would have to stand in two places', () => {
    const [issue] = refusals('v8x-5000', '1-3-2-4-5-6-7-8')
    expect(issue.code).toBe('throw-in-two-places')
    expect(issue.message).toBe(
      'Cylinders 1 and 2 share throw 1, and the order 1-3-2-4-5-6-7-8 wants it in two places, 90° apart.',
    )
    expect(issue.fix).toContain('split by 90°')
  })
})
