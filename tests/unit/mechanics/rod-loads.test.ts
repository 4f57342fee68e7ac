import { describe, expect, it } from 'vitest'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import type { Train } from '@/lib/mechanics/train'
import { presets } from '@/scene/model/presets'
import { DEG, presetTrain, RPM } from './trains'

const angles = Array.from({ length: 60 }, (_, k) => (0.37 + 12.1 * k) * DEG)

describe.each(presets.map(({ id }) => id))('loads of %s', (id) => {
  const train = presetTrain(id)
  const plan = buildPlan(train, train.operating.rated ?? 300)
  const instant = buildInstant(plan)
  const bank = (i: number) => train.banks[train.cylinders[i].bank].angle

  it('what the pins and mains, the walls and the heads take is the shaking force: action is reaction', () => {
    for (const angle of angles) {
      fillInstant(instant, plan, angle)
      let [vertical, horizontal, peak] = [0, 0, 0]
      train.cylinders.forEach((_, i) => {
        const [cos, sin] = [Math.cos(bank(i)), Math.sin(bank(i))]
        vertical += instant.gasForce[i] * cos - instant.sideThrust[i] * sin
        horizontal += instant.gasForce[i] * sin + instant.sideThrust[i] * cos
        peak = Math.max(peak, Math.abs(instant.pistonPinU[i]), Math.abs(instant.gasForce[i]))
      })
      for (let main = 0; main < train.mains.length; main++) {
        vertical += instant.mainVertical[main]
        horizontal += instant.mainHorizontal[main]
      }
      expect(Math.abs(vertical - instant.shakingVertical) / peak).toBeLessThan(1e-12)
      expect(Math.abs(horizontal - instant.shakingHorizontal) / peak).toBeLessThan(1e-12)
    }
  })

  it('the moment of the pin loads about the crank axis is gas torque and inertia torque together', () => {
    for (const angle of angles) {
      fillInstant(instant, plan, angle)
      let [torque, scale] = [0, 0]
      train.cylinders.forEach(({ throw: pin, link }, i) => {
        if (link) return
        const stand = angle + train.throws[pin].angle
        const { radius } = train.throws[pin]
        const [vertical, horizontal] = [instant.crankPinVertical[i], instant.crankPinHorizontal[i]]
        torque += radius * (horizontal * Math.cos(stand) - vertical * Math.sin(stand))
        scale += radius * Math.hypot(vertical, horizontal)
      })
      expect(Math.abs(torque - instant.gasTorque - instant.inertiaTorque) / scale).toBeLessThan(1e-12)
    }
  })

  it('the shaking force is the loss of momentum', () => {
    const momentum = (angle: number) => momentumOf(train, plan.speed, angle)
    const h = 1e-4
    const moving = train.cylinders.reduce((sum, { pistonMass, rod }) => sum + pistonMass + rod.mass, 0)
    const scale = moving * train.throws[0].radius * plan.speed ** 2
    for (const angle of angles.slice(0, 12)) {
      fillInstant(instant, plan, angle)
      const [before, after] = [momentum(angle - h), momentum(angle + h)]
      const slope = (k: number) => (-(after[k] - before[k]) / (2 * h)) * plan.speed
      expect(Math.abs(slope(0) - instant.shakingVertical) / scale).toBeLessThan(1e-6)
      expect(Math.abs(slope(1) - instant.shakingHorizontal) / scale).toBeLessThan(1e-6)
    }
  })
})

/** Momentum of all that moves, from positions alone by differences. */
function momentumOf(train: Train, speed: number, angle: number): [number, number] {
  const h = 1e-4
  const [before, after] = [firstMoments(train, angle - h), firstMoments(train, angle + h)]
  return [((after[0] - before[0]) / (2 * h)) * speed, ((after[1] - before[1]) / (2 * h)) * speed]
}

