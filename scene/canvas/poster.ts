import type { InkTheme, Pose, Visibility } from '@/scene/frame/types'
import { fine } from './raster/fine'
import { paint } from './raster/paint'
import type { RigShape } from './raster/prepare'
import { createRaster, setSize, setVisibility } from './raster/raster'

export interface PosterView {
  viewProjection: Float64Array
  eye: Float64Array
  /** Per cylinder; none where left out. */
  tint?: Float32Array
  /** Picture pixels for each CSS pixel: line widths grow with it. Default 1. */
  ratio?: number
}

/** One still picture without a canvas: posters, thumbnails, pictures for links. `samples` is 1 … 16. RGBA. */
export function drawPoster(
  rig: RigShape,
  pose: Pose,
  view: PosterView,
  theme: InkTheme,
  visibility: Visibility | null,
  width: number,
  height: number,
  samples: number,
): Uint8ClampedArray<ArrayBuffer> {
  const raster = createRaster(rig, theme, fine)
  const tint = view.tint ?? new Float32Array(raster.flat.cylinderCount)
  if (visibility) setVisibility(raster, visibility)
  setSize(raster, width, height, view.ratio ?? 1)
  paint(raster, { pose, viewProjection: view.viewProjection, eye: view.eye, tint })
  if (samples > 1) {
    for (let sample = 0; sample < samples; sample++) fine.addSample(raster, sample)
    fine.showSamples(raster, samples)
  }
  return new Uint8ClampedArray(raster.image.buffer)
}
