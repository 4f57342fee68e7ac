export interface Least {
  at: number
  value: number
}

const GOLDEN = (Math.sqrt(5) - 1) / 2
const NARROW = 48

/**
 * The least value of a continuous periodic `f` and where it is, 0 ≤ at < period: sampled `steps` times, and every dip
 * among the samples narrowed by golden section (J. Kiefer, Proc. Am. Math. Soc. 4, 1953) until its bracket is 1e-10 of
 * a step, so that a kink is found as well as a smooth least. Two dips inside one step are taken for one.
 */
export function leastOverPeriod(f: (x: number) => number, period: number, steps = 360): Least {
  const step = period / steps
  const samples = Float64Array.from({ length: steps }, (_, i) => f(i * step))
  let best: Least = { at: 0, value: samples[0] }
  for (let i = 0; i < steps; i++) {
    const before = samples[(i + steps - 1) % steps]
    const after = samples[(i + 1) % steps]
    if (samples[i] < best.value) best = { at: i * step, value: samples[i] }
    if (before > samples[i] && samples[i] <= after) {
      const dip = narrowed(f, (i - 1) * step, (i + 1) * step)
      if (dip.value < best.value) best = dip
    }
  }
  return { at: ((best.at % period) + period) % period, value: best.value }
}

function narrowed(f: (x: number) => number, from: number, to: number): Least {
  let [a, b] = [from, to]
  let [left, right] = [b - GOLDEN * (b - a), a + GOLDEN * (b - a)]
  let [atLeft, atRight] = [f(left), f(right)]
  for (let k = 0; k < NARROW; k++) {
    if (atLeft < atRight) {
      b = right
      ;[right, atRight] = [left, atLeft]
      left = b - GOLDEN * (b - a)
      atLeft = f(left)
    } else {
      a = left
      ;[left, atLeft] = [right, atRight]
      right = a + GOLDEN * (b - a)
      atRight = f(right)
    }
  }
  return atLeft < atRight ? { at: left, value: atLeft } : { at: right, value: atRight }
}
