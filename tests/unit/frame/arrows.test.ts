import { describe, expect, it } from 'vitest'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import type { Train } from '@/lib/mechanics/train'
import {
  buildArrows,
  COUPLE,
  fillArrows,
  GAS,
  INERTIA,
  ON_CRANK_PIN,
  ON_ENGINE,
  ON_MAIN,
  ON_PISTON,
  RESULTANT,
  type Arrows,
} from '@/scene/frame/arrows'
import { buildPose, fillPose } from '@/scene/frame/pose'
import { niceAbove, niceBelow, niceScale } from '@/scene/frame/nice-scale'
import { buildOrbitPath, fillOrbitPath } from '@/scene/frame/orbit-path'
import { presetRig, type Built } from './rigs'

const overlays = {
  gas: true,
  inertia: true,
  total: true,
  on: { pistons: true, crankPins: true, mains: true },
  shaking: true,
  orbit: true,
  firing: true,
  pressure: true,
  labels: true,
}
/** Large, so that no arrow is too short to be drawn. */
const SCALE = 1
const SPEED = 300

const instantOf = (train: Train, angle: number) => {
  const plan = buildPlan(train, SPEED)
  const instant = buildInstant(plan)
  fillInstant(instant, plan, angle)
  return instant
}

const arrowsAt = ({ rig, train }: Built, angle: number, scale = SCALE) => {
  const pose = fillPose(buildPose(rig), rig, angle)
  return fillArrows(buildArrows(rig, train), rig, pose, instantOf(train, angle), overlays, scale)
}

/** Force of one arrow as vertical and horizontal, N; nothing where it is too short to be drawn. */
const forceOf = (arrows: Arrows, mirror: number, kind: number, on: number, index: number) => {
  for (let i = 0; i < arrows.count; i++) {
    if (arrows.kinds[i] !== kind || arrows.on[i] !== on || arrows.index[i] !== index) continue
    const dx = arrows.tips[3 * i] - arrows.tails[3 * i]
    const dy = arrows.tips[3 * i + 1] - arrows.tails[3 * i + 1]
    return [dy / SCALE, (mirror * dx) / SCALE]
  }
  return [0, 0]
}

describe('fillArrows(out, rig, pose, instant, overlays, scale)', () => {
  it('splits a crank pin’s load as the kernel does with the gas taken away: also under a master rod', () => {
    for (const id of ['v8x-5000', 'i3-1000', 'r7-11', 'v6-90s-3200', 'm6-2t-520']) {
      const engine = presetRig(id)
      const { rig, train } = engine
      const bare: Train = { ...train, gas: { model: 'none' } }
      for (const angle of [0.2, 1.7, 4.4, 8.1]) {
        const arrows = arrowsAt(engine, angle)
        const alone = instantOf(bare, angle)
        const whole = instantOf(train, angle)
        train.throws.forEach((_, pin) => {
          const wanted = [0, 0]
          let size = 0
          train.cylinders.forEach(({ throw: own, link }, i) => {
            if (own !== pin || link) return
            wanted[0] += alone.crankPinVertical[i]
            wanted[1] += alone.crankPinHorizontal[i]
            size += Math.hypot(whole.crankPinVertical[i], whole.crankPinHorizontal[i])
          })
          const found = forceOf(arrows, rig.mirror, INERTIA, ON_CRANK_PIN, pin)
          expect(Math.hypot(found[0] - wanted[0], found[1] - wanted[1])).toBeLessThan(1e-9 * size)
        })
      }
    }
  })

  it('gas and inertia add up to the total: on crank pins as vectors, on pistons along the bore', () => {
    const engine = presetRig('v8x-5000')
    const { rig, train } = engine
    const arrows = arrowsAt(engine, 0.4)
    const part = (kind: number, on: number, index: number) => forceOf(arrows, rig.mirror, kind, on, index)
    train.throws.forEach((_, pin) => {
      const [gas, inertia, total] = [GAS, INERTIA, RESULTANT].map((kind) => part(kind, ON_CRANK_PIN, pin))
      for (const k of [0, 1]) expect(gas[k] + inertia[k]).toBeCloseTo(total[k], 6)
    })
    train.cylinders.forEach(({ bank }, i) => {
      const { angle } = train.banks[bank]
      const along = ([vertical, horizontal]: number[]) =>
        vertical * Math.cos(angle) + horizontal * Math.sin(angle)
      const [gas, inertia, total] = [GAS, INERTIA, RESULTANT].map((kind) => along(part(kind, ON_PISTON, i)))
      expect(gas + inertia).toBeCloseTo(total, 6)
    })
  })

  it('pushes the piston with the gas force towards the crank, from its crown', () => {
    const engine = presetRig('single-450')
    const { train, rig } = engine
    const angle = 0.25
    const arrows = arrowsAt(engine, angle)
    const instant = instantOf(train, angle)
    const [vertical, horizontal] = forceOf(arrows, rig.mirror, GAS, ON_PISTON, 0)
    expect(vertical).toBeCloseTo(-instant.gasForce[0], 3)
    expect(horizontal).toBeCloseTo(0, 6)
  })

  it('carries the mains’ loads and the shaking force, and a couple as an opposite pair with its moment', () => {
    const engine = presetRig('i3-1000')
    const { train, rig } = engine
    const arrows = arrowsAt(engine, 1)
    const instant = instantOf(train, 1)
    train.mains.forEach((_, i) => {
      const [vertical, horizontal] = forceOf(arrows, rig.mirror, RESULTANT, ON_MAIN, i)
      expect(vertical).toBeCloseTo(instant.mainVertical[i], 3)
      expect(horizontal).toBeCloseTo(instant.mainHorizontal[i], 3)
    })
    const pair = [...Array(arrows.count).keys()].filter((i) => arrows.kinds[i] === COUPLE)
    expect(pair).toHaveLength(2)
    const couple = Math.hypot(instant.coupleVertical, instant.coupleHorizontal)
    for (const i of pair) {
      expect(arrows.magnitudes[i]).toBeCloseTo(couple, 6)
      expect(arrows.on[i]).toBe(ON_ENGINE)
    }
    const moment = pair.reduce((sum, i) => {
      const force = (arrows.tips[3 * i + 1] - arrows.tails[3 * i + 1]) / SCALE
      return sum + (arrows.tails[3 * i + 2] - train.referenceAxial) * force
    }, 0)
    expect(moment).toBeCloseTo(instant.coupleVertical, 6)
  })

  it('leaves out what is switched off', () => {
    const { rig, train } = presetRig('v8x-5000')
    const pose = fillPose(buildPose(rig), rig, 1)
    const arrows = buildArrows(rig, train)
    const only = {
      ...overlays,
      inertia: false,
      total: false,
      shaking: false,
      on: { pistons: true, crankPins: false, mains: true },
    }
    fillArrows(arrows, rig, pose, instantOf(train, 1), only, SCALE)
    const kinds = [...arrows.kinds.subarray(0, arrows.count)]
    expect(kinds.every((kind) => kind === GAS)).toBe(true)
    expect([...arrows.on.subarray(0, arrows.count)].every((on) => on === ON_PISTON)).toBe(true)
  })
})

