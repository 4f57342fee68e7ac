import { readFileSync } from 'node:fs'
import { expect } from 'vitest'

export type Value = number | number[] | string
interface Allowed {
  abs?: number
  rel?: number
}

export interface Entry {
  id: string
  topic: string
  source: { author: string; title: string; where?: string }
  provenance: 'published' | 'common practice' | 'from memory'
  inputs: Record<string, number>
  expected: Record<string, unknown>
  exact?: Record<string, Value>
  tolerance: Record<string, Allowed>
}

export const entries = JSON.parse(
  readFileSync(new URL('../../../golden/published.json', import.meta.url), 'utf8'),
) as Entry[]

/** The kernel's figure; where the print rests on an approximation, also the figure that approximation gives. */
export type Figure = Value | { exact: number; printed: number }
export type Figures = Record<string, Figure>

export interface Case {
  /** From the entry's own inputs; those that are no plain number are read with `inputs`. */
  figures: (i: Record<string, number>) => Figures
  /** Keys of the entry that the kernel has no figure for, and why. */
  without?: Record<string, string>
}

/** The inputs of an entry in the shape it has. */
export const inputs = <T>(id: string) => entries.find((e) => e.id === id)!.inputs as unknown as T

export const title = (id: string) => {
  const e = entries.find((entry) => entry.id === id)!
  return `${id}: ${e.source.author}, ${e.source.title} (${e.provenance})`
}

/** `exact` to 1e-6 and `expected` within the entry's own tolerance, key by key; every key must have its figure. */
export function check(id: string, { figures, without = {} }: Case) {
  const entry = entries.find((e) => e.id === id)!
  const given = figures(entry.inputs)
  const keys = [...new Set([...Object.keys(entry.expected), ...Object.keys(entry.exact ?? {})])]
  expect([...Object.keys(given), ...Object.keys(without)].sort()).toEqual(keys.sort())
  for (const [key, figure] of Object.entries(given)) {
    const [exact, printed] = isPair(figure) ? [figure.exact, figure.printed] : [figure, figure]
    if (entry.exact && key in entry.exact)
      within(`${key} (exact)`, exact, entry.exact[key], { rel: 1e-6, abs: 1e-9 })
    if (key in entry.expected)
      within(
        `${key} (printed)`,
        printed,
        entry.expected[key] as Value,
        entry.tolerance[key] ?? entry.tolerance.default,
      )
  }
}

const isPair = (figure: Figure): figure is { exact: number; printed: number } =>
  typeof figure === 'object' && !Array.isArray(figure)

function within(name: string, actual: Value, wanted: Value, { abs = 0, rel = 0 }: Allowed) {
  if (typeof actual === 'string' || typeof wanted === 'string') return expect(actual, name).toBe(wanted)
  const [a, w] = [[actual].flat(), [wanted].flat()]
  expect(a.length, name).toBe(w.length)
  a.forEach((value, i) => {
    const off = Math.abs(value - w[i])
    expect(off, `${name}: ${value} against ${w[i]}`).toBeLessThanOrEqual(Math.max(abs, rel * Math.abs(w[i])))
  })
}
