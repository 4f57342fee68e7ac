import type { Outline } from './outline'

/** Second moment of area about the origin, ∫(x² + y²) dA. */
export function polarArea(outline: Outline): number {
  let sum = 0
  for (let i = 0; i < outline.length; i += 2) {
    const j = (i + 2) % outline.length
    const [ax, ay, bx, by] = [outline[i], outline[i + 1], outline[j], outline[j + 1]]
    sum += ((ax * by - ay * bx) * (ax * ax + ax * bx + bx * bx + ay * ay + ay * by + by * by)) / 12
  }
  return sum
}
