import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fine } from '@/scene/canvas/raster/fine'
import { paint } from '@/scene/canvas/raster/paint'
import { createRaster, setSize, setTheme, setVisibility } from '@/scene/canvas/raster/raster'
import { addSample, showSamples } from '@/scene/canvas/raster/refine'
import { barMesh, boxMesh, frameOf, poseOf, rigOf, slate, vellum } from '@/tests/support/drawing/small-rig'

const rig = rigOf([
  { mesh: boxMesh(0.5, 0.5, 0.5, true), part: { bank: 0, cylinder: 0 } },
  { mesh: barMesh(0.2, 1) },
  { mesh: boxMesh(1, 0.1, 0.3) },
], [[0, 1, 0]]) // prettier-ignore

const place = fc.double({ min: -1.2, max: 1.2, noNaN: true })
const motion = fc.record({ x: place, y: place, turn: fc.double({ min: -3, max: 3, noNaN: true }) })
const step = fc.record({
  motions: fc.tuple(motion, motion, motion),
  visibility: fc.array(fc.integer({ min: 0, max: 3 }), { minLength: 3, maxLength: 3 }),
  distance: fc.constantFrom(1.1, 4, 8, 30),
  tint: fc.double({ min: 0, max: 1, noNaN: true }),
  dark: fc.boolean(),
  width: fc.constantFrom(120, 120, 120, 90),
  still: fc.boolean(),
})

describe('paint(raster, frame): dirty box', () => {
  it('leaves the sheet as a fresh full picture would, after any frames, sizes, colours and parts', () => {
    fc.assert(
      fc.property(fc.array(step, { minLength: 1, maxLength: 6 }), (steps) => {
        const raster = createRaster(rig, vellum, fine)
        let sheet = new Uint32Array(0)
        for (const { motions, visibility, distance, tint, dark, width, still } of steps) {
          if (raster.palette.theme.paper !== (dark ? slate : vellum).paper)
            setTheme(raster, dark ? slate : vellum)
          setVisibility(raster, Uint8Array.from(visibility))
          setSize(raster, width, 80, 1)
          if (sheet.length !== width * 80) sheet = new Uint32Array(width * 80)
          const frame = frameOf(
            poseOf(...motions),
            { eye: [1, 1, -distance], fov: 0.3, aspect: width / 80 },
            [tint],
          )
          paint(raster, frame)
          put(sheet, raster.image, raster.dirty, width)
          if (still) {
            for (let sample = 0; sample < 3; sample++) addSample(raster, sample)
            showSamples(raster, 3)
            put(sheet, raster.image, raster.drawn, width)
          }
          const fresh = createRaster(rig, dark ? slate : vellum, fine)
          setVisibility(fresh, Uint8Array.from(visibility))
          setSize(fresh, width, 80, 1)
          paint(fresh, frame)
          if (still) {
            for (let sample = 0; sample < 3; sample++) addSample(fresh, sample)
            showSamples(fresh, 3)
          }
          expect(sheet).toEqual(fresh.image)
        }
      }),
      { numRuns: 40, seed: 7 },
    )
  })

  it('is small where little is drawn, and the whole sheet after new colours', () => {
    const raster = createRaster(rig, vellum, fine)
    setVisibility(raster, Uint8Array.of(1, 0, 0))
    setSize(raster, 400, 300, 1)
    const frame = frameOf(poseOf({}, {}, {}), { eye: [0, 0, -10], fov: 0.6, aspect: 4 / 3 })
    paint(raster, frame)
    expect([...raster.dirty]).toEqual([0, 0, 400, 300])
    paint(raster, frame)
    const area = (box: Int32Array) => (box[2] - box[0]) * (box[3] - box[1])
    expect(area(raster.dirty)).toBeLessThan(0.02 * 400 * 300)
    setTheme(raster, slate)
    paint(raster, frame)
    expect([...raster.dirty]).toEqual([0, 0, 400, 300])
  })
})

function put(sheet: Uint32Array, image: Uint32Array, box: Int32Array, width: number) {
  for (let y = box[1]; y < box[3]; y++)
    for (let x = box[0]; x < box[2]; x++) sheet[y * width + x] = image[y * width + x]
}
