import { gaussLegendre } from '@/lib/numerics/gauss-legendre'
import { chamberVolume, type Chamber } from './chamber'
import type { Gas } from './train'

export type HeatRelease = Extract<Gas, { model: 'heat-release' }>

/**
 * Single-zone pressure from heat release. With dp/dθ = ((γ−1)·dQ/dθ − γ·p·dV/dθ)/V the quantity p·V^γ grows only by
 * heat, d(p·V^γ)/dθ = (γ−1)·V^(γ−1)·dQ/dθ, so the pressure at any angle is an integral and needs no stepping:
 *   p = (p·V^γ at intake closing + (γ−1) ∫ V^(γ−1) dQ) / V^γ   from intake closing to exhaust opening,
 *   Q(x) = heat × (1 − exp(−a·x^(m+1))), x the fraction of the combustion duration, held after it
 *   (I. I. Wiebe's law, as in J. B. Heywood, Internal Combustion Engine Fundamentals, 1988, section 9.2).
 * After exhaust opening p falls to exhaust pressure as exp(−Δθ/blowdown); from the cycle's start to intake closing it is
 * intake pressure. Angles from firing top dead centre, −half a cycle ≤ angle < half a cycle; rad, Pa, m³, J.
 */
export interface HeatReleaseTable {
  /** p·V^γ at intake closing. */
  base: number
  /** w = x^(1/4) where heat begins to count (intake closed and combustion started) and ends to (burnt or exhaust open). */
  begin: number
  end: number
  /** (γ−1) ∫ V^(γ−1) dQ from `begin` to the end of each panel; the first entry is 0. */
  gain: Float64Array
  /** Pressure at exhaust opening. */
  opening: number
}

const PANELS = 48
const rule = gaussLegendre(8)

export function heatReleaseTable(gas: HeatRelease, chamber: Chamber): HeatReleaseTable {
  const begin = rootAt(gas, gas.intakeCloses)
  const end = rootAt(gas, gas.exhaustOpens)
  const gain = new Float64Array(PANELS + 1)
  for (let panel = 0; panel < PANELS; panel++)
    gain[panel + 1] =
      gain[panel] + gainBetween(gas, chamber, edge(begin, end, panel), edge(begin, end, panel + 1))
  const base = gas.intakePressure * chamberVolume(chamber, gas.intakeCloses) ** gas.gamma
  const opening = (base + gain[PANELS]) / chamberVolume(chamber, gas.exhaustOpens) ** gas.gamma
  return { base, begin, end, gain, opening }
}

/** The pressure at `angle`, where the chamber's volume is `volume`. */
export function heatReleasePressure(
  gas: HeatRelease,
  table: HeatReleaseTable,
  chamber: Chamber,
  angle: number,
  volume: number,
): number {
  if (angle < gas.intakeCloses) return gas.intakePressure
  if (angle > gas.exhaustOpens) {
    const fall = Math.exp((gas.exhaustOpens - angle) / gas.blowdown)
    return gas.exhaustPressure + (table.opening - gas.exhaustPressure) * fall
  }
  return (table.base + gainUpTo(gas, table, chamber, angle)) / Math.pow(volume, gas.gamma)
}

function gainUpTo(gas: HeatRelease, table: HeatReleaseTable, chamber: Chamber, angle: number): number {
  const { begin, end, gain } = table
  const root = rootAt(gas, angle)
  if (root <= begin) return 0
  if (root >= end) return gain[PANELS]
  const panel = Math.floor(((root - begin) / (end - begin)) * PANELS)
  return gain[panel] + gainBetween(gas, chamber, edge(begin, end, panel), root)
}

/** w = x^(1/4) at an angle, 0 before combustion and 1 after it. */
function rootAt(gas: HeatRelease, angle: number): number {
  const x = (angle - gas.combustionStart) / gas.combustionDuration
  return x <= 0 ? 0 : x >= 1 ? 1 : Math.sqrt(Math.sqrt(x))
}

const edge = (begin: number, end: number, panel: number) => begin + ((end - begin) * panel) / PANELS

/**
 * (γ−1) ∫ V^(γ−1) dQ between two values of w = x^(1/4): in w the heat is released without the kink that x^m has at
 * its start, so that a few Gauss points a panel suffice for any exponent m ≥ 0.
 */
function gainBetween(gas: HeatRelease, chamber: Chamber, from: number, to: number): number {
  const { nodes, weights } = rule
  const half = (to - from) / 2
  let sum = 0
  for (let k = 0; k < nodes.length; k++) {
    const w = from + half * (1 + nodes[k])
    const x = w * w * w * w
    const power = Math.pow(x, gas.wiebeM)
    const rate = power * Math.exp(-gas.wiebeA * power * x) * w * w * w
    const volume = chamberVolume(chamber, gas.combustionStart + gas.combustionDuration * x)
    sum += weights[k] * rate * Math.pow(volume, gas.gamma - 1)
  }
  return (gas.gamma - 1) * gas.heatPerCycle * gas.wiebeA * (gas.wiebeM + 1) * 4 * half * sum
}
