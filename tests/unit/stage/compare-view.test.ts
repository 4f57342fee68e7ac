import { describe, expect, it } from 'vitest'
import { buildArrows, fillArrows, ON_ENGINE } from '@/scene/frame/arrows'
import { fillViewProjection, project } from '@/scene/frame/camera'
import { extentOf } from '@/scene/frame/extent'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { buildInstant, fillInstant } from '@/lib/mechanics/plan'
import { defaultView } from '@/scene/model/default-scene'
import { presetById } from '@/scene/model/presets'
import { toTrain } from '@/scene/model/to-train'
import { arrowsClipped } from '@/scene/stage/arrows-clipped'
import { buildStageModel } from '@/scene/stage/build-stage-model'
import {
  cameraOfShot,
  commonScale,
  newtonsPerCm,
  ownScale,
  pixelsPerCm,
  shotOf,
  shotOfCamera,
} from '@/scene/stage/shared-view'

const modelOf = (id: string) => {
  const document = presetById(id)!.train
  return buildStageModel(document, toTrain(document), (7000 * Math.PI) / 30)
}
const [cross, flat] = [modelOf('v8x-5000'), modelOf('v8f-4200')]
const direction = { yaw: -0.7, pitch: 0.4 }
const sheet = { width: 480, height: 360 }
const aspect = sheet.width / sheet.height
const shot = shotOf([cross.rig, flat.rig], aspect, direction)
const { overlays } = defaultView(presetById('v8x-5000')!.train)
const shaking = { ...overlays, total: false, gas: false, inertia: false, shaking: true }

describe('shotOf, cameraOfShot', () => {
  it('has every engine whole on the sheet from one direction and distance', () => {
    for (const { rig } of [cross, flat]) {
      const camera = cameraOfShot(shot, rig)
      expect([camera.yaw, camera.pitch, camera.distance]).toEqual([
        direction.yaw,
        direction.pitch,
        shot.distance,
      ])
      const viewProjection = new Float64Array(16)
      fillViewProjection(viewProjection, new Float64Array(3), camera, aspect)
      const points = extentOf(rig)
      const at = new Float64Array(3)
      const outside = points.filter((x, i) => {
        if (i % 3 > 0) return false
        const seen = project(at, viewProjection, x, points[i + 1], points[i + 2], sheet.width, sheet.height)
        return !seen || at[0] < 0 || at[0] > sheet.width || at[1] < 0 || at[1] > sheet.height
      })
      expect(outside).toHaveLength(0)
    }
  })

  it('a camera that a hand has moved is the same move of another engine', () => {
    const camera = cameraOfShot(shot, cross.rig)
    const moved = {
      ...camera,
      yaw: 1,
      target: camera.target.map((at) => at + 0.1) as [number, number, number],
    }
    const other = cameraOfShot(shotOfCamera(moved, cross.rig), flat.rig)
    const start = cameraOfShot(shot, flat.rig)
    expect(other.yaw).toBe(1)
    other.target.forEach((at, k) => expect(at - start.target[k]).toBeCloseTo(0.1, 12))
  })
})

describe('commonScale, newtonsPerCm', () => {
  it('one scale: an arrow of the same force is as long in either drawing, and a centimetre is what the legend says', () => {
    const scale = commonScale([cross, flat])
    const camera = cameraOfShot(shot, flat.rig)
    const perCm = newtonsPerCm(scale, camera, sheet.height)
    expect(newtonsPerCm(scale, cameraOfShot(shot, cross.rig), sheet.height)).toBe(perCm)
    // the shaking force of the flat-plane engine at rest angle, measured on the sheet square to the view
    const instant = buildInstant(flat.plan)
    fillInstant(instant, flat.plan, 0.3)
    const pose = fillPose(buildPose(flat.rig), flat.rig, 0.3)
    const arrows = fillArrows(buildArrows(flat.rig, flat.plan.train), flat.rig, pose, instant, shaking, scale)
    const index = arrows.on.subarray(0, arrows.count).indexOf(ON_ENGINE)
    const square = { ...camera, yaw: 0, pitch: 0 }
    const viewProjection = new Float64Array(16)
    fillViewProjection(viewProjection, new Float64Array(3), square, aspect)
    const [tail, tip] = [arrows.tails, arrows.tips].map((points) => {
      const at = new Float64Array(3)
      // at the target's own depth, where a pixel is what metresPerPixel says
      project(
        at,
        viewProjection,
        points[3 * index],
        points[3 * index + 1],
        square.target[2],
        sheet.width,
        sheet.height,
      )
      return at
    })
    const centimetres = Math.hypot(tip[0] - tail[0], tip[1] - tail[1]) / pixelsPerCm
    expect(centimetres * perCm).toBeCloseTo(arrows.magnitudes[index], 4)
  })

  it('is set by the largest force of any', () => {
    expect(commonScale([cross, flat])).toBeLessThanOrEqual(Math.max(ownScale(cross), ownScale(flat)))
    expect(commonScale([flat, cross])).toBe(commonScale([cross, flat]))
  })
})

describe('arrowsClipped', () => {
  const camera = cameraOfShot(shot, flat.rig)
  it('is false at a scale that fits and true at one that is far too large, or close up', () => {
    const scale = commonScale([cross, flat])
    expect(arrowsClipped(flat, shaking, camera, sheet, scale)).toBe(false)
    expect(arrowsClipped(flat, shaking, camera, sheet, 40 * scale)).toBe(true)
    expect(arrowsClipped(flat, shaking, { ...camera, distance: camera.distance / 40 }, sheet, scale)).toBe(
      true,
    )
  })

  it('sees only arrows that are drawn', () => {
    const none = { ...shaking, shaking: false, on: { pistons: false, crankPins: false, mains: false } }
    expect(arrowsClipped(flat, none, camera, sheet, 1)).toBe(false)
  })
})
