/**
 * Where a value stands in a document, independent of its place in a list: keys of objects, and "#" with the name of an
 * entry in a list of named entries. ORDER is the order of such a list.
 */
export type NamedPath = readonly string[]

export const ORDER = 'order'

/** One value that differs between two documents; undefined where there is none. */
export interface Difference {
  path: NamedPath
  was: unknown
  now: unknown
}

type Keyed = Record<string, unknown>

const isObject = (value: unknown): value is Keyed =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

/** How entries of a list are told apart, whatever their place: by their name, a doubt stood by by what it is about. */
export function nameOf(entry: unknown): string | null {
  if (!isObject(entry)) return null
  if (typeof entry.id === 'string') return `#${entry.id}`
  if (typeof entry.code === 'string' && typeof entry.path === 'string') return `#${entry.code} ${entry.path}`
  return null
}

/** The entries of a list by name, in their order; null where it is no list of entries with names of their own. */
export function named(list: unknown): Map<string, unknown> | null {
  if (!Array.isArray(list)) return null
  const entries = new Map<string, unknown>()
  for (const entry of list) {
    const name = nameOf(entry)
    if (name === null || entries.has(name)) return null
    entries.set(name, entry)
  }
  return entries
}

/** Figures and lists of figures are equal by value; a missing key is as good as an undefined one. */
export function sameValue(one: unknown, other: unknown): boolean {
  if (one === other) return true
  if (Array.isArray(one) && Array.isArray(other))
    return one.length === other.length && one.every((value, i) => sameValue(value, other[i]))
  if (!isObject(one) || !isObject(other)) return false
  return keysOf(one, other).every((key) => sameValue(one[key], other[key]))
}

const keysOf = (one: Keyed, other: Keyed) => [...new Set([...Object.keys(one), ...Object.keys(other)])]

/** Two of one kind are compared inside; `model` tells kinds of one thing apart, and a camera is one value. */
const comparedInside = (one: Keyed, other: Keyed, path: NamedPath) =>
  one.model === other.model && path.at(-1) !== 'camera'

/** Where nothing is said, these hold nothing, rather than being absent as a whole. */
const empty: Record<string, unknown> = { shape: {}, inertia: {}, operating: {}, acknowledged: [] }

/** Everything that differs, each at the innermost place where it does. */
export function differencesOf(before: unknown, after: unknown, path: NamedPath = []): Difference[] {
  const nothing = empty[path.at(-1) ?? '']
  const [was, now] = [before ?? nothing, after ?? nothing]
  if (sameValue(was, now)) return []
  if (isObject(was) && isObject(now) && comparedInside(was, now, path))
    return keysOf(was, now).flatMap((key) => differencesOf(was[key], now[key], [...path, key]))
  const [old, young] = [named(was), named(now)]
  if (!old || !young) return [{ path, was, now }]
  const names = [...new Set([...old.keys(), ...young.keys()])]
  const inside = names.flatMap((name) => differencesOf(old.get(name), young.get(name), [...path, name]))
  const oldOrder = [...old.keys()].filter((name) => young.has(name))
  const youngOrder = [...young.keys()].filter((name) => old.has(name))
  return sameValue(oldOrder, youngOrder)
    ? inside
    : [...inside, { path: [...path, ORDER], was: oldOrder, now: youngOrder }]
}

/** The value at a path; undefined where there is none. */
export function valueIn(document: unknown, path: NamedPath): unknown {
  return path.reduce<unknown>(
    (at, step) => (Array.isArray(at) ? named(at)?.get(step) : isObject(at) ? at[step] : undefined),
    document,
  )
}

/** Whether one place lies in the other, or is it. */
export const within = (inner: NamedPath, outer: NamedPath): boolean =>
  outer.length <= inner.length && outer.every((step, i) => step === inner[i])

export const pathKey = (path: NamedPath): string => path.map(encodeURIComponent).join('/')
