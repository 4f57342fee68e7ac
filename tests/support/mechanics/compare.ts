import { expect } from 'vitest'
import type { CrankTrainInput } from '@/scene/model/crank-train'
import { angleGap, expectClose, worstShare } from './close'
import { intervals } from './firing'
import { coefficient } from './fourier'
import { answer, type Answer } from './kernel'
import { along, reference, type Reference } from './reference'
import type { Vec } from './plane'

const DEG = Math.PI / 180

interface Both {
  kernel: Answer
  plain: Reference
  /** Allowed share of a signal's peak. */
  share: number
}

/** The whole answer to one document and speed beside the plain calculation of it. */
export function bothAnswers(document: CrankTrainInput, speedRpm: number, stepDeg: number): Both {
  const kernel = answer(document, speedRpm, stepDeg)
  return {
    kernel,
    plain: reference(document, speedRpm, [...kernel.angleDeg]),
    share: document.gas?.model === 'heat-release' ? 1e-6 : 1e-9,
  }
}

const each = (plain: Reference, f: (instant: Reference['instants'][number]) => number) =>
  plain.instants.map(f)

export function compareKinematics({ kernel, plain }: Both) {
  plain.train.cylinders.forEach((c, i) => {
    const k = kernel.kinematics[c.id]
    const { speed, dead } = plain
    const of = (f: (m: Reference['instants'][number]['motions'][number]) => number) =>
      each(plain, ({ motions }) => f(motions[i]))
    expectClose(
      `${c.id} pin height`,
      k.pinHeightMm,
      of((m) => m.s * 1000),
      1e-9,
    )
    expectClose(
      `${c.id} travel`,
      k.travelMm,
      of((m) => (dead[i].sTop - m.s) * 1000),
      1e-9,
    )
    expectClose(
      `${c.id} velocity`,
      k.velocityMS,
      of((m) => m.sD1 * speed),
      1e-9,
    )
    expectClose(
      `${c.id} acceleration`,
      k.accelerationMS2,
      of((m) => m.sD2 * speed ** 2),
      1e-9,
    )
    const footAcross = of((m) => Math.asin((along(m.bigEnd.at, c.bank)[1] - c.offset) / c.rod) / DEG)
    expectClose(`${c.id} rod angle`, k.rodAngleDeg, footAcross, 1e-9, 1)
    expect(angleGap(k.tdcDeg, dead[i].top / DEG), `${c.id} top dead centre`).toBeLessThan(1e-7)
    expect(angleGap(k.bdcDeg, dead[i].bottom / DEG), `${c.id} bottom dead centre`).toBeLessThan(1e-7)
    expectClose(`${c.id} stroke`, [k.strokeMm], [(dead[i].sTop - dead[i].sBottom) * 1000], 1e-11)
  })
}

export function compareGas({ kernel, plain, share }: Both) {
  plain.train.cylinders.forEach((c, i) => {
    expectClose(
      `${c.id} pressure`,
      kernel.gas[c.id].pressureBar,
      plain.pressures[i].map((p) => p / 1e5),
      share,
    )
  })
}

