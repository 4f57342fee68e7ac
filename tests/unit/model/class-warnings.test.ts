import { describe, expect, it } from 'vitest'
import { crankTrainSchema } from '@/scene/model/crank-train'
import { acknowledge, acknowledgementOf, doubtsOf, withdraw } from '@/scene/model/doubts'
import { engineClassOf, guessedClass } from '@/scene/model/engine-class'
import { presetById, presets } from '@/scene/model/presets'
import { readScene } from '@/scene/model/read-scene'
import { newScene } from '@/scene/model/default-scene'

const train = (id: string) => presetById(id)!.train

describe('guessedClass(document)', () => {
  it.each([
    ['single-450', 'small-single'],
    ['single-125-2t', 'small-single'],
    ['i4-2000', 'car'],
    ['b6-3400', 'car'],
    ['v8x-5000', 'car'],
    ['v12-60-6000', 'car'],
    ['v2-45-1600', 'v-twin'],
    ['v2-90-1000', 'v-twin'],
    ['v8f-4200', 'racing'],
    ['v10-72-5000', 'racing'],
    ['i6d-12800', 'heavy-diesel'],
    ['m6-2t-520', 'marine'],
    ['r7-11', 'radial'],
    // no column of their own: parallel twin, motorcycle four
    ['p2-270-700', null],
    ['i4x-1000', null],
  ])('guessedClass(%s) is %s', (id, expected) => expect(guessedClass(train(id))).toBe(expected))
  it('a class that somebody has set goes before the guess, and none asks nothing', () => {
    expect(engineClassOf({ ...train('i4-2000'), engineClass: 'racing' })).toBe('racing')
    expect(doubtsOf({ ...train('i4-2000'), engineClass: 'none' })).toEqual([])
    expect(doubtsOf({ ...train('i4-2000'), engineClass: 'racing' }).length).toBeGreaterThan(3)
  })
})

describe('doubtsOf(document)', () => {
  it.each(presets.map(({ id }) => id))('doubtsOf(%s) is empty: presets are what is usual', (id) => {
    expect(doubtsOf(train(id)).map(({ code, head, message }) => `${code} ${head} ${message}`)).toEqual([])
  })
})

describe('acknowledge(document, doubt, reason)', () => {
  const heavy = { ...train('i4-2000'), masses: { ...train('i4-2000').masses, pistonKg: 0.6 } }
  const doubt = doubtsOf(heavy).find(({ code }) => code === 'M02')!
  const kept = acknowledge(heavy, doubt, '  steel piston, weighed ', '2026-12-01T10:00:00Z')

  it('stores code, path, value and reason in the document, which still reads', () => {
    expect(kept.acknowledged).toEqual([
      {
        code: 'M02',
        path: 'masses.pistonKg',
        value: 0.6,
        reason: 'steel piston, weighed',
        at: '2026-12-01T10:00:00Z',
      },
    ])
    const read = readScene(JSON.parse(JSON.stringify(newScene(kept))))
    expect(read.ok && read.scene.train.acknowledged).toEqual(kept.acknowledged)
  })
  it('holds for this very value: another is asked about again', () => {
    expect(acknowledgementOf(kept, doubt)?.reason).toBe('steel piston, weighed')
    const heavier = { ...kept, masses: { ...kept.masses, pistonKg: 0.7 } }
    const [again] = doubtsOf(heavier).filter(({ code }) => code === 'M02')
    expect(acknowledgementOf(heavier, again)).toBeUndefined()
    expect(acknowledge(heavier, again, 'cast iron').acknowledged).toHaveLength(1)
  })
  it('withdraw(document, doubt) leaves the document as it was', () => {
    expect(withdraw(kept, doubt)).toEqual(heavy)
  })
  it('a document that knows nothing of it opens as before, and one without a reason is refused', () => {
    expect(crankTrainSchema.parse(train('i4-2000'))).toEqual(train('i4-2000'))
    expect(
      crankTrainSchema.safeParse({ ...heavy, acknowledged: [{ code: 'M02', path: 'x', reason: ' ' }] })
        .success,
    ).toBe(false)
  })
})
