/**
 * The root of a continuous `f` between a and b, where f(a) and f(b) differ in sign, to the last bit that f itself
 * resolves: false position with the Illinois change (Dowell and Jarratt, BIT 11, 1971), bisecting where that stalls.
 * Throws RangeError when there is no change of sign.
 */
export function bracketedRoot(f: (x: number) => number, a: number, b: number): number {
  let [low, high, atLow, atHigh] = [a, b, f(a), f(b)]
  if (atLow === 0) return low
  if (atHigh === 0) return high
  if (atLow > 0 === atHigh > 0) throw new RangeError('f has the same sign at both ends')
  for (let step = 0; step < 200; step++) {
    const secant = high - (atHigh * (high - low)) / (atHigh - atLow)
    const inside = secant > Math.min(low, high) && secant < Math.max(low, high)
    const x = inside && step % 3 !== 2 ? secant : (low + high) / 2
    if (x === low || x === high) break
    const value = f(x)
    if (value === 0) return x
    if (value > 0 === atHigh > 0) {
      atLow /= 2
      high = x
      atHigh = value
    } else {
      low = high
      atLow = atHigh
      high = x
      atHigh = value
    }
  }
  return high
}
