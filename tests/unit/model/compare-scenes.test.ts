import { describe, expect, it } from 'vitest'
import { changedParts } from '@/scene/frame/changed-parts'
import { compareVersions, type VersionChanges } from '@/scene/frame/compare-versions'
import { asShown } from '@/scene/model/change-words'
import { compareScenes, seenChanges } from '@/scene/model/compare-scenes'
import { newScene } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import type { Scene } from '@/scene/model/scene'
import { presetRig } from '../frame/rigs'

const cross = newScene(presetById('v8x-5000')!.train)
const withTrain = (change: Partial<Scene['train']>, scene = cross): Scene => ({
  ...scene,
  train: { ...scene.train, ...change },
})
const shape = (change: Partial<NonNullable<Scene['train']['shape']>>) => ({
  shape: { ...cross.train.shape, ...change },
})
const texts = (change: Parameters<typeof asShown>[0]) => {
  const { was, now, unit } = asShown(change, 'si')
  return [was, now, unit]
}
const named = <C extends { name: string }>(changes: readonly C[], name: string) => {
  const found = changes.find((one) => one.name === name)
  if (!found) throw new Error(`${name} is not among ${changes.map((one) => one.name).join(', ')}`)
  return found
}

describe('compareScenes(older, newer)', () => {
  it('a version and itself have nothing between them, also after it was stored and read', () => {
    expect(compareScenes(cross, JSON.parse(JSON.stringify(cross)) as Scene)).toEqual({
      parameters: [],
      view: [],
    })
  })

  it('a figure is named in the words of the trade with both values in SI', () => {
    const { parameters } = compareScenes(cross, withTrain(shape({ counterweightRadiusMm: 90.5 })))
    expect(parameters).toHaveLength(1)
    expect(parameters[0]).toMatchObject({ name: 'Counterweight radius', quantity: 'length', is: 'changed' })
    expect(parameters[0].was).toBeCloseTo(0.0895, 12)
    expect(parameters[0].now).toBeCloseTo(0.0905, 12)
    expect(texts(parameters[0])).toEqual(['89.5', '90.5', 'mm'])
  })

  it('parts that came and went say so with their figures', () => {
    const [, ...others] = cross.train.counterweights
    const slug = { id: 'slug', axialMm: 12, angleDeg: 90, massKg: 0.2, radiusMm: 60 }
    const { parameters } = compareScenes(cross, withTrain({ counterweights: [...others, slug] }))
    expect(parameters.map(({ name, is, was }) => [name, is, was === null])).toEqual([
      ['Counterweight 1F', 'removed', false],
      ['Counterweight slug', 'added', true],
    ])
    expect(named(parameters, 'Counterweight slug').now).toContain('mass 0.2 kg')
  })

  it('an inserted cylinder is one part added: nothing after it is said to be another', () => {
    const three = newScene(presetById('i3-1000')!.train)
    const cylinders = three.train.cylinders.toSpliced(1, 0, { ...three.train.cylinders[0], id: '9' })
    const { parameters } = compareScenes(three, withTrain({ cylinders }, three))
    expect(parameters.map(({ name }) => name)).toEqual(['Cylinder 9'])
  })

  it('camera, angle and what is shown stand apart from what was set', () => {
    const newer: Scene = {
      ...withTrain({ balanceFactor: 0.6 }),
      view: {
        ...cross.view,
        angleDeg: 90,
        hidden: ['bores'],
        camera: { yawDeg: 1, pitchDeg: 2, distanceMm: 900, targetMm: [0, 0, 0] },
      },
    }
    const { parameters, view } = compareScenes(cross, newer)
    expect(parameters.map(({ name }) => name)).toEqual(['Balance factor'])
    expect(view.map(({ name }) => name).sort()).toEqual(['Camera', 'Crank angle', 'Hidden'])
  })

  it('the same done to every counterweight is one change', () => {
    const counterweights = cross.train.counterweights.map((one) => ({ ...one, radiusMm: one.radiusMm + 1 }))
    const { parameters } = compareScenes(cross, withTrain({ counterweights }))
    expect(parameters.map(({ name, paths }) => [name, paths.length])).toEqual([
      ['Radius of all 8 counterweights', 8],
    ])
  })

  it('a change below display precision is counted and not seen; in inches it may be seen', () => {
    const { parameters } = compareScenes(cross, withTrain(shape({ counterweightRadiusMm: 89.53 })))
    expect(seenChanges(parameters, 'si')).toMatchObject({ seen: [], below: [{}] })
    expect(seenChanges(parameters, 'us').seen).toHaveLength(1)
  })
})

