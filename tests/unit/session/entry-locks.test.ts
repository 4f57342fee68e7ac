import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fields } from '@/components/bench/fields'
import { differ, exceptions, ownField, ownNames, ownValues } from '@/components/bench/own-fields'
import { analyse } from '@/lib/mechanics/analysis'
import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import { toTrain } from '@/scene/model/to-train'
import { keepFitting } from '@/scene/session/keep-fitting'
import { deckOf, displacementOf } from '@/scene/session/locks'
import { createSession } from '@/scene/session/session'
import { setOut, type SettingOut } from '@/scene/session/set-out'

const start = (preset = 'i4-2000') => createSession({ scene: newScene(presetById(preset)!.train) })
type Session = ReturnType<typeof start>
const train = (session: Session) => session.getState().scene.train
const swept = (session: Session) =>
  analyse(toTrain(train(session)), { speed: 1, include: [] }).train.displacementCc

describe('session.setLock(displacement) (D-18)', () => {
  it('bore changes and stroke follows: the swept volume of the analysis stays, in one undo step', () => {
    const session = start()
    const before = { scene: session.getState().scene, swept: swept(session) }
    session.setLock('displacement', true)
    session.enter(fields.bore, '90')
    session.seal()
    expect(train(session).cylinderDefaults.boreMm).toBe(90)
    expect(train(session).cylinderDefaults.strokeMm).toBeCloseTo((87.6 * 85.2 ** 2) / 90 ** 2, 1)
    expect(swept(session)).toBeCloseTo(before.swept, 9)
    expect(session.getState().past).toHaveLength(1)
    session.undo()
    expect(session.getState().scene).toEqual(before.scene)
  })
  it('stroke changes and bore follows', () => {
    const session = start('v8x-5000')
    const before = swept(session)
    session.setLock('displacement', true)
    session.enter(fields.stroke, '92')
    expect(train(session).cylinderDefaults.strokeMm).toBe(92)
    expect(swept(session)).toBeCloseTo(before, 9)
  })
  it('any bore from 60 to 92 mm holds it, with the offset and with one unequal cylinder', () => {
    fc.assert(
      fc.property(fc.double({ min: 75, max: 91, noNaN: true }), (bore) => {
        const session = start()
        session.edit([{ path: ['train', 'cylinders', 2, 'boreMm'], value: 84 }])
        const before = swept(session)
        session.setLock('displacement', true)
        session.enter(fields.bore, `${bore} mm`)
        expect(session.getState().refused).toEqual({})
        expect(Math.abs(swept(session) / before - 1)).toBeLessThan(1e-12)
      }),
      { numRuns: 40 },
    )
  })
  it('with the lock let go only the typed value changes', () => {
    const session = start()
    session.setLock('displacement', true)
    session.setLock('displacement', false)
    session.enter(fields.bore, '90')
    expect(train(session).cylinderDefaults.strokeMm).toBe(87.6)
  })
})

describe('session.setLock(deck) (D-18)', () => {
  it('rod changes and compression height follows: the crown stands where it stood', () => {
    const session = start()
    const deck = deckOf(train(session))!
    session.setLock('deck', true)
    session.enter(fields.rodLength, '148.5')
    expect(train(session).shape!.compressionHeightMm).toBeCloseTo(29, 1)
    expect(deckOf(train(session))).toBeCloseTo(deck, 9)
    session.enter(fields.stroke, '86')
    expect(deckOf(train(session))).toBeCloseTo(deck, 9)
    session.enter(fields.compressionHeight, '31')
    expect(train(session).shape!.compressionHeightMm).toBe(31)
    expect(deckOf(train(session))).toBeCloseTo(deck, 9)
  })
  it('with both locks a bore moves stroke and compression height', () => {
    const session = start()
    const before = { deck: deckOf(train(session))!, swept: displacementOf(train(session)) }
    session.setLock('deck', true)
    session.setLock('displacement', true)
    session.enter(fields.bore, '88')
    expect(deckOf(train(session))).toBeCloseTo(before.deck, 9)
    expect(displacementOf(train(session)) / before.swept).toBeCloseTo(1, 12)
    expect(session.getState().past).toHaveLength(1)
  })
  it('a rod that leaves no room for the piston is refused, and nothing has moved', () => {
    const session = start()
    session.setLock('deck', true)
    const before = session.getState().scene
    session.enter(fields.rodLength, '180')
    expect(session.getState().scene).toBe(before)
    expect(session.getState().refused.rodLengthMm.message).toMatch(/at least 0.001 mm/)
  })
})

