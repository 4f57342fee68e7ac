import { project } from '@/scene/frame/camera'
import { changedParts } from '@/scene/frame/changed-parts'
import { buildPose, fillPose } from '@/scene/frame/pose'
import type { Frame, Mesh, PartGroup, Pose, Rig } from '@/scene/frame/types'
import { solid, type Pen } from './paint-arrow'
import type { Palette } from './palette'

/** An older version as outlines over the newer one: only the parts that differ, since the others would lie on themselves. */
export interface Ghost {
  rig: Rig
  pose: Pose
  parts: { index: number; group: PartGroup; net: EdgeNet }[]
}

/** The edges of a mesh as lines that can be followed from end to end, so that dashes run on round a corner. */
interface EdgeNet {
  mesh: Mesh
  /** 4 an edge: both vertices, both faces. */
  edges: Int32Array
  /** The edges at vertex i are `around[first[i]] … around[first[i + 1] − 1]`. */
  first: Int32Array
  around: Int32Array
  // filled anew for every picture
  open: Uint8Array
  seen: Uint8Array
  x: Float64Array
  y: Float64Array
}

const dashDot = [9, 3, 2, 3]
const width = 0.9

export function buildGhost(older: Rig, newer: Rig): Ghost {
  const { changed, removed } = changedParts(older, newer)
  const drawn = new Set([...changed, ...removed])
  const nets = new Map<number, EdgeNet>()
  const netOf = (mesh: number) => {
    const net = nets.get(mesh) ?? edgeNet(older.meshes[mesh])
    nets.set(mesh, net)
    return net
  }
  return {
    rig: older,
    pose: buildPose(older),
    parts: older.parts.flatMap(({ id, group, mesh }, index) =>
      drawn.has(id) ? [{ index, group, net: netOf(mesh) }] : [],
    ),
  }
}

function edgeNet(mesh: Mesh): EdgeNet {
  const edges = Int32Array.from([...mesh.creases, ...mesh.smooth])
  const vertices = mesh.positions.length / 3
  const first = new Int32Array(vertices + 1)
  for (let i = 0; i < edges.length; i += 4) {
    first[edges[i] + 1]++
    first[edges[i + 1] + 1]++
  }
  for (let i = 0; i < vertices; i++) first[i + 1] += first[i]
  const next = first.slice()
  const around = new Int32Array(edges.length / 2)
  for (let edge = 0; edge < edges.length / 4; edge++) {
    around[next[edges[4 * edge]]++] = edge
    around[next[edges[4 * edge + 1]]++] = edge
  }
  return {
    ...{ mesh, edges, first, around },
    open: new Uint8Array(edges.length / 4),
    seen: new Uint8Array(mesh.triangles.length / 3),
    x: new Float64Array(vertices),
    y: new Float64Array(vertices),
  }
}

const point = new Float64Array(3)

/** Draws the older version at this very crank angle with the newer one's camera. Allocates nothing. */
export function paintGhost(
  pen: Pen,
  ghost: Ghost,
  angle: number,
  frame: Frame,
  palette: Palette,
  hidden: readonly PartGroup[],
  sheetWidth: number,
  sheetHeight: number,
): void {
  fillPose(ghost.pose, ghost.rig, angle)
  pen.strokeStyle = palette.line
  pen.lineWidth = width
  pen.lineJoin = 'round'
  pen.lineCap = 'butt'
  pen.setLineDash(dashDot)
  pen.beginPath()
  for (let i = 0; i < ghost.parts.length; i++) {
    const { index, group, net } = ghost.parts[i]
    if (hidden.includes(group)) continue
    if (!place(net, ghost.pose, 4 * index, frame, sheetWidth, sheetHeight)) continue
    openOutlines(net)
    traceOutlines(pen, net)
  }
  pen.stroke()
  pen.setLineDash(solid)
}

/** Projects the vertices and finds which faces look at us; false where a vertex lies behind the eye. */
function place(net: EdgeNet, pose: Pose, at: number, frame: Frame, wide: number, high: number): boolean {
  const { positions, triangles, normals } = net.mesh
  const { eye, viewProjection } = frame
  const cos = pose[at]
  const sin = pose[at + 1]
  const dx = pose[at + 2]
  const dy = pose[at + 3]
  for (let v = 0; v < net.x.length; v++) {
    const x = positions[3 * v]
    const y = positions[3 * v + 1]
    const across = cos * x - sin * y + dx
    const up = sin * x + cos * y + dy
    if (!project(point, viewProjection, across, up, positions[3 * v + 2], wide, high)) return false
    net.x[v] = point[0]
    net.y[v] = point[1]
  }
  // the eye in the part's own coordinates
  const ex = cos * (eye[0] - dx) + sin * (eye[1] - dy)
  const ey = cos * (eye[1] - dy) - sin * (eye[0] - dx)
  for (let face = 0; face < net.seen.length; face++) {
    const corner = 3 * triangles[3 * face]
    const towards =
      normals[3 * face] * (ex - positions[corner]) +
      normals[3 * face + 1] * (ey - positions[corner + 1]) +
      normals[3 * face + 2] * (eye[2] - positions[corner + 2])
    net.seen[face] = towards > 0 ? 1 : 0
  }
  return true
}

/** An outline runs where one face looks at us and the other does not, or there is no other. */
function openOutlines({ edges, seen, open }: EdgeNet) {
  for (let edge = 0; edge < open.length; edge++) {
    const a = edges[4 * edge + 2]
    const b = edges[4 * edge + 3]
    open[edge] = (a >= 0 ? seen[a] : 0) === (b >= 0 ? seen[b] : 0) ? 0 : 1
  }
}

function traceOutlines(pen: Pen, net: EdgeNet) {
  const { edges, open, x, y } = net
  for (let edge = 0; edge < open.length; edge++) {
    if (open[edge] === 0) continue
    open[edge] = 0
    pen.moveTo(x[edges[4 * edge]], y[edges[4 * edge]])
    let end = edges[4 * edge + 1]
    while (end >= 0) {
      pen.lineTo(x[end], y[end])
      end = follow(net, end)
    }
  }
}

/** Takes the next open edge at a vertex and gives its other end; −1 where there is none. */
function follow({ edges, open, first, around }: EdgeNet, vertex: number): number {
  for (let i = first[vertex]; i < first[vertex + 1]; i++) {
    const edge = around[i]
    if (open[edge] === 0) continue
    open[edge] = 0
    return edges[4 * edge] === vertex ? edges[4 * edge + 1] : edges[4 * edge]
  }
  return -1
}

/** How an older version is drawn, for a model that has one. */
export const pastGhost = { build: buildGhost, paint: paintGhost }
export type PastGhost = typeof pastGhost
