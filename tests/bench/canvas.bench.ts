import { bench, describe } from 'vitest'
import { fine } from '@/scene/canvas/raster/fine'
import { paint } from '@/scene/canvas/raster/paint'
import { createRaster, setSize } from '@/scene/canvas/raster/raster'
import { addSample, allSamples, showSamples } from '@/scene/canvas/raster/refine'
import { presetRig, shotOf } from '@/tests/support/drawing/engines'
import { vellum } from '@/tests/support/drawing/small-rig'
import type { Raster, RasterFrame } from '@/scene/canvas/raster/types'

// Wanted on two cores without a GPU: 12 ms for a third of 1280 × 720, 20 ms zoomed twice.

const rig = presetRig('v8x-5000')
const pictures = 24

const turn = (zoom: number) =>
  Array.from({ length: pictures }, (_, i) => shotOf(rig, { angleDeg: (720 * i) / pictures, zoom }))

function rasterOf(width: number, height: number) {
  const raster = createRaster(rig, vellum, fine)
  setSize(raster, width, height, height / 720)
  return raster
}

const checksum = ({ image }: Raster) => image.reduce((sum, pixel) => (Math.imul(sum, 31) + pixel) | 0, 0)

/** Runs through a turn again and again; the picture it ends on must be what a fresh raster paints of that frame. */
function paintTurn(name: string, frames: RasterFrame[], width: number, height: number) {
  const raster = rasterOf(width, height)
  let next = 0
  bench(name, () => paint(raster, frames[next++ % pictures]), {
    time: 2000,
    teardown() {
      const fresh = rasterOf(width, height)
      paint(fresh, frames[0])
      paint(raster, frames[0])
      if (checksum(fresh) !== checksum(raster))
        throw new Error(`${name}: the picture depends on what was drawn before`)
    },
  })
}

describe(`cross-plane V8, ${createRaster(rig, vellum, fine).flat.faceCount} triangles`, () => {
  paintTurn('1280 × 720, a third of the picture', turn(0.75), 1280, 720)
  paintTurn('1280 × 720, framed', turn(1), 1280, 720)
  paintTurn('1280 × 720, zoomed twice', turn(1.5), 1280, 720)
  paintTurn('960 × 540, framed', turn(1), 960, 540)
  paintTurn('640 × 360, framed', turn(1), 640, 360)
  paintTurn('2560 × 1440, framed', turn(1), 2560, 1440)

  const still = rasterOf(1280, 720)
  const [frame] = turn(1)
  bench('1280 × 720, framed and still, 16 samples', () => {
    paint(still, frame)
    for (let sample = 0; sample < allSamples; sample++) addSample(still, sample)
    showSamples(still, allSamples)
  })
})
