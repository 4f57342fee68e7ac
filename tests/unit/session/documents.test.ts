import { describe, expect, it } from 'vitest'
import { newScene } from '@/scene/model/default-scene'
import { presetById, presets } from '@/scene/model/presets'
import type { Scene } from '@/scene/model/scene'
import { createClock } from '@/scene/session/clock'
import { readKept, snapshot, writeKept } from '@/scene/session/draft'
import { fileStem } from '@/components/ui/download'
import { readFile } from '@/scene/session/file'
import { fitOrder } from '@/scene/session/fit-order'
import { judge } from '@/scene/session/judge'
import { getAt, setAt } from '@/scene/session/path'
import { createResults } from '@/scene/session/results'
import { createSession } from '@/scene/session/session'
import { setOut, type SettingOut } from '@/scene/session/set-out'
import {
  addBalanceShaft,
  addBank,
  addCollector,
  addCounterweight,
  addCylinder,
  addMain,
  addThrow,
  removeCylinder,
  rename,
  setThrowPitch,
  throwPitch,
} from '@/scene/session/structure'

const train = (id: string) => presetById(id)!.train

describe('setAt', () => {
  const document = { a: { b: [1, { c: 2 }] }, d: 3 }
  it("setAt(d, ['a', 'b', 1, 'c'], 5) shares everything beside the path", () => {
    const next = setAt(document, ['a', 'b', 1, 'c'], 5)
    expect(getAt(next, ['a', 'b', 1, 'c'])).toBe(5)
    expect(getAt(document, ['a', 'b', 1, 'c'])).toBe(2)
    expect(next.d).toBe(3)
  })
  it('setting what is there already gives the same object', () =>
    expect(setAt(document, ['d'], 3)).toBe(document))
  it('undefined takes the field out, and a missing object is made', () => {
    expect(setAt(document, ['d'], undefined)).toEqual({ a: document.a })
    expect(setAt(document as object, ['x', 'y'], 1)).toMatchObject({ x: { y: 1 } })
  })
})

describe('fitOrder', () => {
  it.each(presets.map(({ id }) => id))('fitOrder(%s) is an order that the crank allows', (id) => {
    const document = train(id)
    expect(judge({ ...document, firingOrder: fitOrder(document) })).toEqual([])
  })
  it('finds the even order of a three with pins at 0/120/240', () => {
    const document = train('i3-1000')
    const turned = { ...document, throws: document.throws.map((pin, i) => ({ ...pin, angleDeg: 120 * i })) }
    expect(fitOrder(turned)).toEqual(['1', '2', '3'])
  })
})

describe('setOut', () => {
  const base = { title: 'New', cycle: 'four-stroke', boreMm: 86, strokeMm: 86 } as const
  const layouts: [string, SettingOut][] = [
    ['a single', { ...base, arrangement: 'every-bank', bankAngles: [0], throwAngles: [0] }],
    [
      'a flat-plane four',
      { ...base, arrangement: 'every-bank', bankAngles: [0], throwAngles: [0, 180, 180, 0] },
    ],
    [
      'a cross-plane V8',
      { ...base, arrangement: 'every-bank', bankAngles: [-45, 45], throwAngles: [0, 90, 270, 180] },
    ],
    [
      'a boxer four',
      { ...base, arrangement: 'banks-in-turn', bankAngles: [-90, 90], throwAngles: [0, 180, 180, 0] },
    ],
    [
      'a five-cylinder radial',
      { ...base, arrangement: 'master-rod', bankAngles: [0, 72, 144, 216, 288], throwAngles: [0] },
    ],
    [
      'a two-stroke twin',
      { ...base, cycle: 'two-stroke', arrangement: 'every-bank', bankAngles: [0], throwAngles: [0, 180] },
    ],
    [
      'a W of three banks',
      { ...base, arrangement: 'every-bank', bankAngles: [-60, 0, 60], throwAngles: [0, 120, 240] },
    ],
    [
      'twenty-four cylinders',
      {
        ...base,
        arrangement: 'every-bank',
        bankAngles: [-30, 30],
        throwAngles: Array.from({ length: 12 }, (_, i) => 120 * i),
      },
    ],
  ]
  it.each(layouts)('setOut of %s is a document that runs', (_name, layout) => {
    const document = setOut(layout)
    expect(judge(document)).toEqual([])
    const results = createResults()(newScene(document))
    expect(results.analysis.torque.totalNm.every(Number.isFinite)).toBe(true)
  })
  it('a boxer set out with banks in turn fires evenly', () => {
    const results = createResults()(newScene(setOut(layouts[3][1])))
    expect(results.analysis.firing.intervalsDeg).toHaveLength(4)
    expect(results.analysis.firing.even).toBe(true)
  })
})

