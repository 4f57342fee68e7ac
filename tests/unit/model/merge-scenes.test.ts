import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { newScene } from '@/scene/model/default-scene'
import { differencesOf, pathKey, valueIn, within } from '@/scene/model/differences'
import { mergeScenes, type Choice, type Conflict } from '@/scene/model/merge-scenes'
import { presetById } from '@/scene/model/presets'
import type { Scene } from '@/scene/model/scene'

const base = newScene(presetById('v8x-5000')!.train)

/** One thing somebody does: to a figure, to a part of a list, or to how it is looked at. */
const edit = fc.oneof(
  fc.record({
    do: fc.constant('figure' as const),
    field: fc.constantFrom('balanceFactor', 'crankMassKg', 'pistonPinKg', 'counterweightRadiusMm', 'title'),
    value: fc.integer({ min: 1, max: 5 }),
  }),
  fc.record({ do: fc.constant('drop' as const), at: fc.nat({ max: 7 }) }),
  fc.record({
    do: fc.constant('weigh' as const),
    at: fc.nat({ max: 7 }),
    value: fc.integer({ min: 1, max: 3 }),
  }),
  fc.record({
    do: fc.constant('add' as const),
    at: fc.nat({ max: 7 }),
    name: fc.constantFrom('new 1', 'new 2'),
    value: fc.integer({ min: 1, max: 2 }),
  }),
  fc.record({ do: fc.constant('turn round' as const) }),
  fc.record({ do: fc.constant('look' as const), value: fc.integer({ min: 0, max: 3 }) }),
)
type Edit = typeof edit extends fc.Arbitrary<infer T> ? T : never

function done(scene: Scene, one: Edit): Scene {
  const { train } = scene
  const weights = train.counterweights
  const withWeights = (counterweights: typeof weights): Scene => ({
    ...scene,
    train: { ...train, counterweights },
  })
  switch (one.do) {
    case 'figure': {
      if (one.field === 'title') return { ...scene, train: { ...train, title: `Engine ${one.value}` } }
      if (one.field === 'balanceFactor')
        return { ...scene, train: { ...train, balanceFactor: one.value / 10 } }
      if (one.field === 'crankMassKg') return { ...scene, train: { ...train, crankMassKg: 20 + one.value } }
      if (one.field === 'pistonPinKg')
        return { ...scene, train: { ...train, masses: { ...train.masses, pistonPinKg: one.value / 10 } } }
      return {
        ...scene,
        train: { ...train, shape: { ...train.shape, counterweightRadiusMm: 80 + one.value } },
      }
    }
    case 'drop':
      return withWeights(weights.filter((_, i) => i !== one.at))
    case 'weigh':
      return withWeights(
        weights.map((weight, i) => (i === one.at ? { ...weight, massKg: one.value } : weight)),
      )
    case 'add': {
      const added = { id: one.name, axialMm: 0, angleDeg: 0, massKg: one.value, radiusMm: 50 }
      if (weights.some(({ id }) => id === one.name)) return scene
      return withWeights(weights.toSpliced(one.at, 0, added))
    }
    case 'turn round':
      return withWeights(weights.toReversed())
    case 'look':
      return { ...scene, view: { ...scene.view, angleDeg: 10 * one.value } }
  }
}

const edited = fc.array(edit, { maxLength: 5 }).map((edits) => edits.reduce(done, base))

function merged(theirs: Scene, mine: Scene, choose: (conflict: Conflict) => Choice | undefined) {
  const { conflicts } = mergeScenes(base, theirs, mine)
  const choices = Object.fromEntries(conflicts.map((conflict) => [conflict.key, choose(conflict)]))
  const { read } = mergeScenes(base, theirs, mine, choices)
  if (!read.ok) throw new Error(read.issues.map(({ message }) => message).join(' '))
  return { conflicts, scene: read.scene }
}

const value = (scene: unknown, path: readonly string[]) => valueIn(scene, path)

