/**
 * Complex Fourier coefficient of order k (per crank revolution) of a signal sampled evenly over a cycle,
 * by the plain sum.
 */
export function coefficient(signal: ArrayLike<number>, order: number, revolutions: number): [number, number] {
  const n = signal.length
  let [re, im] = [0, 0]
  for (let i = 0; i < n; i++) {
    const phase = (2 * Math.PI * ((order * revolutions * i) % n)) / n
    re += signal[i] * Math.cos(phase)
    im -= signal[i] * Math.sin(phase)
  }
  return [re / n, im / n]
}

/** Slope by crank angle of a smooth periodic signal, from its Fourier sum up to `highest` orders a cycle. */
export function slope(
  signal: ArrayLike<number>,
  revolutions: number,
  highest = Math.floor(signal.length / 4),
) {
  const n = signal.length
  const result = new Float64Array(n)
  for (let k = 1; k <= highest; k++) {
    let [a, b] = [0, 0]
    for (let i = 0; i < n; i++) {
      const phase = (2 * Math.PI * ((k * i) % n)) / n
      a += signal[i] * Math.cos(phase)
      b += signal[i] * Math.sin(phase)
    }
    const order = k / revolutions
    for (let i = 0; i < n; i++) {
      const phase = (2 * Math.PI * ((k * i) % n)) / n
      result[i] += ((2 * order) / n) * (b * Math.cos(phase) - a * Math.sin(phase))
    }
  }
  return result
}
