import document from '@/scene/model/presets/v8x-5000.json'
import { fine } from '@/scene/canvas/raster/fine'
import { paint } from '@/scene/canvas/raster/paint'
import { createRaster, setSize } from '@/scene/canvas/raster/raster'
import { buildRig } from '@/scene/frame/build-rig'
import { fillViewProjection, frameCamera } from '@/scene/frame/camera'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { defaultPitch, defaultYaw } from '@/scene/frame/view-direction'
import { crankTrainSchema } from '@/scene/model/crank-train'
import { toTrain } from '@/scene/model/to-train'
import { vellum } from './small-rig'
import type { RasterFrame } from '@/scene/canvas/raster/types'

// Bundled and run alone with --expose-gc: prints what 1,000 frames make and keep, in bytes.

const train = crankTrainSchema.parse(document)
const rig = buildRig(train, toTrain(train))
const raster = createRaster(rig, vellum, fine)
setSize(raster, 320, 180, 0.5)
const frame: RasterFrame = {
  pose: buildPose(rig),
  viewProjection: new Float64Array(16),
  eye: new Float64Array(3),
  tint: new Float32Array(rig.anchors.firing.length),
}
fillViewProjection(
  frame.viewProjection,
  frame.eye,
  frameCamera(rig.bounds, 16 / 9, { yaw: defaultYaw, pitch: defaultPitch }),
  16 / 9,
)

const collect = (globalThis as unknown as { gc(): void }).gc
const buffers = () => Object.values(raster).filter(ArrayBuffer.isView)

function run(frames: number) {
  for (let i = 0; i < frames; i++) {
    fillPose(frame.pose, rig, i * 0.05)
    frame.tint[i % 8] = (i % 32) / 32
    paint(raster, frame)
  }
}

/** What a frame makes once the code is compiled: the compiler works beside it and takes its time, so the least counts. */
function leastMade(batches: number, frames: number) {
  let least = Infinity
  for (let batch = 0; batch < batches; batch++) {
    collect()
    const before = process.memoryUsage().heapUsed
    run(frames)
    least = Math.min(least, (process.memoryUsage().heapUsed - before) / frames)
  }
  return least
}

run(100)
collect()
const held = buffers()
const before = process.memoryUsage()
const madeAFrame = leastMade(10, 100)
collect()
const after = process.memoryUsage()
process.stdout.write(
  JSON.stringify({
    madeAFrame,
    kept: after.heapUsed - before.heapUsed,
    keptInBuffers: after.arrayBuffers - before.arrayBuffers,
    sameBuffers: buffers().every((buffer, i) => buffer === held[i]),
  }),
)
