import type { PlaneSignal } from './cycle-parts'

export const loadParts = ['gas', 'inertia', 'total'] as const
export type LoadPart = (typeof loadParts)[number]

/** One signal at a speed, rad/s: of the gas alone, of inertia alone, or of both. */
export function signalAt(
  gas: Float64Array,
  inertia: Float64Array,
  part: LoadPart,
  speed: number,
): Float64Array {
  if (part === 'gas') return gas
  const square = speed * speed
  const from = part === 'total' ? 1 : 0
  return inertia.map((value, j) => from * gas[j] + square * value)
}

export const planeAt = (
  gas: PlaneSignal,
  inertia: PlaneSignal,
  part: LoadPart,
  speed: number,
): PlaneSignal => ({
  vertical: signalAt(gas.vertical, inertia.vertical, part, speed),
  horizontal: signalAt(gas.horizontal, inertia.horizontal, part, speed),
})

/** Samples at most 1° apart, of which every `between`th is an angle of an answer in steps of `stepDeg`. */
export function samplesFor(stepDeg: number): { sampleDeg: number; between: number } {
  const between = Math.ceil(stepDeg - 1e-9)
  return { sampleDeg: stepDeg / between, between }
}
