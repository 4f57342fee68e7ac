import type { InkTheme, Visibility } from '@/scene/frame/types'
import { frameBytes, readFrame, type FrameBuffer, type Painted } from './protocol'
import { paint } from './raster/paint'
import type { RigShape } from './raster/prepare'
import { createRaster, setRig, setSize, setTheme, setVisibility } from './raster/raster'
import { createResolution } from './resolution'
import type { Sheet } from './sheet'
import type { Fine, Raster, RasterFrame } from './raster/types'

/** Paints frames onto a sheet and refines the one that stands still, in a worker or on the page. */
export interface Painter {
  setRig(rig: RigShape): void
  setTheme(theme: InkTheme): void
  setVisibility(visibility: Visibility): void
  resize(width: number, height: number, ratio: number): void
  /** From now on pictures are fine. */
  enrich(fine: Fine): void
  /** Paints at once, and if it is a still frame goes on refining it until the next call. */
  draw(frame: RasterFrame, still: boolean): Painted
  dispose(): void
}

/** Where the painter gets the time and how it lets others run in between. */
export interface Pacing {
  now(): number
  /** Runs the step soon, after what is waiting now. */
  soon(step: () => void): void
}

export function createPainter(sheet: Sheet, pacing: Pacing, startFine: Fine | null = null): Painter {
  const resolution = createResolution()
  const painted: Painted = { milliseconds: 0, width: 0, height: 0 }
  const size = { width: 1, height: 1, ratio: 1 }
  let fine = startFine
  let raster: Raster | null = null
  let theme: InkTheme | null = null
  let rig: RigShape | null = null
  let visibility: Visibility | null = null
  /** The frame last drawn, kept for new colours and refinement. */
  let last: FrameBuffer | null = null
  let lastStill = false
  let drawn = false
  /** Work that was put off belongs to a turn; a new turn drops it. */
  let turn = 0
  let stale = true

  const setUp = () => {
    if (!rig || !theme) return
    if (raster) setRig(raster, rig)
    else raster = createRaster(rig, theme, fine)
    if (visibility) setVisibility(raster, visibility)
    const { partCount, cylinderCount } = raster.flat
    last = readFrame(new ArrayBuffer(frameBytes(partCount, cylinderCount)), partCount)
    drawn = false
    turn++
  }

  const paintLast = () => {
    const { width, height, ratio } = size
    if (!raster || !last) return
    const began = pacing.now()
    const scale = resolution.scale(width, height, ratio, lastStill)
    const before = raster.image
    setSize(raster, Math.max(1, Math.round(width * scale)), Math.max(1, Math.round(height * scale)), scale)
    if (raster.image !== before) sheet.resize(raster.width, raster.height)
    paint(raster, last)
    sheet.put(raster.image, raster.dirty)
    stale = false
    painted.milliseconds = pacing.now() - began
    painted.width = raster.width
    painted.height = raster.height
    const pixels = raster.width * raster.height
    if (!lastStill) resolution.add(painted.milliseconds, pixels, width * height * ratio * ratio)
    const mine = ++turn
    const { fine } = raster
    if (lastStill && fine) pacing.soon(() => refine(fine, mine, 0))
  }

  const refine = (fine: Fine, mine: number, sample: number) => {
    if (mine !== turn || !raster) return
    fine.addSample(raster, sample)
    const samples = sample + 1
    if (samples === fine.firstSamples || samples === fine.allSamples) {
      fine.showSamples(raster, samples)
      sheet.put(raster.image, raster.drawn)
    }
    if (samples < fine.allSamples) pacing.soon(() => refine(fine, mine, samples))
  }

  /** Draws the last frame again unless a new one comes first. */
  const redrawSoon = () => {
    stale = true
    const mine = ++turn
    if (drawn) pacing.soon(() => mine === turn && paintLast())
  }

  return {
    setRig(next) {
      rig = next
      visibility = null
      setUp()
    },
    setTheme(next) {
      theme = next
      if (raster) setTheme(raster, next)
      else setUp()
      redrawSoon()
    },
    setVisibility(next) {
      visibility = next
      if (!raster) return
      setVisibility(raster, next)
      redrawSoon()
    },
    resize(width, height, ratio) {
      // The frame that fits the new size is on its way: the old one would only be stretched.
      size.width = Math.max(1, width)
      size.height = Math.max(1, height)
      size.ratio = ratio
      stale = true
    },
    enrich(next) {
      fine = next
      if (raster) raster.fine = next
      redrawSoon()
    },
    draw(frame, still) {
      if (!last) return painted
      if (drawn && still && lastStill && !stale && sameFrame(frame, last)) return painted
      last.pose.set(frame.pose)
      last.viewProjection.set(frame.viewProjection)
      last.eye.set(frame.eye)
      last.tint.set(frame.tint)
      lastStill = still
      drawn = true
      paintLast()
      return painted
    },
    dispose() {
      turn++
      raster = last = null
      drawn = false
    },
  }
}

const sameFrame = (a: RasterFrame, b: RasterFrame) =>
  same(a.viewProjection, b.viewProjection) &&
  same(a.eye, b.eye) &&
  same(a.pose, b.pose) &&
  same(a.tint, b.tint)

function same(a: ArrayLike<number>, b: ArrayLike<number>) {
  for (let i = 0; i < b.length; i++) if (a[i] !== b[i]) return false
  return true
}
