import {
  Document,
  type Accessor,
  type Buffer,
  type Material,
  type Mesh as ModelMesh,
} from '@gltf-transform/core'
import { buildPose, fillPose } from '@/scene/frame/pose'
import type { InkTheme, Mesh, Part, Rig, Surface } from '@/scene/frame/types'

/** What the drawing is made with; a model has no more colours than that. */
export type ModelColours = Pick<InkTheme, 'part' | 'metal' | 'ink'>

export interface ModelRequest {
  rig: Rig
  /** Crank angle, rad. */
  angle: number
  title: string
  colours: ModelColours
  /** Part groups that are left out. */
  hidden?: readonly Part['group'][]
  /** Where the model comes from: scene, version, angle, method. */
  stamp: Record<string, string | number>
}

const degrees = 180 / Math.PI

/**
 * A rig at a crank angle as glTF 2.0: metres, y up, z along the crank from the free end to the drive end. Both are
 * right-handed with y up, so places are taken as they are; an engine that turns the other way has been mirrored
 * by its pose, never by a negative scale, so that faces keep their outside outside.
 */
export function modelDocument({ rig, angle, title, colours, hidden = [], stamp }: ModelRequest): Document {
  const document = new Document()
  const root = document.getRoot()
  root.getAsset().generator = 'Counterthrow'
  const scene = document.createScene(title).setExtras({ ...stamp, units: 'm', up: 'y' })
  root.setDefaultScene(scene)
  const maker = new MeshMaker(document, colours)
  const pose = fillPose(buildPose(rig), rig, angle)
  const groups = new Map<string, ReturnType<Document['createNode']>>()
  rig.parts.forEach((part, index) => {
    if (hidden.includes(part.group)) return
    let group = groups.get(part.group)
    if (!group) {
      group = document.createNode(part.group)
      groups.set(part.group, group)
      scene.addChild(group)
    }
    const [cos, sin, x, y] = pose.subarray(4 * index, 4 * index + 4)
    const half = Math.atan2(sin, cos) / 2
    const node = document
      .createNode(part.id)
      .setMesh(maker.mesh(rig.meshes[part.mesh], part))
      .setTranslation([x, y, 0])
      .setRotation([0, 0, Math.sin(half), Math.cos(half)])
      .setExtras({ words: part.label, kind: part.kind })
    group.addChild(node)
  })
  scene.setExtras({ ...scene.getExtras(), crankAngleDeg: angle * degrees })
  return document
}

/** Meshes of the rig, each made once: faces by fill, without normals, which by the format means flat; creases as lines of ink. */
class MeshMaker {
  private readonly buffer: Buffer
  private readonly made = new Map<Mesh, ModelMesh>()
  private readonly fills: Record<Surface['fill'], Material>
  private readonly ink: Material

  constructor(
    private readonly document: Document,
    { part, metal, ink }: ModelColours,
  ) {
    this.buffer = document.createBuffer()
    const plain = (name: string, colour: number) =>
      document
        .createMaterial(name)
        .setBaseColorFactor(linear(colour))
        .setMetallicFactor(0)
        .setRoughnessFactor(1)
    const bare = plain('metal', metal)
    this.fills = { part: plain('part', part), metal: bare, crown: bare }
    this.ink = plain('ink', ink)
  }

  mesh(mesh: Mesh, part: Part): ModelMesh {
    const known = this.made.get(mesh)
    if (known) return known
    const made = this.document.createMesh(part.kind)
    const places = this.accessor('VEC3', mesh.positions)
    const add = (material: Material, mode: 1 | 4, indices: number[]) => {
      if (indices.length === 0) return
      const list = mesh.positions.length / 3 > 65_535 ? Uint32Array.from(indices) : Uint16Array.from(indices)
      made.addPrimitive(
        this.document
          .createPrimitive()
          .setMode(mode)
          .setMaterial(material)
          .setAttribute('POSITION', places)
          .setIndices(this.accessor('SCALAR', list)),
      )
    }
    for (const material of new Set(Object.values(this.fills))) add(material, 4, this.facesOf(mesh, material))
    add(this.ink, 1, edgesOf(mesh))
    this.made.set(mesh, made)
    return made
  }

  private facesOf({ triangles, faceSurface, surfaces }: Mesh, material: Material): number[] {
    const indices: number[] = []
    faceSurface.forEach((surface, face) => {
      if (this.fills[surfaces[surface].fill] !== material) return
      indices.push(triangles[3 * face], triangles[3 * face + 1], triangles[3 * face + 2])
    })
    return indices
  }

  private accessor(type: 'VEC3' | 'SCALAR', values: Float32Array | Uint16Array | Uint32Array): Accessor {
    return this.document.createAccessor().setType(type).setArray(values.slice()).setBuffer(this.buffer)
  }
}

function edgesOf({ creases }: Mesh): number[] {
  const indices: number[] = []
  for (let at = 0; at < creases.length; at += 4) indices.push(creases[at], creases[at + 1])
  return indices
}

/** sRGB 0xRRGGBB as the linear factors that the format asks for (IEC 61966-2-1). */
function linear(colour: number): [number, number, number, number] {
  const channel = (shift: number) => {
    const value = ((colour >> shift) & 255) / 255
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4
  }
  return [channel(16), channel(8), channel(0), 1]
}
