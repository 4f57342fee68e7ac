import { buildArrows, COUPLE, fillArrows, GAS, INERTIA, ON_ENGINE, type Arrows } from '@/scene/frame/arrows'
import { project } from '@/scene/frame/camera'
import { boreStack, niceScale } from '@/scene/frame/nice-scale'
import { buildOrbitPath, fillOrbitPath } from '@/scene/frame/orbit-path'
import type { Camera } from '@/scene/frame/types'
import { metresPerPixel } from './camera-moves'
import { paintLegend, type LegendRow } from './legend'
import { paintArrow, paintRing, type ArrowForm, type Pen } from './paint-arrow'
import { paintDiamond } from './paint-diamond'
import { paintPath, type PathForm } from './paint-path'
import type { Palette } from './palette'
import type { Ghost } from './past-ghost'
import type { ForcedPicture } from './forced-picture'
import { scaleBar, type ScaleBar } from './scale-bar'
import { createPath, fillCoupleArc, fillRotation, type SpacePath } from './space-paths'
import type { StageLook } from './types'

/** The vectors and marks over the engine: their buffers live as long as the picture does. */
export interface Overlay {
  picture: ForcedPicture
  past: Ghost | null
  arrows: Arrows
  /** Of world per newton: the page's one scale. */
  metresPerNewton: number
  orbit: SpacePath
  couple: SpacePath
  rotation: SpacePath
  /** A path on the sheet. */
  sheetPath: Float64Array
  bar: ScaleBar
  barScale: number
}

export interface OverlayView {
  camera: Camera
  look: StageLook
  palette: Palette
  width: number
  height: number
  steadily: boolean
  /** What the vectors are; a pane leaves it out. */
  rows: LegendRow[]
}

export function createOverlay(picture: ForcedPicture): Overlay {
  const { model, rig } = picture
  const { referenceAxial } = model.plan.train
  const metresPerNewton = model.metresPerNewton ?? niceScale(model.peakForce, boreStack(rig)).metresPerNewton
  const orbit = fillOrbitPath(buildOrbitPath(model.orbit), rig, model.orbit, referenceAxial, metresPerNewton)
  const rotation = createPath(32)
  fillRotation(rotation, rig)
  return {
    picture,
    past: model.past ? model.past.ghost.build(model.past.rig, rig) : null,
    arrows: buildArrows(rig, model.plan.train),
    metresPerNewton,
    orbit: { points: orbit, count: orbit.length / 3 },
    couple: createPath(32),
    rotation,
    sheetPath: new Float64Array(2 * Math.max(32, orbit.length / 3)),
    bar: { force: 0, length: 0, label: '' },
    barScale: 0,
  }
}

const tail = new Float64Array(3)
const tip = new Float64Array(3)

export function paintOverlay(pen: Pen, overlay: Overlay, view: OverlayView): void {
  const { look, palette, width, height } = view
  const { overlays } = look
  pen.clearRect(0, 0, width, height)
  const { past, picture } = overlay
  if (past) {
    const { model, instant, frame } = picture
    model.past?.ghost.paint(pen, past, instant.angle, frame, palette, look.hidden, width, height)
  }
  if (overlays.labels) paintSpacePath(pen, overlay, view, overlay.rotation, 'rotation')
  if (overlays.orbit) paintSpacePath(pen, overlay, view, overlay.orbit, 'orbit')
  if (overlays.shaking) paintCouple(pen, overlay, view)
  paintArrows(pen, overlay, view)
  if (overlays.firing) paintFirings(pen, overlay, view)
  if (view.rows.length > 0 && overlay.metresPerNewton > 0)
    paintLegend(pen, palette, width, barFor(overlay, view), view.rows)
}

