import type { CrankTrainInput } from '@/scene/model/crank-train'
import { cylinderPressure } from './cylinder-pressure'
import { firingEvents } from './firing'
import { crankPin, deadCentre, rodMotion } from './linkage'
import { plainTrain, type PlainTrain } from './plain-train'
import { add, dot, polar, times, turned, type Vec } from './plane'
import { reactions, virtualWork } from './reactions'

const DEG = Math.PI / 180

/**
 * A slow, plain second opinion on the whole analysis: loop equations by Newton's method, every body's equations of
 * motion in one dense system, torque by virtual work, pressure by a general integrator, firing by trying everything.
 */
export function reference(document: CrankTrainInput, speedRpm: number, anglesDeg: number[]) {
  const train = plainTrain(document)
  const speed = (speedRpm * 2 * Math.PI) / 60
  const ids = train.cylinders.map((c) => c.id)
  const dead = train.cylinders.map((_, i) => {
    const [top, bottom] = [deadCentre(train, i, 'top'), deadCentre(train, i, 'bottom')]
    return { top, bottom, sTop: rodMotion(train, i, top).s, sBottom: rodMotion(train, i, bottom).s }
  })
  const events = firingEvents({
    cycleDeg: train.cycleDeg,
    tdcDeg: Object.fromEntries(ids.map((id, i) => [id, dead[i].top / DEG])),
    order: document.firingOrder,
    statedDeg: Object.fromEntries(train.cylinders.map((c) => [c.id, c.firesAtDeg])),
  })
  if (!events) throw new Error('no choice of turns keeps the order')
  const crankcase = (document.crankcasePressureBar ?? 1.01325) * 1e5
  const pressures = train.cylinders.map((c, i) =>
    cylinderPressure(train, i, events.find((e) => e.cylinder === c.id)!.angleDeg, anglesDeg),
  )
  const instants = anglesDeg.map((angleDeg, k) =>
    instant(
      train,
      angleDeg * DEG,
      speed,
      pressures.map((p) => p[k] - crankcase),
    ),
  )
  return { train, speed, dead, events, pressures, instants }
}

export type Reference = ReturnType<typeof reference>

function instant(train: PlainTrain, angle: number, speed: number, netPressures: number[]) {
  const w2 = speed * speed
  const motions = train.cylinders.map((_, i) => rodMotion(train, i, angle))
  const gasForces = train.cylinders.map((c, i) => netPressures[i] * c.area)
  const loads = new Map(
    train.cylinders.flatMap((c, i) => {
      if (c.link) return []
      const members = [i, ...train.cylinders.flatMap((other, j) => (other.link?.master === i ? [j] : []))]
      return [...reactions(train, members, motions, gasForces, speed)]
    }),
  )
  const crankPins = train.cylinders.map((c, i): Vec | undefined => {
    if (c.link) return undefined
    const bearing = times(-c.bearing * w2, crankPin(train, c, angle).d2)
    return add(times(-1, loads.get(i)!.onRodFoot), bearing)
  })
  const rotating = [
    ...train.throws.map((t) => ({ z: t.z, force: polar(t.unbalance * w2, angle + t.angle) })),
    ...(train.document.counterweights ?? []).map((c) => ({
      z: c.axialMm / 1000,
      force: polar((c.massKg * c.radiusMm * w2) / 1000, angle + c.angleDeg * DEG),
    })),
  ]
  const shafts = (train.document.balanceShafts ?? []).map((b) => ({
    z: b.axialMm / 1000,
    force: polar((b.unbalanceKgMm * w2 * b.speedRatio ** 2) / 1000, b.angleDeg * DEG + b.speedRatio * angle),
  }))
  const inertia = train.cylinders.map((c, i) => {
    const m = motions[i]
    const foot = c.link ? m.bigEnd : crankPin(train, c, angle)
    return {
      z: c.z,
      force: times(
        -w2,
        add(times(c.pistonMass, m.pistonPin.d2), times(c.rodMass, m.cg.d2), times(c.bearing, foot.d2)),
      ),
    }
  })
  const onFrame = [...rotating, ...shafts, ...inertia]
  const onCrank = [
    ...rotating,
    ...train.cylinders.flatMap((c, i) => (crankPins[i] ? [{ z: c.z, force: crankPins[i]! }] : [])),
  ]
  const work = train.cylinders.map((_, i) => virtualWork(train, i, motions[i], gasForces[i], speed))
  const bearingWork = train.cylinders.map((c, i) =>
    c.link ? -c.bearing * w2 * dot(motions[i].bigEnd.d2, motions[i].bigEnd.d1) : 0,
  )
  return {
    angle,
    motions,
    gasForces,
    loads,
    crankPins,
    mains: mainLoads(
      (train.document.mains ?? []).map((m) => m.axialMm / 1000),
      onCrank,
    ),
    gasTorque: sum(work.map((w) => w.gas)),
    inertiaTorque: sum(work.map((w) => w.inertia)) + sum(bearingWork),
    shaking: add(...onFrame.map((f) => f.force)),
    couple: add(...onFrame.map((f) => times(f.z - train.referenceZ, f.force))),
  }
}

/** The lever rule bay by bay; in the order the mains stand in the document. */
function mainLoads(places: number[], forces: { z: number; force: Vec }[]): Vec[] {
  if (places.length < 2) return []
  const sorted = places.map((z, i) => ({ z, i })).sort((a, b) => a.z - b.z)
  const loads = places.map((): Vec => [0, 0])
  for (const { z, force } of forces) {
    const after = sorted.findIndex((m, k) => k > 0 && z <= m.z)
    const right = after === -1 ? sorted.length - 1 : after
    const [l, r] = [sorted[right - 1], sorted[right]]
    const share = (z - l.z) / (r.z - l.z)
    loads[l.i] = add(loads[l.i], times(1 - share, force))
    loads[r.i] = add(loads[r.i], times(share, force))
  }
  return loads
}

const sum = (values: number[]) => values.reduce((a, b) => a + b, 0)

/** Components of an engine-frame vector along and across a direction. */
export const along = (v: Vec, angle: number): Vec => [
  dot(v, polar(1, angle)),
  dot(v, turned(polar(1, angle))),
]
