import { describe, expect, it } from 'vitest'
import { addSample, allSamples, showSamples } from '@/scene/canvas/raster/refine'
import { boxMesh, frameOf, poseOf, rigOf, slate, vellum } from '@/tests/support/drawing/small-rig'
import { colourAt, count, drawn, inkAt } from '@/tests/support/drawing/picture'

const rig = rigOf([{ mesh: boxMesh(1.4, 1.4, 1.4) }])
const frame = frameOf(poseOf({ turn: 0.2 }), { eye: [4, 3, -9], fov: 0.3 })

const refined = (samples: number, theme = vellum) => {
  const raster = drawn(rig, frame, { theme })
  for (let sample = 0; sample < samples; sample++) addSample(raster, sample)
  showSamples(raster, samples)
  return raster
}

describe('addSample(raster, sample), showSamples(raster, samples)', () => {
  it('gives the same picture every time', () => {
    expect(refined(allSamples).image).toEqual(refined(allSamples).image)
  })

  it('changes only pixels at the border of a tone, and leaves lines as they were drawn', () => {
    const once = drawn(rig, frame)
    const still = refined(allSamples)
    expect(still.ink).toEqual(once.ink)
    const changed = count(once, (x, y) => colourAt(once, x, y) !== colourAt(still, x, y))
    expect(changed).toBeGreaterThan(20)
    expect(changed).toBeLessThan(0.06 * 200 * 200)
    const black = count(once, (x, y) => inkAt(once, x, y) === 255 && colourAt(still, x, y) !== vellum.ink)
    expect(black).toBe(0)
  })

  it.each([
    ['vellum', vellum],
    ['slate', slate],
  ] as const)('averages each pixel between the tones that meet there in %s', (_, theme) => {
    const still = refined(allSamples, theme)
    const channel = (colour: number) => colour & 255
    const tones = [theme.paper, theme.part, theme.metal, theme.ink].map(channel)
    const outside = count(still, (x, y) => {
      const value = channel(colourAt(still, x, y))
      return value < Math.min(...tones) || value > Math.max(...tones)
    })
    expect(outside).toBe(0)
    const between = count(
      still,
      (x, y) => inkAt(still, x, y) === 0 && !tones.includes(channel(colourAt(still, x, y))),
    )
    expect(between).toBeLessThan(300)
  })

  it('covers at the border of a face what the face covers there', () => {
    // Without lines: the tone alone is read as the share of a pixel that the face covers.
    const bare = rig.meshes.map((mesh) => ({
      ...mesh,
      creases: new Int32Array(0),
      smooth: new Int32Array(0),
    }))
    const raster = drawn(
      { ...rig, meshes: bare },
      frameOf(poseOf({ turn: 0.3 }), { eye: [0, 0, -9], fov: 0.3 }),
    )
    for (let sample = 0; sample < allSamples; sample++) addSample(raster, sample)
    showSamples(raster, allSamples)
    const blue = (colour: number) => colour & 255
    const share = (x: number, y: number) =>
      (blue(colourAt(raster, x, y)) - blue(vellum.paper)) / (blue(vellum.metal) - blue(vellum.paper))
    expect(share(100, 100)).toBe(1)
    expect(share(2, 2)).toBe(0)
    let area = 0
    for (let y = 0; y < 200; y++) for (let x = 0; x < 200; x++) area += share(x, y)
    const side = (1.4 * 200) / (2 * Math.tan(0.15) * (9 - 0.7))
    // A sixteenth of a pixel all round, and the rounding of twelve grey levels.
    expect(Math.abs(area - side * side)).toBeLessThan((4 * side) / 16)
  })
})
