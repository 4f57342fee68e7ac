import { cutMesh, emptyMesh } from './cut-mesh'
import type { Rig } from './types'

/**
 * The rig cut at a plane across the crank, its drive-end side kept. Every part moves within planes across the crank, so
 * one cut holds at every angle. Parts, their order, the drive and the pose's layout stay; what lies wholly before the
 * plane is left with an empty mesh.
 */
export function sectionRig(rig: Rig, axial: number): Rig {
  const meshes = rig.meshes.map((mesh) => {
    if (mesh.box[2] >= axial) return mesh
    return mesh.box[5] <= axial ? emptyMesh : cutMesh(mesh, axial)
  })
  return { ...rig, meshes }
}