function paintArrows(pen: Pen, overlay: Overlay, { look, palette, width, height }: OverlayView) {
  const { picture, arrows, metresPerNewton } = overlay
  const { model, rig, pose, instant, frame } = picture
  const { viewProjection } = frame
  fillArrows(arrows, rig, pose, instant, look.overlays, metresPerNewton)
  const { tails, tips, kinds, on } = arrows
  let shakes = false
  for (let i = 0; i < arrows.count; i++) {
    // The couple is drawn as its arc.
    if (kinds[i] === COUPLE) continue
    if (on[i] === ON_ENGINE) shakes = true
    const at = 3 * i
    if (!project(tail, viewProjection, tails[at], tails[at + 1], tails[at + 2], width, height)) continue
    if (!project(tip, viewProjection, tips[at], tips[at + 1], tips[at + 2], width, height)) continue
    const form: ArrowForm = kinds[i] === GAS ? 'gas' : kinds[i] === INERTIA ? 'inertia' : 'resultant'
    paintArrow(pen, palette, form, tail[0], tail[1], tip[0], tip[1])
  }
  // Nothing worth an arrow is left of the shaking force: that is said, too.
  if (!look.overlays.shaking || shakes) return
  if (project(tip, viewProjection, 0, 0, model.plan.train.referenceAxial, width, height))
    paintRing(pen, palette, tip[0], tip[1])
}

function paintCouple(pen: Pen, overlay: Overlay, view: OverlayView) {
  const { model, rig, instant } = overlay.picture
  const { coupleVertical, coupleHorizontal } = instant
  const { referenceAxial } = model.plan.train
  fillCoupleArc(overlay.couple, rig, coupleVertical, coupleHorizontal, model.fullCouple, referenceAxial)
  paintSpacePath(pen, overlay, view, overlay.couple, 'couple')
}

function paintSpacePath(
  pen: Pen,
  { picture, sheetPath }: Overlay,
  { palette, width, height }: OverlayView,
  path: SpacePath,
  form: PathForm,
) {
  const { points, count } = path
  const { viewProjection } = picture.frame
  for (let i = 0; i < count; i++) {
    if (!project(tip, viewProjection, points[3 * i], points[3 * i + 1], points[3 * i + 2], width, height))
      return
    sheetPath[2 * i] = tip[0]
    sheetPath[2 * i + 1] = tip[1]
  }
  paintPath(pen, palette, form, sheetPath, count)
}

const diamond = 7
const steadyDiamond = 4.5

/** Filled over the cylinder whose charge burns; where that would flash, small ones over all that fire. */
function paintFirings(pen: Pen, { picture }: Overlay, { palette, width, height, steadily }: OverlayView) {
  const { model, rig, markers, frame } = picture
  for (let i = 0; i < model.events.length; i++) {
    const { cylinder } = model.events[i]
    if (!steadily && markers.burning[cylinder] === 0) continue
    const [x, y, z] = rig.anchors.firing[cylinder]
    if (!project(tip, frame.viewProjection, x, y, z, width, height)) continue
    paintDiamond(pen, palette, tip[0], tip[1], steadily ? steadyDiamond : diamond, true)
  }
}

function barFor(overlay: Overlay, { camera, look, height }: OverlayView): ScaleBar {
  const scale = overlay.metresPerNewton / metresPerPixel(camera, height)
  if (scale !== overlay.barScale || !overlay.bar.label.endsWith(look.forceUnit)) {
    overlay.bar = scaleBar(scale, look.forceUnit)
    overlay.barScale = scale
  }
  return overlay.bar
}

/** Only what is drawn is explained. */
export function legendRows({ overlays }: StageLook): LegendRow[] {
  const { gas, inertia, total, shaking, on } = overlays
  const anywhere = on.pistons || on.crankPins
  const rows: LegendRow[] = []
  if (gas && anywhere) rows.push({ form: 'gas', text: 'Gas force' })
  if (inertia && anywhere) rows.push({ form: 'inertia', text: 'Inertia force' })
  const resultant = total && (anywhere || on.mains)
  if (resultant || shaking)
    rows.push({
      form: 'resultant',
      text: resultant && shaking ? 'Resultant, shaking' : resultant ? 'Resultant' : 'Shaking force',
    })
  return rows
}
