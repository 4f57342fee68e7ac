import { useFBO } from '@react-three/drei/core/Fbo'
import { extend, useFrame } from '@react-three/fiber'
import { useEffect, useMemo } from 'react'
import {
  BufferAttribute,
  BufferGeometry,
  Group,
  Mesh,
  NearestFilter,
  RedFormat,
  RGBAIntegerFormat,
  UnsignedByteType,
  UnsignedShortType,
} from 'three'
import type { Drawing } from './drawing'
import { buildGeometries } from './geometry'
import type { Materials } from './materials'
import type { PartTable } from './part-table'
import type { Rig } from '@/scene/frame/types'

// All of three that the elements below need.
extend({ Group, Mesh })

/** Each pass sees one layer. */
const layers = { ids: 1, faces: 2, lines: 3, compose: 4 }

const nearest = { minFilter: NearestFilter, magFilter: NearestFilter }
/** Four whole numbers a pixel. */
const numbers = {
  ...nearest,
  format: RGBAIntegerFormat,
  type: UnsignedShortType,
  internalFormat: 'RGBA16UI',
} as const

interface EngineProps {
  rig: Rig
  table: PartTable
  drawing: Drawing
  materials: Materials
}

/** The engine as four passes over one scene; every frame is drawn from what stands in `drawing` and `table`. */
export function Engine({ rig, table, drawing, materials }: EngineProps) {
  const ids = useFBO(numbers)
  const ghostIds = useFBO(numbers)
  const coverage = useFBO({ ...nearest, format: RedFormat, type: UnsignedByteType, depthBuffer: false })
  const geometries = useMemo(() => buildGeometries(rig), [rig])
  const sheet = useMemo(() => wholeSheet(), [])

  useEffect(
    () => () => {
      for (const { faces, lines } of geometries) {
        faces.dispose()
        lines.dispose()
      }
    },
    [geometries],
  )
  useEffect(() => () => table.dispose(), [table])
  useEffect(() => () => sheet.dispose(), [sheet])

  useFrame(({ gl, scene, camera }) => {
    const { uniforms } = drawing
    uniforms.parts.value = table.texture
    uniforms.ids.value = uniforms.ghostIds.value = uniforms.coverage.value = null

    camera.layers.set(layers.ids)
    uniforms.ghosts.value = false
    gl.setRenderTarget(ids)
    gl.clear()
    gl.render(scene, camera)
    uniforms.ghosts.value = true
    gl.setRenderTarget(ghostIds)
    gl.clear()
    if (table.ghosts) gl.render(scene, camera)

    uniforms.ids.value = ids.texture
    uniforms.ghostIds.value = ghostIds.texture
    gl.setRenderTarget(coverage)
    gl.clear()
    camera.layers.set(layers.lines)
    gl.render(scene, camera)

    uniforms.coverage.value = coverage.texture
    gl.setRenderTarget(null)
    gl.clear()
    camera.layers.set(layers.faces)
    gl.render(scene, camera)
    camera.layers.set(layers.compose)
    gl.render(scene, camera)
  }, 1)

  return (
    <>
      {geometries.map(({ faces, lines }, i) => (
        <group key={i}>
          <mesh layers={layers.ids} geometry={faces} material={materials.ids} frustumCulled={false} />
          <mesh layers={layers.faces} geometry={faces} material={materials.faces} frustumCulled={false} />
          <mesh layers={layers.lines} geometry={lines} material={materials.lines} frustumCulled={false} />
        </group>
      ))}
      <mesh layers={layers.compose} geometry={sheet} material={materials.compose} frustumCulled={false} />
    </>
  )
}

/** One triangle that covers the sheet. */
function wholeSheet() {
  const geometry = new BufferGeometry()
  geometry.setAttribute('position', new BufferAttribute(new Float32Array([-1, -1, 0, 3, -1, 0, -1, 3, 0]), 3))
  return geometry
}
