import { describe, expect, it } from 'vitest'
import { formFor, readForm, type WishForm } from '@/components/layouts/form'
import { firstWords, missWords, searchedWords } from '@/components/layouts/words'
import type { LayoutRequest } from '@/lib/mechanics/layouts/layout'
import { presetById, presets } from '@/scene/model/presets'
import { toTrain } from '@/scene/model/to-train'
import { DEG, searchLayouts, vee } from '@/tests/support/mechanics/layout-search'

const document = presetById('v8x-5000')!.train
const train = toTrain(document)
const form = formFor(document)
const read = (part: Partial<WishForm>) => readForm({ ...form, ...part }, train)
const fields = (part: Partial<WishForm>) => read(part).problems.map(({ field }) => field)
const asked = (part: Partial<WishForm>): LayoutRequest => {
  const { request } = read(part)
  if (!request) throw new Error('refused')
  return request
}

describe('readForm(formFor(document), train)', () => {
  it.each(presets.map(({ id }) => id))('%s: the form as it opens can be searched', (id) => {
    const { train: own } = presetById(id)!
    expect(readForm(formFor(own), toTrain(own)).problems).toEqual([])
  })

  it('takes the engine on the bench: cylinders, cycle, bank angle, masses', () => {
    const request = asked({})
    expect(request.cylinders).toBe(8)
    expect(request.cycle).toBeCloseTo(4 * Math.PI, 12)
    expect(request.bankAngles.map((angle) => angle / DEG)).toEqual([expect.closeTo(90, 9)])
    expect(request.rodsPerThrow).toBe(2)
    expect(request.balanceFactor).toBe(document.balanceFactor)
  })

  it('tries each bank angle that is written, and split angles to either side', () => {
    expect(asked({ bankAngles: '60/72/90' }).bankAngles).toHaveLength(3)
    const splits = asked({ cylinders: '6', pins: 'split', splitMost: '60', splitStep: '30' }).splits
    expect(splits.map((angle) => Math.round(angle / DEG))).toEqual([-60, -30, 0, 30, 60])
  })

  it('a limit in degrees reaches the search as an angle', () => {
    const wishes = { ...form.wishes, unevenness: { importance: 'much', atMost: '30' } } as const
    expect(asked({ wishes }).wishes.unevenness).toEqual({ weight: 3, atMost: expect.closeTo(30 * DEG, 12) })
  })

  it.each<[string, Partial<WishForm>, string]>([
    ['thirteen cylinders', { cylinders: '13' }, 'cylinders'],
    ['seven and a half', { cylinders: '7.5' }, 'cylinders'],
    ['words for a number', { cylinders: 'eight' }, 'cylinders'],
    ['an odd number in pairs', { cylinders: '7' }, 'cylinders'],
    ['a bank angle beyond flat', { bankAngles: '200' }, 'bankAngles'],
    ['a length for an angle', { bankAngles: '90 mm' }, 'bankAngles'],
    ['splits too fine', { pins: 'split', splitStep: '1' }, 'splitStep'],
    [
      'a limit below nothing',
      { wishes: { ...form.wishes, counterweight: { importance: 'no', atMost: '-1' } } },
      'counterweight',
    ],
  ])('%s is refused at its field, with a mend that is taken', (_, part, field) => {
    const { problems } = read(part)
    expect([...new Set(problems.map((problem) => problem.field))]).toEqual([field])
    const { message, mend } = problems[0]
    expect(message).not.toBe('')
    const mended: Partial<WishForm> =
      field === 'counterweight'
        ? { wishes: { ...form.wishes, counterweight: { importance: 'no', atMost: mend! } } }
        : { ...part, [field]: mend! }
    expect(fields(mended)).toEqual([])
  })
})

describe('what was found, in words', () => {
  const words = (request: LayoutRequest) => {
    const found = searchLayouts(request)
    return {
      first: found.layouts.length > 0 ? firstWords(found, request) : '',
      searched: searchedWords(found, request),
      miss: missWords(found, request),
    }
  }

  it('why the first is first, and what the next loses by', () => {
    const { first, searched } = words(vee(8, 90, { wishes: { unevenness: { atMost: 0 }, secondForce: {} } }))
    expect(first).toMatch(/^0\/90\/270\/180 is first: no free second-order force and even firing\./)
    expect(first).toMatch(/The next phasing, .* is as good in all that is wished; it loses by/)
    expect(searched).toContain('throws at steps of 90°, where alone it can fire evenly')
  })

  it('how many phasings and orders on which grids', () => {
    const { searched } = words(vee(8, 90, { wishes: { sameBank: {} } }))
    expect(searched).toMatch(
      /^Looked at 14,820 phasings and [\d,]+ whole firing orders: throws at steps of 90°, 10° and 15°\./,
    )
  })

  it('which wish excludes all, and by how much the nearest misses', () => {
    const { miss } = words(vee(6, 90, { wishes: { unevenness: { atMost: 0 } } }))
    expect(miss).toContain('Nothing on these grids has unevenness at most 0°.')
    expect(miss).toMatch(/The nearest is .*: unevenness .*°, asked at most 0°\./)
  })
})
