import type { Mesh, Surface } from '../types'

export interface SurfaceSpec {
  fill?: Surface['fill']
  cut?: boolean
  /** Its borders carry no ink: a wall that lies flush against another part. */
  silent?: boolean
}

/** Unit normals closer than this are one plane: no edge between them. */
const FLAT = 1 - 1e-6

/**
 * Collects the faces of closed solids. A surface is a patch of smoothly joined faces: where two surfaces meet is a
 * crease, where two faces of one surface bend is a smooth edge. So a generator says by its surfaces where ink may be.
 */
export class MeshBuilder {
  private readonly points: number[] = []
  private readonly faces: number[] = []
  private readonly surfaceOf: number[] = []
  private readonly specs: SurfaceSpec[] = []

  vertex(x: number, y: number, z: number): number {
    return this.points.push(x, y, z) / 3 - 1
  }

  surface(spec: SurfaceSpec = {}): number {
    return this.specs.push(spec) - 1
  }

  triangle(a: number, b: number, c: number, surface: number) {
    this.faces.push(a, b, c)
    this.surfaceOf.push(surface)
  }

  finish(): Mesh {
    const positions = Float32Array.from(this.points)
    const { normals, area } = this.facing()
    const { creases, smooth, border } = this.edges(normals)
    const surfaces = this.specs.map(({ fill = 'part', cut = false }, i): Surface => {
      return { meanWidth: border[i] > 0 ? (2 * area[i]) / border[i] : Math.sqrt(area[i]), fill, cut }
    })
    const triangles = Uint32Array.from(this.faces)
    const faceSurface = Uint16Array.from(this.surfaceOf)
    return { positions, triangles, normals, faceSurface, surfaces, creases, smooth, box: boxOf(positions) }
  }

  /** Unit normals of the faces and areas of the surfaces. */
  private facing() {
    const { points, faces, surfaceOf } = this
    const normals = new Float32Array(faces.length)
    const area = new Float64Array(this.specs.length)
    for (let at = 0; at < faces.length; at += 3) {
      const a = 3 * faces[at]
      const b = 3 * faces[at + 1]
      const c = 3 * faces[at + 2]
      const ux = points[b] - points[a]
      const uy = points[b + 1] - points[a + 1]
      const uz = points[b + 2] - points[a + 2]
      const vx = points[c] - points[a]
      const vy = points[c + 1] - points[a + 1]
      const vz = points[c + 2] - points[a + 2]
      const x = uy * vz - uz * vy
      const y = uz * vx - ux * vz
      const z = ux * vy - uy * vx
      const length = Math.sqrt(x * x + y * y + z * z)
      normals[at] = x / (length || 1)
      normals[at + 1] = y / (length || 1)
      normals[at + 2] = z / (length || 1)
      area[surfaceOf[at / 3]] += length / 2
    }
    return { normals, area }
  }

  /** Pairs the two faces of every edge; corners that leave each vertex are chained until their other half comes by. */
  private edges(normals: Float32Array) {
    const { points, faces, surfaceOf, specs } = this
    const border = new Float64Array(specs.length)
    const creases: number[] = []
    const smooth: number[] = []
    const leaving = new Int32Array(points.length / 3).fill(-1)
    const chain = new Int32Array(faces.length)
    const end = (corner: number) => faces[corner % 3 === 2 ? corner - 2 : corner + 1]
    for (let corner = 0; corner < faces.length; corner++) {
      const from = faces[corner]
      const to = end(corner)
      let twin = leaving[to]
      while (twin >= 0 && end(twin) !== from) twin = chain[twin]
      if (twin < 0) {
        chain[corner] = leaving[from]
        leaving[from] = corner
        continue
      }
      const face = (corner / 3) | 0
      const other = (twin / 3) | 0
      const here = surfaceOf[face]
      const there = surfaceOf[other]
      if (here === there) {
        const bend =
          normals[3 * face] * normals[3 * other] +
          normals[3 * face + 1] * normals[3 * other + 1] +
          normals[3 * face + 2] * normals[3 * other + 2]
        if (bend < FLAT) smooth.push(to, from, other, face)
        continue
      }
      const dx = points[3 * from] - points[3 * to]
      const dy = points[3 * from + 1] - points[3 * to + 1]
      const dz = points[3 * from + 2] - points[3 * to + 2]
      const length = Math.sqrt(dx * dx + dy * dy + dz * dz)
      border[here] += length
      border[there] += length
      if (!specs[here].silent && !specs[there].silent) creases.push(to, from, other, face)
    }
    return { creases: Int32Array.from(creases), smooth: Int32Array.from(smooth), border }
  }
}

export function boxOf(positions: Float32Array): Float32Array {
  const box = Float32Array.of(Infinity, Infinity, Infinity, -Infinity, -Infinity, -Infinity)
  for (let i = 0; i < positions.length; i++) {
    const axis = i % 3
    if (positions[i] < box[axis]) box[axis] = positions[i]
    if (positions[i] > box[axis + 3]) box[axis + 3] = positions[i]
  }
  return box
}

/** The same mesh further along the crank; everything but the places is shared. */
export function movedAlong(mesh: Mesh, axial: number): Mesh {
  if (axial === 0) return mesh
  const positions = mesh.positions.slice()
  for (let i = 2; i < positions.length; i += 3) positions[i] += axial
  return { ...mesh, positions, box: boxOf(positions) }
}
