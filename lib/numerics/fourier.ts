/** cos and sin of 2π·j/n, j = 0 … n − 1: one table serves every order of a signal of n samples. */
export interface UnitCircle {
  cos: Float64Array
  sin: Float64Array
}

export function unitCircle(n: number): UnitCircle {
  const cos = new Float64Array(n)
  const sin = new Float64Array(n)
  for (let j = 0; j < n; j++) {
    cos[j] = Math.cos((2 * Math.PI * j) / n)
    sin[j] = Math.sin((2 * Math.PI * j) / n)
  }
  return { cos, sin }
}

export interface Complex {
  re: number
  im: number
}

/**
 * The complex Fourier coefficient c = (1/n) Σ f_j e^(−i·2π·bin·j/n) of a real signal sampled over one period.
 * The harmonic itself is 2·Re(c·e^(i·2π·bin·j/n)). Bins from 0 up to, and not at, half the number of samples.
 */
export function fourierCoefficient(signal: ArrayLike<number>, bin: number, circle: UnitCircle): Complex {
  const n = signal.length
  let [re, im] = [0, 0]
  for (let j = 0, k = 0; j < n; j++) {
    re += signal[j] * circle.cos[k]
    im -= signal[j] * circle.sin[k]
    k += bin
    if (k >= n) k -= n
  }
  return { re: re / n, im: im / n }
}

/** A·cos(x − phase), with its phase in rad. */
export interface Harmonic {
  amplitude: number
  phase: number
}

/** The harmonic 2·Re(c·e^(ix)) that a coefficient other than the mean stands for. */
export const harmonicOf = ({ re, im }: Complex): Harmonic => ({
  amplitude: 2 * Math.hypot(re, im),
  phase: re === 0 && im === 0 ? 0 : -Math.atan2(im, re),
})
