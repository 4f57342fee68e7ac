import { encodePng } from './encode-png'
import { modelOf } from './model-of'
import { drawPoster } from '@/scene/canvas/poster'
import { fillViewProjection, namedCamera } from '@/scene/frame/camera'
import { cameraOf } from '@/scene/frame/scene-camera'
import type { InkTheme } from '@/scene/frame/types'
import type { Scene } from '@/scene/model/scene'
import { cutRig } from '@/scene/stage/cut-rig'
import { createForced, turnForced } from '@/scene/stage/forced-picture'
import { createPicture, fillVisibility, turnPicture } from '@/scene/stage/picture'

/** The colours of app/tokens.css, which a server cannot ask a browser for; a test holds the two together. */
export const inkThemes: Record<'light' | 'dark', InkTheme> = {
  light: {
    paper: 0xf5f2ea,
    part: 0xe9e5d9,
    metal: 0xfbfaf6,
    ink: 0x20262b,
    line: 0x747a7c,
    pencil: 0x7a4cc0,
    pencilWash: 0xe3daef,
    gas: 0xa57a11,
    fire: 0xa2301c,
  },
  dark: {
    paper: 0x14181b,
    part: 0x232a2f,
    metal: 0x1b2024,
    ink: 0xe9e4d8,
    line: 0x868e91,
    pencil: 0xd9bceb,
    pencilWash: 0x3a3046,
    gas: 0xe8ba55,
    fire: 0xf0745e,
  },
}

export interface PictureSize {
  width: number
  height: number
  /** Picture pixels for each pixel of the page it is shown on: lines grow with it. */
  ratio: number
}

export const thumbnailSize: PictureSize = { width: 288, height: 192, ratio: 2 }
export const posterSize: PictureSize = { width: 1280, height: 800, ratio: 1 }
/** What the Open Graph protocol's readers show whole. */
export const cardSize: PictureSize = { width: 1200, height: 630, ratio: 1 }

const samples = 4
const degree = Math.PI / 180

/** A scene as PNG: its engine at the saved angle and view, cut and hidden as saved. */
export function drawScene(
  scene: Scene,
  theme: keyof typeof inkThemes | InkTheme,
  size: PictureSize,
): Promise<Buffer> {
  const { train: document, view } = scene
  const { width, height, ratio } = size
  const model = modelOf(document, view.speedRpm)
  const axial = view.sectionAxialMm === null ? null : view.sectionAxialMm / 1000
  const picture = createPicture({ rig: cutRig(model.rig, axial) })
  const { hidden, ghost, overlays } = view
  fillVisibility(picture, { hidden, ghost, lit: [] })
  turnPicture(picture, view.angleDeg * degree)
  turnForced(createForced(picture, model), view.angleDeg * degree, overlays.pressure)
  const { viewProjection, eye, tint } = picture.frame
  const camera = view.camera ? cameraOf(view.camera) : namedCamera('free', picture.rig, width / height)
  fillViewProjection(viewProjection, eye, camera, width / height)
  const lens = { viewProjection, eye, tint, ratio }
  const colours = typeof theme === 'string' ? inkThemes[theme] : theme
  const rgba = drawPoster(
    picture.rig,
    picture.pose,
    lens,
    colours,
    picture.visibility,
    width,
    height,
    samples,
  )
  return encodePng(rgba, width, height)
}
