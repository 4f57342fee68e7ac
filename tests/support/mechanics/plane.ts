/** A vector in the engine's plane, [vertical, horizontal]; angles turn from the first towards the second. */
export type Vec = readonly [number, number]

export const add = (...terms: Vec[]): Vec => terms.reduce(([a, b], [c, d]) => [a + c, b + d], [0, 0] as Vec)
export const sub = (a: Vec, b: Vec): Vec => [a[0] - b[0], a[1] - b[1]]
export const times = (k: number, a: Vec): Vec => [k * a[0], k * a[1]]
export const polar = (length: number, angle: number): Vec => [
  length * Math.cos(angle),
  length * Math.sin(angle),
]
/** A quarter turn on. */
export const turned = (a: Vec): Vec => [-a[1], a[0]]
export const dot = (a: Vec, b: Vec) => a[0] * b[0] + a[1] * b[1]
/** Moment of force b at arm a, positive in the direction of rotation. */
export const cross = (a: Vec, b: Vec) => a[0] * b[1] - a[1] * b[0]