describe('whole-train edits', () => {
  const v8 = train('v8x-5000')
  const events = createResults()(newScene(v8)).eventsDeg
  it('addThrow then addCylinder gives a train of nine that runs', () => {
    const next = addCylinder(addThrow(v8), events)
    expect(next.cylinders).toHaveLength(9)
    expect(next.cylinders[8].throw).toBe('5')
    expect(judge(next)).toEqual([])
  })
  it('removeCylinder takes it out of the order and the collectors too', () => {
    const next = removeCylinder(v8, '4')
    expect(next.firingOrder).not.toContain('4')
    expect(next.collectors.flatMap((collector) => collector.cylinders)).not.toContain('4')
    expect(judge(next)).toEqual([])
  })
  it.each([
    ['banks', 'A', 'left'],
    ['throws', '2', 'two'],
    ['cylinders', '3', 'three'],
  ] as const)('rename(%s, %s, %s) holds everywhere it is used', (list, from, to) => {
    const next = rename(v8, list, from, to)
    expect(JSON.stringify(next)).not.toContain(
      `"${list === 'cylinders' ? 'cylinder' : list.slice(0, -1)}":"${from}"`,
    )
    expect(judge(next)).toEqual([])
  })
  it('a link rod follows its master to a new name', () => {
    const next = rename(train('r7-11'), 'cylinders', '1', 'master')
    expect(next.cylinders[1].link?.master).toBe('master')
    expect(judge(next)).toEqual([])
  })
  it('what is added can be read at once', () => {
    for (const add of [addBank, addThrow, addCounterweight, addBalanceShaft, addMain, addCollector])
      expect(judge(add(v8)), add.name).toEqual([])
  })
  it('setThrowPitch(t, 100) moves mains and throws, and keeps cylinders beside their throws', () => {
    const next = setThrowPitch(v8, 100)
    expect(throwPitch(next)).toBeCloseTo(100, 9)
    expect(next.cylinders[0].axialMm - next.throws[0].axialMm).toBeCloseTo(11, 9)
    expect(next.mains[1].axialMm - next.mains[0].axialMm).toBeCloseTo(100, 9)
    expect(judge(next)).toEqual([])
  })
})

describe('createResults', () => {
  it('a change of the view costs nothing, a change of speed keeps the rig', () => {
    const compute = createResults()
    const scene = newScene(train('v8x-5000'))
    const first = compute(scene)
    expect(compute({ ...scene, view: { ...scene.view, slowdown: 10 } })).toBe(first)
    const faster = compute({ ...scene, view: { ...scene.view, speedRpm: 7000 } })
    expect(faster).not.toBe(first)
    expect(faster.model.rig).toBe(first.model.rig)
  })
  it('at 0 rpm it shows positions and gas forces, and no figure is lost', () => {
    const scene = newScene(train('v8x-5000'))
    const { analysis } = createResults()({ ...scene, view: { ...scene.view, speedRpm: 0 } })
    expect(JSON.stringify(analysis.orders)).not.toContain('null')
    expect(Math.max(...analysis.shaking.verticalN)).toBe(0)
    expect(Math.max(...analysis.loads['1'].gasForceN)).toBeGreaterThan(1e4)
  })
  it('the bare order of the cross-plane V8 is its full forward couple', () => {
    const { bareOrders, analysis } = createResults()(newScene(train('v8x-5000')))
    const first = bareOrders.find(({ order }) => order === 1)!
    expect(first.forwardNm).toBeGreaterThan(1e4)
    expect(first.backwardNm).toBeLessThan(1e-6 * first.forwardNm)
    expect(analysis.orders.find(({ order }) => order === 1)!.forwardNm).toBeLessThan(1e-3 * first.forwardNm)
  })
})

describe('a draft', () => {
  const store = () => {
    const kept = new Map<string, string>()
    return {
      getItem: (key: string) => kept.get(key) ?? null,
      setItem: (key: string, value: string) => void kept.set(key, value),
      removeItem: (key: string) => void kept.delete(key),
    }
  }
  it('readKept(store) gives what writeKept(store) left, at the angle of the clock', () => {
    const session = createSession({ scene: newScene(train('i4-2000')) })
    const clock = createClock()
    clock.setAngle((123.4 * Math.PI) / 180)
    const here = store()
    const { base, saved } = session.getState()
    expect(writeKept(here, { scene: snapshot(session, clock), base, saved, keptAt: 5 })).toBe(true)
    const kept = readKept(here, null)
    expect(kept?.scene.view.angleDeg).toBe(123.4)
    expect(kept?.scene.train).toEqual(session.getState().scene.train)
    expect(readKept(here, 'another')).toBeNull()
  })
  it('a draft that does not read any more is not taken up', () => {
    const here = store()
    const scene = newScene(train('i4-2000'))
    const broken = setAt(scene, ['train', 'cylinderDefaults', 'rodLengthMm'], 1)
    writeKept(here, { scene: broken, base: { train: scene.train, word: 'preset' }, saved: null, keptAt: 1 })
    expect(readKept(here, null)).toBeNull()
    here.setItem('counterthrow.draft.new', '{')
    expect(readKept(here, null)).toBeNull()
  })
})

describe('readFile', () => {
  const scene: Scene = newScene(train('v2-45-1600'))
  it('takes a scene as it was downloaded, and a crank train alone with the usual view', () => {
    expect(readFile(JSON.stringify(scene))).toEqual({ ok: true, scene })
    expect(readFile(JSON.stringify(scene.train))).toEqual({ ok: true, scene })
  })
  it('a wrong value is told with its path from the top of the file', () => {
    const answer = readFile(JSON.stringify(setAt(scene, ['train', 'cylinderDefaults', 'boreMm'], -3)))
    expect(answer.ok).toBe(false)
    if (!answer.ok) expect(answer.issues[0].path).toBe('train.cylinderDefaults.boreMm')
  })
  it.each(['', '{', '[]', '{"format":"other/1"}', 'null'])('readFile(%j) is refused in words', (text) => {
    const answer = readFile(text)
    expect(answer.ok).toBe(false)
    if (!answer.ok) expect(answer.issues[0].fix).not.toBe('')
  })
  it('the name of the file is the title of the sheet', () => {
    expect(fileStem(scene.train.title)).toBe('45-v-twin-1-6-l-common-pin')
  })
})
