import { describe, expect, it } from 'vitest'
import { cutMesh } from '@/scene/frame/cut-mesh'
import { addLathe, tubeProfile } from '@/scene/frame/mesh/lathe'
import { MeshBuilder } from '@/scene/frame/mesh/mesh-builder'
import { areaMoments, circle, rectangle } from '@/scene/frame/mesh/outline'
import { addPrism } from '@/scene/frame/mesh/prism'
import { sectionRig } from '@/scene/frame/section'
import { buildPose, fillPose } from '@/scene/frame/pose'
import type { Mesh } from '@/scene/frame/types'
import { measured, openEdges, presetRig, presetRigs, randomRigs } from './rigs'

const made = (build: (builder: MeshBuilder) => void) => {
  const builder = new MeshBuilder()
  build(builder)
  return builder.finish()
}

/** Area of the faces that the plane made: flagged, facing the free end, at this place. */
const capArea = (mesh: Mesh, axial: number) => {
  const faces = [...mesh.faceSurface.keys()].filter((face) => {
    const z = mesh.positions[3 * mesh.triangles[3 * face] + 2]
    return (
      mesh.surfaces[mesh.faceSurface[face]].cut &&
      mesh.normals[3 * face + 2] === -1 &&
      Math.abs(z - axial) < 1e-5
    )
  })
  const triangles = Uint32Array.from(
    faces.flatMap((face) => [...mesh.triangles.subarray(3 * face, 3 * face + 3)]),
  )
  return measured({ ...mesh, triangles }).area
}

describe('cutMesh(mesh, axial)', () => {
  it('cuts a plate with a hole: cap area the plate’s less the hole’s, closed again, the rest of the volume', () => {
    const hole = circle(1, 1, 1)
    const plate = made((builder) =>
      addPrism(builder, { outline: rectangle(-3, -3, 3, 3), holes: [hole], from: 0, to: 2 }),
    )
    const cut = cutMesh(plate, 0.5)
    const section = 36 - areaMoments(hole).area
    expect(openEdges(cut)).toBe(0)
    expect(capArea(cut, 0.5)).toBeCloseTo(section, 4)
    expect(measured(cut).volume).toBeCloseTo(1.5 * section, 4)
  })

  it('cuts a tube lying across the plane in two separate strips', () => {
    const tube = made((builder) =>
      addLathe(builder, { profile: tubeProfile(1, 2, 0, 5), axis: 'y', steps: 48 }),
    )
    const cut = cutMesh(tube, 0)
    expect(openEdges(cut)).toBe(0)
    expect(capArea(cut, 0)).toBeCloseTo(10, 3)
    expect(measured(cut).volume).toBeCloseTo(measured(tube).volume / 2, 3)
  })

  it('goes on a hair where the plane lies in a face', () => {
    const box = made((builder) => addPrism(builder, { outline: rectangle(0, 0, 1, 1), from: 0, to: 1 }))
    const cut = cutMesh(box, 0)
    expect(openEdges(cut)).toBe(0)
    expect(measured(cut).volume).toBeCloseTo(1, 4)
  })

  it('draws the cap’s rim as creases and keeps the ink of what is left', () => {
    const box = made((builder) => addPrism(builder, { outline: rectangle(0, 0, 1, 1), from: 0, to: 1 }))
    const cut = cutMesh(box, 0.5)
    // four upper edges, four shortened uprights, four sides of the cap in two pieces each where a wall's diagonal is cut
    expect(cut.creases.length / 4).toBe(16)
    expect(cut.surfaces[cut.surfaces.length - 1].meanWidth).toBeCloseTo(0.5, 6)
  })
})

describe('sectionRig(rig, axial)', () => {
  it('keeps parts, their order and the pose, and closes every mesh it cuts', () => {
    for (const { rig, name } of [...presetRigs(), ...randomRigs(12)]) {
      for (const share of [0.2, 0.5, 0.77]) {
        const axial = rig.bounds[2] + share * (rig.bounds[5] - rig.bounds[2])
        const section = sectionRig(rig, axial)
        expect(section.parts).toBe(rig.parts)
        expect(section.meshes).toHaveLength(rig.meshes.length)
        expect([...fillPose(buildPose(section), section, 1)]).toEqual([...fillPose(buildPose(rig), rig, 1)])
        for (const [i, mesh] of section.meshes.entries()) {
          if (mesh === rig.meshes[i]) continue
          expect(openEdges(mesh), name).toBe(0)
          if (mesh.triangles.length > 0) expect(mesh.box[2]).toBeGreaterThanOrEqual(axial - 1e-5)
          expect(measured(mesh).volume).toBeLessThanOrEqual(measured(rig.meshes[i]).volume)
        }
      }
    }
  })

  it('leaves what lies before the plane with an empty mesh and shares what lies behind it', () => {
    const { rig } = presetRig('v8x-5000')
    const section = sectionRig(rig, 0)
    const meshOf = (id: string) => rig.parts.find((part) => part.id === id)!.mesh
    expect(section.meshes[meshOf('free-end')].triangles).toHaveLength(0)
    expect(section.meshes[meshOf('flywheel')]).toBe(rig.meshes[meshOf('flywheel')])
    expect(section.meshes[meshOf('main-journal:M3')].surfaces.some(({ cut }) => cut)).toBe(true)
  })

  it('cuts a V8 in well under 60 ms', () => {
    const { rig } = presetRig('v8x-5000')
    sectionRig(rig, -0.06)
    const times = [0, 1, 2, 3, 4].map((k) => {
      const start = performance.now()
      sectionRig(rig, -0.06 + k / 1000)
      return performance.now() - start
    })
    console.info(`section of a V8: ${Math.min(...times).toFixed(1)} ms`)
    expect(Math.min(...times)).toBeLessThan(60)
  })
})
