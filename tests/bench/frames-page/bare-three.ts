import {
  BufferAttribute,
  BufferGeometry,
  Camera,
  DirectionalLight,
  Mesh,
  MeshLambertMaterial,
  Scene,
  WebGLRenderer,
} from 'three'
import type { Frame, Rig } from '@/scene/frame/types'

/** What anybody would write first: a mesh a part, one lit material, the renderer's own antialiasing. */
export function bareThree(canvas: HTMLCanvasElement, rig: Rig, width: number, height: number) {
  const renderer = new WebGLRenderer({ canvas, antialias: true })
  renderer.setPixelRatio(1)
  renderer.setSize(width, height, false)
  const scene = new Scene()
  const light = new DirectionalLight(0xffffff, 3)
  light.position.set(1, 2, -1)
  scene.add(light)
  const material = new MeshLambertMaterial({ color: 0xe9e5d9 })
  const geometries = rig.meshes.map(({ positions, triangles }) => {
    const geometry = new BufferGeometry()
    geometry.setAttribute('position', new BufferAttribute(positions, 3))
    geometry.setIndex(new BufferAttribute(triangles, 1))
    geometry.computeVertexNormals()
    return geometry
  })
  const meshes = rig.parts.map((part) => {
    const mesh = new Mesh(geometries[part.mesh], material)
    mesh.matrixAutoUpdate = false
    mesh.frustumCulled = false
    scene.add(mesh)
    return mesh
  })
  const camera = new Camera()
  camera.matrixAutoUpdate = false
  return {
    draw({ pose, viewProjection }: Frame) {
      meshes.forEach((mesh, i) => {
        const [cos, sin, x, y] = pose.subarray(4 * i, 4 * i + 4)
        mesh.matrix.set(cos, -sin, 0, x, sin, cos, 0, y, 0, 0, 1, 0, 0, 0, 0, 1)
        mesh.matrixWorldNeedsUpdate = true
      })
      camera.projectionMatrix.fromArray(viewProjection)
      renderer.render(scene, camera)
    },
    dispose() {
      for (const geometry of geometries) geometry.dispose()
      material.dispose()
      renderer.dispose()
    },
  }
}
