import { boxOf } from './mesh/mesh-builder'
import { areaMoments, type Outline } from './mesh/outline'
import { triangulate } from './mesh/triangulate'
import type { Mesh, Surface } from './types'

export const emptyMesh: Mesh = {
  positions: new Float32Array(0),
  triangles: new Uint32Array(0),
  normals: new Float32Array(0),
  faceSurface: new Uint16Array(0),
  surfaces: [],
  creases: new Int32Array(0),
  smooth: new Int32Array(0),
  box: new Float32Array(6),
}

/** The part of a closed mesh with z above the plane, closed again by a cut face for every solid it went through. */
export function cutMesh(mesh: Mesh, axial: number): Mesh {
  const plane = clearOf(mesh, axial)
  const cut = new Cut(mesh, plane)
  cut.faces()
  cut.edges(mesh.creases, cut.creases)
  cut.edges(mesh.smooth, cut.smooth)
  cut.close()
  return cut.finish()
}

/** A plane a hair's breadth on where it would go through a vertex, so that every cut edge has one point inside it. */
function clearOf({ positions, box }: Mesh, axial: number): number {
  const hair = 1e-6 * (box[5] - box[2])
  let plane = axial
  for (let i = 2; i < positions.length; i += 3) {
    if (Math.abs(positions[i] - plane) >= hair / 2) continue
    plane += hair
    i = -1
  }
  return plane
}

class Cut {
  readonly creases: number[] = []
  readonly smooth: number[] = []
  private readonly points: number[] = []
  private readonly triangles: number[] = []
  private readonly normals: number[] = []
  private readonly surfaceOf: number[] = []
  private readonly surfaces: Surface[]
  /** Old vertex and face to new; −1 where it is gone. */
  private readonly vertexOf: Int32Array
  private readonly faceOf: Int32Array
  private readonly onEdge = new Map<number, number>()
  /** An old vertex beside each cut point. */
  private readonly beside = new Map<number, number>()
  /** The cap's border: each cut point to the next, and the wall face beside. */
  private readonly next = new Map<number, number>()
  private readonly wallAt = new Map<number, number>()

  constructor(
    private readonly mesh: Mesh,
    private readonly plane: number,
  ) {
    this.surfaces = [...mesh.surfaces]
    this.vertexOf = new Int32Array(mesh.positions.length / 3).fill(-1)
    this.faceOf = new Int32Array(mesh.faceSurface.length).fill(-1)
  }

  private above(vertex: number): boolean {
    return this.mesh.positions[3 * vertex + 2] > this.plane
  }

  private keep(vertex: number): number {
    if (this.vertexOf[vertex] < 0) {
      const { positions } = this.mesh
      const at = 3 * vertex
      this.vertexOf[vertex] = this.points.push(positions[at], positions[at + 1], positions[at + 2]) / 3 - 1
    }
    return this.vertexOf[vertex]
  }

  /** The point where the plane cuts the edge between a vertex above it and one below. */
  private between(a: number, b: number): number {
    const [low, high] = a < b ? [a, b] : [b, a]
    const key = low * this.vertexOf.length + high
    let point = this.onEdge.get(key)
    if (point === undefined) {
      const { positions } = this.mesh
      const t = (this.plane - positions[3 * low + 2]) / (positions[3 * high + 2] - positions[3 * low + 2])
      const at = (axis: number) =>
        positions[3 * low + axis] + t * (positions[3 * high + axis] - positions[3 * low + axis])
      point = this.points.push(at(0), at(1), this.plane) / 3 - 1
      this.onEdge.set(key, point)
      this.beside.set(point, low)
    }
    return point
  }

  private face(a: number, b: number, c: number, from: number): number {
    const { normals, faceSurface } = this.mesh
    this.triangles.push(a, b, c)
    this.normals.push(normals[3 * from], normals[3 * from + 1], normals[3 * from + 2])
    return this.surfaceOf.push(faceSurface[from]) - 1
  }

  faces() {
    const { triangles } = this.mesh
    for (let from = 0; 3 * from < triangles.length; from++) {
      const corners = [triangles[3 * from], triangles[3 * from + 1], triangles[3 * from + 2]]
      const kept = corners.filter((corner) => this.above(corner)).length
      if (kept === 0) continue
      if (kept === 3) {
        this.faceOf[from] = this.face(
          this.keep(corners[0]),
          this.keep(corners[1]),
          this.keep(corners[2]),
          from,
        )
        continue
      }
      // turn the face so that its lone corner comes first
      const lone = corners.findIndex((corner) => this.above(corner) === (kept === 1))
      const a = corners[lone]
      const b = corners[(lone + 1) % 3]
      const c = corners[(lone + 2) % 3]
      const ab = this.between(a, b)
      const ca = this.between(c, a)
      if (kept === 1) {
        this.faceOf[from] = this.face(this.keep(a), ab, ca, from)
        this.border(ca, ab, this.faceOf[from])
      } else {
        this.faceOf[from] = this.face(ab, this.keep(b), this.keep(c), from)
        this.border(ab, ca, this.face(ab, this.keep(c), ca, from))
      }
    }
  }

