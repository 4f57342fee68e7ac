import { describe, expect, it } from 'vitest'
import { defaultView, newScene } from '@/scene/model/default-scene'
import { migrate } from '@/scene/model/migrate'
import { presets } from '@/scene/model/presets'
import { readScene } from '@/scene/model/read-scene'
import { changed } from './change'
import type { CrankTrain } from '@/scene/model/crank-train'

const trainOf = (id: string) => presets.find((preset) => preset.id === id)!.train

describe('defaultView(train) and newScene(train)', () => {
  it.each(presets.map(({ id, train }) => [id, train] as const))(
    '%s: a new scene can be read back',
    (_, train) => {
      const scene = newScene(train)
      expect(readScene(JSON.parse(JSON.stringify(scene)))).toMatchObject({ ok: true, scene })
    },
  )

  it('runs at rated speed, shown slowly enough to follow', () => {
    const view = defaultView(trainOf('v8x-5000'))
    expect(view.speedRpm).toBe(6500)
    expect(view.speedRpm / view.slowdown).toBeLessThanOrEqual(30)
    expect(view.speedRpm / view.slowdown).toBeGreaterThan(10)
  })

  it('has a speed for a train that states none', () => {
    expect(defaultView(changed('v8x-5000', { operating: undefined }) as CrankTrain).speedRpm).toBe(3000)
  })
})

describe('readScene(json)', () => {
  const scene = newScene(trainOf('i4-2000'))

  it('gives the scene and its train', () => {
    const read = readScene(scene)
    expect(read.ok && read.train.cylinders).toHaveLength(4)
  })

  it('refuses a view with its paths from the scene', () => {
    const read = readScene({ ...scene, view: { ...scene.view, slowdown: 0, angleDeg: 'x' } })
    expect(read).toMatchObject({
      ok: false,
      issues: [
        { path: 'view.angleDeg', code: 'wrong-type' },
        {
          path: 'view.slowdown',
          code: 'out-of-range',
          message: 'Slowdown cannot be 0: it must be at least 1.',
        },
      ],
    })
  })

  it('refuses a train with its paths from the scene', () => {
    const short = readScene({ ...scene, train: changed('i4-2000', { 'cylinderDefaults.rodLengthMm': 45 }) })
    expect(!short.ok && short.issues[0]).toMatchObject({
      path: 'train.cylinderDefaults.rodLengthMm',
      code: 'rod-too-short',
    })
    const newer = readScene({ ...scene, train: changed('i4-2000', { format: 'crank-train/9' }) })
    expect(newer).toMatchObject({ ok: false, issues: [{ path: 'train.format', code: 'newer-format' }] })
  })

  it.each([[null], ['x'], [[]], [{ format: 'scene/1' }], [{ ...scene, train: null }]])(
    'refuses %j',
    (json) => {
      expect(readScene(json).ok).toBe(false)
    },
  )

  it('refuses a scene of the future', () => {
    expect(readScene({ ...scene, format: 'scene/2' })).toMatchObject({
      ok: false,
      issues: [{ path: 'format', code: 'newer-format' }],
    })
  })
})

describe('migrate(json, kind, current, migrations)', () => {
  const migrations = {
    1: ({ size, ...rest }: Record<string, unknown>) => ({ ...rest, sizeMm: size }),
    2: (document: Record<string, unknown>) => ({ ...document, colour: 'ink' }),
  }
  const first = { format: 'thing/1', size: 4 }

  it('opens every older format, one step at a time', () => {
    const third = { format: 'thing/3', sizeMm: 4, colour: 'ink' }
    expect(migrate(first, 'thing', 3, migrations)).toEqual({ ok: true, json: third })
    expect(migrate({ format: 'thing/2', sizeMm: 4 }, 'thing', 3, migrations)).toEqual({
      ok: true,
      json: third,
    })
    expect(migrate(third, 'thing', 3, migrations)).toEqual({ ok: true, json: third })
    expect(first).toEqual({ format: 'thing/1', size: 4 })
  })

  it('passes on what is no document of the kind, for the schema to judge', () => {
    for (const json of [
      null,
      7,
      'x',
      {},
      { format: 3 },
      { format: 'thing/x' },
      { format: 'thing/0' },
      { format: 'other/1' },
    ])
      expect(migrate(json, 'thing', 3, migrations)).toEqual({ ok: true, json })
  })

  it('refuses a newer format', () => {
    expect(migrate({ format: 'thing/4' }, 'thing', 3, migrations)).toMatchObject({
      ok: false,
      issues: [{ path: 'format', code: 'newer-format' }],
    })
  })
})
