import { describe, expect, it } from 'vitest'
import { anchorIssues, pinnables } from '@/scene/frame/anchor-issues'
import { buildRig } from '@/scene/frame/build-rig'
import { findAnchor } from '@/scene/frame/find-anchor'
import { partTraits } from '@/scene/frame/part-traits'
import { anchorSchema, vectorIds, type Anchor } from '@/scene/model/anchor'
import type { Rig } from '@/scene/frame/types'
import type { CrankTrain } from '@/scene/model/crank-train'
import { newScene } from '@/scene/model/default-scene'
import { presetById, presets } from '@/scene/model/presets'
import { stillDrawingSchema } from '@/scene/model/still-drawing'
import { toTrain } from '@/scene/model/to-train'

const train = (id: string): CrankTrain => presetById(id)!.train

const rigs = new Map<CrankTrain, Rig>()
function rigOf(document: CrankTrain): Rig {
  const rig = rigs.get(document) ?? buildRig(document, toTrain(document))
  rigs.set(document, rig)
  return rig
}

const cross = train('v8x-5000')

function anchorOn(document: CrankTrain, partId: string, more: Partial<Anchor> = {}): Anchor {
  const part = pinnables(rigOf(document)).find(({ id }) => id === partId)
  const { overlays } = newScene(document).view
  const box = part?.boxMm ?? [0, 0, 0, 0, 0, 0]
  return {
    version: 1,
    partId,
    pointMm: [box[0], box[4], (box[2] + box[5]) / 2],
    angleDeg: 90,
    playing: false,
    speedRpm: 6000,
    camera: { yawDeg: 30, pitchDeg: 10, distanceMm: 2000, targetMm: [0, 0, 0] },
    view: null,
    hidden: [],
    ghost: [],
    overlays,
    sectionAxialMm: null,
    units: 'si',
    ...more,
  }
}

const found = (partId: string, older: CrankTrain, newer: CrankTrain, more: Partial<Anchor> = {}) =>
  findAnchor({ partId, speedRpm: 6000, units: 'si', ...more }, older, newer)

const heavier = (document: CrankTrain, id: string, grams: number): CrankTrain => ({
  ...document,
  counterweights: document.counterweights.map((weight) =>
    weight.id === id ? { ...weight, massKg: weight.massKg + grams / 1000 } : weight,
  ),
})

