import type { Gas } from '@/lib/mechanics/train'

export interface FiringEvent {
  cylinder: number
  angle: number
}

/** The firing state of every cylinder at one crank angle. */
export interface FiringMarkers {
  /** Crank angle since its event, rad, in 0 … cycle. */
  since: Float64Array
  /** 1 while its charge burns. */
  burning: Uint8Array
  /** The cylinder whose event came last. */
  firing: number
}

/** Crank angles from firing top dead centre between which a charge burns, rad. */
export interface Burn {
  from: number
  to: number
}

/** Without a heat-release model a charge is drawn burning for 60° from its event (common practice). */
const PLAIN: Burn = { from: 0, to: Math.PI / 3 }

export const burnOf = (gas: Gas): Burn =>
  gas.model === 'heat-release'
    ? { from: gas.combustionStart, to: gas.combustionStart + gas.combustionDuration }
    : PLAIN

export const buildFiringMarkers = (cylinders: number): FiringMarkers => ({
  since: new Float64Array(cylinders),
  burning: new Uint8Array(cylinders),
  firing: -1,
})

export function fillFiringMarkers(
  out: FiringMarkers,
  events: readonly FiringEvent[],
  cycle: number,
  burn: Burn,
  angle: number,
): FiringMarkers {
  out.firing = -1
  let latest = Infinity
  for (let k = 0; k < events.length; k++) {
    const { cylinder } = events[k]
    const since = wrap(angle - events[k].angle, cycle)
    out.since[cylinder] = since
    // a burn that starts before the event is the end of the cycle
    out.burning[cylinder] = wrap(since - burn.from, cycle) < burn.to - burn.from ? 1 : 0
    if (since >= latest) continue
    latest = since
    out.firing = cylinder
  }
  return out
}

function wrap(angle: number, cycle: number): number {
  const rest = angle % cycle
  return rest < 0 ? rest + cycle : rest
}

/**
 * How far each piston crown is tinted: the root of its share of the peak pressure, both above the crankcase's, so that
 * compression shows beside combustion. 0 where there is no gas.
 */
export function fillTint(
  out: Float32Array,
  pressure: Float64Array,
  crankcase: number,
  peak: number,
): Float32Array {
  const span = peak - crankcase
  for (let i = 0; i < out.length; i++) {
    const share = span > 0 ? (pressure[i] - crankcase) / span : 0
    out[i] = Math.sqrt(Math.min(Math.max(share, 0), 1))
  }
  return out
}
