import type { Anchors, Part } from './types'

/** Where the banks stand, found once for a rig: which is the far one depends on the eye. */
export interface Banks {
  /** Mean firing point of each bank. */
  points: Float64Array
  /** How far those points stand from the crank axis. */
  reach: number
  /** 0 near … 1 far, filled by `fillFar`. */
  far: Float64Array
}

export function placeBanks(parts: readonly Part[], firing: Anchors['firing']): Banks {
  const bankOf = new Map<number, number>()
  for (const part of parts) if (part.cylinder >= 0 && part.bank >= 0) bankOf.set(part.cylinder, part.bank)
  const count = Math.max(0, ...[...bankOf.values()].map((bank) => bank + 1))
  const points = new Float64Array(3 * count)
  const members = new Int32Array(count)
  let reach = 0
  for (const [cylinder, bank] of bankOf) {
    const point = firing[cylinder]
    for (let k = 0; k < 3; k++) points[3 * bank + k] += point[k]
    members[bank]++
    reach += Math.hypot(point[0], point[1]) / bankOf.size
  }
  for (let i = 0; i < points.length; i++) points[i] /= members[Math.floor(i / 3)] || 1
  return { points, reach, far: new Float64Array(count) }
}

/** A bank whose firing points stand well behind the nearest bank's is the far one; in between it changes smoothly. */
export function fillFar({ points, reach, far }: Banks, viewProjection: Float64Array): void {
  const m = viewProjection
  let nearest = Infinity
  for (let bank = 0; bank < far.length; bank++) {
    far[bank] = m[3] * points[3 * bank] + m[7] * points[3 * bank + 1] + m[11] * points[3 * bank + 2]
    nearest = Math.min(nearest, far[bank])
  }
  for (let bank = 0; bank < far.length; bank++) {
    const share = Math.min(1, Math.max(0, ((far[bank] - nearest) / reach - 0.2) / 0.4))
    far[bank] = share * share * (3 - 2 * share)
  }
}
