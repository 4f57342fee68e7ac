import { BufferAttribute, InstancedBufferAttribute, InstancedBufferGeometry } from 'three'
import type { Mesh, Rig } from '@/scene/frame/types'

/** One mesh of the rig as the graphics card holds it, drawn once for all the parts that have it. */
export interface MeshGeometry {
  faces: InstancedBufferGeometry
  lines: InstancedBufferGeometry
}

export function buildGeometries(rig: Rig): MeshGeometry[] {
  return rig.meshes.map((mesh, index) => {
    const parts = rig.parts.flatMap((part, i) => (part.mesh === index ? [i] : []))
    const instances = new InstancedBufferAttribute(Float32Array.from(parts), 1)
    return { faces: faceGeometry(mesh, instances), lines: lineGeometry(mesh, instances) }
  })
}

const instanced = (part: InstancedBufferAttribute) => {
  const geometry = new InstancedBufferGeometry()
  geometry.instanceCount = part.count
  geometry.setAttribute('part', part)
  return geometry
}

const fills = { part: 0, metal: 1, crown: 2 }
const cutFlag = 4

function faceGeometry(mesh: Mesh, part: InstancedBufferAttribute) {
  const corners = mesh.triangles.length
  const position = new Float32Array(3 * corners)
  const normal = new Float32Array(3 * corners)
  const surface = new Float32Array(2 * corners)
  for (let i = 0; i < corners; i++) {
    const face = Math.floor(i / 3)
    const { fill, cut } = mesh.surfaces[mesh.faceSurface[face]]
    for (let k = 0; k < 3; k++) {
      position[3 * i + k] = mesh.positions[3 * mesh.triangles[i] + k]
      normal[3 * i + k] = mesh.normals[3 * face + k]
    }
    surface[2 * i] = mesh.faceSurface[face]
    surface[2 * i + 1] = fills[fill] + (cut ? cutFlag : 0)
  }
  const geometry = instanced(part)
  geometry.setAttribute('position', new BufferAttribute(position, 3))
  geometry.setAttribute('normal', new BufferAttribute(normal, 3))
  geometry.setAttribute('surface', new BufferAttribute(surface, 2))
  return geometry
}

/** Signs of an edge: 1 where it runs with the corners of face a, 2 the same for face b, 4 for a crease. */
const creaseSign = 4

const follows = ({ triangles }: Mesh, face: number, from: number, to: number): number => {
  for (let k = 0; face >= 0 && k < 3; k++)
    if (triangles[3 * face + k] === from && triangles[3 * face + ((k + 1) % 3)] === to) return 1
  return 0
}

/** A quad an edge, its four corners alike: the vertex shader spreads them by their number. */
function lineGeometry(mesh: Mesh, part: InstancedBufferAttribute) {
  const edges = (mesh.creases.length + mesh.smooth.length) / 4
  const from = new Float32Array(12 * edges)
  const to = new Float32Array(12 * edges)
  const normalA = new Float32Array(12 * edges)
  const normalB = new Float32Array(12 * edges)
  const traits = new Float32Array(16 * edges) // surface a, surface b, their widths
  const signs = new Float32Array(4 * edges)
  const index = new Uint32Array(6 * edges)
  const widths = surfaceWidths(mesh)
  let edge = 0
  const add = (list: Int32Array, crease: number) => {
    for (let i = 0; i < list.length; i += 4, edge++) {
      const faceA = list[i + 2]
      const faceB = list[i + 3]
      const surfaceA = mesh.faceSurface[faceA]
      const surfaceB = faceB < 0 ? -1 : mesh.faceSurface[faceB]
      const sign =
        crease + follows(mesh, faceA, list[i], list[i + 1]) + 2 * follows(mesh, faceB, list[i], list[i + 1])
      for (let corner = 4 * edge; corner < 4 * edge + 4; corner++) {
        for (let k = 0; k < 3; k++) {
          from[3 * corner + k] = mesh.positions[3 * list[i] + k]
          to[3 * corner + k] = mesh.positions[3 * list[i + 1] + k]
          normalA[3 * corner + k] = mesh.normals[3 * faceA + k]
          normalB[3 * corner + k] = faceB < 0 ? 0 : mesh.normals[3 * faceB + k]
        }
        traits.set([surfaceA, surfaceB, widths[surfaceA], surfaceB < 0 ? 0 : widths[surfaceB]], 4 * corner)
        signs[corner] = sign
      }
      index.set(
        [0, 1, 2, 2, 1, 3].map((corner) => 4 * edge + corner),
        6 * edge,
      )
    }
  }
  add(mesh.creases, creaseSign)
  add(mesh.smooth, 0)
  const geometry = instanced(part)
  geometry.setIndex(new BufferAttribute(index, 1))
  geometry.setAttribute('position', new BufferAttribute(from, 3))
  geometry.setAttribute('to', new BufferAttribute(to, 3))
  geometry.setAttribute('normalA', new BufferAttribute(normalA, 3))
  geometry.setAttribute('normalB', new BufferAttribute(normalB, 3))
  geometry.setAttribute('traits', new BufferAttribute(traits, 4))
  geometry.setAttribute('signs', new BufferAttribute(signs, 1))
  return geometry
}

/** A curved surface leans away at every angle: its mean foreshortening is 2/pi whichever way it is turned. */
const meanForeshortening = 2 / Math.PI
const flatFrom = 0.999

/** Mean width of each surface; of a curved one as it is seen, with a minus, of a flat one still to be foreshortened. */
function surfaceWidths({ surfaces, faceSurface, normals, positions, triangles }: Mesh): Float64Array {
  const sums = new Float64Array(4 * surfaces.length)
  faceSurface.forEach((surface, face) => {
    const [a, b, c] = [0, 1, 2].map((k) => 3 * triangles[3 * face + k])
    const side = (to: number) => [0, 1, 2].map((k) => positions[to + k] - positions[a + k])
    const [ux, uy, uz] = side(b)
    const [vx, vy, vz] = side(c)
    const area = Math.hypot(uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx)
    for (let k = 0; k < 3; k++) sums[4 * surface + k] += area * normals[3 * face + k]
    sums[4 * surface + 3] += area
  })
  return Float64Array.from(surfaces, ({ meanWidth }, i) => {
    const flat = Math.hypot(sums[4 * i], sums[4 * i + 1], sums[4 * i + 2]) >= flatFrom * sums[4 * i + 3]
    return flat ? meanWidth : -meanForeshortening * meanWidth
  })
}
