import { describe, expect, it } from 'vitest'
import type { CrankTrainInput } from '@/scene/model/crank-train'
import { expectClose } from '@/tests/support/mechanics/close'
import { slope } from '@/tests/support/mechanics/fourier'
import { answer, RAD_S, type Answer } from '@/tests/support/mechanics/kernel'
import { plainTrain } from '@/tests/support/mechanics/plain-train'
import { add, cross, polar, sub, times, turned, type Vec } from '@/tests/support/mechanics/plane'
import { preset } from '@/tests/support/mechanics/presets'
import { randomTrain } from '@/tests/support/mechanics/random-train'

/**
 * Newton's laws for the whole train, from the kernel's own positions and forces: momentum and angular momentum are
 * built from where its figures put every mass, and their slopes must be the forces and moments it reports.
 */
const RPM = 2400
const SPEED = RPM * RAD_S
const DEG = Math.PI / 180

const cases = [
  ...Array.from({ length: 14 }, (_, i) => {
    const document = randomTrain(2000 + i, { cylinders: i + 1, links: i % 3 === 1 })
    return { name: `train ${2000 + i} of ${i + 1} cylinders`, document }
  }),
  ...['i4-2000', 'v8x-5000', 'r7-11', 'single-125-2t'].map((id) => ({
    name: `preset ${id}`,
    document: preset(id),
  })),
]

/** Where a cylinder's piston pin, rod and big end are, from the kernel's pin height and rod angle. */
function places(document: CrankTrainInput, got: Answer) {
  const train = plainTrain(document)
  const rodsAt = got.kinematics!
  return train.cylinders.map((c) => {
    const k = rodsAt[c.id]
    const axis = polar(1, c.bank)
    const across = turned(axis)
    return Array.from(k.pinHeightMm, (mm, i) => {
      const angle = k.rodAngleDeg[i] * DEG
      const pin = add(times(mm / 1000, axis), times(c.offset, across))
      // the rod's direction from its big end: its sine is the rod angle's, and it points up the cylinder
      const rod = add(times(Math.cos(angle), axis), times(-Math.sin(angle), across))
      const foot = sub(pin, times(c.rod, rod))
      return { pin, foot, cg: add(foot, times(c.rodCg, rod)), turn: c.bank - angle }
    })
  })
}

