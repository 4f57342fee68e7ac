import { describe, expect, it } from 'vitest'
import { analyse } from '@/lib/mechanics/analysis'
import { cycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { rodCouples } from '@/lib/mechanics/loads/rod-couples'
import type { Train } from '@/lib/mechanics/train'
import { expectClose } from '@/tests/support/mechanics/close'
import { trainOf } from '@/tests/support/mechanics/kernel'
import { preset } from '@/tests/support/mechanics/presets'
import { DEG, RPM } from './trains'

const withInertia = (share: number): Train => {
  const train = trainOf(preset('i4-2000'))
  return {
    ...train,
    cylinders: train.cylinders.map((cylinder) => {
      const { rod, rodLength } = cylinder
      const twoMass = rod.mass * rod.cgFromBigEnd * (rodLength - rod.cgFromBigEnd)
      return { ...cylinder, rod: { ...rod, inertia: share * twoMass, rigid: true } }
    }),
  }
}

describe('rodCouples(parts, speed)', () => {
  it('is what the side thrust of the rigid rod is off from that of two masses, at the arm of the rod', () => {
    const speed = 6000 * RPM
    const [rigid, twoMass] = [withInertia(0.8), withInertia(1)]
    const run = (train: Train) => analyse(train, { speed, include: ['loads', 'kinematics'] })
    const [one, other] = [run(rigid), run(twoMass)]
    const parts = cycleParts(rigid)
    const [first] = rodCouples(parts, speed)
    const couple = parts.inertia.rodTurn[0].map((turn) => first.error * turn * speed * speed)
    const byThrust = one.loads!['1'].sideThrustN.map((thrust, j) => {
      const lean = one.kinematics!['1'].rodAngleDeg[j] * DEG
      return -(thrust - other.loads!['1'].sideThrustN[j]) * rigid.cylinders[0].rodLength * Math.cos(lean)
    })
    expect(Math.max(...byThrust)).toBeGreaterThan(1)
    expectClose('couple', couple, byThrust, 1e-9)
    expect(first.peak).toBeCloseTo(Math.max(...byThrust.map(Math.abs)), 6)
  })

  it('has the error of the entered inertia, grows with the square of the speed, and is 0 where the two agree', () => {
    const parts = cycleParts(withInertia(0.8))
    const [slow, fast] = [rodCouples(parts, 100)[0], rodCouples(parts, 300)[0]]
    expect(slow.error / slow.twoMass).toBeCloseTo(-0.2, 9)
    expect(slow.inertia).toBeCloseTo(slow.twoMass + slow.error, 15)
    expect(fast.peak / slow.peak).toBeCloseTo(9, 9)
    for (const { peak } of rodCouples(cycleParts(withInertia(1)), 300)) expect(peak).toBeCloseTo(0, 12)
  })

  it('is not told for a rod whose inertia was not entered', () => {
    const train = withInertia(0.8)
    const [first, ...others] = train.cylinders
    const mixed = { ...train, cylinders: [{ ...first, rod: { ...first.rod, rigid: false } }, ...others] }
    expect(rodCouples(cycleParts(mixed, 5), 100).map(({ cylinder }) => cylinder)).toEqual([1, 2, 3])
  })
})
