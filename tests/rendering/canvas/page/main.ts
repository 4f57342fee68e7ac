import { createCanvasRenderer } from '@/scene/canvas/create-canvas-renderer'
import { drawPoster } from '@/scene/canvas/poster'
import { buildRig } from '@/scene/frame/build-rig'
import { fillViewProjection, frameCamera } from '@/scene/frame/camera'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { defaultPitch, defaultYaw } from '@/scene/frame/view-direction'
import type { Frame } from '@/scene/frame/types'
import { crankTrainSchema } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'
import { slate, vellum } from '@/tests/support/drawing/small-rig'
import preset from '@/scene/model/presets/v8x-5000.json'

/** A page with nothing but the canvas renderer and a V8, steered by `window.drawing`. */
const train = crankTrainSchema.parse(preset)
const rig = buildRig(train, toTrain(train))

const tick = () => new Promise(requestAnimationFrame)

function frameAt(angle: number, aspect: number, zoom: number, still: boolean): Frame {
  const frame: Frame = {
    pose: fillPose(buildPose(rig), rig, angle),
    viewProjection: new Float64Array(16),
    eye: new Float64Array(3),
    tint: new Float32Array(rig.anchors.firing.length),
    still,
  }
  const camera = frameCamera(rig.bounds, aspect, { yaw: defaultYaw, pitch: defaultPitch })
  camera.distance /= zoom
  fillViewProjection(frame.viewProjection, frame.eye, camera, aspect)
  return frame
}

function mount(width: number, height: number, ratio: number) {
  const canvas = document.createElement('canvas')
  canvas.style.width = `${width}px`
  canvas.style.height = `${height}px`
  document.body.replaceChildren(canvas)
  const told = { ready: 0, painted: [] as { milliseconds: number; width: number; height: number }[] }
  const renderer = createCanvasRenderer(
    canvas,
    () => told.ready++,
    (painted) => told.painted.push({ ...painted }),
  )
  renderer.setTheme(vellum)
  renderer.setRig(rig)
  renderer.resize(width, height, ratio)
  return { canvas, renderer, told }
}

/** Asks at every tick until the renderer takes the frame. */
async function draw({ renderer }: ReturnType<typeof mount>, frame: Frame) {
  while (!renderer.draw(frame)) await tick()
}

function pixelsOf(canvas: HTMLCanvasElement) {
  const copy = document.createElement('canvas')
  copy.width = canvas.width
  copy.height = canvas.height
  const context = copy.getContext('2d')
  if (!context) throw new Error('no 2D context')
  context.drawImage(canvas, 0, 0)
  return context.getImageData(0, 0, copy.width, copy.height).data
}

/** Looks at every tick until the canvas is this picture; never answers when it does not become it. */
async function becomes(canvas: HTMLCanvasElement, picture: Uint8ClampedArray) {
  while (!same(pixelsOf(canvas), picture)) await tick()
}

const same = (a: Uint8ClampedArray, b: Uint8ClampedArray) =>
  a.length === b.length && a.every((value, i) => value === b[i])

const drawing = {
  /** Draws one still frame and waits until the canvas is the poster of 16 samples. */
  async still() {
    const made = mount(640, 400, 1)
    const frame = frameAt(0.4, 1.6, 1, true)
    await draw(made, frame)
    await becomes(made.canvas, drawPoster(rig, frame.pose, frame, vellum, null, 640, 400, 16))
    made.renderer.dispose()
    return { ready: made.told.ready, painted: made.told.painted.length }
  },

  /** Changes the theme under a frame and waits until the canvas is the poster in the new one. */
  async retheme() {
    const made = mount(640, 400, 1)
    const frame = frameAt(0.4, 1.6, 0.5, false)
    // a still picture first: a moving one is plain until seams and hatch are there
    await draw(made, frameAt(0.4, 1.6, 1, true))
    await draw(made, frame)
    await becomes(made.canvas, drawPoster(rig, frame.pose, frame, vellum, null, 640, 400, 1))
    made.renderer.setTheme(slate)
    await becomes(made.canvas, drawPoster(rig, frame.pose, frame, slate, null, 640, 400, 1))
    made.renderer.dispose()
    return true
  },

  /** The answer to a second frame while the first is being drawn. */
  async busy() {
    const made = mount(640, 400, 1)
    await draw(made, frameAt(0.4, 1.6, 1, false))
    const answer = made.renderer.draw(frameAt(0.5, 1.6, 1, false))
    made.renderer.dispose()
    return answer
  },

  /** Runs the engine for so many frames and gives what each cost. */
  async run(width: number, height: number, ratio: number, zoom: number, frames: number) {
    const made = mount(width, height, ratio)
    for (let i = 0; i < frames; i++) await draw(made, frameAt(i * 0.05, width / height, zoom, false))
    while (made.told.painted.length < frames) await tick()
    made.renderer.dispose()
    return made.told.painted
  },
}

declare global {
  interface Window {
    drawing: typeof drawing
  }
}

window.drawing = drawing
