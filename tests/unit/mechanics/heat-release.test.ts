import { describe, expect, it } from 'vitest'
import { chamberVolume } from '@/lib/mechanics/chamber'
import type { HeatRelease } from '@/lib/mechanics/heat-release'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import type { Train } from '@/lib/mechanics/train'
import { DEG, presetTrain } from './trains'

const withGas = (id: string, more: Partial<HeatRelease> = {}): Train => {
  const train = presetTrain(id)
  return { ...train, gas: { ...(train.gas as HeatRelease), ...more } }
}

/** Pressure over cylinder 0 at angles from its firing top dead centre, degrees. */
function pressures(train: Train, cylinder = 0) {
  const plan = buildPlan(train, 300)
  const instant = buildInstant(plan)
  return (angleDeg: number) => {
    fillInstant(instant, plan, plan.fires[cylinder] + angleDeg * DEG)
    return instant.pressure[cylinder]
  }
}

/** The differential equation by fourth-order Runge–Kutta in small steps, from intake closing on. */
function stepped(train: Train, cylinder: number, toDeg: number, steps: number) {
  const gas = train.gas as HeatRelease
  const chamber = buildPlan(train, 0).chambers[cylinder]
  const burning = (angle: number) => {
    const x = (angle - gas.combustionStart) / gas.combustionDuration
    const { wiebeA: a, wiebeM: m } = gas
    return (gas.heatPerCycle * a * (m + 1) * x ** m * Math.exp(-a * x ** (m + 1))) / gas.combustionDuration
  }
  const slope = (angle: number, p: number, burns: boolean) => {
    const h = 1e-5
    const volume = chamberVolume(chamber, angle)
    const growth = (chamberVolume(chamber, angle + h) - chamberVolume(chamber, angle - h)) / (2 * h)
    return (
      ((gas.gamma - 1) * (burns ? burning(Math.max(angle, gas.combustionStart)) : 0) -
        gas.gamma * p * growth) /
      volume
    )
  }
  const end = toDeg * DEG
  const kinks = [gas.combustionStart, gas.combustionStart + gas.combustionDuration]
  const pieces = [gas.intakeCloses, ...kinks.filter((angle) => angle > gas.intakeCloses && angle < end), end]
  let p = gas.intakePressure
  for (let piece = 1; piece < pieces.length; piece++) {
    const step = (pieces[piece] - pieces[piece - 1]) / steps
    const middle = (pieces[piece] + pieces[piece - 1]) / 2
    const burns = middle > kinks[0] && middle < kinks[1]
    for (let k = 0; k < steps; k++) {
      const at = pieces[piece - 1] + k * step
      const k1 = slope(at, p, burns)
      const k2 = slope(at + step / 2, p + (step / 2) * k1, burns)
      const k3 = slope(at + step / 2, p + (step / 2) * k2, burns)
      const k4 = slope(at + step, p + step * k3, burns)
      p += (step / 6) * (k1 + 2 * k2 + 2 * k3 + k4)
    }
  }
  return p
}

describe('the heat-release pressure', () => {
  it.each([
    ['a single', 'i4-2000', 0, {}, 9],
    ['a link rod', 'r7-11', 3, {}, 9],
    ['a two-stroke', 'single-125-2t', 0, {}, 9],
    // where heat starts like a root, small steps are what is inexact
    ['an exponent below one', 'v8x-5000', 0, { wiebeM: 0.5 }, 5],
  ] as const)('solves its differential equation: %s', (_, id, cylinder, more, digits) => {
    const train = withGas(id, more)
    const at = pressures(train, cylinder)
    for (const angle of [-15, -3, 10, 36, 80])
      expect(at(angle) / stepped(train, cylinder, angle, 4000)).toBeCloseTo(1, digits)
  })

  it('without heat compresses by p·V^γ = constant, from intake closing to exhaust opening', () => {
    const train = withGas('i4-2000', { heatPerCycle: 0 })
    const at = pressures(train)
    const gas = train.gas as HeatRelease
    const chamber = buildPlan(train, 0).chambers[0]
    const volume = (angleDeg: number) => chamberVolume(chamber, angleDeg * DEG)
    const base = gas.intakePressure * volume(gas.intakeCloses / DEG) ** gas.gamma
    for (const angle of [-100, -20, 0, 77, 130])
      expect(at(angle) * volume(angle) ** gas.gamma).toBeCloseTo(base, 8)
    expect(volume(180 - 1e-9) / chamber.clearance).toBeLessThan(10.8)
  })

  it('is intake pressure up to intake closing, and falls to exhaust pressure after exhaust opening', () => {
    const train = withGas('i4-2000')
    const gas = train.gas as HeatRelease
    const at = pressures(train)
    expect(at(-360)).toBe(gas.intakePressure)
    expect(at(-200)).toBe(gas.intakePressure)
    const opening = at(gas.exhaustOpens / DEG)
    const fall = (angle: number) => (at(angle) - gas.exhaustPressure) / (opening - gas.exhaustPressure)
    expect(fall(gas.exhaustOpens / DEG + 14)).toBeCloseTo(Math.exp(-1), 12)
    expect(fall(gas.exhaustOpens / DEG + 140)).toBeCloseTo(Math.exp(-10), 12)
  })

  it('is periodic over the cycle, and the cycle begins half of it before firing', () => {
    const at = pressures(withGas('v8x-5000'))
    for (const angle of [-360, -100, 0, 12.3, 200]) expect(at(angle + 720)).toBeCloseTo(at(angle), 5)
    expect(at(360)).toBe(at(-360))
  })

  it('counts no heat before the intake closes', () => {
    const train = withGas('i4-2000', { combustionStart: -150 * DEG, combustionDuration: 120 * DEG })
    const at = pressures(train)
    const gas = train.gas as HeatRelease
    expect(at(gas.intakeCloses / DEG)).toBeCloseTo(gas.intakePressure, 6)
    expect(at(0) / stepped(train, 0, 0, 4000)).toBeCloseTo(1, 9)
  })

  it('counts no heat after the exhaust opens', () => {
    const train = withGas('i4-2000', { combustionDuration: 300 * DEG })
    const gas = train.gas as HeatRelease
    const opens = gas.exhaustOpens / DEG
    expect(pressures(train)(opens) / stepped(train, 0, opens, 4000)).toBeCloseTo(1, 9)
  })

  it('survives combustion that is all but sudden', () => {
    const at = pressures(withGas('i4-2000', { combustionStart: 0, combustionDuration: 1e-6 * DEG }))
    expect(at(1) / at(-1)).toBeGreaterThan(2)
    expect(Number.isFinite(at(0))).toBe(true)
  })
})
