import { describe, expect, it } from 'vitest'
import { layoutsSchema } from '@/lib/contracts/layouts'
import type { Issue } from '@/scene/model/issue'
import { call } from './support/call'
import { useServer } from './support/server'

useServer()

const post = (body: unknown) => call('POST', '/api/v1/layouts', { body })
const answerOf = async (body: unknown) => {
  const { status, body: answer } = await post(body)
  expect(status).toBe(200)
  const parsed = layoutsSchema.parse(answer)
  expect(parsed).toEqual(answer)
  return parsed
}
const v8 = { cylinders: 8, banks: 2, bankAnglesDeg: [90] }

describe('POST /layouts', () => {
  it('finds the flat-plane V8 when banks must alternate (common practice)', async () => {
    const { layouts, evaluated, capped } = await answerOf({
      ...v8,
      wishes: { unevennessDeg: { atMost: 0 }, sameBank: { atMost: 0 } },
    })
    expect(layouts[0].throwAnglesDeg.map((angle) => Math.round(angle))).toEqual([0, 180, 180, 0])
    expect(layouts[0].secondOrderForce).toBeCloseTo(4 * Math.SQRT2, 9)
    expect(layouts[0].intervalsDeg).toHaveLength(8)
    expect(evaluated).toBeGreaterThan(0)
    expect(capped).toBe(false)
  })

  it('finds the cross-plane V8 when no free second-order force is wished (common practice)', async () => {
    const { layouts } = await answerOf({
      ...v8,
      wishes: { unevennessDeg: { atMost: 0 }, secondOrderForce: { atMost: 0 } },
    })
    expect(layouts[0].throwAnglesDeg.map((angle) => Math.round(angle))).toEqual([0, 90, 270, 180])
    expect(layouts[0].bare.couple1.forward).toBeCloseTo(Math.sqrt(10), 9)
  })

  it('takes a request of one number, and keeps as many layouts as asked for', async () => {
    const { layouts, stepsDeg } = await answerOf({ cylinders: 4, keep: 3 })
    expect(layouts).toHaveLength(3)
    expect(stepsDeg).toEqual([180, 10, 15])
    expect(layouts[0].bankAngleDeg).toBeNull()
  })

  it('says which wishes nothing fulfils, and the nearest miss', async () => {
    const { layouts, nearestMiss } = await answerOf({
      cylinders: 6,
      banks: 2,
      bankAnglesDeg: [90],
      wishes: { unevennessDeg: { atMost: 0 } },
    })
    expect(layouts).toEqual([])
    expect(nearestMiss?.impossible).toEqual(['unevennessDeg'])
    // a common-pin crank at 0/120/240 fires at 90° and 150° by turns: the nearest miss is no worse
    expect(nearestMiss?.layout.unevennessDeg).toBeGreaterThan(1)
    expect(nearestMiss?.layout.unevennessDeg).toBeLessThanOrEqual(60)
  })

  it.each([
    ['no cylinders', {}, ['cylinders']],
    ['13 cylinders', { cylinders: 13 }, ['cylinders']],
    ['an odd V', { cylinders: 7, banks: 2 }, ['cylinders']],
    ['two rods on one bank', { cylinders: 4, rodsPerThrow: 2 }, ['rodsPerThrow']],
    ['a split pin with one rod', { cylinders: 4, splitAnglesDeg: [30] }, ['splitAnglesDeg']],
    ['a step that leaves a rest', { cylinders: 4, stepsDeg: [50] }, ['stepsDeg.0']],
    ['a search too large', { cylinders: 8, stepsDeg: [5] }, ['stepsDeg']],
    ['twelve cylinders of a two-stroke', { cylinders: 12, cycle: 'two-stroke' }, ['cylinders']],
    [
      'a limit below nothing',
      { cylinders: 4, wishes: { counterweight: { atMost: -1 } } },
      ['wishes.counterweight.atMost'],
    ],
  ])('refuses %s with its path, what is wrong and what would be right', async (_, body, paths) => {
    const answer = await post(body)
    expect(answer.status).toBe(422)
    const { issues } = answer.body as { issues: Issue[] }
    expect(issues.map(({ path }) => path)).toEqual(paths)
    for (const { message, fix } of issues) expect(message !== '' && fix !== '').toBe(true)
  })
})
