import { solved } from './dense'
import type { RodMotion } from './linkage'
import type { PlainTrain } from './plain-train'
import { cross, dot, polar, sub, times, turned, type Vec } from './plane'

/** Forces in the engine frame, N. */
export interface Reactions {
  /** The piston on the rod. */
  onRodTop: Vec
  /** What the rod's big end gets from the pin or knuckle it turns on. */
  onRodFoot: Vec
  /** The wall on the piston, towards +90° of the cylinder. */
  wall: number
}

/**
 * Every unknown force of one throw's rods at once, from Newton's and Euler's equations of each body written out as
 * one dense linear system: five unknowns and five equations a cylinder.
 */
export function reactions(
  train: PlainTrain,
  members: number[],
  motions: RodMotion[],
  gasForces: number[],
  speed: number,
): Map<number, Reactions> {
  const n = members.length
  const a = Array.from({ length: 5 * n }, () => new Array<number>(5 * n).fill(0))
  const b = new Array<number>(5 * n).fill(0)
  members.forEach((index, k) => {
    const c = train.cylinders[index]
    const m = motions[index]
    const [row, col] = [5 * k, 5 * k]
    const axis = polar(1, c.bank)
    const across = turned(axis)
    const gas = times(-gasForces[index], axis)
    const w2 = speed * speed
    const topArm = sub(m.pistonPin.at, m.cg.at)
    const footArm = sub(m.bigEnd.at, m.cg.at)
    for (const i of [0, 1]) {
      // piston: wall·across − onRodTop + gas = mass × acceleration
      a[row + i][col + i] = -1
      a[row + i][col + 4] = across[i]
      b[row + i] = c.pistonMass * w2 * m.pistonPin.d2[i] - gas[i]
      // rod: onRodTop + onRodFoot − Σ links' feet = mass × acceleration of its centre of gravity
      a[row + 2 + i][col + i] = 1
      a[row + 2 + i][col + 2 + i] = 1
      b[row + 2 + i] = c.rodMass * w2 * m.cg.d2[i]
    }
    // rod: moments about its centre of gravity
    setMoment(a[row + 4], col, topArm, 1)
    setMoment(a[row + 4], col + 2, footArm, 1)
    b[row + 4] = c.rodInertia * w2 * m.angleD2
    members.forEach((other, j) => {
      if (train.cylinders[other].link?.master !== index) return
      const foot = 5 * j + 2
      a[row + 2][foot] -= 1
      a[row + 3][foot + 1] -= 1
      setMoment(a[row + 4], foot, sub(motions[other].bigEnd.at, m.cg.at), -1)
    })
  })
  const x = solved(a, b)
  return new Map(
    members.map((index, k) => [
      index,
      {
        onRodTop: [x[5 * k], x[5 * k + 1]] as Vec,
        onRodFoot: [x[5 * k + 2], x[5 * k + 3]] as Vec,
        wall: x[5 * k + 4],
      },
    ]),
  )
}

function setMoment(row: number[], col: number, arm: Vec, sign: number) {
  row[col] += sign * cross(arm, [1, 0])
  row[col + 1] += sign * cross(arm, [0, 1])
}

/**
 * Torque on the crank by virtual work, with no pin load in it: what the gas does less what the masses take up,
 * over the turn of the crank.
 */
export function virtualWork(train: PlainTrain, index: number, m: RodMotion, gasForce: number, speed: number) {
  const c = train.cylinders[index]
  const w2 = speed * speed
  return {
    gas: -gasForce * m.sD1,
    inertia: -(
      c.pistonMass * w2 * m.sD2 * m.sD1 +
      c.rodMass * w2 * dot(m.cg.d2, m.cg.d1) +
      c.rodInertia * w2 * m.angleD2 * m.angleD1
    ),
  }
}