  /** The cap runs along the wall's edge the other way. */
  private border(from: number, to: number, wall: number) {
    this.next.set(from, to)
    this.wallAt.set(from, wall)
  }

  edges(list: Int32Array, out: number[]) {
    for (let i = 0; i < list.length; i += 4) {
      const [a, b, one, other] = [list[i], list[i + 1], list[i + 2], list[i + 3]]
      const [keepA, keepB] = [this.above(a), this.above(b)]
      if (!keepA && !keepB) continue
      const from = keepA ? this.keep(a) : this.between(a, b)
      const to = keepB ? this.keep(b) : this.between(a, b)
      out.push(from, to, this.faceOf[one], other < 0 ? -1 : this.faceOf[other])
    }
  }

  close() {
    const loops = this.loops()
    if (loops.length === 0) return
    const surface = this.surfaces.push({ meanWidth: 0, fill: 'part', cut: true }) - 1
    let area = 0
    let around = 0
    const capAt = new Map<number, number>()
    for (const { outer, holes } of gathered(loops)) {
      const vertices = [outer, ...holes].flatMap(({ points }) => points)
      const shape = triangulate(
        outer.outline,
        holes.map(({ outline }) => outline),
      )
      for (let k = 0; k < shape.length; k += 3) {
        const corners = [vertices[shape[k]], vertices[shape[k + 1]], vertices[shape[k + 2]]]
        this.triangles.push(...corners)
        this.normals.push(0, 0, -1)
        const face = this.surfaceOf.push(surface) - 1
        corners.forEach((from, side) => {
          if (this.next.get(from) === corners[(side + 1) % 3]) capAt.set(from, face)
        })
      }
      area += [outer, ...holes].reduce((sum, { area }) => sum + area, 0)
    }
    for (const [from, to] of this.next) {
      around += Math.hypot(
        this.points[3 * from] - this.points[3 * to],
        this.points[3 * from + 1] - this.points[3 * to + 1],
      )
      this.creases.push(from, to, capAt.get(from) ?? -1, this.wallAt.get(from) ?? -1)
    }
    this.surfaces[surface] = { meanWidth: around > 0 ? (2 * area) / around : 0, fill: 'part', cut: true }
  }

  private loops(): Loop[] {
    const loops: Loop[] = []
    const solidAt = this.solidAt()
    const seen = new Set<number>()
    for (const start of this.next.keys()) {
      if (seen.has(start)) continue
      const points: number[] = []
      for (let at: number | undefined = start; at !== undefined && !seen.has(at); at = this.next.get(at)) {
        seen.add(at)
        points.push(at)
      }
      // seen from the free end, where the cap faces: x turned over
      const outline = points.flatMap((point) => [-this.points[3 * point], this.points[3 * point + 1]])
      loops.push({ points, outline, area: areaMoments(outline).area, solid: solidAt(start) })
    }
    return loops
  }

  /** Which closed solid of the old mesh a cut point belongs to. */
  private solidAt(): (point: number) => number {
    const { triangles } = this.mesh
    const root = Int32Array.from(this.vertexOf, (_, i) => i)
    const find = (i: number): number => {
      while (root[i] !== i) i = root[i] = root[root[i]]
      return i
    }
    for (let i = 0; i < triangles.length; i += 3) {
      root[find(triangles[i + 1])] = find(triangles[i])
      root[find(triangles[i + 2])] = find(triangles[i])
    }
    return (point) => find(this.beside.get(point) as number)
  }

  finish(): Mesh {
    const positions = Float32Array.from(this.points)
    return {
      positions,
      triangles: Uint32Array.from(this.triangles),
      normals: Float32Array.from(this.normals),
      faceSurface: Uint16Array.from(this.surfaceOf),
      surfaces: this.surfaces,
      creases: Int32Array.from(this.creases),
      smooth: Int32Array.from(this.smooth),
      box: boxOf(positions),
    }
  }
}

interface Loop {
  points: number[]
  outline: Outline
  area: number
  solid: number
}

/** Each outer loop with the holes of its own solid that lie in it and in no smaller one. */
function gathered(loops: Loop[]): { outer: Loop; holes: Loop[] }[] {
  const regions = loops.filter(({ area }) => area > 0).map((outer) => ({ outer, holes: [] as Loop[] }))
  regions.sort((a, b) => a.outer.area - b.outer.area)
  for (const hole of loops) {
    if (hole.area >= 0) continue
    const around = regions.find(({ outer }) => {
      return outer.solid === hole.solid && holds(outer.outline, hole.outline[0], hole.outline[1])
    })
    around?.holes.push(hole)
  }
  return regions
}

/** Is the point inside the outline (crossings of a ray to the right)? */
function holds(outline: Outline, x: number, y: number): boolean {
  let inside = false
  for (let i = 0, j = outline.length - 2; i < outline.length; j = i, i += 2) {
    const crosses = outline[i + 1] > y !== outline[j + 1] > y
    if (
      crosses &&
      x < outline[i] + ((y - outline[i + 1]) / (outline[j + 1] - outline[i + 1])) * (outline[j] - outline[i])
    ) {
      inside = !inside
    }
  }
  return inside
}