describe('mergeScenes(base, theirs, mine, choices)', () => {
  it('what only one has changed is theirs or mine, and what nobody has changed stays', () => {
    fc.assert(
      fc.property(edited, edited, (theirs, mine) => {
        const { conflicts, scene } = merged(theirs, mine, () => 'theirs')
        const free = (path: readonly string[]) => !conflicts.some((one) => within(path, one.path))
        for (const { path, now } of differencesOf(base, mine))
          if (free(path) && path.at(-1) !== 'order') expect(value(scene, path)).toEqual(now)
        for (const { path, now } of differencesOf(base, theirs))
          if (path.at(-1) !== 'order') expect(value(scene, path)).toEqual(now)
        const touched = [...differencesOf(base, mine), ...differencesOf(base, theirs)]
        for (const { path } of differencesOf(base, scene))
          expect(touched.some((one) => within(path, one.path) || within(one.path, path))).toBe(true)
      }),
      { numRuns: 60 },
    )
  })

  it('choosing mine everywhere gives every value of mine', () => {
    fc.assert(
      fc.property(edited, edited, (theirs, mine) => {
        const { scene } = merged(theirs, mine, () => 'mine')
        for (const { path, now } of differencesOf(base, mine))
          if (path.at(-1) !== 'order') expect(value(scene, path)).toEqual(now)
      }),
      { numRuns: 60 },
    )
  })

  it('without a conflict it is the same whoever saved first', () => {
    fc.assert(
      fc.property(edited, edited, (one, other) => {
        const there = mergeScenes(base, one, other)
        const back = mergeScenes(base, other, one)
        expect(there.conflicts.map(({ key }) => key).sort()).toEqual(
          back.conflicts.map(({ key }) => key).sort(),
        )
        if (there.conflicts.length > 0) return
        if (!there.read.ok || !back.read.ok) throw new Error('both can stand')
        const apart = differencesOf(there.read.scene, back.read.scene)
        // two new parts may come in either order
        expect(apart.filter(({ path }) => path.at(-1) !== 'order')).toEqual([])
      }),
      { numRuns: 60 },
    )
  })

  it('nothing of mine is theirs, nothing of theirs is mine, and the same from both is no conflict', () => {
    fc.assert(
      fc.property(edited, (scene) => {
        for (const [theirs, mine] of [
          [scene, base],
          [base, scene],
          [scene, scene],
        ]) {
          const { conflicts, read } = mergeScenes(base, theirs, mine)
          expect(conflicts).toEqual([])
          if (!read.ok) throw new Error('it stood before')
          expect(differencesOf(scene, read.scene)).toEqual([])
        }
      }),
      { numRuns: 60 },
    )
  })

  it('a part that one took out and the other changed is asked about as a whole', () => {
    const out = done(base, { do: 'drop', at: 7 })
    const heavier = done(base, { do: 'weigh', at: 7, value: 2 })
    const { conflicts, scene } = merged(out, heavier, () => 'mine')
    expect(conflicts.map(({ key, theirs }) => [key, theirs])).toEqual([
      [pathKey(['train', 'counterweights', '#4D']), undefined],
    ])
    expect(scene.train.counterweights.at(-1)).toMatchObject({ id: '4D', massKg: 2 })
    expect(merged(out, heavier, () => 'theirs').scene.train.counterweights).toHaveLength(7)
  })

  it('how it is looked at is one choice, whatever of it both have changed', () => {
    const theirs: Scene = { ...base, view: { ...base.view, angleDeg: 10, speedRpm: 5000 } }
    const mine: Scene = { ...base, view: { ...base.view, angleDeg: 20, slowdown: 100 } }
    const { conflicts, scene } = merged(theirs, mine, () => 'mine')
    expect(conflicts.map(({ key }) => key)).toEqual(['view'])
    expect(scene.view).toEqual(mine.view)
  })

  it('what each set right by itself and is wrong together is refused with the reason', () => {
    const theirs: Scene = {
      ...base,
      train: { ...base.train, cylinderDefaults: { ...base.train.cylinderDefaults, strokeMm: 130 } },
    }
    const mine: Scene = {
      ...base,
      train: { ...base.train, cylinderDefaults: { ...base.train.cylinderDefaults, rodLengthMm: 60 } },
    }
    const { conflicts, read } = mergeScenes(base, theirs, mine)
    expect(conflicts).toEqual([])
    if (read.ok) throw new Error('a rod of 60 mm cannot turn a throw of 65 mm')
    expect(read.issues[0].message).toContain('60 mm')
    expect(read.issues[0].path).toContain('rodLengthMm')
  })
})
