import { placeBanks, type Banks } from '@/scene/frame/banks'
import type { Rig } from '@/scene/frame/types'

/** What the raster needs of a rig: may be sent to a worker. */
export type RigShape = Pick<Rig, 'meshes' | 'parts'> & { anchors: Pick<Rig['anchors'], 'firing'> }

/**
 * A rig in flat arrays. Meshes stand one after another and are shared by parts; a part has its own run of
 * projected vertices, faces and surfaces. Surface 0 is the paper.
 */
export interface FlatRig {
  partCount: number
  vertexCount: number
  faceCount: number
  edgeCount: number
  surfaceCount: number
  cylinderCount: number
  /** Bits that a surface number needs. */
  surfaceBits: number

  meshVertex: Int32Array // first of each mesh, one more than there are meshes
  meshFace: Int32Array
  meshCrease: Int32Array
  meshSmooth: Int32Array
  positions: Float64Array
  triangles: Int32Array // vertex numbers local to the mesh
  normals: Float64Array
  /** normal · first vertex: the face looks at an eye e where normal · e is greater. */
  offsets: Float64Array
  areas: Float64Array
  faceSurface: Int32Array // local to the mesh
  creases: Int32Array
  smooth: Int32Array
  boxes: Float64Array // 6 a mesh

  partMesh: Int32Array
  partVertex: Int32Array // one more than there are parts
  partFace: Int32Array
  partSurface: Int32Array
  partBank: Int32Array
  partCut: Uint8Array
  partCylinder: Int32Array

  surfacePart: Int32Array
  surfaceBody: Int32Array
  surfaceWidth: Float64Array
  surfaceCut: Uint8Array
  surfaceFill: Uint8Array // 0 part, 1 metal, 2 crown

  banks: Banks
}

const fills = { part: 0, metal: 1, crown: 2 } as const

export function flattenRig(rig: RigShape): FlatRig {
  const { meshes, parts } = rig
  const starts = (size: (index: number) => number, count: number) => {
    const from = new Int32Array(count + 1)
    for (let i = 0; i < count; i++) from[i + 1] = from[i] + size(i)
    return from
  }
  const meshVertex = starts((i) => meshes[i].positions.length / 3, meshes.length)
  const meshFace = starts((i) => meshes[i].triangles.length / 3, meshes.length)
  const meshCrease = starts((i) => meshes[i].creases.length / 4, meshes.length)
  const meshSmooth = starts((i) => meshes[i].smooth.length / 4, meshes.length)
  const partVertex = starts((i) => meshes[parts[i].mesh].positions.length / 3, parts.length)
  const partFace = starts((i) => meshes[parts[i].mesh].triangles.length / 3, parts.length)
  const partSurface = starts((i) => meshes[parts[i].mesh].surfaces.length, parts.length)
  for (let i = 0; i <= parts.length; i++) partSurface[i] += 1

  const positions = new Float64Array(meshVertex[meshes.length] * 3)
  const triangles = new Int32Array(meshFace[meshes.length] * 3)
  const normals = new Float64Array(triangles.length)
  const faceSurface = new Int32Array(meshFace[meshes.length])
  const creases = new Int32Array(meshCrease[meshes.length] * 4)
  const smooth = new Int32Array(meshSmooth[meshes.length] * 4)
  const boxes = new Float64Array(meshes.length * 6)
  meshes.forEach((mesh, i) => {
    positions.set(mesh.positions, meshVertex[i] * 3)
    triangles.set(mesh.triangles, meshFace[i] * 3)
    normals.set(mesh.normals, meshFace[i] * 3)
    faceSurface.set(mesh.faceSurface, meshFace[i])
    creases.set(mesh.creases, meshCrease[i] * 4)
    smooth.set(mesh.smooth, meshSmooth[i] * 4)
    boxes.set(mesh.box, i * 6)
  })
  const { offsets, areas } = measureFaces(meshVertex, meshFace, positions, triangles, normals)

  const surfaceCount = partSurface[parts.length]
  const surfacePart = new Int32Array(surfaceCount).fill(-1)
  const surfaceBody = new Int32Array(surfaceCount).fill(-1)
  const surfaceWidth = new Float64Array(surfaceCount)
  const surfaceCut = new Uint8Array(surfaceCount)
  const surfaceFill = new Uint8Array(surfaceCount)
  parts.forEach((part, i) => {
    meshes[part.mesh].surfaces.forEach((surface, k) => {
      const s = partSurface[i] + k
      surfacePart[s] = i
      surfaceBody[s] = part.body
      surfaceWidth[s] = surface.meanWidth
      surfaceCut[s] = surface.cut ? 1 : 0
      surfaceFill[s] = fills[surface.fill]
    })
  })

  return {
    partCount: parts.length,
    vertexCount: partVertex[parts.length],
    faceCount: partFace[parts.length],
    edgeCount: parts.reduce(
      (sum, p) => sum + (meshes[p.mesh].creases.length + meshes[p.mesh].smooth.length) / 4,
      0,
    ),
    surfaceCount,
    surfaceBits: Math.max(1, 32 - Math.clz32(surfaceCount - 1)),
    meshVertex,
    meshFace,
    meshCrease,
    meshSmooth,
    positions,
    triangles,
    normals,
    offsets,
    areas,
    faceSurface,
    creases,
    smooth,
    boxes,
    partMesh: Int32Array.from(parts, (part) => part.mesh),
    partVertex,
    partFace,
    partSurface,
    partBank: Int32Array.from(parts, (part) => part.bank),
    partCut: Uint8Array.from(parts, (part) => (meshes[part.mesh].surfaces.some((s) => s.cut) ? 1 : 0)),
    partCylinder: Int32Array.from(parts, (part) => part.cylinder),
    surfacePart,
    surfaceBody,
    surfaceWidth,
    surfaceCut,
    surfaceFill,
    cylinderCount: rig.anchors.firing.length,
    banks: placeBanks(parts, rig.anchors.firing),
  }
}

function measureFaces(
  meshVertex: Int32Array,
  meshFace: Int32Array,
  positions: Float64Array,
  triangles: Int32Array,
  normals: Float64Array,
) {
  const offsets = new Float64Array(triangles.length / 3)
  const areas = new Float64Array(triangles.length / 3)
  for (let mesh = 0; mesh + 1 < meshFace.length; mesh++)
    for (let face = meshFace[mesh]; face < meshFace[mesh + 1]; face++) {
      const [a, b, c] = [0, 1, 2].map((k) => (meshVertex[mesh] + triangles[face * 3 + k]) * 3)
      const [ux, uy, uz] = [0, 1, 2].map((k) => positions[b + k] - positions[a + k])
      const [vx, vy, vz] = [0, 1, 2].map((k) => positions[c + k] - positions[a + k])
      areas[face] = Math.hypot(uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx) / 2
      for (let k = 0; k < 3; k++) offsets[face] += normals[face * 3 + k] * positions[a + k]
    }
  return { offsets, areas }
}