describe('a cylinder that differs (D-15)', () => {
  const which = (name: string) => ownNames.find((each) => each.name === name)!.index
  it.each(ownNames.map(({ name }) => name).filter((name) => name !== 'Rod inertia'))(
    '%s of one cylinder begins as the common one, is its own, and goes back',
    (name) => {
      const session = start()
      const { scene } = session.getState()
      expect(session.edit(differ(which(name), 2, scene))).toBe(true)
      const { field, common, reset } = ownField(which(name), 2)
      expect(field.get(session.getState().scene)).toBe(common.get(scene))
      expect(exceptions(train(session), common)).toEqual(['3'])
      const next = (common.get(scene) ?? 0) * 1.01 + (name === 'Offset' ? 1 : 0)
      expect(session.edit(field.changes(next, session.getState().scene))).toBe(true)
      expect(field.get(session.getState().scene)).toBe(next)
      expect(common.get(session.getState().scene)).toBe(common.get(scene))
      expect(session.edit(reset(session.getState().scene))).toBe(true)
      expect(ownValues(train(session))).toEqual([])
      expect(session.getState().scene).toEqual(scene)
    },
  )
  it('a piston 2 g heavier on one cylinder leaves its share of unbalance, in g mm and N at speed', () => {
    const session = start()
    const residual = () =>
      analyse(toTrain(train(session)), { speed: 628.3185307179587, include: ['balance'] }).balance!.residual
    const before = residual().staticKgMm
    const { field } = ownField(which('Piston, bare'), 0)
    session.edit(differ(which('Piston, bare'), 0, session.getState().scene))
    session.edit([{ path: ['train', 'balanceFactor'], value: 0.5 }])
    const level = residual().staticKgMm
    session.enter(field, '320')
    expect(session.getState().refused).toEqual({})
    // half of 2 g at a throw of 43.8 mm: 43.8 g mm, which at 6,000 rpm is 17.3 N
    expect((residual().staticKgMm - level) * 1000).toBeCloseTo(43.8, 6)
    expect(before).toBeCloseTo(0, 3)
  })
  it('the usual range holds for one cylinder as for all: 0.32 is asked about', () => {
    const session = start()
    session.edit(differ(which('Piston, bare'), 0, session.getState().scene))
    const { field } = ownField(which('Piston, bare'), 0)
    session.enter(field, '0.32')
    expect(session.getState().refused[field.key].mends[0].label).toBe('Use 0.32 kg = 320 g')
  })
})

describe('keepFitting(old, laid) (D-01)', () => {
  const old = presetById('i4-2000')!.train
  const layout: SettingOut = {
    title: 'Five',
    cycle: 'four-stroke',
    bankAngles: [0],
    throwAngles: [0, 144, 216, 288, 72],
    arrangement: 'every-bank',
    boreMm: 85.2,
    strokeMm: 87.6,
  }
  it('one more cylinder keeps sizes, masses, journals, gas and speeds, and lists what was reset', () => {
    const { document, kept, reset } = keepFitting(old, setOut(layout))
    expect(document.cylinders).toHaveLength(5)
    for (const key of ['cylinderDefaults', 'masses', 'shape', 'gas', 'operating', 'balanceFactor'] as const)
      expect(document[key]).toEqual(old[key])
    expect(kept.join()).toMatch(/bore.*masses.*journals/)
    expect(reset.join()).toMatch(/8 counterweights.*5 mains.*firing order 1-3-4-2, now 1-/)
  })
  it('a two-stroke keeps no four-stroke gas', () => {
    const { document, reset } = keepFitting(old, setOut({ ...layout, cycle: 'two-stroke' }))
    expect(document.gas).not.toEqual(old.gas)
    expect(reset).toContain('gas')
  })
  it('a cylinder that differs stays so where it still is', () => {
    const own = {
      ...old,
      cylinders: old.cylinders.map((each, i) => (i === 2 ? { ...each, pistonKg: 0.32 } : each)),
    }
    const { document, kept } = keepFitting(own, setOut(layout))
    expect(document.cylinders[2].pistonKg).toBe(0.32)
    expect(kept.join()).toContain('own values of cylinder 3')
  })
  it('undo() brings back the exact document', () => {
    const session = start()
    const before = session.getState()
    session.open(newScene(keepFitting(old, setOut(layout)).document), 'set out')
    expect(train(session).cylinders).toHaveLength(5)
    session.undo()
    expect(session.getState().scene).toBe(before.scene)
  })
})
