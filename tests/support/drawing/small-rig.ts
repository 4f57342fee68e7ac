import { addLathe } from '@/scene/frame/mesh/lathe'
import { MeshBuilder } from '@/scene/frame/mesh/mesh-builder'
import { rectangle, type Outline } from '@/scene/frame/mesh/outline'
import { addPrism } from '@/scene/frame/mesh/prism'
import type { InkTheme, Mesh, Part } from '@/scene/frame/types'
import type { RigShape } from '@/scene/canvas/raster/prepare'
import type { RasterFrame } from '@/scene/canvas/raster/types'

export const vellum: InkTheme = {
  paper: 0xf5f2ea, part: 0xe9e5d9, metal: 0xfbfaf6, ink: 0x20262b, line: 0x747a7c,
  pencil: 0x7a4cc0, pencilWash: 0xe3daef, gas: 0xa57a11, fire: 0xa2301c,
} // prettier-ignore
export const slate: InkTheme = {
  paper: 0x14181b, part: 0x232a2f, metal: 0x1b2024, ink: 0xe9e4d8, line: 0x868e91,
  pencil: 0xd9bceb, pencilWash: 0x3a3046, gas: 0xe8ba55, fire: 0xf0745e,
} // prettier-ignore

/** A box about the origin, its six faces six surfaces; the one towards −z may be a cut. */
export function boxMesh(width: number, height: number, depth: number, cut = false): Mesh {
  const builder = new MeshBuilder()
  addPrism(builder, {
    outline: rectangle(-width / 2, -height / 2, width / 2, height / 2),
    from: -depth / 2,
    to: depth / 2,
    ends: { cut },
  })
  return builder.finish()
}

/** A solid of revolution about y. */
export function latheMesh(profile: Outline, steps = 48): Mesh {
  const builder = new MeshBuilder()
  addLathe(builder, { profile, steps })
  return builder.finish()
}

export const barMesh = (radius: number, length: number, steps = 48) =>
  latheMesh([0, -length / 2, radius, -length / 2, radius, length / 2, 0, length / 2], steps)

export interface Placed {
  mesh: Mesh
  part?: Partial<Part>
}

/** A rig of these parts, one mesh each; firing points, where given, are those of cylinders 0, 1, … */
export function rigOf(placed: Placed[], firing: [number, number, number][] = []): RigShape {
  return {
    meshes: placed.map(({ mesh }) => mesh),
    parts: placed.map(({ part }, mesh) => ({
      id: `web:${mesh}`,
      kind: 'web',
      group: 'crank',
      body: mesh,
      motion: { kind: 'fixed' },
      mesh,
      bank: -1,
      cylinder: -1,
      throw: -1,
      label: '',
      ...part,
    })),
    anchors: { firing },
  }
}

/** Part motions as x, y and turn. */
export function poseOf(...motions: { x?: number; y?: number; turn?: number }[]) {
  return Float64Array.from(
    motions.flatMap(({ x = 0, y = 0, turn = 0 }) => [Math.cos(turn), Math.sin(turn), x, y]),
  )
}

export interface Look {
  eye: [number, number, number]
  at?: [number, number, number]
  fov?: number
  aspect?: number
  near?: number
}

/** Looks from `eye` at `at`, y up; never straight along y. */
export function frameOf(pose: Float64Array, look: Look, tint: number[] = []): RasterFrame {
  const { eye, at = [0, 0, 0], fov = 0.3, aspect = 1, near = 0.01 } = look
  const far = 100
  const back = unit([eye[0] - at[0], eye[1] - at[1], eye[2] - at[2]])
  const right = unit(cross([0, 1, 0], back))
  const up = cross(back, right)
  const f = 1 / Math.tan(fov / 2)
  const row = (axis: number[], scale: number) => [...axis.map((v) => v * scale), -dot(axis, eye) * scale]
  const x = row(right, f / aspect)
  const y = row(up, f)
  const view = row(back, 1)
  const z = view.map(
    (v, k) => (v * (far + near)) / (near - far) + (k === 3 ? (2 * far * near) / (near - far) : 0),
  )
  const w = view.map((v) => -v)
  const viewProjection = new Float64Array(16)
  ;[x, y, z, w].forEach((values, r) => values.forEach((value, c) => (viewProjection[c * 4 + r] = value)))
  return { pose, viewProjection, eye: Float64Array.from(eye), tint: Float32Array.from(tint) }
}

const dot = (a: number[], b: number[]) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
const cross = (a: number[], b: number[]) => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
]
const unit = (a: number[]) => a.map((v) => v / Math.hypot(...a))
