import { describe, expect, it } from 'vitest'
import { energyFluctuation } from '@/lib/mechanics/analysis/torque'
import type { CrankTrainInput } from '@/scene/model/crank-train'
import { angleGap, expectClose } from '@/tests/support/mechanics/close'
import { slope } from '@/tests/support/mechanics/fourier'
import { answer, RAD_S, type Answer } from '@/tests/support/mechanics/kernel'
import { randomSource, randomTrain } from '@/tests/support/mechanics/random-train'
import { mirrored, scaled, shuffled, turnedBy } from '@/tests/support/mechanics/transform'

/** Laws that hold for every crank train, over seeded random ones of 1 to 16 unequal cylinders. */
const RPM = 2400
const SPEED = RPM * RAD_S
const DEG = Math.PI / 180
const turns = (document: CrankTrainInput) => (document.cycle === 'four-stroke' ? 2 : 1)
const peak = (...signals: ArrayLike<number>[]) => Math.max(...signals.flatMap((s) => Array.from(s, Math.abs)))

const trains = Array.from({ length: 16 }, (_, i) => {
  const document = randomTrain(1000 + i, { cylinders: i + 1 })
  return { seed: 1000 + i, count: i + 1, document }
})
const each = describe.each(trains)

/** The greatest force any rod carries: what a resultant that cancels is measured by. */
const forceScale = ({ loads }: Answer) =>
  peak(...Object.values(loads).flatMap((l) => [l.pistonPinN.u, l.pistonPinN.v]))
const armOf = (document: CrankTrainInput) =>
  Math.max(0.1, ...document.cylinders.map((c) => Math.abs(c.axialMm) / 1000))

