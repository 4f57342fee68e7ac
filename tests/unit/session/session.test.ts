import { describe, expect, it } from 'vitest'
import { fields } from '@/components/bench/fields'
import { firingOrder, throwAngles } from '@/components/bench/text-fields'
import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import { createSession, type Refusal } from '@/scene/session/session'

const start = (id = 'v8x-5000') => createSession({ scene: newScene(presetById(id)!.train) })
const textOf = ({ mends: [mend] }: Refusal) => ('text' in mend ? mend.text : mend.label)
const bore = (session: ReturnType<typeof start>) => session.getState().scene.train.cylinderDefaults.boreMm

describe('session.edit', () => {
  it('edit([{ path, value }]) makes a new document and leaves the old one as it was', () => {
    const session = start()
    const before = session.getState().scene
    expect(session.edit([{ path: ['train', 'cylinderDefaults', 'boreMm'], value: 92 }])).toBe(true)
    expect(bore(session)).toBe(92)
    expect(before.train.cylinderDefaults.boreMm).toBe(95)
    expect(session.getState().scene.train.masses).toBe(before.train.masses)
  })
  it('answers false and changes nothing where the document could not run', () => {
    const session = start()
    const before = session.getState()
    expect(session.edit([{ path: ['train', 'cylinderDefaults', 'rodLengthMm'], value: 20 }])).toBe(false)
    expect(session.getState()).toBe(before)
  })
  it('a change of the view is no step: undo() goes back past it and keeps it', () => {
    const session = start()
    session.edit([{ path: ['train', 'cylinderDefaults', 'boreMm'], value: 92 }])
    session.edit([{ path: ['view', 'slowdown'], value: 50 }])
    session.undo()
    expect(bore(session)).toBe(95)
    expect(session.getState().scene.view.slowdown).toBe(50)
  })
})

describe('session.enter', () => {
  it("enter(bore, '3.74 in') understands the suffix", () => {
    const session = start()
    session.enter(fields.bore, '3.74 in')
    expect(bore(session)).toBe(94.996)
    expect(session.getState().refused).toEqual({})
  })
  it('typing letter by letter under one focus is one step; seal() begins the next', () => {
    const session = start()
    for (const text of ['92', '92.', '92.5']) session.enter(fields.bore, text)
    session.seal()
    session.enter(fields.bore, '93')
    expect(session.getState().past).toHaveLength(2)
    session.undo()
    expect(bore(session)).toBe(92.5)
    session.undo()
    expect(bore(session)).toBe(95)
    session.redo()
    expect(bore(session)).toBe(92.5)
  })
  it('a rod too short to turn keeps the typed text beside the last good document', () => {
    const session = start()
    const good = session.getState().scene
    session.enter(fields.rodLength, '40')
    const { scene, refused } = session.getState()
    expect(scene).toBe(good)
    expect(refused.rodLengthMm).toMatchObject({ text: '40', label: 'Rod, centres' })
    expect(refused.rodLengthMm.head + refused.rodLengthMm.message).toMatch(/too short to turn.*44\.1/)
  })
  it('what cannot be read is kept with its message, and undo() only clears it', () => {
    const session = start()
    session.enter(fields.bore, 'wide')
    expect(session.getState().refused.boreMm.message).toContain('Could not read “wide” as a length')
    session.undo()
    expect(session.getState().refused).toEqual({})
    expect(bore(session)).toBe(95)
  })
  it('0.388 in a field of grams is held, and the same figure in kilograms is offered (M02)', () => {
    const session = start()
    session.enter(fields.piston, '0.388')
    const held = session.getState().refused[fields.piston.key]
    expect(held.head).toBe('Too light to be meant.')
    expect(session.getState().scene.train.masses.pistonKg).toBe(0.388)
    expect(held.mends).toEqual([{ label: 'Use 0.388 kg = 388 g', text: '0.388 kg' }])
    session.enter(fields.piston, textOf(held))
    expect(session.getState().refused).toEqual({})
    session.enter(fields.piston, '0.388', true)
    expect(session.getState().scene.train.masses.pistonKg).toBeCloseTo(0.000388, 12)
  })
  it('11.2 in a field of grams is asked about in ounces (M03)', () => {
    const session = start()
    session.enter(fields.piston, '11.2')
    expect(textOf(session.getState().refused[fields.piston.key])).toBe('11.2 oz')
  })
  it('bore 3.74 among millimetres looks like inches (U03)', () => {
    const session = start()
    session.enter(fields.bore, '3.74')
    expect(textOf(session.getState().refused.boreMm)).toBe('3.74 in')
  })
  it('balance factor 0.5 is asked about: factors are percent (M06)', () => {
    const session = start()
    session.enter(fields.balanceFactor, '0.5')
    expect(session.getState().refused.balanceFactor).toMatchObject({
      head: '0.5 %?',
      mends: [{ text: '50 %' }],
    })
  })
  it('68,000 rpm is asked about: extra zero? (R02)', () => {
    const session = start()
    session.enter(fields.speed, '68,000')
    expect(session.getState().refused.speedRpm).toMatchObject({
      head: 'Extra zero?',
      mends: [{ text: '6800 rpm' }],
    })
  })
  it('throws that contradict the order wait for the order that fits them, and both go in together', () => {
    // a two-stroke has one turn to fire in: its crank knows one order only
    const session = start('m6-2t-520')
    session.enter(throwAngles, '0/240/120/180/60/300')
    expect(session.getState().refused.throws.text).toBe('0/240/120/180/60/300')
    expect(session.getState().scene.train.throws[1].angleDeg).toBe(120)
    session.enter(firingOrder, '1-6-2-4-3-5')
    expect(session.getState().refused).toEqual({})
    expect(session.getState().scene.train.throws.map((pin) => pin.angleDeg)).toEqual([
      0, 240, 120, 180, 60, 300,
    ])
    expect(session.getState().scene.train.firingOrder).toEqual(['1', '6', '2', '4', '3', '5'])
  })
  it.each([
    ['1-3-3-2', /3/],
    ['1-3-4-2-5', /5/],
    ['1-2-3-4', /1-3-4-2/],
  ])('enter(firingOrder, %j) on a flat-plane four is refused, naming what breaks', (text, said) => {
    const session = start('i4-2000')
    session.enter(firingOrder, text)
    const { head, message } = session.getState().refused.firingOrder
    expect(head + message).toMatch(said)
  })
})