describe.each(cases)('$name', ({ document }) => {
  const got = answer(document, RPM)
  const train = plainTrain(document)
  const revolutions = train.cycleDeg / 360
  const at = places(document, got)
  const count = got.angleDeg.length
  const angles = Array.from(got.angleDeg, (deg) => deg * DEG)
  const rate = (signal: number[]) => slope(signal, revolutions).map((d) => d * SPEED)
  const loads = train.cylinders.map((c) => got.loads[c.id])
  const force = Math.max(...loads.flatMap((l) => Array.from(l.pistonPinN.u, Math.abs)))
  const both = (f: (i: number) => Vec) =>
    [0, 1].map((axis) => Array.from({ length: count }, (_, i) => f(i)[axis]))
  const turning = (moment: number, angle: number) => (i: number) => polar(moment, angles[i] + angle)
  const weights = document.counterweights ?? []
  const shafts = document.balanceShafts ?? []
  const shaft = (b: (typeof shafts)[number], i: number) =>
    polar(b.unbalanceKgMm / 1000, b.angleDeg * DEG + b.speedRatio * angles[i])

  it('rods keep their length: every foot lies where its crank pin or knuckle is', () => {
    train.cylinders.forEach((c, n) => {
      const { angle } = train.throws[c.throwIndex]
      const wanted = (i: number): Vec => {
        const pin = polar(c.radius, angles[i] + angle)
        if (!c.link) return pin
        return add(pin, polar(c.link.radius, at[c.link.master][i].turn + c.link.angle))
      }
      const off = at[n].map(({ foot }, i) => Math.hypot(...sub(foot, wanted(i))))
      expect(Math.max(...off) / c.rod, c.id).toBeLessThan(1e-12)
    })
  })

  it('the shaking force is minus the rate of momentum, and the couple minus that of its moment along the crank', () => {
    const moments = (z: (axial: number) => number) =>
      both((i) =>
        add(
          ...train.cylinders.map((c, n) => {
            const { pin, cg, foot } = at[n][i]
            return times(z(c.z), add(times(c.pistonMass, pin), times(c.rodMass, cg), times(c.bearing, foot)))
          }),
          ...train.throws.map((t) => times(z(t.z), turning(t.unbalance, t.angle)(i))),
          ...weights.map((w) =>
            times(z(w.axialMm / 1000), turning((w.massKg * w.radiusMm) / 1000, w.angleDeg * DEG)(i)),
          ),
          ...shafts.map((b) => times(z(b.axialMm / 1000), shaft(b, i))),
        ),
      ).map((signal) => rate(Array.from(rate(signal))).map((x) => -x))
    const { verticalN, horizontalN, coupleVerticalNm, coupleHorizontalNm } = got.shaking!
    const [v, h] = moments(() => 1)
    expectClose('vertical', verticalN, v, 1e-8, force)
    expectClose('horizontal', horizontalN, h, 1e-8, force)
    const [cv, ch] = moments((z) => z - train.referenceZ)
    const arm = Math.max(0.1, ...train.cylinders.map((c) => Math.abs(c.z - train.referenceZ)))
    expectClose('couple vertical', coupleVerticalNm, cv, 1e-8, force * arm)
    expectClose('couple horizontal', coupleHorizontalNm, ch, 1e-8, force * arm)
    expect.hasAssertions()
  })

  it('torque with the walls’ and the gas’s moments is the rate of angular momentum about the crank', () => {
    const momentum = Array.from({ length: count }, () => 0)
    train.cylinders.forEach((c, n) => {
      const masses = [
        [c.pistonMass, at[n].map((x) => x.pin)],
        [c.rodMass, at[n].map((x) => x.cg)],
        [c.bearing, at[n].map((x) => x.foot)],
      ] as const
      for (const [mass, path] of masses) {
        const [v, h] = [0, 1].map((axis) => rate(path.map((p) => p[axis])))
        path.forEach((p, i) => (momentum[i] += mass * cross(p, [v[i], h[i]])))
      }
      const swing = rate(at[n].map((x) => x.turn))
      swing.forEach((w, i) => (momentum[i] += c.rodInertia * w))
    })
    const outside = Array.from({ length: count }, (_, i) =>
      train.cylinders.reduce((sum, c, n) => {
        const axis = polar(1, c.bank)
        const onPiston = add(
          times(-loads[n].gasForceN[i], axis),
          times(-loads[n].sideThrustN[i], turned(axis)),
        )
        return sum + cross(at[n][i].pin, onPiston)
      }, 0),
    )
    const wanted = Array.from(rate(momentum), (m, i) => outside[i] - m)
    const share = document.gas?.model === 'none' ? 1e-8 : 1e-7
    expectClose('torque', got.torque.totalNm, wanted, share, force * train.cylinders[0].radius)
    expect.hasAssertions()
  })

  it('action and reaction: mains, walls and heads together get the shaking force and its couple', () => {
    const mains = document.mains ?? []
    if (mains.length < 2) {
      expect(got.mains).toEqual({})
      return
    }
    const sums = (z: (axial: number) => number) =>
      both((i) =>
        add(
          ...mains.map((m) =>
            times(z(m.axialMm / 1000), [got.mains[m.id].vertical[i], got.mains[m.id].horizontal[i]]),
          ),
          ...train.cylinders.map((c, n) => {
            const axis = polar(1, c.bank)
            return times(
              z(c.z),
              add(times(loads[n].gasForceN[i], axis), times(loads[n].sideThrustN[i], turned(axis))),
            )
          }),
          // a link that stands elsewhere along the crank than its master hands its load over on the way
          ...train.cylinders.map((c, n): Vec => {
            if (!c.link) return [0, 0]
            const onKnuckle: Vec = [loads[n].knuckleN!.vertical[i], loads[n].knuckleN!.horizontal[i]]
            return times(z(c.z) - z(train.cylinders[c.link.master].z), onKnuckle)
          }),
          ...shafts.map((b) => times(z(b.axialMm / 1000) * b.speedRatio ** 2 * SPEED ** 2, shaft(b, i))),
        ),
      )
    const { verticalN, horizontalN, coupleVerticalNm, coupleHorizontalNm } = got.shaking!
    const [v, h] = sums(() => 1)
    expectClose('vertical', v, verticalN, 1e-10, force)
    expectClose('horizontal', h, horizontalN, 1e-10, force)
    const [cv, ch] = sums((z) => z - train.referenceZ)
    const arm = Math.max(0.1, ...train.cylinders.map((c) => Math.abs(c.z - train.referenceZ)))
    expectClose('couple vertical', cv, coupleVerticalNm, 1e-10, force * arm)
    expectClose('couple horizontal', ch, coupleHorizontalNm, 1e-10, force * arm)
  })

  it('each throw’s tangential loads at its radius make the torque', () => {
    const wanted = Array.from({ length: count }, (_, i) =>
      train.cylinders.reduce(
        (sum, c, n) => sum + (c.link ? 0 : c.radius * loads[n].crankPinN!.tangential[i]),
        0,
      ),
    )
    expectClose('torque', got.torque.totalNm, wanted, 1e-10)
    expect.hasAssertions()
  })

  it('power: gas torque is the gas force times piston speed', () => {
    const wanted = Array.from({ length: count }, (_, i) =>
      train.cylinders.reduce(
        (sum, c, n) => sum - (loads[n].gasForceN[i] * got.kinematics[c.id].velocityMS[i]) / SPEED,
        0,
      ),
    )
    expectClose('gas torque', got.torque.gasNm, wanted, 1e-11, 1e-9)
    expect.hasAssertions()
  })

  it('orders 0.5 to 12 put the shaking force together again', () => {
    const { verticalN, horizontalN } = got.shaking!
    for (const [name, signal] of [
      ['vertical', verticalN],
      ['horizontal', horizontalN],
    ] as const) {
      const rebuilt = angles.map((a) =>
        got.orders.reduce(
          (sum, o) => sum + o[name].amplitudeN * Math.cos(o.order * a - o[name].phaseDeg * DEG),
          0,
        ),
      )
      expectClose(name, rebuilt, signal, 2e-6, force)
    }
    expect.hasAssertions()
  })

  it('no order carries more than its share: their mean squares stay within the signal’s (Parseval)', () => {
    const { totalNm, meanNm } = got.torque!
    const square = Array.from(totalNm).reduce((sum, t) => sum + (t - meanNm) ** 2, 0) / count
    const orders = got.orders.reduce((sum, o) => sum + o.torqueNm ** 2 / 2, 0)
    expect(orders).toBeLessThanOrEqual(square * (1 + 1e-5))
    if (document.gas?.model === 'none') expect(orders).toBeGreaterThan(square * (1 - 1e-9))
    for (const o of got.orders) {
      const total = (o.vertical.amplitudeN ** 2 + o.horizontal.amplitudeN ** 2) / 2
      expect(Math.abs(o.forwardN ** 2 + o.backwardN ** 2 - total) / force ** 2).toBeLessThan(1e-10)
    }
  })
})
