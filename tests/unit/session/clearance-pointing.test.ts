import { describe, expect, it } from 'vitest'
import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import { createSession } from '@/scene/session/session'

const session = () => createSession({ scene: newScene(presetById('v2-45-1600')!.train) })

describe('session.point(parts)', () => {
  it('lights several parts, in place of one that was picked, until one is picked again', () => {
    const { point, pick, getState } = session()
    pick('piston:1')
    point(['piston:1', 'piston:2'])
    expect(getState()).toMatchObject({ pointed: ['piston:1', 'piston:2'], picked: null })
    pick('rod:1')
    expect(getState()).toMatchObject({ pointed: [], picked: 'rod:1' })
  })

  it('is no change of the document, and ends with another one', () => {
    const { point, open, getState } = session()
    const { scene } = getState()
    point(['piston:1'])
    expect(getState()).toMatchObject({ scene, past: [] })
    open(newScene(presetById('single-450')!.train), 'preset')
    expect(getState().pointed).toEqual([])
  })
})