describe('compareVersions(older, newer)', () => {
  // TRADE 13, story C: common practice
  it('a counterweight radius of 1 mm more: what half a disc holds, the share used, and the gap to the skirt', () => {
    const lighter = { ...cross.train.masses, pistonPinKg: 0.112 - 0.002 }
    const newer = withTrain({ ...shape({ counterweightRadiusMm: 90.5 }), masses: lighter })
    const changes: VersionChanges = compareVersions(cross, newer, 'si')
    const radius = named(changes.parameters, 'Counterweight radius')
    expect(texts(named(radius.effects, 'Fullest web, share of it used'))).toEqual(['98.7', '95.5', '%'])
    const gap = named(radius.effects, 'Skirt to counterweight')
    expect(texts(gap)).toEqual(['2.4', '1.4', 'mm'])
    expect(gap.below).toBeCloseTo(0.0015, 12)
    const capacity = named(radius.effects, 'Half-disc capacity of a web')
    expect((capacity.now as number) / (capacity.was as number)).toBeCloseTo((90.5 / 89.5) ** 3, 9)
    expect(radius.parts.every((part) => part.startsWith('counterweight:'))).toBe(true)

    const pin = named(changes.parameters, 'Piston pin mass')
    expect(pin.effects.map(({ name }) => name)).toContain('Crank pin, most')
    expect(pin.effects.map(({ name }) => name)).not.toContain('Skirt to counterweight')
    expect(changes.speedRpm).toBe(cross.train.operating!.maxRpm)
  })

  it('an effect that two changes have together belongs to neither', () => {
    const masses = { ...cross.train.masses, pistonPinKg: 0.1, ringsKg: 0.05 }
    const changes = compareVersions(cross, withTrain({ masses }), 'si')
    expect(changes.effects.map(({ name }) => name)).toContain('Bob-weight')
    for (const { effects } of changes.parameters)
      expect(effects.map(({ name }) => name)).not.toContain('Bob-weight')
  })

  it('inertia forces are told at the speed asked for: four times at twice the speed', () => {
    const four = newScene(presetById('i4-2000')!.train)
    const newer = withTrain({ masses: { ...four.train.masses, pistonPinKg: 0.2 } }, four)
    const second = (speedRpm: number) =>
      named(
        compareVersions(four, newer, 'si', speedRpm).parameters.flatMap(({ effects }) => effects),
        'Second order, vertical',
      )
    const [slow, fast] = [second(2000), second(4000)]
    expect((fast.now as number) / (slow.now as number)).toBeCloseTo(4, 9)
    expect((fast.was as number) / (slow.was as number)).toBeCloseTo(4, 9)
  })

  it('another camera alone has no effects and changes no part', () => {
    const changes = compareVersions(cross, { ...cross, view: { ...cross.view, angleDeg: 90 } }, 'si')
    expect(changes).toMatchObject({
      parameters: [],
      effects: [],
      drawn: { changed: [], added: [], removed: [] },
    })
    expect(changes.view).toHaveLength(1)
  })
})

describe('changedParts(older, newer)', () => {
  it('a longer rod moves what hangs on it and leaves the crank alone', () => {
    const { rig } = presetRig('i4-2000')
    const train = structuredClone(presetById('i4-2000')!.train)
    train.cylinderDefaults.rodLengthMm = train.cylinderDefaults.rodLengthMm! + 5
    const changes = compareVersions(newScene(presetById('i4-2000')!.train), newScene(train), 'si').drawn
    expect(changes.changed).toEqual(expect.arrayContaining(['rod:1', 'piston:4', 'ring:2']))
    expect(changes.changed.filter((id) => /^(web|crank-pin|main)/.test(id))).toEqual([])
    expect(changedParts(rig, rig)).toEqual({ changed: [], added: [], removed: [] })
  })
})
