import { MeshBuilder, movedAlong } from './mesh/mesh-builder'
import { CRANK, FIXED, PISTON, ROD, SHAFT, type Drive } from './pose'
import type { Mesh, Motion, Part } from './types'

/** How a part stands at crank angle zero: its angle in the sense of rotation and its place across the crank. */
export interface Stand {
  phase?: number
  x?: number
  y?: number
  ratio?: number
}

/** A part without its mesh; −1 where bank, cylinder and throw are left out. */
type Named = Omit<Part, 'mesh' | 'bank' | 'cylinder' | 'throw'> &
  Partial<Pick<Part, 'bank' | 'cylinder' | 'throw'>>

const KINDS: Record<Motion['kind'], number> = {
  fixed: FIXED,
  crank: CRANK,
  rod: ROD,
  piston: PISTON,
  shaft: SHAFT,
}

/** What all parts of the crank have in common; journals, throws, webs and counterweights are one body. */
export const crankPart = { group: 'crank', body: 0, motion: { kind: 'crank' } } as const

/** Gathers parts and their meshes; equal parts at one place along the crank share a mesh, elsewhere all but its places. */
export class RigParts {
  readonly parts: Part[] = []
  readonly meshes: Mesh[] = []
  private readonly stands: Stand[] = []
  private readonly made = new Map<string, Mesh>()
  private readonly placed = new Map<string, number>()
  private bodies = crankPart.body + 1

  mesh(key: string, axial: number, build: (builder: MeshBuilder) => void): number {
    const place = `${key} at ${axial}`
    const known = this.placed.get(place)
    if (known !== undefined) return known
    let mesh = this.made.get(key)
    if (!mesh) {
      const builder = new MeshBuilder()
      build(builder)
      mesh = builder.finish()
      this.made.set(key, mesh)
    }
    const index = this.meshes.push(movedAlong(mesh, axial)) - 1
    this.placed.set(place, index)
    return index
  }

  /** A body of its own: between its parts runs no outline. */
  newBody(): number {
    return this.bodies++
  }

  /** Returns the part's index. */
  add(named: Named, mesh: number, stand: Stand = {}): number {
    this.stands.push(stand)
    return this.parts.push({ bank: -1, cylinder: -1, throw: -1, ...named, mesh }) - 1
  }

  /** The drive with its part arrays. */
  finish(drive: Drive): Drive {
    const { parts, stands } = this
    return {
      ...drive,
      kind: Uint8Array.from(parts, ({ motion }) => KINDS[motion.kind]),
      index: Int16Array.from(parts, ({ motion }) => {
        if (motion.kind === 'shaft') return motion.shaft
        return 'cylinder' in motion ? motion.cylinder : -1
      }),
      cosPhase: Float64Array.from(stands, ({ phase = 0 }) => Math.cos(phase)),
      sinPhase: Float64Array.from(stands, ({ phase = 0 }) => Math.sin(phase)),
      atX: Float64Array.from(stands, ({ x = 0 }) => x),
      atY: Float64Array.from(stands, ({ y = 0 }) => y),
      ratio: Float64Array.from(stands, ({ ratio = 0 }) => ratio),
    }
  }
}