describe('niceScale(peakForce, stack)', () => {
  it('has the largest arrow between 0.24 and 0.6 of the stack, in round steps', () => {
    for (let peak = 3; peak < 3e7; peak *= 1.37) {
      const { metresPerNewton, legendForce, legendLength } = niceScale(peak, 0.3)
      expect(peak * metresPerNewton).toBeLessThanOrEqual(0.6 * 0.3 * (1 + 1e-9))
      expect(peak * metresPerNewton).toBeGreaterThan(0.23 * 0.3)
      expect(legendLength).toBeCloseTo(legendForce * metresPerNewton, 12)
      const digits = legendForce / 10 ** Math.floor(Math.log10(legendForce) + 1e-9)
      expect([1, 2, 5]).toContain(Math.round(digits * 1e6) / 1e6)
    }
  })

  it('is round in another unit too', () => {
    const pound = 4.4482216152605
    const { legendForce } = niceScale(40_000, 0.3, pound)
    const pounds = legendForce / pound
    expect([1, 2, 5]).toContain(Math.round(pounds / 10 ** Math.floor(Math.log10(pounds) + 1e-9)))
  })

  it('niceAbove and niceBelow keep a round value', () => {
    for (const value of [1, 2, 5, 10, 500, 0.02]) {
      expect(niceAbove(value)).toBeCloseTo(value, 12)
      expect(niceBelow(value)).toBeCloseTo(value, 12)
    }
    expect(niceAbove(3)).toBe(5)
    expect(niceBelow(3)).toBe(2)
  })
})

describe('fillOrbitPath(out, rig, forces, axial, metresPerNewton)', () => {
  it('stands where the tip of the shaking arrow does', () => {
    const engine = presetRig('v2-90-1000')
    const { rig, train } = engine
    const instant = instantOf(train, 0.9)
    const forces = Float64Array.of(instant.shakingVertical, instant.shakingHorizontal)
    const path = fillOrbitPath(buildOrbitPath(forces), rig, forces, train.referenceAxial, SCALE)
    const arrows = arrowsAt(engine, 0.9)
    const i = [...Array(arrows.count).keys()].find(
      (k) => arrows.on[k] === ON_ENGINE && arrows.kinds[k] === RESULTANT,
    )!
    for (let k = 0; k < 3; k++) expect(path[k]).toBeCloseTo(arrows.tips[3 * i + k], 12)
  })
})