describe('anchors', () => {
  it.each(presets.map(({ id }) => id))('partTraits(%s) knows exactly the parts that its rig has', (id) => {
    const document = train(id)
    const { parts } = rigOf(document)
    for (const part of parts) expect(partTraits(document, part.id, 100), part.id).not.toBeNull()
    const mains = document.mains.map((main) => [`main-journal:${main.id}`, `main-bearing:${main.id}`])
    const cylinders = document.cylinders.map(({ id: own }) => `rod-cap:${own}`)
    const crank = document.throws.flatMap(({ id: own }) => [`web:${own}F`, `web:${own}D`, `crank-pin:${own}`])
    const weights = document.counterweights.map(({ id: own }) => `counterweight:${own}`)
    const between = document.throws.slice(1).map(({ id: own }, i) => `web:${document.throws[i].id}-${own}`)
    const stubs = ['main-journal:free', 'main-journal:drive']
    const strange = ['piston:none', 'web:9', 'toString', 'constructor:1', 'rod:', ':']
    for (const name of [
      ...mains.flat(),
      ...cylinders,
      ...crank,
      ...weights,
      ...between,
      ...stubs,
      ...strange,
    ]) {
      const there = parts.some((part) => part.id === name)
      expect(partTraits(document, name, 100) !== null, name).toBe(there)
    }
  })

  it('findAnchor() says same of every part in the same engine read twice', () => {
    const again = structuredClone(cross)
    for (const { id } of [...rigOf(cross).parts, ...vectorIds.map((vector) => ({ id: vector }))]) {
      expect(found(id, cross, again)).toEqual({ standing: 'same', changes: [] })
    }
  })

  it('findAnchor() names the parameters of that part that changed, as they are shown, and no other part', () => {
    const newer = heavier(cross, '4D', 12)
    const [before, after] = [cross, newer].map(({ counterweights }) =>
      counterweights.find(({ id }) => id === '4D')!,
    )
    const shown = (kg: number) => (kg * 1000).toFixed(1).replace(/\B(?=(\d{3})+\.)/g, ',')
    const { standing, changes } = found('counterweight:4D', cross, newer)
    expect(standing).toBe('changed')
    expect(changes.map(({ name }) => name)).toEqual(['Mass', 'Mass × radius'])
    expect(changes[0]).toEqual({
      name: 'Mass',
      from: shown(before.massKg),
      to: shown(after.massKg),
      unit: 'g',
    })
    expect(found('counterweight:4F', cross, newer).standing).toBe('same')
    expect(found('web:4D', cross, newer).standing).toBe('same')
    expect(found('vector:total-couple', cross, newer).standing).toBe('changed')
  })

  it('findAnchor() does not see a change below the precision that the figure is shown in', () => {
    expect(found('counterweight:4D', cross, heavier(cross, '4D', 0.0004)).standing).toBe('same')
    const longer = { ...cross, cylinderDefaults: { ...cross.cylinderDefaults, rodLengthMm: 146.54 } }
    const base = { ...cross, cylinderDefaults: { ...cross.cylinderDefaults, rodLengthMm: 146.5 } }
    expect(found('rod:3', base, longer).standing).toBe('same')
    // 0.04 mm is 0.0016 in, which three decimals of an inch show
    expect(found('rod:3', base, longer, { units: 'us' })).toMatchObject({
      standing: 'changed',
      changes: [{ name: 'Length between centres', from: '5.768', to: '5.769', unit: 'in' }],
    })
  })

  it('findAnchor() finds a part again by what it is called when a cylinder is put in before it', () => {
    const first = cross.cylinders[0]
    const more: CrankTrain = {
      ...cross,
      cylinders: [{ ...first, id: '9' }, ...cross.cylinders],
      firingOrder: ['9', ...cross.firingOrder],
    }
    const indexIn = (document: CrankTrain) => toTrain(document).cylinders.findIndex(({ id }) => id === '5')
    expect(indexIn(more)).toBe(indexIn(cross) + 1)
    for (const id of ['piston:5', 'rod:5', 'liner:5', 'crank-pin:3', 'main-journal:M3', 'counterweight:2F'])
      expect(found(id, cross, more).standing, id).toBe('same')
  })

  it('findAnchor() says gone of a part that is not there any more, whatever its index would now be', () => {
    const fewer: CrankTrain = {
      ...cross,
      cylinders: cross.cylinders.filter(({ id }) => id !== '5'),
      counterweights: cross.counterweights.filter(({ id }) => id !== '2F'),
      firingOrder: cross.firingOrder.filter((id) => id !== '5'),
    }
    for (const id of ['piston:5', 'rod-cap:5', 'counterweight:2F'])
      expect(found(id, cross, fewer), id).toEqual({ standing: 'gone', changes: [] })
    expect(found('piston:6', cross, fewer).standing).toBe('same')
    // and there again in a later version that has it
    expect(found('piston:5', cross, structuredClone(cross)).standing).toBe('same')
  })

  it('findAnchor() takes one whole turn for none, and the other rotation for a change of every part', () => {
    const turned = { ...cross, throws: cross.throws.map((pin) => ({ ...pin, angleDeg: pin.angleDeg + 360 })) }
    expect(found('crank-pin:1', cross, turned).standing).toBe('same')
    const mirrored: CrankTrain = { ...cross, rotation: 'counterclockwise' }
    expect(found('flywheel', { ...cross, rotation: 'clockwise' }, mirrored)).toMatchObject({
      changes: [{ name: 'Rotation from the free end', from: 'clockwise', to: 'counterclockwise', unit: '' }],
    })
  })

  const judge = (document: CrankTrain, anchor: Anchor) =>
    anchorIssues(anchorSchema.parse(anchor), pinnables(rigOf(document)), document)

  it('anchorIssues() lets a point on every part and on the resultants through', () => {
    for (const { id } of pinnables(rigOf(cross))) expect(judge(cross, anchorOn(cross, id)), id).toEqual([])
  })

  it('anchorIssues() refuses an unknown part, saying what could be given', () => {
    expect(judge(cross, anchorOn(cross, 'piston:9'))).toMatchObject([
      { path: 'partId', code: 'unknown-part', message: 'Version 1 has no part “piston:9”.' },
    ])
  })

  it('anchorIssues() refuses a point beside its part, with axis, figure and range', () => {
    const good = anchorOn(cross, 'piston:3')
    const [x, y, z] = good.pointMm
    expect(judge(cross, { ...good, pointMm: [x - 0.5, y, z] })).toEqual([])
    const [issue, ...rest] = judge(cross, { ...good, pointMm: [x, y + 50, z] })
    expect(rest).toEqual([])
    expect(issue).toMatchObject({ path: 'pointMm.1', code: 'off-the-part' })
    expect(issue.message).toMatch(/^The point lies beside Piston 3: y is [\d.]+ mm, and the part goes from /)
  })

  it('anchorIssues() refuses an angle that the cycle does not have', () => {
    const two = train('single-125-2t')
    const at = (document: CrankTrain, angleDeg: number) =>
      judge(document, anchorOn(document, 'flywheel', { angleDeg }))
    expect(at(two, 359.9)).toEqual([])
    expect(at(two, 400)).toMatchObject([{ path: 'angleDeg', fix: 'Give 40.0°.' }])
    expect(at(cross, 719.9)).toEqual([])
    expect(anchorSchema.safeParse(anchorOn(cross, 'flywheel', { angleDeg: 720 })).success).toBe(false)
  })

  const line = (count: number) => ({
    shape: 'freehand',
    points: Array.from({ length: count }, () => [0.5, 0.5]),
  })
  const drawing = (shapes: unknown[], more: object = {}) =>
    stillDrawingSchema.safeParse({ aspect: 1.6, words: 'A gap', shapes, ...more }).success

  it('a drawing on the still has words, stays on the picture and within its limits', () => {
    const arrow = { shape: 'arrow', from: [0, 0], to: [1, 1] }
    expect(drawing([arrow, { shape: 'box', from: [0.1, 0.1], to: [0.2, 0.2] }, line(1996)])).toBe(true)
    expect(drawing([arrow], { words: '  ' })).toBe(false)
    expect(drawing([])).toBe(false)
    expect(drawing([{ shape: 'arrow', from: [0, 0], to: [1.01, 1] }])).toBe(false)
    expect(drawing(Array.from({ length: 51 }, () => arrow))).toBe(false)
    expect(drawing([line(1000), line(1001)])).toBe(false)
    expect(drawing([line(1)])).toBe(false)
  })
})