each('a train of $count cylinders (seed $seed)', ({ document }) => {
  const got = answer(document, RPM)
  const revolutions = turns(document)
  const force = forceScale(got)
  const arm = armOf(document)

  it('velocity is the slope of position, acceleration that of velocity', () => {
    for (const [id, k] of Object.entries(got.kinematics)) {
      const byTime = (signal: ArrayLike<number>) => slope(signal, revolutions).map((d) => d * SPEED)
      expectClose(
        `${id} velocity`,
        k.velocityMS,
        byTime(k.pinHeightMm).map((x) => x / 1000),
        1e-9,
      )
      expectClose(`${id} acceleration`, k.accelerationMS2, byTime(k.velocityMS), 1e-9)
    }
    expect.hasAssertions()
  })

  it('position repeats every turn, and travel is 0 at top and the true stroke at bottom dead centre', () => {
    for (const [id, k] of Object.entries(got.kinematics)) {
      expectClose(id, k.pinHeightMm.slice(0, 360), k.pinHeightMm.slice(-360), 1e-12)
      expect(Math.min(...k.travelMm), id).toBeGreaterThan(-1e-9)
      expect(Math.max(...k.travelMm), id).toBeLessThan(k.strokeMm * (1 + 1e-12))
      expect(Math.min(...k.travelMm) / k.strokeMm, id).toBeLessThan(1e-4)
      expect(Math.max(...k.travelMm) / k.strokeMm, id).toBeGreaterThan(1 - 1e-4)
    }
  })

  it('the shaking force has no mean: what the frame is pushed it is pushed back', () => {
    const { verticalN, horizontalN, coupleVerticalNm, coupleHorizontalNm } = got.shaking!
    const mean = (s: ArrayLike<number>) => Math.abs(Array.from(s).reduce((a, b) => a + b, 0) / s.length)
    expect(mean(verticalN) / force).toBeLessThan(1e-11)
    expect(mean(horizontalN) / force).toBeLessThan(1e-11)
    expect(mean(coupleVerticalNm) / force / arm).toBeLessThan(1e-11)
    expect(mean(coupleHorizontalNm) / force / arm).toBeLessThan(1e-11)
  })

  it('inertia torque does no work over a turn', () => {
    const { inertiaNm } = got.torque!
    const mean = Array.from(inertiaNm).reduce((a, b) => a + b, 0) / inertiaNm.length
    expect(Math.abs(mean) / peak(inertiaNm)).toBeLessThan(1e-9)
  })

  it('peaks and means are those of the signals given at 1°, at any coarser step too', () => {
    const coarse = answer(document, RPM, 10)
    for (const [id, { vertical, horizontal, peakN, meanN }] of Object.entries(got.mains)) {
      const size = vertical.map((v, i) => Math.hypot(v, horizontal[i]))
      expectClose(
        `${id} peak`,
        [peakN, coarse.mains[id].peakN],
        Array(2).fill(Math.max(...size)) as number[],
        1e-12,
      )
      const mean = size.reduce((a, b) => a + b, 0) / size.length
      expectClose(`${id} mean`, [meanN, coarse.mains[id].meanN], [mean, mean], 1e-12)
    }
    const { totalNm, meanNm, peakNm, energyFluctuationJ } = got.torque
    const mean = totalNm.reduce((a, b) => a + b, 0) / totalNm.length
    expectClose('mean torque', [meanNm, coarse.torque.meanNm], [mean, mean], 1e-12, peakNm)
    expectClose('peak torque', [peakNm, coarse.torque.peakNm], [peak(totalNm), peak(totalNm)], 1e-12)
    expect(coarse.torque.energyFluctuationJ / energyFluctuationJ).toBeCloseTo(1, 9)
  })

  it('the energy fluctuation is the range of the torque’s integral over its mean', () => {
    const fine = answer(document, RPM, 0.25)
    const { totalNm, meanNm, energyFluctuationJ } = fine.torque
    let [energy, least, greatest] = [0, 0, 0]
    for (const torque of totalNm) {
      energy += (torque - meanNm) * 0.25 * DEG
      least = Math.min(least, energy)
      greatest = Math.max(greatest, energy)
    }
    // a plain running sum is good to a step's worth of torque
    expect(Math.abs(energyFluctuationJ - (greatest - least))).toBeLessThan(2 * peak(totalNm) * 0.25 * DEG)
  })

  it('totals are gas and inertia together', () => {
    const { gasNm, inertiaNm, totalNm } = got.torque!
    expectClose(
      'torque',
      totalNm,
      Array.from(gasNm, (g, i) => g + inertiaNm[i]),
      1e-12,
    )
  })

  it('turning every bank, throw, counterweight and shaft turns force and couple and nothing else', () => {
    const deg = 73.4
    const after = answer(turnedBy(document, deg), RPM)
    const [cos, sin] = [Math.cos(deg * DEG), Math.sin(deg * DEG)]
    const turned = (v: ArrayLike<number>, h: ArrayLike<number>) => [
      Array.from(v, (x, i) => x * cos - h[i] * sin),
      Array.from(v, (x, i) => x * sin + h[i] * cos),
    ]
    const [v, h] = turned(got.shaking.verticalN, got.shaking.horizontalN)
    expectClose('vertical', after.shaking.verticalN, v, 1e-10, force)
    expectClose('horizontal', after.shaking.horizontalN, h, 1e-10, force)
    const [cv, ch] = turned(got.shaking.coupleVerticalNm, got.shaking.coupleHorizontalNm)
    expectClose('couple vertical', after.shaking.coupleVerticalNm, cv, 1e-10, force * arm)
    expectClose('couple horizontal', after.shaking.coupleHorizontalNm, ch, 1e-10, force * arm)
    expectClose('torque', after.torque.totalNm, got.torque.totalNm, 1e-9)
    for (const [id, l] of Object.entries(got.loads)) {
      expectClose(`${id} side thrust`, after.loads[id].sideThrustN, l.sideThrustN, 1e-9)
      if (l.crankPinN)
        expectClose(`${id} radial`, after.loads[id].crankPinN!.radial, l.crankPinN.radial, 1e-9)
    }
    got.orders.forEach((o, k) => {
      expect(Math.abs(after.orders[k].forwardN - o.forwardN) / force).toBeLessThan(1e-10)
      expect(Math.abs(after.orders[k].backwardN - o.backwardN) / force).toBeLessThan(1e-10)
    })
  })

  it('the direction of rotation changes no figure', () => {
    const other = document.rotation === 'clockwise' ? 'counterclockwise' : 'clockwise'
    expect(answer({ ...document, rotation: other }, RPM)).toEqual(got)
  })

  it('twice the speed: twice the velocity, four times the acceleration and every inertia force', () => {
    const fast = answer({ ...document, gas: { model: 'none' } }, 2 * RPM)
    const slow = answer({ ...document, gas: { model: 'none' } }, RPM)
    const times = (signal: ArrayLike<number>, k: number) => Array.from(signal, (x) => x * k)
    for (const [id, k] of Object.entries(slow.kinematics)) {
      expectClose(id, fast.kinematics[id].velocityMS, times(k.velocityMS, 2), 1e-12)
      expectClose(id, fast.kinematics[id].accelerationMS2, times(k.accelerationMS2, 4), 1e-12)
      expectClose(id, fast.loads[id].sideThrustN, times(slow.loads[id].sideThrustN, 4), 1e-12)
    }
    expectClose(
      'force',
      fast.shaking.verticalN,
      times(slow.shaking.verticalN, 4),
      1e-12,
      4 * forceScale(slow),
    )
    expectClose('torque', fast.torque.totalNm, times(slow.torque.totalNm, 4), 1e-12)
  })

  it('lengths ×k and masses ×k³: forces at the same speed ×k⁴, torques and couples ×k⁵, pressures unchanged', () => {
    const k = 1.37
    const large = answer(scaled({ ...document, gas: { model: 'none' } }, k), RPM)
    const small = answer({ ...document, gas: { model: 'none' } }, RPM)
    const times = (signal: ArrayLike<number>, factor: number) => Array.from(signal, (x) => x * factor)
    const unit = forceScale(small)
    expectClose(
      'force',
      large.shaking.verticalN,
      times(small.shaking.verticalN, k ** 4),
      1e-10,
      unit * k ** 4,
    )
    expectClose(
      'couple',
      large.shaking.coupleVerticalNm,
      times(small.shaking.coupleVerticalNm, k ** 5),
      1e-10,
      unit * arm * k ** 5,
    )
    expectClose('torque', large.torque.totalNm, times(small.torque.totalNm, k ** 5), 1e-10)
    for (const [id, l] of Object.entries(small.loads))
      expectClose(id, large.loads[id].pistonPinN.u, times(l.pistonPinN.u, k ** 4), 1e-10)
    const same = answer(scaled(document, k), RPM).gas
    for (const [id, { pressureBar }] of Object.entries(got.gas))
      expectClose(id, same![id].pressureBar, pressureBar, 1e-10)
  })

  it('the order in which the document lists its parts changes nothing', () => {
    const { whole } = randomSource(document.cylinders.length)
    const after = answer(
      shuffled(document, (n) => whole(0, n - 1)),
      RPM,
    )
    const unit = force
    expectClose('vertical', after.shaking.verticalN, got.shaking.verticalN, 1e-12, unit)
    expectClose('horizontal', after.shaking.horizontalN, got.shaking.horizontalN, 1e-12, unit)
    expectClose('couple', after.shaking.coupleVerticalNm, got.shaking.coupleVerticalNm, 1e-12, unit * arm)
    expectClose('torque', after.torque.totalNm, got.torque.totalNm, 1e-12)
    expect(after.firing.events.map((e) => e.cylinder)).toEqual(got.firing.events.map((e) => e.cylinder))
    for (const id of Object.keys(got.loads))
      expectClose(id, after.loads[id].pistonPinN.u, got.loads[id].pistonPinN.u, 1e-12)
    for (const id of Object.keys(got.mains)) {
      expectClose(id, after.mains[id].vertical, got.mains[id].vertical, 1e-12, force)
      expectClose(id, after.mains[id].horizontal, got.mains[id].horizontal, 1e-12, force)
    }
  })

  it('a finer step gives the same figures at the angles both have', () => {
    const fine = answer(document, RPM, 0.5)
    const everyOther = (signal: ArrayLike<number>) => Array.from(signal).filter((_, i) => i % 2 === 0)
    expectClose('force', everyOther(fine.shaking.verticalN), got.shaking.verticalN, 1e-12, force)
    expectClose('torque', everyOther(fine.torque.totalNm), got.torque.totalNm, 1e-12)
    expect(Math.abs(fine.torque.meanNm - got.torque.meanNm) / peak(got.torque.totalNm)).toBeLessThan(1e-4)
  })
})

