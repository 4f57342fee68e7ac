/** Solves a·x = b by Gaussian elimination with partial pivoting; overwrites both. */
export function solved(a: number[][], b: number[]): number[] {
  const n = b.length
  for (let k = 0; k < n; k++) {
    let best = k
    for (let i = k + 1; i < n; i++) if (Math.abs(a[i][k]) > Math.abs(a[best][k])) best = i
    if (a[best][k] === 0) throw new Error('singular system')
    ;[a[k], a[best]] = [a[best], a[k]]
    ;[b[k], b[best]] = [b[best], b[k]]
    for (let i = k + 1; i < n; i++) {
      const factor = a[i][k] / a[k][k]
      if (factor === 0) continue
      for (let j = k; j < n; j++) a[i][j] -= factor * a[k][j]
      b[i] -= factor * b[k]
    }
  }
  for (let k = n - 1; k >= 0; k--) {
    for (let j = k + 1; j < n; j++) b[k] -= a[k][j] * b[j]
    b[k] /= a[k][k]
  }
  return b
}
