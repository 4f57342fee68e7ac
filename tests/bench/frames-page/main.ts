import { createCanvasRenderer } from '@/scene/canvas/create-canvas-renderer'
import { buildRig } from '@/scene/frame/build-rig'
import { fillViewProjection, frameCamera } from '@/scene/frame/camera'
import { buildPose, fillPose } from '@/scene/frame/pose'
import type { Frame } from '@/scene/frame/types'
import { defaultPitch, defaultYaw } from '@/scene/frame/view-direction'
import { crankTrainSchema } from '@/scene/model/crank-train'
import preset from '@/scene/model/presets/v8x-5000.json'
import { toTrain } from '@/scene/model/to-train'
import { createWebglRenderer } from '@/scene/webgl/create-webgl-renderer'
import { vellum } from '@/tests/support/drawing/small-rig'
import { bareThree } from './bare-three'

/** The same engine, sheet and angles drawn three ways, one after the other on one page. */
const train = crankTrainSchema.parse(preset)
const rig = buildRig(train, toTrain(train))
const WIDTH = 1280
const HEIGHT = 720

const frame: Frame = {
  pose: buildPose(rig),
  viewProjection: new Float64Array(16),
  eye: new Float64Array(3),
  tint: new Float32Array(rig.anchors.firing.length),
  still: false,
}
const camera = frameCamera(rig.bounds, WIDTH / HEIGHT, { yaw: defaultYaw, pitch: defaultPitch })
fillViewProjection(frame.viewProjection, frame.eye, camera, WIDTH / HEIGHT)

function newCanvas() {
  const canvas = document.createElement('canvas')
  canvas.width = WIDTH
  canvas.height = HEIGHT
  Object.assign(canvas.style, { width: `${WIDTH}px`, height: `${HEIGHT}px`, display: 'block' })
  document.body.replaceChildren(canvas)
  return canvas
}

const tick = () => new Promise(requestAnimationFrame)

/** Waits until the graphics pipeline has drawn what it was told. */
function finished(canvas: HTMLCanvasElement) {
  const gl = canvas.getContext('webgl2')!
  gl.readPixels(0, 0, 1, 1, gl.RGBA, gl.UNSIGNED_BYTE, new Uint8Array(4))
}

async function timed(frames: number, draw: () => void) {
  const times: number[] = []
  for (let i = 0; i < frames; i++) {
    await tick()
    fillPose(frame.pose, rig, i * 0.05)
    const began = performance.now()
    draw()
    times.push(performance.now() - began)
  }
  return times
}

const drawing = {
  triangles: rig.parts.reduce((sum, part) => sum + rig.meshes[part.mesh].triangles.length / 3, 0),

  /** Our canvas renderer: what each frame cost in its worker. */
  async canvas(frames: number) {
    const times: number[] = []
    const renderer = createCanvasRenderer(newCanvas(), undefined, ({ milliseconds }) =>
      times.push(milliseconds),
    )
    renderer.setTheme(vellum)
    renderer.setRig(rig)
    renderer.resize(WIDTH, HEIGHT, 1)
    for (let i = 0; i < frames; i++) {
      fillPose(frame.pose, rig, i * 0.05)
      while (!renderer.draw(frame)) await tick()
    }
    while (times.length < frames) await tick()
    renderer.dispose()
    return times
  },

  /** Our WebGL renderer, each frame until it is drawn. */
  async webgl(frames: number) {
    const canvas = newCanvas()
    const renderer = await createWebglRenderer(canvas)
    renderer.setTheme(vellum)
    renderer.setRig(rig)
    renderer.resize(WIDTH, HEIGHT, 1)
    const times = await timed(frames, () => {
      renderer.draw(frame)
      finished(canvas)
    })
    renderer.dispose()
    return times
  },

  /** A bare three.js loop of the same triangles: one material, no ink, no passes. */
  async three(frames: number) {
    const canvas = newCanvas()
    const { draw, dispose } = bareThree(canvas, rig, WIDTH, HEIGHT)
    const times = await timed(frames, () => {
      draw(frame)
      finished(canvas)
    })
    dispose()
    return times
  },
}

declare global {
  interface Window {
    ways: typeof drawing
  }
}

window.ways = drawing
