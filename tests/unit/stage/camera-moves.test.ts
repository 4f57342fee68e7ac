import { assert, double, property, record, tuple } from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Camera } from '@/scene/frame/types'
import { blendCamera, sameCamera } from '@/scene/stage/camera-blend'
import { drag, shove, zoomAt } from '@/scene/stage/camera-moves'

const bounds = Float64Array.of(-0.3, -0.2, 0, 0.3, 0.4, 0.6)

const number = (min: number, max: number) => double({ min, max, noNaN: true })
const cameras = record({
  yaw: number(-3, 3),
  pitch: number(-1.5, 1.5),
  target: tuple(number(-1, 1), number(-1, 1), number(-1, 1)),
  distance: number(0.1, 20),
  fov: number(0.1, 0.34),
})

/** Where a point of the world stands on a sheet `height` high, from its middle, y down: by the definition of Camera. */
function seen(camera: Camera, [x, y, z]: number[], height: number) {
  const direction = [
    Math.sin(camera.yaw) * Math.cos(camera.pitch),
    Math.sin(camera.pitch),
    -Math.cos(camera.yaw) * Math.cos(camera.pitch),
  ]
  const eye = camera.target.map((t, i) => t + camera.distance * direction[i])
  const right = [-Math.cos(camera.yaw), 0, -Math.sin(camera.yaw)]
  const up = [
    direction[1] * right[2] - direction[2] * right[1],
    direction[2] * right[0] - direction[0] * right[2],
    direction[0] * right[1] - direction[1] * right[0],
  ]
  const from = [x - eye[0], y - eye[1], z - eye[2]]
  const dot = (a: number[], b: number[]) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
  const scale = height / 2 / Math.tan(camera.fov / 2) / -dot(from, direction)
  return [dot(from, right) * scale, -dot(from, up) * scale]
}

describe('shove(camera, dx, dy, height)', () => {
  it('what is under the hand stays under it', () => {
    assert(
      property(cameras, number(-300, 300), number(-300, 300), (camera, dx, dy) => {
        const [x, y] = seen(shove(camera, dx, dy, 600), camera.target, 600)
        expect(x).toBeCloseTo(dx, 6)
        expect(y).toBeCloseTo(dy, 6)
      }),
    )
  })
})

describe('zoomAt(camera, factor, x, y, height, bounds)', () => {
  it('holds the point under the pointer', () => {
    assert(
      property(cameras, number(0.5, 2), number(-200, 200), number(-200, 200), (camera, factor, x, y) => {
        const under = shove(camera, -x, -y, 600).target
        const [px, py] = seen(zoomAt(camera, factor, x, y, 600, bounds), under, 600)
        expect(px).toBeCloseTo(x, 6)
        expect(py).toBeCloseTo(y, 6)
      }),
    )
  })
})

describe('drag(camera, dx, dy)', () => {
  it('the near side of the engine follows the hand, right and down', () => {
    const camera: Camera = { yaw: 0.3, pitch: 0.2, target: [0, 0, 0], distance: 3, fov: 0.3 }
    const near = [
      Math.sin(0.3) * Math.cos(0.2) * 0.5,
      Math.sin(0.2) * 0.5,
      -Math.cos(0.3) * Math.cos(0.2) * 0.5,
    ]
    const [x, y] = seen(drag(camera, 20, 20), near, 600)
    expect(x).toBeGreaterThan(5)
    expect(y).toBeGreaterThan(5)
  })
})

describe('sameCamera(a, b)', () => {
  it('what a document has rounded to 0.01° and 0.01 mm is the same view; a degree more is not', () => {
    const camera: Camera = {
      yaw: -0.7331,
      pitch: 0.4538,
      target: [0.0123, 0.1, 0.25],
      distance: 2.3456,
      fov: 0.28,
    }
    expect(sameCamera(camera, { ...camera, yaw: camera.yaw + 0.00008, distance: 2.34561 })).toBe(true)
    expect(sameCamera(camera, { ...camera, yaw: camera.yaw + Math.PI / 180 })).toBe(false)
  })
})

describe('blendCamera(out, from, to, t)', () => {
  it('goes the short way round', () => {
    const from: Camera = { yaw: 3, pitch: 0, target: [0, 0, 0], distance: 1, fov: 0.3 }
    const out = structuredClone(from)
    blendCamera(out, from, { ...from, yaw: -3 }, 0.5)
    expect(Math.abs(out.yaw)).toBeCloseTo(Math.PI, 6)
  })

  it('arrives', () => {
    assert(
      property(cameras, cameras, (from, to) => {
        const out = structuredClone(from)
        blendCamera(out, from, to, 1)
        expect(out.distance).toBeCloseTo(to.distance, 9)
        expect(out.target[2]).toBeCloseTo(to.target[2], 9)
        expect(Math.cos(out.yaw - to.yaw)).toBeCloseTo(1, 9)
      }),
    )
  })
})
