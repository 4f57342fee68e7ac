import type { Train } from './train'

/**
 * What leads one rod: its crank circle, or, for a link rod, a knuckle on the master rod as well. Angles rad, lengths m.
 * In the cylinder's own frame the crank pin stands at angle θ + phase.
 */
export interface RodPath {
  bank: number
  cosBank: number
  sinBank: number
  /** Throw angle − bank angle. */
  phase: number
  cosPhase: number
  sinPhase: number
  radius: number
  length: number
  offset: number
  /** Index of the master rod's cylinder, −1 for a rod on its own crank pin. */
  master: number
  knuckleRadius: number
  /** Of the knuckle's direction at an upright master rod, in this cylinder's frame: β(master) − β + knuckle angle. */
  knucklePhase: number
  cosKnuckle: number
  sinKnuckle: number
}

export function rodPaths(train: Train): RodPath[] {
  return train.cylinders.map((cylinder) => {
    const bank = train.banks[cylinder.bank].angle
    const pin = train.throws[cylinder.throw]
    const { link } = cylinder
    const master = link ? train.cylinders[link.master] : undefined
    const phase = pin.angle - bank
    const knucklePhase = link && master ? train.banks[master.bank].angle - bank + link.knuckleAngle : 0
    return {
      bank,
      cosBank: Math.cos(bank),
      sinBank: Math.sin(bank),
      phase,
      cosPhase: Math.cos(phase),
      sinPhase: Math.sin(phase),
      radius: pin.radius,
      length: cylinder.rodLength,
      offset: cylinder.offset,
      master: link ? link.master : -1,
      knuckleRadius: link ? link.knuckleRadius : 0,
      knucklePhase,
      cosKnuckle: Math.cos(knucklePhase),
      sinKnuckle: Math.sin(knucklePhase),
    }
  })
}
