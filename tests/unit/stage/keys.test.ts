import { describe, expect, it } from 'vitest'
import { readKey } from '@/scene/stage/keys'

const degree = Math.PI / 180
const press = (key: string, more: Partial<Parameters<typeof readKey>[0]> = {}) =>
  readKey({ key, code: '', shiftKey: false, ctrlKey: false, altKey: false, metaKey: false, ...more })

describe('readKey(event)', () => {
  it('arrows orbit by 15°', () => {
    expect(press('ArrowRight')).toEqual({ kind: 'orbit', yaw: 15 * degree, pitch: 0 })
    expect(press('ArrowDown')).toEqual({ kind: 'orbit', yaw: 0, pitch: 15 * degree })
  })

  it('plus comes nearer, minus goes away, Home frames the engine', () => {
    expect(press('+')).toMatchObject({ kind: 'zoom', factor: 1 / 1.2 })
    expect(press('=')).toEqual(press('+'))
    expect(press('-')).toMatchObject({ kind: 'zoom', factor: 1.2 })
    expect(press('Home')).toEqual({ kind: 'home' })
  })

  it('brackets turn the crank by 1°, with Shift by 10° on any keyboard, comma and period by 0.1°', () => {
    expect(press('[')).toEqual({ kind: 'step', angle: -degree })
    expect(press(']')).toEqual({ kind: 'step', angle: degree })
    expect(press('{', { shiftKey: true })).toEqual({ kind: 'step', angle: -10 * degree })
    expect(press('}', { shiftKey: true, code: 'BracketRight' })).toEqual({ kind: 'step', angle: 10 * degree })
    expect(press('Ü', { shiftKey: true, code: 'BracketLeft' })).toEqual({ kind: 'step', angle: -10 * degree })
    expect(press(',')).toEqual({ kind: 'step', angle: -0.1 * degree })
    expect(press('.')).toEqual({ kind: 'step', angle: 0.1 * degree })
  })

  it('space plays or pauses, figures take the named views in their order', () => {
    expect(press(' ')).toEqual({ kind: 'play' })
    expect(press('1')).toEqual({ kind: 'view', name: 'free' })
    expect(press('6')).toEqual({ kind: 'view', name: 'top' })
    expect(press('7')).toBeNull()
    expect(press('0')).toBeNull()
  })

  it('leaves Tab, Enter, letters and every chord to the browser', () => {
    for (const key of ['Tab', 'Enter', 'Escape', 'a', 'F5']) expect(press(key)).toBeNull()
    expect(press('ArrowRight', { ctrlKey: true })).toBeNull()
    expect(press('-', { metaKey: true })).toBeNull()
    expect(press(']', { altKey: true })).toBeNull()
  })
})