export function compareLoads({ kernel, plain, share }: Both) {
  const { cylinders, throws } = plain.train
  cylinders.forEach((c, i) => {
    const k = kernel.loads[c.id]
    const top = each(plain, ({ loads }) => along(loads.get(i)!.onRodTop, c.bank)[0])
    const topAcross = each(plain, ({ loads }) => along(loads.get(i)!.onRodTop, c.bank)[1])
    const peak = Math.max(...top.map(Math.abs), ...topAcross.map(Math.abs))
    expectClose(
      `${c.id} gas force`,
      k.gasForceN,
      each(plain, (x) => x.gasForces[i]),
      share,
      peak * 1e-6,
    )
    expectClose(`${c.id} piston pin u`, k.pistonPinN.u, top, share)
    expectClose(`${c.id} piston pin v`, k.pistonPinN.v, topAcross, share, peak)
    expectClose(
      `${c.id} side thrust`,
      k.sideThrustN,
      each(plain, ({ loads }) => -loads.get(i)!.wall),
      share,
      peak,
    )
    if (c.link) {
      expect(k.crankPinN, `${c.id} crank pin of a link rod`).toBeUndefined()
      const onKnuckle = plain.instants.map(({ loads, motions }): Vec => {
        const { onRodFoot } = loads.get(i)!
        const bearing = c.bearing * plain.speed ** 2
        return [
          -onRodFoot[0] - bearing * motions[i].bigEnd.d2[0],
          -onRodFoot[1] - bearing * motions[i].bigEnd.d2[1],
        ]
      })
      expectPair(`${c.id} knuckle`, k.knuckleN!, onKnuckle, share)
      return
    }
    const load = plain.instants.map(({ crankPins }) => crankPins[i]!)
    expectPair(`${c.id} crank pin`, k.crankPinN!, load, share)
    const throwAngle = throws[c.throwIndex].angle
    const turned = plain.instants.map((x) => along(x.crankPins[i]!, x.angle + throwAngle))
    const most = Math.max(...turned.map(([a, b]) => Math.hypot(a, b)))
    expectClose(
      `${c.id} radial`,
      k.crankPinN!.radial,
      turned.map((v) => v[0]),
      share,
      most,
    )
    expectClose(
      `${c.id} tangential`,
      k.crankPinN!.tangential,
      turned.map((v) => v[1]),
      share,
      most,
    )
  })
}

function expectPair(
  name: string,
  actual: { vertical: ArrayLike<number>; horizontal: ArrayLike<number> },
  wanted: Vec[],
  share: number,
) {
  const peak = Math.max(...wanted.map(([v, h]) => Math.hypot(v, h)))
  expectClose(
    `${name} vertical`,
    actual.vertical,
    wanted.map((v) => v[0]),
    share,
    peak,
  )
  expectClose(
    `${name} horizontal`,
    actual.horizontal,
    wanted.map((v) => v[1]),
    share,
    peak,
  )
}

export function compareMains({ kernel, plain, share }: Both) {
  const mains = plain.train.document.mains ?? []
  expect(Object.keys(kernel.mains).sort()).toEqual(mains.length < 2 ? [] : mains.map((m) => m.id).sort())
  if (mains.length < 2) return
  mains.forEach(({ id }, j) => {
    const wanted = plain.instants.map((x) => x.mains[j])
    expectPair(`main ${id}`, kernel.mains[id], wanted, share)
  })
}

export function compareTorque({ kernel, plain, share }: Both) {
  const torque = kernel.torque!
  const gas = each(plain, (x) => x.gasTorque)
  const inertia = each(plain, (x) => x.inertiaTorque)
  const total = gas.map((g, k) => g + inertia[k])
  const peak = Math.max(...total.map(Math.abs))
  expectClose('gas torque', torque.gasNm, gas, share, peak)
  expectClose('inertia torque', torque.inertiaNm, inertia, share, peak)
  expectClose('total torque', torque.totalNm, total, share)
}

export function compareShaking({ kernel, plain }: Both) {
  const { speed, train } = plain
  const scale =
    train.cylinders.reduce((sum, c) => sum + (c.pistonMass + c.rodMass) * c.radius, 0) * speed ** 2
  const { verticalN, horizontalN, coupleVerticalNm, coupleHorizontalNm } = kernel.shaking!
  const force = { vertical: verticalN, horizontal: horizontalN }
  const couple = { vertical: coupleVerticalNm, horizontal: coupleHorizontalNm }
  // A balanced engine's resultant is the rounding of large forces that cancel: measured by one cylinder's forces.
  const near = (name: string, a: ArrayLike<number>, w: number[], size: number) => {
    expect(worstShare(a, w, size), name).toBeLessThanOrEqual(1e-9)
  }
  const arm = Math.max(0.01, ...train.cylinders.map((c) => Math.abs(c.z - train.referenceZ)))
  near(
    'vertical',
    force.vertical,
    each(plain, (x) => x.shaking[0]),
    scale,
  )
  near(
    'horizontal',
    force.horizontal,
    each(plain, (x) => x.shaking[1]),
    scale,
  )
  near(
    'couple vertical',
    couple.vertical,
    each(plain, (x) => x.couple[0]),
    scale * arm,
  )
  near(
    'couple horizontal',
    couple.horizontal,
    each(plain, (x) => x.couple[1]),
    scale * arm,
  )
}

