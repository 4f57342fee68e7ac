import { describe, expect, it } from 'vitest'
import { firingEvents } from '@/lib/mechanics/firing'
import { buildInstant, buildPlan, fillInstant } from '@/lib/mechanics/plan'
import { buildFiringMarkers, burnOf, fillFiringMarkers, fillTint } from '@/scene/frame/firing-markers'
import { partFacts } from '@/scene/frame/part-figures'
import { stateInWords } from '@/scene/frame/words'
import { presetRig, presetRigs } from './rigs'

const DEG = Math.PI / 180
const events = [
  { cylinder: 0, angle: 0 },
  { cylinder: 2, angle: 240 * DEG },
  { cylinder: 1, angle: 480 * DEG },
]
const burn = { from: -10 * DEG, to: 50 * DEG }
const at = (degrees: number) =>
  fillFiringMarkers(buildFiringMarkers(3), events, 4 * Math.PI, burn, degrees * DEG)

describe('fillFiringMarkers(out, events, cycle, burn, angle)', () => {
  it('counts from each event round the cycle and names the last one', () => {
    const { since, firing: last } = at(250)
    expect(since[2] / DEG).toBeCloseTo(10, 9)
    expect(since[0] / DEG).toBeCloseTo(250, 9)
    expect(since[1] / DEG).toBeCloseTo(490, 9)
    expect(last).toBe(2)
  })

  it('burns inside its window only, also across the seam of the cycle', () => {
    expect([...at(0).burning]).toEqual([1, 0, 0])
    expect([...at(49).burning]).toEqual([1, 0, 0])
    expect([...at(51).burning]).toEqual([0, 0, 0])
    expect([...at(715).burning]).toEqual([1, 0, 0])
    expect([...at(705).burning]).toEqual([0, 0, 0])
    expect([...at(235).burning]).toEqual([0, 0, 1])
  })

  it('takes the window of a heat-release model', () => {
    const { gas } = presetRig('v8x-5000').train
    expect(burnOf(gas).from / DEG).toBeCloseTo(-18, 9)
    expect(burnOf(gas).to / DEG).toBeCloseTo(37, 9)
  })
})

describe('fillTint(out, pressure, crankcase, peak)', () => {
  it('runs from 0 at the crankcase’s pressure to 1 at the peak and stays in between', () => {
    const out = fillTint(new Float32Array(4), Float64Array.of(1e5, 5e4, 7e6, 9e6), 1e5, 7e6)
    expect([...out]).toEqual([0, 0, 1, 1])
    expect([...fillTint(new Float32Array(1), Float64Array.of(1e5), 1e5, 1e5)]).toEqual([0])
  })
})

describe('stateInWords(train, instant, events, system)', () => {
  const { train } = presetRig('v8x-5000')
  const plan = buildPlan(train, 680)
  const instant = buildInstant(plan)
  const order = firingEvents(train)

  it('says the angle, who is firing with what force, and who is next', () => {
    const first = order.find(({ cylinder }) => train.cylinders[cylinder].id === '1')!
    const angle = first.angle + 22 * DEG
    fillInstant(instant, plan, angle)
    const words = stateInWords(train, instant, order, 'si')
    expect(words).toMatch(
      /^Crank \d+\.\d°\. Cylinder 1 is firing, [\d.]+ kN on its piston\. Cylinder 8 fires next, in 68\.0°\.$/,
    )
  })

  it('never says of one cylinder that it is firing and that it fires next, also where it is lit before its top', () => {
    const gas = train.gas
    if (gas.model !== 'heat-release') throw new Error('this preset has a heat release')
    const early = { ...train, gas: { ...gas, combustionStart: -20 * DEG } }
    const said = new Set<boolean>()
    for (let degree = 0; degree < 720; degree += 5) {
      fillInstant(instant, plan, degree * DEG)
      const words = stateInWords(early, instant, order, 'si')
      const firing = [...words.matchAll(/Cylinder (\S+) is firing/g)].map(([, id]) => id)
      const [, next] = /Cylinder (\S+) fires next/.exec(words) ?? []
      said.add(firing.length > 0)
      expect(firing).not.toContain(next)
      expect(next).toBeDefined()
    }
    expect(said.has(true)).toBe(true)
  })

  it('says of a lone cylinder that it is firing, and only otherwise when it fires next', () => {
    const single = presetRig('single-450').train
    const alone = buildPlan(single, 300)
    const at = buildInstant(alone)
    const [event] = firingEvents(single)
    fillInstant(at, alone, event.angle + 20 * DEG)
    expect(stateInWords(single, at, [event], 'si')).toMatch(/is firing, [\d.]+ k?N on its piston\.$/)
    fillInstant(at, alone, event.angle + Math.PI)
    expect(stateInWords(single, at, [event], 'si')).toMatch(/fires next, in \d+\.0°\.$/)
  })
})

describe('partFacts(rig, train, id)', () => {
  it('has finite figures for every part of every preset, and pistons, pins and mains have some', () => {
    for (const { rig, train } of presetRigs()) {
      const plan = buildPlan(train, 100)
      const instant = buildInstant(plan)
      fillInstant(instant, plan, 1)
      for (const { id, label, kind } of rig.parts) {
        const facts = partFacts(rig, train, id)!
        expect(facts.label).toBe(label)
        for (const { value } of facts.figures) expect(Number.isFinite(value(instant))).toBe(true)
        if (kind !== 'main-journal') expect(facts.figures.length).toBeGreaterThan(0)
      }
    }
  })

  it('reads the instant and the document', () => {
    const { rig, train } = presetRig('v8x-5000')
    const plan = buildPlan(train, 100)
    const instant = buildInstant(plan)
    fillInstant(instant, plan, 1)
    const value = (id: string, name: string) =>
      partFacts(rig, train, id)!
        .figures.find((figure) => figure.name === name)!
        .value(instant)
    expect(value('piston:1', 'Gas force')).toBe(instant.gasForce[1])
    expect(value('counterweight:1F', 'Mass × radius')).toBeCloseTo(1.402995 * 0.0528, 9)
    const load = Math.hypot(
      value('crank-pin:1', 'Radial, outwards'),
      value('crank-pin:1', 'Tangential, forwards'),
    )
    expect(load).toBeCloseTo(value('crank-pin:1', 'Load'), 6)
    expect(partFacts(rig, train, 'piston:99')).toBeNull()
  })
})
