import type { Frame, InkTheme, Visibility } from '@/scene/frame/types'
import type { RigShape } from './raster/prepare'
import type { RasterFrame } from './raster/types'

/** Page → worker. Everything but frames is sent when it changes; a frame's buffer is lent and comes back. */
export type Order =
  | { kind: 'canvas'; canvas: OffscreenCanvas }
  | { kind: 'rig'; rig: RigShape }
  | { kind: 'theme'; theme: InkTheme }
  | { kind: 'visibility'; visibility: Visibility }
  | { kind: 'size'; width: number; height: number; ratio: number }
  | { kind: 'frame'; buffer: ArrayBuffer; still: boolean }

/** Worker → page. */
export type Answer =
  { kind: 'able'; able: boolean } | { kind: 'painted'; buffer: ArrayBuffer; painted: Painted }

/** What one picture cost and how large it was, in picture pixels. */
export interface Painted {
  milliseconds: number
  width: number
  height: number
}

const viewLength = 16
const eyeLength = 3

/** A frame in one buffer: view and eye, then the pose, then the tints. */
export interface FrameBuffer extends RasterFrame {
  buffer: ArrayBuffer
}

export const frameBytes = (parts: number, cylinders: number) =>
  8 * (viewLength + eyeLength + 4 * parts) + 4 * cylinders

/** Views into a buffer made for this many parts. */
export function readFrame(buffer: ArrayBuffer, parts: number): FrameBuffer {
  const doubles = viewLength + eyeLength + 4 * parts
  return {
    buffer,
    viewProjection: new Float64Array(buffer, 0, viewLength),
    eye: new Float64Array(buffer, 8 * viewLength, eyeLength),
    pose: new Float64Array(buffer, 8 * (viewLength + eyeLength), 4 * parts),
    tint: new Float32Array(buffer, 8 * doubles),
  }
}

export function writeFrame(out: FrameBuffer, frame: Frame) {
  out.viewProjection.set(frame.viewProjection)
  out.eye.set(frame.eye)
  out.pose.set(frame.pose.subarray(0, out.pose.length))
  out.tint.set(frame.tint.subarray(0, out.tint.length))
}