/** Orders of the shaking force and couple against the plain Fourier sum of the plain calculation. */
export function compareOrders({ kernel, plain }: Both) {
  const revolutions = plain.train.cycleDeg / 360
  const { speed, train } = plain
  const scale =
    train.cylinders.reduce((sum, c) => sum + (c.pistonMass + c.rodMass) * c.radius, 0) * speed ** 2
  const arm = Math.max(0.01, ...train.cylinders.map((c) => Math.abs(c.z - train.referenceZ)))
  const parts = {
    vertical: each(plain, (x) => x.shaking[0]),
    horizontal: each(plain, (x) => x.shaking[1]),
    coupleVertical: each(plain, (x) => x.couple[0]),
    coupleHorizontal: each(plain, (x) => x.couple[1]),
  }
  expect(kernel.orders.map((o) => o.order)).toEqual(
    Array.from({ length: 12 * revolutions }, (_, k) => (k + 1) / revolutions),
  )
  for (const o of kernel.orders) {
    const c = Object.fromEntries(
      Object.entries(parts).map(([name, signal]) => [name, coefficient(signal, o.order, revolutions)]),
    ) as Record<keyof typeof parts, [number, number]>
    const phasor = (
      name: string,
      amplitude: number,
      phaseDeg: number,
      [re, im]: [number, number],
      size: number,
    ) => {
      const off = Math.hypot(
        amplitude * Math.cos(phaseDeg * DEG) - 2 * re,
        -amplitude * Math.sin(phaseDeg * DEG) - 2 * im,
      )
      expect(off / size, `order ${o.order} ${name}`).toBeLessThanOrEqual(1e-9)
    }
    phasor('vertical', o.vertical.amplitudeN, o.vertical.phaseDeg, c.vertical, scale)
    phasor('horizontal', o.horizontal.amplitudeN, o.horizontal.phaseDeg, c.horizontal, scale)
    phasor(
      'couple vertical',
      o.coupleVertical.amplitudeNm,
      o.coupleVertical.phaseDeg,
      c.coupleVertical,
      scale * arm,
    )
    phasor(
      'couple horizontal',
      o.coupleHorizontal.amplitudeNm,
      o.coupleHorizontal.phaseDeg,
      c.coupleHorizontal,
      scale * arm,
    )
    // z = vertical + i·horizontal: its coefficients at +k and −k
    const forward = (v: [number, number], h: [number, number]) => Math.hypot(v[0] - h[1], v[1] + h[0])
    const backward = (v: [number, number], h: [number, number]) => Math.hypot(v[0] + h[1], -v[1] + h[0])
    const near = (name: string, a: number, w: number, size: number) =>
      expect(Math.abs(a - w) / size, `order ${o.order} ${name}`).toBeLessThanOrEqual(1e-9)
    near('forward', o.forwardN, forward(c.vertical, c.horizontal), scale)
    near('backward', o.backwardN, backward(c.vertical, c.horizontal), scale)
    near('forward couple', o.forwardNm, forward(c.coupleVertical, c.coupleHorizontal), scale * arm)
    near('backward couple', o.backwardNm, backward(c.coupleVertical, c.coupleHorizontal), scale * arm)
  }
}

