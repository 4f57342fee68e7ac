/** Round numbers from 1, 2, 2.5 and 5 that enclose low … high in about `count` steps. */
export function ticks(low: number, high: number, count: number): number[] {
  const span = high - low || Math.abs(high) || 1
  const rough = span / count
  const power = 10 ** Math.floor(Math.log10(rough))
  const step = [1, 2, 2.5, 5, 10].map((m) => m * power).find((s) => s >= rough * 0.999) ?? 10 * power
  const first = Math.floor(low / step + 1e-9)
  const last = Math.max(first + 1, Math.ceil(high / step - 1e-9))
  return Array.from({ length: last - first + 1 }, (_, i) => Number(((first + i) * step).toPrecision(12)))
}