describe('what was understood', () => {
  it('stands beside the field while a suffix is typed, until it is left', () => {
    const session = start()
    session.enter(fields.bore, '3.74 in')
    expect(session.getState().understood).toEqual({ key: 'boreMm', text: '94.996' })
    session.seal()
    expect(session.getState().understood).toBeNull()
    session.enter(fields.bore, '94')
    expect(session.getState().understood).toBeNull()
  })
  it('a speed below nothing is refused in words, and 0 stands still', () => {
    const session = start()
    session.enter(fields.speed, '-100')
    expect(session.getState().refused.speedRpm.message).toContain('0 or more')
    session.enter(fields.speed, '0')
    expect(session.getState().scene.view.speedRpm).toBe(0)
  })
})

describe('session.setSystem', () => {
  it('twenty turns of the units switch leave the document the very same object', () => {
    const session = start()
    const { scene } = session.getState()
    for (let i = 0; i < 20; i++) session.setSystem(i % 2 ? 'si' : 'us')
    expect(session.getState().scene).toBe(scene)
  })
  it('in inches a bare number is inches, and what is shown can be typed back without a change', () => {
    const session = start()
    session.setSystem('us')
    session.enter(fields.bore, '3.74')
    expect(bore(session)).toBe(94.996)
    session.enter(fields.bore, fields.bore.show(session.getState().scene, 'us').text)
    expect(bore(session)).toBe(94.996)
  })
})

describe('session.open', () => {
  it('undo() brings back the whole document that was there, with its view', () => {
    const session = start()
    session.markSaved({ sceneId: 'a', version: 3, scene: session.getState().scene })
    session.edit([{ path: ['view', 'speedRpm'], value: 3000 }])
    const before = session.getState()
    session.open(newScene(presetById('r7-11')!.train), 'preset')
    expect(session.getState().scene.view.speedRpm).not.toBe(3000)
    session.undo()
    expect(session.getState().saved).toBe(before.saved)
    expect(session.getState().scene).toBe(before.scene)
    expect(session.getState().base).toBe(before.base)
  })
})
