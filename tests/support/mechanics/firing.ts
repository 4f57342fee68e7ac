export interface FiringInput {
  cycleDeg: number
  /** A top dead centre of each cylinder, degrees. */
  tdcDeg: Record<string, number>
  order: string[]
  statedDeg: Record<string, number | undefined>
}

/** Rounding of two sums of squares that are equal on paper, degrees². */
const TIE = 1e-5

const modulo = (x: number, m: number): number => {
  const r: number = ((x % m) + m) % m
  return m - r < 1e-7 ? 0 : r
}

/** Intervals from each event to the next in a closed cycle; all at once counts as one interval of the whole cycle. */
export function intervals(angles: number[], cycleDeg: number) {
  const gaps: number[] = angles.map((a, i): number => modulo(angles[(i + 1) % angles.length] - a, cycleDeg))
  if (!gaps.some((g) => g > 0)) gaps[gaps.length - 1] = cycleDeg
  return gaps
}

/**
 * Every choice of turns that keeps the order, tried one by one; the rule of the document format picks among them.
 * Two cylinders at once keep an order only where no choice sets them apart.
 */
export const firingEvents = (input: FiringInput) => chosen(input, 0.01) ?? chosen(input, -1)

function chosen({ cycleDeg, tdcDeg, order, statedDeg }: FiringInput, leastGap: number) {
  const turns = Math.round(cycleDeg / 360)
  const choices = order.map((id) => {
    const all: number[] = Array.from({ length: turns }, (_, k) =>
      modulo(modulo(tdcDeg[id], 360) + 360 * k, cycleDeg),
    )
    const stated = statedDeg[id]
    if (stated === undefined) return all.sort((a, b) => a - b)
    return all.filter((a) => Math.abs(modulo(a - stated + cycleDeg / 2, cycleDeg) - cycleDeg / 2) <= 0.5)
  })
  let best: { angles: number[]; squares: number } | undefined
  const angles: number[] = []
  const tryFrom = (k: number, used: number) => {
    if (k === order.length) {
      const gaps = intervals(angles, cycleDeg)
      if (Math.abs(gaps.reduce((a, b) => a + b, 0) - cycleDeg) > 1e-6 || gaps[gaps.length - 1] <= leastGap)
        return
      const squares = gaps.reduce((sum, g) => sum + g * g, 0)
      if (
        !best ||
        squares < best.squares - TIE ||
        (squares < best.squares + TIE && earlier(angles, best.angles))
      )
        best = { angles: [...angles], squares }
      return
    }
    for (const angle of choices[k]) {
      const gap = k === 0 ? 0 : modulo(angle - angles[k - 1], cycleDeg)
      if (used + gap > cycleDeg + 1e-6 || (k > 0 && gap <= leastGap)) continue
      angles.push(angle)
      tryFrom(k + 1, used + gap)
      angles.pop()
    }
  }
  tryFrom(0, 0)
  if (!best) return undefined
  return order.map((cylinder, i) => ({ cylinder, angleDeg: best!.angles[i] }))
}

function earlier(a: number[], b: number[]) {
  const at = a.findIndex((x, i) => Math.abs(x - b[i]) > 1e-7)
  return at !== -1 && a[at] < b[at]
}
