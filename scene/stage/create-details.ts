import { buildRay, fillRay, pickPart } from '@/scene/frame/picking'
import { createBalloons } from './balloons'
import { createForced, turnForced, type ForcedPicture } from './forced-picture'
import type { Point } from './gestures'
import { layHands } from './hands'
import { createLabels } from './labels'
import { legendRoom } from './legend'
import { createOverlay, legendRows, paintOverlay, type Overlay, type OverlayView } from './overlay'
import { steady } from './steady'
import type { CreateDetails, MovingModel, Picture, StageLook, StageModel } from './types'
import { createUpperLayers } from './upper-layers'
import { listWords, placeWords, type WordSheet } from './words'

const hasForces = (model: MovingModel): model is StageModel => 'plan' in model

/** Forces, marks, labels, balloons, legend, picking, gestures and keys. */
export const createDetails: CreateDetails = (hold, under) => {
  if (under) return under
  const { host, clock, events, pane, eye, sheet } = hold
  const layers = createUpperLayers(host, !pane)
  const labels = createLabels(layers.written)
  const balloons = createBalloons(layers.written, (number) => events.onBalloon?.(number))
  const ray = buildRay()

  let forced: ForcedPicture | null = null
  let overlay: Overlay | null = null
  let view: (OverlayView & WordSheet) | null = null
  let drawn = false
  let pointer: Point | null = null
  let pointed = false
  let hovered: string | null = null

  function partAt(at: Point): string | null {
    if (!forced || !drawn) return null
    const { rig, pose, visibility } = forced
    const { width, height } = sheet
    fillRay(ray, eye.camera, width / height, (2 * at.x) / width - 1, 1 - (2 * at.y) / height)
    return rig.parts[pickPart(rig, pose, visibility, ray)]?.id ?? null
  }

  const offHands = pane
    ? () => {}
    : layHands(host, layers.surface, {
        clock,
        camera: eye.camera,
        sheet: () => (forced && sheet.height > 0 ? { ...sheet, bounds: forced.rig.bounds } : null),
        move: hold.move,
        moved() {
          balloons.unsettle()
          hold.moved()
        },
        view: hold.view,
        pick: (at) => events.onPick?.(partAt(at), ray.hit),
        hover(at) {
          pointer = at
          pointed = true
          hold.wake()
        },
      })

  /** New buffers where they must be. */
  function standOn(picture: Picture) {
    if (forced?.model === picture.model) return
    forced = hasForces(picture.model) ? createForced(picture, picture.model) : null
    overlay = forced && createOverlay(forced)
    drawn = false
    hovered = null
  }

  return {
    stand(picture, look: StageLook) {
      standOn(picture)
      if (!forced) return
      const rows = pane ? [] : legendRows(look)
      const { width, height } = sheet
      const legend = legendRoom(rows)
      view = {
        ...{ camera: eye.camera, look, palette: hold.palette },
        ...{ width, height, steadily: false, rows, legend },
      }
      if (pane) return
      labels.set(listWords(forced, look))
      balloons.set(look.balloons)
    },
    resize() {
      if (view) Object.assign(view, { width: sheet.width, height: sheet.height })
      balloons.unsettle()
    },
    tick() {
      if (!pointed) return
      pointed = false
      const part = pointer && partAt(pointer)
      if (part === hovered) return
      hovered = part
      events.onHover?.(part)
    },
    turn(angle) {
      if (!forced || !view) return
      drawn = true
      turnForced(forced, angle, view.look.overlays.pressure && !steady(clock, forced.model.events))
    },
    finish(still) {
      if (!forced || !overlay || !view || !drawn) return
      if (!still) events.onTick?.(forced.instant)
      view.steadily = steady(clock, forced.model.events)
      layers.resize(sheet.width, sheet.height, sheet.ratio)
      paintOverlay(layers.pen, overlay, view)
      if (pane) return
      balloons.place(forced, sheet.width, sheet.height, still)
      balloons.paint(layers.pen, view.palette)
      placeWords(labels, forced, view)
    },
    retheme(palette) {
      if (view) view.palette = palette
    },
    dispose() {
      offHands()
      layers.remove()
    },
  }
}