function firstMoments(train: Train, angle: number): [number, number] {
  const plan = plans.get(train) ?? buildPlan({ ...train, gas: { model: 'none' } }, 1)
  plans.set(train, plan)
  const instant = buildInstant(plan)
  fillInstant(instant, plan, angle)
  const { motion } = instant
  let [vertical, horizontal] = [0, 0]
  const add = (mass: number, u: number, v: number, bank: number) => {
    vertical += mass * (u * Math.cos(bank) - v * Math.sin(bank))
    horizontal += mass * (u * Math.sin(bank) + v * Math.cos(bank))
  }
  train.cylinders.forEach(({ bank, pistonMass, rod, rodLength, bigEndBearing, offset }, i) => {
    const lean = train.banks[bank].angle
    const [u, v] = [motion.bigEndU[i], motion.bigEndV[i]]
    const share = rod.cgFromBigEnd / rodLength
    add(pistonMass, motion.pin[i], offset, lean)
    add(rod.mass, u + share * (motion.pin[i] - u), v + share * (offset - v), lean)
    add(bigEndBearing, u, v, lean)
  })
  for (const pin of train.throws) add(pin.unbalance, 1, 0, angle + pin.angle)
  for (const weight of train.counterweights) add(weight.mass * weight.radius, 1, 0, angle + weight.angle)
  for (const shaft of train.balanceShafts) add(shaft.unbalance, 1, 0, shaft.speedRatio * angle + shaft.angle)
  return [vertical, horizontal]
}

const plans = new Map<Train, ReturnType<typeof buildPlan>>()

describe('the rod as a rigid body', () => {
  const at = (train: Train, speed: number) => {
    const plan = buildPlan(train, speed)
    const instant = buildInstant(plan)
    fillInstant(instant, plan, 1)
    return instant
  }
  const single = presetTrain('single-450')
  const rodOf = (train: Train, inertia: number): Train => ({
    ...train,
    cylinders: train.cylinders.map((cylinder) => ({ ...cylinder, rod: { ...cylinder.rod, inertia } })),
  })

  it('with inertia mass·a·b is two masses at its ends', () => {
    const [cylinder] = single.cylinders
    const { mass, cgFromBigEnd: h } = cylinder.rod
    const small = (mass * h) / cylinder.rodLength
    const masses: Train = {
      ...single,
      cylinders: [
        {
          ...cylinder,
          pistonMass: cylinder.pistonMass + small,
          bigEndBearing: cylinder.bigEndBearing + mass - small,
          rod: { mass: 1e-9, cgFromBigEnd: 0, inertia: 0, rigid: true },
        },
      ],
    }
    const rigid = at(rodOf(single, mass * h * (cylinder.rodLength - h)), 900)
    const split = at(masses, 900)
    expect(rigid.crankPinVertical[0]).toBeCloseTo(split.crankPinVertical[0], 3)
    expect(rigid.sideThrust[0]).toBeCloseTo(split.sideThrust[0], 3)
    expect(rigid.inertiaTorque).toBeCloseTo(split.inertiaTorque, 5)
  })

  it('its own inertia changes side thrust and torque, and no shaking force', () => {
    const [one, other] = [at(rodOf(single, 0.0005), 900), at(rodOf(single, 0.001), 900)]
    expect(Math.abs(one.sideThrust[0] - other.sideThrust[0])).toBeGreaterThan(10)
    expect(Math.abs(one.inertiaTorque - other.inertiaTorque)).toBeGreaterThan(0.1)
    expect(one.shakingVertical).toBe(other.shakingVertical)
    expect(one.shakingHorizontal).toBe(other.shakingHorizontal)
  })

  it('forces grow with the square of the speed', () => {
    const train = { ...single, gas: { model: 'none' as const } }
    const [slow, fast] = [at(train, 1000 * RPM), at(train, 3000 * RPM)]
    expect(fast.crankPinVertical[0] / slow.crankPinVertical[0]).toBeCloseTo(9, 12)
    expect(fast.inertiaTorque / slow.inertiaTorque).toBeCloseTo(9, 12)
  })
})
