import { describe, expect, it } from 'vitest'
import { fillViewProjection, namedCamera, project } from '@/scene/frame/camera'
import { buildRay } from '@/scene/frame/picking'
import { fillPinned, middleOfPart, ON_ENGINE_FRAME, pointOnPart, standsBehind } from '@/scene/frame/pins'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { SHOWN } from '@/scene/frame/types'
import { viewNameOf } from '@/scene/frame/view-name'
import { cylinderValues } from '@/scene/model/cylinder-values'
import { presetRig, presetRigs } from './rigs'

const degree = Math.PI / 180

describe('fillPinned(out, pose, part, x, y, z)', () => {
  it('puts a point on a piston crown where the slider-crank relation puts the piston, at every degree of the cycle', () => {
    const { document, rig } = presetRig('i3-1000')
    const cylinder = document.cylinders[0]
    const { strokeMm, rodLengthMm, offsetMm } = cylinderValues(document, cylinder)
    const [radius, length] = [strokeMm / 2000, rodLengthMm / 1000]
    const phase = document.throws.find(({ id }) => id === cylinder.throw)!.angleDeg
    const bank = document.banks.find(({ id }) => id === cylinder.bank)!.angleDeg
    const part = rig.parts.findIndex(({ id }) => id === `piston:${cylinder.id}`)
    const pose = buildPose(rig)
    const out = new Float64Array(3)
    const height = (angleDeg: number) => {
      const alpha = (angleDeg + phase - bank) * degree
      return (
        radius * Math.cos(alpha) + Math.sqrt(length ** 2 - (radius * Math.sin(alpha) - offsetMm / 1000) ** 2)
      )
    }
    fillPose(pose, rig, 0)
    const [, before] = fillPinned(out, pose, part, 0, 0.01, 0)
    for (let angleDeg = 0; angleDeg < 720; angleDeg++) {
      fillPose(pose, rig, angleDeg * degree)
      const [, y] = fillPinned(out, pose, part, 0, 0.01, 0)
      expect(y - before).toBeCloseTo(height(angleDeg) - height(0), 12)
    }
  })

  it('leaves what is pinned to the engine as a whole where it is', () => {
    const { rig } = presetRig('v8x-5000')
    const pose = fillPose(buildPose(rig), rig, 1)
    expect([...fillPinned(new Float64Array(3), pose, ON_ENGINE_FRAME, 0.1, 0.2, 0.3)]).toEqual([
      0.1, 0.2, 0.3,
    ])
  })
})

describe('pointOnPart(pose, part, world)', () => {
  it('undoes fillPinned for every part of every preset at odd angles', () => {
    for (const { rig } of presetRigs()) {
      const pose = buildPose(rig)
      for (const angle of [0.3, 2.9, 7.7]) {
        fillPose(pose, rig, angle)
        rig.parts.forEach((_, part) => {
          const point = middleOfPart(rig, part)
          const world = fillPinned(new Float64Array(3), pose, part, ...point)
          const back = pointOnPart(pose, part, world)
          for (let k = 0; k < 3; k++) expect(back[k]).toBeCloseTo(point[k], 12)
        })
      }
    }
  })
})

describe('standsBehind(…)', () => {
  it('sees the crown of the near cylinder and not that of the far one, looked at along the crank', () => {
    const { rig } = presetRig('i3-1000')
    const pose = fillPose(buildPose(rig), rig, 0)
    const visibility = new Uint8Array(rig.parts.length).fill(SHOWN)
    const camera = namedCamera('end', rig, 1.4)
    const eye = new Float64Array(3)
    fillViewProjection(new Float64Array(16), eye, camera, 1.4)
    const behind = (id: string) => {
      const part = rig.parts.findIndex((one) => one.id === id)
      const point = fillPinned(new Float64Array(3), pose, part, ...middleOfPart(rig, part))
      return standsBehind(buildRay(), rig, pose, visibility, camera, eye, point, part)
    }
    expect(behind('free-end')).toBe(false)
    const mains = rig.parts.filter(({ kind }) => kind === 'main-journal').map(({ id }) => id)
    expect(behind(mains[mains.length - 1])).toBe(true)
  })
})

describe('viewNameOf(camera, rig)', () => {
  it('names every named view and nothing beside it', () => {
    const { rig } = presetRig('v8x-5000')
    for (const name of ['free', 'end', 'drive', 'side', 'bank', 'top'] as const) {
      const camera = namedCamera(name, rig, 1.5)
      expect(viewNameOf(camera, rig)).toBe(name)
      expect(viewNameOf({ ...camera, yaw: camera.yaw + 0.01 }, rig)).toBeNull()
    }
  })
})

describe('project(fillPinned(…))', () => {
  it('is what a pinhole on the same lens sees, worked out from right, up and towards by hand', () => {
    const { rig } = presetRig('v2-90-1000')
    const pose = fillPose(buildPose(rig), rig, 1.1)
    const camera = {
      yaw: 0.4,
      pitch: -0.2,
      distance: 1.3,
      fov: 0.28,
      target: [0.01, 0.05, -0.02] as [number, number, number],
    }
    const [width, height] = [900, 640]
    const matrix = new Float64Array(16)
    fillViewProjection(matrix, new Float64Array(3), camera, width / height)
    const part = rig.parts.findIndex(({ id }) => id === 'piston:2')
    const [x, y, z] = fillPinned(new Float64Array(3), pose, part, ...middleOfPart(rig, part))
    const spot = new Float64Array(3)
    project(spot, matrix, x, y, z, width, height)
    // towards the eye: the engine's −z turned by yaw about y, then raised by pitch
    const towards = [
      Math.sin(camera.yaw) * Math.cos(camera.pitch),
      Math.sin(camera.pitch),
      -Math.cos(camera.yaw) * Math.cos(camera.pitch),
    ]
    const flat = Math.hypot(towards[0], towards[2])
    const right = [towards[2] / flat, 0, -towards[0] / flat]
    const up = [
      towards[1] * right[2] - towards[2] * right[1],
      towards[2] * right[0] - towards[0] * right[2],
      towards[0] * right[1] - towards[1] * right[0],
    ]
    const from = [x, y, z].map((at, k) => at - camera.target[k] - towards[k] * camera.distance)
    const along = (axis: number[]) => axis.reduce((sum, value, k) => sum + value * from[k], 0)
    const depth = -along(towards)
    const scale = height / 2 / Math.tan(camera.fov / 2) / depth
    expect(spot[0]).toBeCloseTo(width / 2 + along(right) * scale, 6)
    expect(spot[1]).toBeCloseTo(height / 2 - along(up) * scale, 6)
  })
})
