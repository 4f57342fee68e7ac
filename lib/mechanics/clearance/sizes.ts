import type { DeadCentres } from '../dead-centres'
import type { RodPath } from '../rod-path'
import type { Train } from '../train'

/** A convex outline in the plane, x and y in turn, thickened all round by `round`; one point is a circle. m. */
export interface Solid {
  points: Float64Array
  round: number
}

/** A stretch of the crank along its axis, m. */
export interface Stretch {
  from: number
  to: number
}

/** One rod; `along` runs from its big end's centre to the piston pin. */
export interface RodBody {
  /** Half the shank's width at places along the rod, ascending; outside them the rod is no shank. */
  shank: { along: number; half: number }[]
  /** Big end (or knuckle eye) round its own centre. */
  eye: number
}

/** The bodies whose clearances are looked at: what the train itself does not know. SI; one entry a cylinder unless said. */
export interface ClearanceSizes {
  /** Crown above and skirt below the piston pin; null for a crosshead's piston, which never comes down to the crank. */
  pistons: ({ crown: number; skirt: number } | null)[]
  rods: RodBody[]
  /** Height of the bore's lower edge over the crank axis. */
  boreBottoms: number[]
  /** One a counterweight of the train: its stretch and the radius it sweeps; null where nothing stands. */
  counterweights: ((Stretch & { radius: number }) | null)[]
  /** Webs that carry no counterweight, with the crank pins that they reach round: the least that a web can be. */
  webs: (Stretch & { pins: { angle: number; throwRadius: number; radius: number }[] })[]
  /** Height of the deck over the crank axis, where it is known. */
  deck: number | null
}

/** What every gap is worked out from. */
export interface ClearanceModel {
  train: Train
  paths: readonly RodPath[]
  centres: readonly DeadCentres[]
  sizes: ClearanceSizes
}
