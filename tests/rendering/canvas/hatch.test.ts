import { describe, expect, it } from 'vitest'
import { boxMesh, frameOf, poseOf, rigOf } from '@/tests/support/drawing/small-rig'
import { drawn, inkAt, inkIn } from '@/tests/support/drawing/picture'
import type { Raster } from '@/scene/canvas/raster/types'

/** A cut face 200 pixels and more wide, straight before the eye. */
const cutFace = (bank: number, motion: { x?: number; y?: number; turn?: number } = {}, scale = 1) => {
  const rig = rigOf([{ mesh: boxMesh(2, 2, 0.1, true), part: { bank, cylinder: 0 } }], [[0, 1, 0]])
  return drawn(rig, frameOf(poseOf(motion), { eye: [0, 0, -10.05], fov: 0.25 }), {
    width: 300 * scale,
    height: 300 * scale,
    scale,
  })
}

/** Strokes met along a row: rises of ink past half of the strongest. */
function strokes(raster: Raster, y: number, from: number, to: number) {
  let most = 0
  for (let x = from; x < to; x++) most = Math.max(most, inkAt(raster, x, y))
  let met = 0
  for (let x = from; x < to; x++)
    if (inkAt(raster, x, y) > most / 2 && inkAt(raster, x - 1, y) <= most / 2) met++
  return met
}

const meanInk = (raster: Raster) => inkIn(raster, 80, 80, 220, 220) / (140 * 140)

describe('paint(raster, frame): hatch of cut faces', () => {
  it('spaces the lines 5.5 CSS pixels apart at 45° to the part', () => {
    // Along a row lines at 45° stand 5.5 · √2 apart.
    expect(Math.abs(strokes(cutFace(0), 150, 80, 220) - 140 / (5.5 * Math.SQRT2))).toBeLessThan(1.5)
    expect(Math.abs(strokes(cutFace(0, {}, 2), 300, 160, 440) - 140 / (5.5 * Math.SQRT2))).toBeLessThan(1.5)
  })

  it('runs along the row where the part is turned by 45°', () => {
    const turned = cutFace(0, { turn: Math.PI / 4 })
    const rows = Array.from({ length: 100 }, (_, k) => inkIn(turned, 110, 100 + k, 190, 101 + k) / 80)
    const columns = Array.from({ length: 100 }, (_, k) => inkIn(turned, 100 + k, 110, 101 + k, 190) / 80)
    const spread = (values: number[]) => Math.max(...values) - Math.min(...values)
    expect(Math.max(spread(rows), spread(columns))).toBeGreaterThan(0.4)
    expect(Math.min(spread(rows), spread(columns))).toBeLessThan(0.1)
  })

  it('rides with the part', () => {
    const here = cutFace(0)
    const metre = 300 / (2 * Math.tan(0.125) * 10)
    const there = cutFace(0, { x: 20 / metre })
    // +x lies to the left of an eye that looks along +z.
    for (let y = 100; y < 200; y++)
      for (let x = 100; x < 200; x++)
        expect(Math.abs(inkAt(there, x - 20, y) - inkAt(here, x, y))).toBeLessThan(20)
  })

  it('tells the banks apart: paired lines twice for 1.6 pitches, broken less, crossed twice, dotted least', () => {
    const [single, paired, broken, crossed, dotted, pairedBroken] = [0, 1, 2, 3, 4, 5].map((bank) =>
      meanInk(cutFace(bank)),
    )
    expect(paired / single).toBeCloseTo(2 / 1.6, 1)
    expect(broken).toBeLessThan(0.85 * single)
    expect(crossed / single).toBeGreaterThan(1.7)
    expect(dotted).toBeLessThan(0.7 * single)
    expect(pairedBroken).toBeLessThan(0.85 * paired)
    expect(meanInk(cutFace(6))).toBeCloseTo(single, 6)
  })

  it('leaves faces alone that are not cut', () => {
    const rig = rigOf([{ mesh: boxMesh(2, 2, 0.1) }])
    const raster = drawn(rig, frameOf(poseOf({}), { eye: [0, 0, -10.05], fov: 0.25 }), {
      width: 300,
      height: 300,
    })
    expect(inkIn(raster, 80, 80, 220, 220)).toBe(0)
  })
})
