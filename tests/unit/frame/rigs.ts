import type { Train } from '@/lib/mechanics/train'
import { buildRig } from '@/scene/frame/build-rig'
import type { Mesh, Rig } from '@/scene/frame/types'
import { crankTrainSchema, type CrankTrain, type CrankTrainInput } from '@/scene/model/crank-train'
import { presets } from '@/scene/model/presets'
import { toTrain } from '@/scene/model/to-train'
import { randomTrain } from '../../support/mechanics/random-train'

export interface Built {
  name: string
  document: CrankTrain
  train: Train
  rig: Rig
}

export function built(name: string, input: CrankTrainInput | CrankTrain): Built {
  const document = crankTrainSchema.parse(input)
  const train = toTrain(document)
  return { name, document, train, rig: buildRig(document, train) }
}

const known = new Map<string, Built>()

export function presetRig(id: string): Built {
  const found = known.get(id)
  if (found) return found
  const preset = presets.find((one) => one.id === id)
  if (!preset) throw new Error(`no preset ${id}`)
  const rig = built(id, preset.train)
  known.set(id, rig)
  return rig
}

export const presetRigs = (): Built[] => presets.map(({ id }) => presetRig(id))

/** Engines nobody would build: without `shape`, with throws, mains and weights anywhere. */
export const randomRigs = (count: number): Built[] =>
  Array.from({ length: count }, (_, seed) => built(`random ${seed}`, randomTrain(seed + 1)))

/** The volume that a closed mesh holds, by the divergence theorem as a sum over its faces; and its area. */
export function measured({ positions: p, triangles }: Mesh): { volume: number; area: number } {
  let volume = 0
  let area = 0
  for (let i = 0; i < triangles.length; i += 3) {
    const [a, b, c] = [3 * triangles[i], 3 * triangles[i + 1], 3 * triangles[i + 2]]
    const [ux, uy, uz] = [p[b] - p[a], p[b + 1] - p[a + 1], p[b + 2] - p[a + 2]]
    const [vx, vy, vz] = [p[c] - p[a], p[c + 1] - p[a + 1], p[c + 2] - p[a + 2]]
    const [x, y, z] = [uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx]
    volume += (p[a] * x + p[a + 1] * y + p[a + 2] * z) / 6
    area += Math.sqrt(x * x + y * y + z * z) / 2
  }
  return { volume, area }
}

/** Edges that do not have exactly one face on either side. */
export function openEdges({ triangles, positions }: Mesh): number {
  const vertices = positions.length / 3
  const count = new Map<number, number>()
  for (let i = 0; i < triangles.length; i++) {
    const key = triangles[i] * vertices + triangles[i % 3 === 2 ? i - 2 : i + 1]
    count.set(key, (count.get(key) ?? 0) + 1)
  }
  let open = 0
  for (const [key, times] of count) {
    const back = (key % vertices) * vertices + Math.floor(key / vertices)
    if (times !== 1 || count.get(back) !== 1) open++
  }
  return open
}

/** The closed solids of a mesh, each as a mesh of its own triangles over the same points. */
export function solidsOf(mesh: Mesh): Mesh[] {
  const root = Array.from({ length: mesh.positions.length / 3 }, (_, i) => i)
  const find = (i: number): number => (root[i] === i ? i : (root[i] = find(root[i])))
  for (let i = 0; i < mesh.triangles.length; i += 3) {
    for (const k of [1, 2]) root[find(mesh.triangles[i + k])] = find(mesh.triangles[i])
  }
  const groups = new Map<number, number[]>()
  for (let i = 0; i < mesh.triangles.length; i += 3) {
    const key = find(mesh.triangles[i])
    const group = groups.get(key) ?? []
    group.push(mesh.triangles[i], mesh.triangles[i + 1], mesh.triangles[i + 2])
    groups.set(key, group)
  }
  return [...groups.values()].map((triangles) => ({ ...mesh, triangles: Uint32Array.from(triangles) }))
}

/** Vertices − edges + faces of a closed mesh. */
export const eulerNumber = ({ triangles }: Mesh): number =>
  new Set(triangles).size - triangles.length / 2 + triangles.length / 3
