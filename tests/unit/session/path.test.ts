import { describe, expect, expectTypeOf, it } from 'vitest'
import { inTrain, type ScenePath } from '@/scene/session/path'

describe('a change of the scene', () => {
  // the compiler is what refuses here: the types stage reads this file
  it('begins in the train or in the view, and nowhere else', () => {
    expectTypeOf<['train', 'inertia', 'flywheelKgM2']>().toExtend<ScenePath>()
    expectTypeOf<['view', 'slowdown']>().toExtend<ScenePath>()
    expectTypeOf<['inertia', 'flywheelKgM2']>().not.toExtend<ScenePath>()
    expectTypeOf<string[]>().not.toExtend<ScenePath>()
  })

  it('inTrain([{ path: ["masses", "pistonKg"] }]) stands in the train', () => {
    expect(inTrain([{ path: ['masses', 'pistonKg'], value: 0.4 }])).toEqual([
      { path: ['train', 'masses', 'pistonKg'], value: 0.4 },
    ])
  })
})
