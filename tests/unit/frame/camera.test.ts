import { describe, expect, it } from 'vitest'
import { directionOf, fillViewProjection, frameCamera, namedCamera, project } from '@/scene/frame/camera'
import { keptOutside, orbit, pan, zoom } from '@/scene/frame/camera-moves'
import { cornersOf, extentOf } from '@/scene/frame/extent'
import { namedViews } from '@/scene/frame/named-views'
import { buildRay, fillRay } from '@/scene/frame/picking'
import { cameraOf, sceneCameraOf } from '@/scene/frame/scene-camera'
import { presetRig, presetRigs } from './rigs'

const viewOf = (camera: Parameters<typeof fillViewProjection>[2], aspect: number) => {
  const matrix = new Float64Array(16)
  const eye = new Float64Array(3)
  fillViewProjection(matrix, eye, camera, aspect)
  return { matrix, eye }
}
const out = new Float64Array(3)

describe('frameCamera(bounds, aspect, direction), namedCamera(name, rig, aspect)', () => {
  /** How far from the middle towards the edge of the sheet the farthest point lies. */
  const widest = (matrix: Float64Array, points: ArrayLike<number>, aspect: number) => {
    let most = 0
    for (let i = 0; i < points.length; i += 3) {
      if (!project(out, matrix, points[i], points[i + 1], points[i + 2], 2 * aspect, 2)) return Infinity
      most = Math.max(most, Math.abs(out[0] - aspect) / aspect, Math.abs(out[1] - 1))
    }
    return most
  }

  it('have every corner of the box, or all of the engine, on the sheet and touch its margin', () => {
    for (const { rig } of presetRigs()) {
      for (const aspect of [0.5, 1.6, 3]) {
        const box = viewOf(frameCamera(rig.bounds, aspect, { yaw: -0.7, pitch: 0.4 }), aspect).matrix
        expect(widest(box, cornersOf(rig.bounds), aspect)).toBeCloseTo(0.92, 6)
        for (const name of namedViews) {
          const { matrix } = viewOf(namedCamera(name, rig, aspect), aspect)
          expect(widest(matrix, extentOf(rig), aspect)).toBeCloseTo(0.92, 6)
        }
      }
    }
  })

  it('never looks through a stronger lens than 20°', () => {
    expect(frameCamera([0, 0, 0, 1, 1, 1], 1, { yaw: 0, pitch: 0 }).fov).toBeLessThanOrEqual(
      (20 * Math.PI) / 180,
    )
  })
})

describe('fillViewProjection(out, eye, camera, aspect)', () => {
  const camera = frameCamera([-1, -1, -1, 1, 1, 1], 1, { yaw: 0, pitch: 0 })

  it('looks from the free end along +z at yaw 0: −x to the right, y up', () => {
    const { matrix, eye } = viewOf(camera, 1)
    expect(eye[2]).toBeLessThan(-1)
    project(out, matrix, -0.5, 0, 0, 100, 100)
    expect(out[0]).toBeGreaterThan(50)
    project(out, matrix, 0, 0.5, 0, 100, 100)
    expect(out[1]).toBeLessThan(50)
  })

  it('turns the eye towards +x with yaw and upwards with pitch', () => {
    expect(viewOf(orbit(camera, 0.3, 0), 1).eye[0]).toBeGreaterThan(0)
    expect(viewOf(orbit(camera, 0, 0.3), 1).eye[1]).toBeGreaterThan(0)
  })

  it('agrees with the ray of picking: what projects to a place lies on the ray through it', () => {
    const turned = orbit(camera, -0.9, 0.5)
    const { matrix, eye } = viewOf(turned, 1.7)
    const point = [0.3, -0.4, 0.7]
    project(out, matrix, point[0], point[1], point[2], 2, 2)
    const ray = fillRay(buildRay(), turned, 1.7, out[0] - 1, 1 - out[1])
    const from = point.map((value, k) => value - eye[k])
    const length = Math.hypot(...from)
    from.forEach((value, k) => expect(value / length).toBeCloseTo(ray.direction[k], 9))
  })

  it('refuses a point behind the eye', () => {
    expect(project(out, viewOf(camera, 1).matrix, 0, 0, -100, 10, 10)).toBe(false)
  })
})

describe('namedCamera(name, rig, aspect)', () => {
  const { rig } = presetRig('v8x-5000')
  const screen = (name: (typeof namedViews)[number], at: readonly number[]) => {
    project(out, viewOf(namedCamera(name, rig, 1.6), 1.6).matrix, at[0], at[1], at[2], 1.6, 1)
    return [out[0], out[1], out[2]]
  }

  it('puts the free end on the left in side, top and free view, nearest in end view, farthest in drive view', () => {
    for (const name of ['side', 'top', 'free'] as const) {
      expect(screen(name, rig.anchors.freeEnd)[0]).toBeLessThan(screen(name, rig.anchors.driveEnd)[0])
    }
    expect(screen('end', rig.anchors.freeEnd)[2]).toBeLessThan(screen('end', rig.anchors.driveEnd)[2])
    expect(screen('drive', rig.anchors.freeEnd)[2]).toBeGreaterThan(screen('drive', rig.anchors.driveEnd)[2])
  })

  it('looks square to a bank’s bores in bank view: from below its outside on a V, from above on a boxer', () => {
    expect(directionOf('bank', rig).pitch).toBeCloseTo(-Math.PI / 4, 6)
    expect(directionOf('bank', presetRig('b6-3400').rig).pitch).toBeCloseTo(Math.PI / 2, 6)
    expect(directionOf('bank', presetRig('i6-3000').rig).pitch).toBeCloseTo(0, 6)
  })
})

describe('orbit, pan, zoom', () => {
  const { rig } = presetRig('v8x-5000')
  const camera = namedCamera('free', rig, 1.6)

  it('orbit stops overhead and below', () => {
    expect(orbit(camera, 0, 9).pitch).toBe(Math.PI / 2)
    expect(orbit(camera, 0, -9).pitch).toBe(-Math.PI / 2)
  })

  it('pan moves the picture by the share of the sheet’s height asked for', () => {
    const before = viewOf(camera, 1.6).matrix
    const after = viewOf(pan(camera, 0.25, -0.1), 1.6).matrix
    const [x, y, z] = camera.target
    project(out, before, x, y, z, 160, 100)
    const [fromX, fromY] = out
    project(out, after, x, y, z, 160, 100)
    expect(out[0] - fromX).toBeCloseTo(25, 9)
    expect(out[1] - fromY).toBeCloseTo(10, 9)
  })

  it('zoom stops before the eye enters the engine’s box and before the engine is out of sight', () => {
    const inside = zoom(camera, 1e-6, rig.bounds)
    const { eye } = viewOf(inside, 1.6)
    expect([0, 1, 2].some((k) => eye[k] < rig.bounds[k] || eye[k] > rig.bounds[k + 3])).toBe(true)
    expect(zoom(camera, 1e9, rig.bounds).distance).toBeLessThan(100)
  })

  it('keptOutside leaves a camera alone that stands outside', () => {
    expect(keptOutside(camera, rig.bounds)).toEqual(camera)
  })
})

describe('cameraOf(scene camera), sceneCameraOf(camera)', () => {
  it('go there and back', () => {
    const saved = {
      yawDeg: -42.5,
      pitchDeg: 26.25,
      distanceMm: 1234.56,
      targetMm: [1, -2.5, 300] as [number, number, number],
    }
    expect(sceneCameraOf(cameraOf(saved))).toEqual(saved)
  })
})