describe('energyFluctuation(torque, cycle)', () => {
  it('takes the torque straight between samples and the extremes where it crosses its mean', () => {
    // one lobe of height 3 over a base of 1½
    expect(energyFluctuation([3, -1, -1, -1], 4)).toBeCloseTo(2.25, 12)
    expect(energyFluctuation([-3, 1, 1, 1], 4)).toBeCloseTo(2.25, 12)
    expect(energyFluctuation([5, 5, 5], 2 * Math.PI)).toBe(0)
  })
})

const mirrorTrains = trains.filter(({ document }) => document.gas?.model !== 'heat-release')

/** With every firing angle stated: where choices tie, the earliest one is another in the mirror. */
function stated(document: CrankTrainInput): CrankTrainInput {
  const { events } = answer(document, RPM).firing
  const angle = Object.fromEntries(events.map((e) => [e.cylinder, e.angleDeg]))
  return { ...document, cylinders: document.cylinders.map((c) => ({ ...c, firesAtDeg: angle[c.id] })) }
}

describe.each(mirrorTrains)(
  'the mirror image of a train of $count cylinders (seed $seed), run the other way',
  ({ document: plain }) => {
    const document = stated(plain)
    const got = answer(document, RPM)
    const image = answer(mirrored(document), RPM)
    const force = forceScale(got)
    /** The image's signal at −θ. */
    const back = (signal: ArrayLike<number>, sign = 1) =>
      Array.from(signal, (_, i) => sign * signal[(signal.length - i) % signal.length])

    it('keeps position and acceleration, and turns velocity, side thrust and everything horizontal round', () => {
      for (const [id, k] of Object.entries(got.kinematics)) {
        expectClose(id, back(image.kinematics[id].pinHeightMm), k.pinHeightMm, 1e-11)
        expectClose(id, back(image.kinematics[id].velocityMS, -1), k.velocityMS, 1e-11)
        expectClose(id, back(image.kinematics[id].accelerationMS2), k.accelerationMS2, 1e-11)
        expectClose(id, back(image.kinematics[id].rodAngleDeg, -1), k.rodAngleDeg, 1e-11, 1)
        expectClose(id, back(image.loads[id].sideThrustN, -1), got.loads[id].sideThrustN, 1e-8, force)
        expectClose(id, back(image.loads[id].pistonPinN.u), got.loads[id].pistonPinN.u, 1e-8)
      }
      expectClose('vertical', back(image.shaking.verticalN), got.shaking.verticalN, 1e-11, force)
      expectClose('horizontal', back(image.shaking.horizontalN, -1), got.shaking.horizontalN, 1e-11, force)
    })

    it('needs the opposite torque at the same place', () => {
      expectClose('torque', back(image.torque.totalNm, -1), got.torque.totalNm, 1e-8)
    })

    it('fires in the reverse order', () => {
      const cycle = turns(document) * 360
      const before = Object.fromEntries(got.firing.events.map((e) => [e.cylinder, e.angleDeg]))
      for (const e of image.firing.events)
        expect(angleGap(-e.angleDeg, before[e.cylinder], cycle)).toBeLessThan(1e-7)
    })
  },
)