export function compareBalance({ kernel, plain }: Both) {
  const { train } = plain
  const { document } = train
  const share = document.balanceFactor ?? 0
  const balance = kernel.balance
  const split = train.cylinders.map((c) => ({
    reciprocating: c.pistonMass + (c.rodMass * c.rodCg) / c.rod,
    rotating: c.bearing + (c.rodMass * (c.rod - c.rodCg)) / c.rod,
  }))
  train.cylinders.forEach((c, i) => {
    const got = balance.cylinders[c.id]
    expectClose(
      `${c.id} split`,
      [got.reciprocatingKg, got.rotatingKg],
      [split[i].reciprocating, split[i].rotating],
      1e-12,
    )
  })
  const pull = { force: [0, 0], couple: [0, 0] }
  const hang = (momentKgMm: number, angle: number, z: number) => {
    const parts = [momentKgMm * Math.cos(angle), momentKgMm * Math.sin(angle)]
    parts.forEach((part, axis) => {
      pull.force[axis] += part
      pull.couple[axis] += part * (z - train.referenceZ) * 1000
    })
  }
  let size = 0
  document.throws.forEach(({ id }, t) => {
    const members = train.cylinders.flatMap((c, i) => (c.throwIndex === t ? [i] : []))
    const sum = (f: (i: number) => number) => members.reduce((total, i) => total + f(i), 0)
    const reciprocating = share * sum((i) => split[i].reciprocating)
    const rotating = sum((i) => split[i].rotating)
    const oil = sum((i) => train.cylinders[i].oil)
    const got = balance.bobWeights[id]
    expectClose(
      `bob-weight ${id}`,
      [got.kg, got.rotatingKg, got.oilKg],
      [reciprocating + rotating + oil, rotating, oil],
      1e-12,
    )
    const { angle, z, unbalance, radius } = train.throws[t]
    // the oil allowance is on the bob-weight card only
    const moment = unbalance * 1000 + (reciprocating + rotating) * radius * 1000
    size += moment
    hang(moment, angle, z)
  })
  for (const c of document.counterweights ?? [])
    hang(c.massKg * c.radiusMm, c.angleDeg * DEG, c.axialMm / 1000)
  const { staticKgMm, staticAngleDeg, coupleKgMm2, coupleAngleDeg } = balance.residual
  const turned = (length: number, angleDeg: number) => [
    length * Math.cos(angleDeg * DEG),
    length * Math.sin(angleDeg * DEG),
  ]
  const arm = Math.max(1, ...train.cylinders.map((c) => Math.abs(c.z - train.referenceZ) * 1000))
  expectClose('residual', turned(staticKgMm, staticAngleDeg), pull.force, 1e-11, size)
  expectClose('residual couple', turned(coupleKgMm2, coupleAngleDeg), pull.couple, 1e-11, size * arm)
}

export function compareFiring({ kernel, plain }: Both) {
  const { events, train } = plain
  const { firing } = kernel
  expect(firing.events.map((e) => e.cylinder)).toEqual(events.map((e) => e.cylinder))
  firing.events.forEach((e, i) => {
    expect(angleGap(e.angleDeg, events[i].angleDeg, train.cycleDeg), e.cylinder).toBeLessThan(1e-6)
  })
  const among = (
    name: string,
    got: { intervalsDeg: number[]; even: boolean },
    member: (id: string) => boolean,
  ) => {
    const angles = events.filter((e) => member(e.cylinder)).map((e) => e.angleDeg)
    const wanted = intervals(angles, train.cycleDeg)
    expectClose(`${name} intervals`, got.intervalsDeg, wanted, 1e-9)
    const mean = train.cycleDeg / angles.length
    expect(got.even, `${name} even`).toBe(wanted.every((gap) => Math.abs(gap - mean) <= 0.5))
  }
  const bankOf = (id: string) => train.cylinders.find((c) => c.id === id)!.bankId
  among('engine', firing, () => true)
  for (const bank of train.document.banks)
    if (events.some((e) => bankOf(e.cylinder) === bank.id))
      among(`bank ${bank.id}`, firing.banks[bank.id], (id) => bankOf(id) === bank.id)
  for (const c of train.document.collectors ?? [])
    among(`collector ${c.id}`, firing.collectors[c.id], (id) => c.cylinders.includes(id))
  const banks = events.map((e) => bankOf(e.cylinder))
  expect(firing.alternatesBanks).toBe(banks.every((bank, i) => bank !== banks[(i + 1) % banks.length]))
}
