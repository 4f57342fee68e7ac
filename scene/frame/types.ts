/**
 * What the two renderers see: a rig (parts with meshes, built once per document) and a pose (a plane motion per
 * part, filled per angle).
 *
 * World frame, metres: y up, z along the crank from the free end to the drive end, x so that the triple is
 * right-handed: x = −horizontal for an engine that turns clockwise seen from the free end, +horizontal otherwise
 * (`Rig.mirror` is that sign). Every part moves in a plane across z, so a pose is four numbers a part:
 * cos, sin, x, y of the motion p ↦ (cos·px − sin·py + x, sin·px + cos·py + y, pz).
 */

/** A flat-shaded triangle mesh in part coordinates with its ink lines, found once. */
export interface Mesh {
  positions: Float32Array // 3 a vertex
  triangles: Uint32Array // 3 vertex indices a face, counter-clockwise seen from outside
  /** Unit face normals, 3 a face. */
  normals: Float32Array
  /** The surface (patch of smoothly joined faces) of each face, local to the mesh. */
  faceSurface: Uint16Array
  surfaces: Surface[]
  /**
   * Edges that may carry ink, 4 numbers an edge: vertex 0, vertex 1, face a, face b (−1 where there is none).
   * A crease is drawn where either face looks at us; a smooth edge only where one does and the other does not.
   */
  creases: Int32Array
  smooth: Int32Array
  /** minX, minY, minZ, maxX, maxY, maxZ */
  box: Float32Array
}

export interface Surface {
  /** 2·area / perimeter, m: where this is a few pixels on screen, ink is thinner. */
  meanWidth: number
  /** `crown` is metal tinted with that cylinder's pressure (`Frame.tint`). */
  fill: 'part' | 'metal' | 'crown'
  /** A cut face, hatched. */
  cut: boolean
}

export type PartKind =
  | 'main-journal'
  | 'crank-pin'
  | 'web'
  | 'counterweight'
  | 'flywheel'
  | 'free-end'
  | 'rod'
  | 'rod-cap'
  | 'piston'
  | 'ring'
  | 'piston-pin'
  | 'liner'
  | 'main-bearing'
  | 'balance-shaft'

/** What can be shown and hidden together. */
export type PartGroup = 'crank' | 'rods' | 'pistons' | 'bores' | 'flywheel' | 'shafts'

/** How a part is moved, in the indices of the train. */
export type Motion =
  | { kind: 'fixed' }
  | { kind: 'crank' }
  | { kind: 'rod'; cylinder: number }
  | { kind: 'piston'; cylinder: number }
  | { kind: 'shaft'; shaft: number }

export interface Part {
  /** Stable across versions of a scene: kind and the document's own ids, such as "piston:3" or "web:2F". */
  id: string
  kind: PartKind
  group: PartGroup
  /** Parts of one body (journals, throws and webs of the crank) get inside lines between them, not outlines. */
  body: number
  motion: Motion
  mesh: number // index into Rig.meshes
  bank: number // −1: none
  cylinder: number // index, −1: none
  throw: number // index, −1: none
  /** In words, for the picked part, labels and the text twin: "Piston 3". */
  label: string
}

export interface Rig {
  meshes: Mesh[]
  parts: Part[]
  /** −1 for an engine that turns clockwise seen from the free end, else +1. */
  mirror: -1 | 1
  /** Box of everything over a whole turn: minX … maxZ. The camera frames it. */
  bounds: Float64Array
  /** Points that hold everything over a whole turn, x, y, z in turn: named views frame them. */
  extent: Float64Array
  anchors: Anchors
  /** Private to fillPose: lengths, angles and indices in flat arrays. */
  drive: RigDrive
}

/** Where labels, markers and arrows hang; part coordinates are found in the pose through `part`. */
export interface Anchors {
  /** Per cylinder: crown centre in part coordinates of its piston, and the fixed point over its bore where the firing marker stands. */
  crown: { part: number; local: [number, number, number] }[]
  firing: [number, number, number][]
  /** Per cylinder and throw: fixed or moving points that a label names. */
  cylinderLabel: [number, number, number][]
  throwLabel: { part: number; local: [number, number, number] }[]
  main: [number, number, number][]
  freeEnd: [number, number, number]
  driveEnd: [number, number, number]
}

/** Opaque to everyone but rig and pose. */
export interface RigDrive {
  readonly cylinders: number
}

/** 4 a part: cos, sin, x, y. Float64Array of length 4 × parts. */
export type Pose = Float64Array

/** An orbit camera. Angles in radians, lengths in metres. `fov` is the full vertical angle; never above 20° (LOOK). */
export interface Camera {
  /** Turn about the vertical y; 0 looks from the free end along +z. Positive turns the eye towards +x. */
  yaw: number
  /** Elevation of the eye above the horizontal. */
  pitch: number
  target: [number, number, number]
  /** Distance of the eye from the target. */
  distance: number
  fov: number
}

/** Per part: what to do with it. */
export const HIDDEN = 0
export const SHOWN = 1
export const GHOST = 2 // outline only, thin
export const LIT = 3 // picked or pointed at: pencil wash
export type Visibility = Uint8Array

/** The colours of the drawing, sRGB 0xRRGGBB, taken from the tokens by the stage. */
export interface InkTheme {
  paper: number
  part: number
  metal: number
  ink: number
  line: number
  pencil: number
  pencilWash: number
  gas: number
  fire: number
}

/** One picture to draw. Buffers belong to the stage; a renderer copies what it keeps. */
export interface Frame {
  pose: Pose
  /** Column-major 4×4, world → clip (WebGL conventions), and the eye in world coordinates. */
  viewProjection: Float64Array
  eye: Float64Array
  /** Per cylinder 0…1: how far the piston crown is tinted towards `gas` with the pressure over it. */
  tint: Float32Array
  /** True when nothing moves: refine the picture. */
  still: boolean
}

export interface Renderer {
  setRig(rig: Rig): void
  setTheme(theme: InkTheme): void
  setVisibility(visibility: Visibility): void
  /** CSS pixels and device pixel ratio. */
  resize(width: number, height: number, ratio: number): void
  /** False when the last picture is still being drawn: ask again at the next tick. */
  draw(frame: Frame): boolean
  dispose(): void
}
