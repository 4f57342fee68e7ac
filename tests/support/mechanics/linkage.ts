import { solved } from './dense'
import type { PlainCylinder, PlainTrain } from './plain-train'
import { add, polar, sub, times, turned, type Vec } from './plane'

/** A point or an angle with its first and second derivative by crank angle. */
export interface Moving {
  at: Vec
  d1: Vec
  d2: Vec
}

export interface RodMotion {
  bigEnd: Moving
  pistonPin: Moving
  cg: Moving
  /** Direction from the big end to the piston pin. */
  angle: number
  angleD1: number
  angleD2: number
  /** Height of the piston pin along the cylinder. */
  s: number
  sD1: number
  sD2: number
}

const rotating = (length: number, angle: number): Moving => {
  const at = polar(length, angle)
  return { at, d1: turned(at), d2: times(-1, at) }
}

/** A vector of fixed length whose direction is itself a function of the crank angle. */
function swinging(length: number, angle: number, d1: number, d2: number): Moving {
  const at = polar(length, angle)
  return { at, d1: times(d1, turned(at)), d2: sub(times(d2, turned(at)), times(d1 * d1, at)) }
}

const plus = (a: Moving, b: Moving): Moving => ({
  at: add(a.at, b.at),
  d1: add(a.d1, b.d1),
  d2: add(a.d2, b.d2),
})

export const crankPin = (train: PlainTrain, c: PlainCylinder, crankAngle: number) =>
  rotating(c.radius, crankAngle + train.throws[c.throwIndex].angle)

/**
 * One rod from its loop equation, big end + rod = piston pin, solved by Newton's method; its derivatives from the
 * loop equation differentiated once and twice. No closed form of the slider-crank is used.
 */
export function rodMotion(train: PlainTrain, index: number, crankAngle: number): RodMotion {
  const c = train.cylinders[index]
  const bigEnd = c.link ? knuckle(train, c, crankAngle) : crankPin(train, c, crankAngle)
  const axis = polar(1, c.bank)
  const across = turned(axis)

  let angle = c.bank
  let s = c.radius + c.rod
  for (let step = 0, last = Infinity; step < 100; step++) {
    const rod = polar(c.rod, angle)
    const gap = sub(add(bigEnd.at, rod), add(times(s, axis), times(c.offset, across)))
    const [dAngle, dS] = solveLoop(rod, axis, gap)
    angle -= dAngle
    s -= dS
    const change = Math.abs(dAngle) + Math.abs(dS) / c.rod
    if (change < 1e-15 || (change < 1e-11 && change >= last)) break
    last = change
  }
  const rod = polar(c.rod, angle)
  const [angleD1, sD1] = solveLoop(rod, axis, times(-1, bigEnd.d1))
  const [angleD2, sD2] = solveLoop(rod, axis, sub(times(angleD1 * angleD1, rod), bigEnd.d2))
  return {
    bigEnd,
    pistonPin: {
      at: add(times(s, axis), times(c.offset, across)),
      d1: times(sD1, axis),
      d2: times(sD2, axis),
    },
    cg: plus(bigEnd, swinging(c.rodCg, angle, angleD1, angleD2)),
    angle,
    angleD1,
    angleD2,
    s,
    sD1,
    sD2,
  }
}

/** Where a link rod's big end is: carried by its master rod. */
export function knuckle(train: PlainTrain, c: PlainCylinder, crankAngle: number): Moving {
  const { master, radius, angle } = c.link!
  const rod = rodMotion(train, master, crankAngle)
  return plus(rod.bigEnd, swinging(radius, rod.angle + angle, rod.angleD1, rod.angleD2))
}

/** angle and s with angle·(rod a quarter turn on) − s·axis = target. */
function solveLoop(rod: Vec, axis: Vec, target: Vec) {
  const across = turned(rod)
  return solved(
    [
      [across[0], -axis[0]],
      [across[1], -axis[1]],
    ],
    [target[0], target[1]],
  )
}

/** Crank angle (0…2π) where the piston pin stands highest or lowest, by Newton's method from the best of a scan. */
export function deadCentre(train: PlainTrain, index: number, which: 'top' | 'bottom'): number {
  const sign = which === 'top' ? 1 : -1
  let best = 0
  for (let k = 0, most = -Infinity; k < 720; k++) {
    const height = sign * rodMotion(train, index, (k * Math.PI) / 360).s
    if (height > most) [most, best] = [height, (k * Math.PI) / 360]
  }
  for (let step = 0; step < 20; step++) {
    const { sD1, sD2 } = rodMotion(train, index, best)
    best -= sD1 / sD2
  }
  return ((best % (2 * Math.PI)) + 2 * Math.PI) % (2 * Math.PI)
}
