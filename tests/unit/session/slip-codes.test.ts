import { describe, expect, it } from 'vitest'
import { fields } from '@/components/bench/fields'
import { bankAngles } from '@/components/bench/text-fields'
import { presetById } from '@/scene/model/presets'
import type { Field } from '@/scene/session/field'
import { at, literal, start, type Session } from './slip-bench'
import { held, V8 } from './slips-typed'

/** Presses the first offered repair, as the note under the field does. */
function press(session: Session, field: Field) {
  const { mends, key } = session.getState().refused[field.key]
  const [mend] = mends
  if ('text' in mend) session.enter(field, mend.text)
  else if (session.edit(mend.changes)) session.drop(key)
  session.seal()
}

describe('a slip is held beside the drawing', () => {
  it.each(held)('$code: $typed says where, what was understood, the limit and one way out', (slip) => {
    const session = start(slip.preset ?? V8, slip.edits)
    const before = session.getState().scene
    session.enter(slip.field, slip.typed)
    const { scene, refused } = session.getState()
    const refusal = refused[slip.field.key]
    expect(scene).toBe(before)
    expect(refusal.text).toBe(slip.typed)
    expect(refusal.label).not.toBe('')
    for (const said of slip.says)
      expect(`${refusal.head} ${refusal.message}`).toMatch(said instanceof RegExp ? said : literal(said))
    expect(refusal.mends[0].label).toMatch(literal(slip.mend))
    expect(refusal.keep !== null).toBe(slip.keep !== undefined)

    press(session, slip.field)
    // read as intervals, the mended text is an order only with a second press
    if (session.getState().refused[slip.field.key]) press(session, slip.field)
    expect(session.getState().refused).toEqual({})
    expect(at(session, slip.after[0])).toEqual(slip.after[1])

    if (!slip.keep) return
    const keeps = start(slip.preset ?? V8, slip.edits)
    keeps.enter(slip.field, slip.typed, true)
    expect(keeps.getState().refused).toEqual({})
    expect(at(keeps, slip.keep[0])).toEqual(slip.keep[1])
  })

  it.each([
    ['A02', fields.bankAngle, 'ninety', 'Could not read “ninety” as an angle. Example: 90 or 90.0°.'],
    ['U04', fields.bore, 'NaN', 'Not a number. Nothing was changed.'],
    ['U04', fields.bore, '1e999', 'Not a number. Nothing was changed.'],
    ['U04', fields.bore, '', 'Not a number. Nothing was changed.'],
    ['U04', fields.bore, '🙂', 'Not a number. Nothing was changed.'],
    ['R03', fields.most, '0', 'cannot be 0 rpm: it must be at least 0.1 rpm'],
  ] as const)(
    '%s: %s typed %j is said in words, and the way out is what stood there',
    (_code, field, typed, said) => {
      const session = start(V8)
      const before = session.getState().scene
      session.enter(field, typed)
      const { head, message, text } = session.getState().refused[field.key]
      expect(`${head} ${message}`).toContain(said)
      expect(text).toBe(typed)
      expect(session.getState().scene).toBe(before)
      session.drop(field.key)
      expect(session.getState()).toMatchObject({ refused: {}, scene: before })
    },
  )

  it('R03: at 0 rpm the model still stands, and says that forces need speed', () => {
    const session = start(V8)
    session.enter(fields.speed, '0')
    expect(session.getState().scene.view.speedRpm).toBe(0)
    expect(session.getState().refused).toEqual({})
  })
  it('N01: the 65th cylinder is refused with the limit', () => {
    const session = start('i4-2000')
    const many = Array.from({ length: 65 }, (_, i) => ({
      ...presetById('i4-2000')!.train.cylinders[0],
      id: `c${i}`,
    }))
    const add: Field = {
      key: 'table.cylinders.change',
      label: 'Add a cylinder',
      read: () => ({ ok: true, changes: [{ path: ['train', 'cylinders'], value: many }] }),
    }
    session.enter(add, 'Add a cylinder')
    const { head, message } = session.getState().refused[add.key]
    expect(`${head} ${message}`).toMatch(/65 entries given, at most 64/)
  })
  it('a throw angle list with too few angles says how many are wanted', () => {
    const session = start(V8)
    session.enter(bankAngles, '0')
    expect(session.getState().refused.banks.message).toContain('1 angle for 2 banks')
  })
  it('typing on after a slip is judged anew: 3, 3.7, 3.74 in', () => {
    const session = start(V8)
    for (const text of ['3', '3.7', '3.74', '3.74 ', '3.74 in']) session.enter(fields.bore, text)
    expect(session.getState().refused).toEqual({})
    expect(at(session, 'cylinderDefaults.boreMm')).toBe(94.996)
    expect(session.getState().past).toHaveLength(1)
  })
})
