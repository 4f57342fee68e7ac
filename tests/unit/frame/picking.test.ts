import { describe, expect, it } from 'vitest'
import { frameCamera } from '@/scene/frame/camera'
import { buildRay, fillRay, pickPart } from '@/scene/frame/picking'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { GHOST, HIDDEN, SHOWN } from '@/scene/frame/types'
import { presetRig } from './rigs'

const { rig } = presetRig('i3-1000')
const pose = fillPose(buildPose(rig), rig, 0)
const all = () => new Uint8Array(rig.parts.length).fill(SHOWN)
const indexOf = (id: string) => rig.parts.findIndex((part) => part.id === id)

const rayFrom = (origin: number[], direction: number[]) => {
  const ray = buildRay()
  ray.origin.set(origin)
  ray.direction.set(direction)
  return ray
}

describe('pickPart(rig, pose, visibility, ray)', () => {
  const [x, y, z] = [0, 1, 2].map((k) => {
    const { part, local } = rig.anchors.crown[0]
    return [
      pose[4 * part] * local[0] - pose[4 * part + 1] * local[1] + pose[4 * part + 2],
      pose[4 * part + 1] * local[0] + pose[4 * part] * local[1] + pose[4 * part + 3],
      local[2],
    ][k]
  })

  it('meets the crown of the piston from above, at the crown', () => {
    const ray = rayFrom([x, 1, z], [0, -1, 0])
    expect(pickPart(rig, pose, all(), ray)).toBe(indexOf('piston:1'))
    expect(ray.hit[1]).toBeCloseTo(y, 6)
    expect(ray.distance).toBeCloseTo(1 - y, 6)
  })

  it('passes through what is hidden or only outlined', () => {
    for (const state of [HIDDEN, GHOST]) {
      const visibility = all()
      rig.parts.forEach((part, i) => {
        if (part.cylinder === 0 && part.group === 'pistons') visibility[i] = state
      })
      const met = pickPart(rig, pose, visibility, rayFrom([x, 1, z], [0, -1, 0]))
      expect(rig.parts[met].kind).not.toBe('piston')
      expect(met).toBeGreaterThanOrEqual(0)
    }
  })

  it('meets the free end from the free end and the flywheel from the drive end', () => {
    expect(pickPart(rig, pose, all(), rayFrom([0, 0, -2], [0, 0, 1]))).toBe(indexOf('free-end'))
    expect(pickPart(rig, pose, all(), rayFrom([0.001, 0.001, 2], [0, 0, -1]))).toBe(indexOf('flywheel'))
  })

  it('meets nothing beside the engine, behind the eye or before the near plane', () => {
    expect(pickPart(rig, pose, all(), rayFrom([2, 0, -2], [0, 0, 1]))).toBe(-1)
    expect(pickPart(rig, pose, all(), rayFrom([0, 0, -2], [0, 0, -1]))).toBe(-1)
    const late = rayFrom([0, 0, -2], [0, 0, 1])
    late.near = 10
    expect(pickPart(rig, pose, all(), late)).toBe(-1)
  })

  it('follows the pose: half a turn on, another piston is at the top', () => {
    const turned = fillPose(buildPose(rig), rig, Math.PI)
    const ray = rayFrom([x, 1, z], [0, -1, 0])
    pickPart(rig, turned, all(), ray)
    expect(ray.hit[1]).toBeLessThan(y - 0.05)
  })
})

describe('fillRay(ray, camera, aspect, x, y)', () => {
  it('looks from the eye through the target at the middle of the sheet', () => {
    const camera = frameCamera(rig.bounds, 1.5, { yaw: -0.7, pitch: 0.4 })
    const ray = fillRay(buildRay(), camera, 1.5, 0, 0)
    for (let k = 0; k < 3; k++) {
      expect(ray.origin[k] + ray.direction[k] * camera.distance).toBeCloseTo(camera.target[k], 9)
    }
  })
})
